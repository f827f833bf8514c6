using System.Globalization;
using System.Text.RegularExpressions;
using BenchmarkDotNet.Configs;
using BenchmarkDotNet.Diagnosers;
using BenchmarkDotNet.Environments;
using BenchmarkDotNet.Exporters;
using BenchmarkDotNet.Jobs;
using BenchmarkDotNet.Loggers;
using BenchmarkDotNet.Reports;
using BenchmarkDotNet.Running;
using BenchmarkDotNet.Toolchains.InProcess.Emit;

namespace GlassPair.Benchmarks;

/// <summary>What this processor reaches, kept beside the benchmarks: results/&lt;processor&gt;.md.</summary>
internal static partial class ResultsFile
{
    /// <summary>Gets short runs in this process: on a shared machine only ratios count, and those need no more.</summary>
    public static IConfig Config { get; } = DefaultConfig.Instance
        .AddJob(Job.ShortRun.WithToolchain(InProcessEmitToolchain.Instance))
        .AddDiagnoser(MemoryDiagnoser.Default);

    /// <summary>Measures everything and writes the file.</summary>
    public static void Write()
    {
        var text = new AccumulationLogger();
        string processor = HostEnvironmentInfo.GetCurrent().Cpu.Value?.ProcessorName?.Trim() ?? "unknown processor";
        text.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"""
            # {processor}

            Measured on {DateTime.UtcNow:yyyy-MM-dd} with `dotnet run -c Release --project tests/GlassPair.Benchmarks -- record`,
            .NET {Environment.Version}, {Environment.ProcessorCount} threads, shared with other work: ratios hold, times do not.

            ## Every pair against plain numpy

            """));
        text.WriteLine(NumpyComparison.Run());
        foreach (Type type in new[] { typeof(PairFiguresBenchmarks), typeof(ShortlistBenchmarks), typeof(GrowthBenchmarks), typeof(TripletBenchmarks) })
        {
            Summary summary = BenchmarkRunner.Run(type, Config);
            text.WriteLine($"\n## {type.Name}\n");
            MarkdownExporter.GitHub.ExportToLog(summary, text);
        }

        File.WriteAllText(
            BenchmarkGlasses.PathOf($"tests/GlassPair.Benchmarks/results/{NotInNames().Replace(processor, "-").Trim('-')}.md"), text.GetLog());
    }

    [GeneratedRegex("[^A-Za-z0-9]+")]
    private static partial Regex NotInNames();
}
