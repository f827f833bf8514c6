using System.Net.Sockets;
using GlassPair.Web.Stocks;
using Microsoft.AspNetCore.Connections;
using Microsoft.AspNetCore.Hosting.Server;
using Microsoft.AspNetCore.Hosting.Server.Features;
using Microsoft.AspNetCore.Http.Features;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Hosting;

/// <summary>Starts the site and says in words where it can be opened, or why it cannot start.</summary>
public static class Startup
{
    /// <summary>The address where no other is set.</summary>
    public const string UsualAddress = "http://localhost:5080";

    /// <summary>Keeps the host from logging why it could not start, which <see cref="Explain"/> says in words.</summary>
    public static IServiceCollection AddWordsAtStart(this IServiceCollection services)
    {
        var progress = new Progress();
        services.AddSingleton(progress);
        services.Configure<LoggerFilterOptions>(options => options.Rules.Add(new LoggerFilterRule(
            providerName: null, "Microsoft.Extensions.Hosting.Internal.Host", LogLevel.Information, (_, _, _) => progress.HasStarted)));
        return services;
    }

    /// <summary>Says why the site cannot start; null where words cannot say it.</summary>
    public static string? Explain(Exception problem) => problem switch
    {
        IOException { InnerException: AddressInUseException or SocketException } =>
            $"GlassPair cannot start: {problem.Message} Stop the other program, or choose another address with --urls http://localhost:5081",
        OptionsValidationException => $"GlassPair cannot start: its settings are wrong. {problem.Message}",
        InvalidDataException => $"GlassPair cannot start: {problem.Message}",
        _ => null,
    };

    /// <summary>Runs the site until it is stopped.</summary>
    public static async Task RunToEndAsync(this WebApplication app)
    {
        _ = app.Services.GetRequiredService<StockLibrary>();
        Progress progress = app.Services.GetRequiredService<Progress>();
        IFeatureCollection server = app.Services.GetRequiredService<IServer>().Features;
        await app.StartAsync();
        progress.HasStarted = true;
        foreach (string address in server.Get<IServerAddressesFeature>()?.Addresses ?? [])
        {
            Console.WriteLine($"GlassPair is ready: open {Readable(address)}");
        }

        await app.WaitForShutdownAsync();
    }

    private static string Readable(string address) => address
        .Replace("//[::]", "//localhost", StringComparison.Ordinal)
        .Replace("//0.0.0.0", "//localhost", StringComparison.Ordinal)
        .Replace("//127.0.0.1", "//localhost", StringComparison.Ordinal);

    private sealed class Progress
    {
        public volatile bool HasStarted;
    }
}
