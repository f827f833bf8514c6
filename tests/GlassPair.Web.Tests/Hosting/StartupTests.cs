using System.Diagnostics;
using System.Net;
using System.Net.Sockets;

namespace GlassPair.Web.Tests.Hosting;

/// <summary>The program as its user starts it.</summary>
public sealed class StartupTests
{
    private static readonly TimeSpan Patience = TimeSpan.FromMinutes(2);

    [Fact]
    public async Task Start_OnABusyPort_SaysSoInOneSentence()
    {
        using var other = new TcpListener(IPAddress.Loopback, 0);
        other.Start();
        (int code, string said, string complained) = await Run("--urls", FormattableString.Invariant($"http://127.0.0.1:{((IPEndPoint)other.LocalEndpoint).Port}"));
        Assert.Equal(1, code);
        Assert.Matches("^GlassPair cannot start: .*address already in use.*--urls", complained);
        Assert.Single(complained.TrimEnd().Split('\n'));
        Assert.DoesNotContain("   at ", said, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Start_WithAWrongSetting_NamesIt()
    {
        (int code, string said, string complained) = await Run("--urls", "http://127.0.0.1:0", "--GlassPair:Limits:ApiCallsPerMinute=0");
        Assert.Equal(1, code);
        Assert.Contains("ApiCallsPerMinute must be between 1 and 1000000", complained, StringComparison.Ordinal);
        Assert.DoesNotContain("   at ", said + complained, StringComparison.Ordinal);
    }

    private static async Task<(int Code, string Said, string Complained)> Run(params string[] arguments)
    {
        using var stop = new CancellationTokenSource(Patience);
        using Process program = Process.Start(new ProcessStartInfo("dotnet", [Path.Combine(AppContext.BaseDirectory, "GlassPair.Web.dll"), .. arguments])
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            Environment = { ["ASPNETCORE_ENVIRONMENT"] = "Production" },
        })!;
        try
        {
            Task<string> said = program.StandardOutput.ReadToEndAsync(stop.Token);
            Task<string> complained = program.StandardError.ReadToEndAsync(stop.Token);
            await program.WaitForExitAsync(stop.Token);
            return (program.ExitCode, await said, await complained);
        }
        finally
        {
            if (!program.HasExited)
            {
                program.Kill();
            }
        }
    }
}
