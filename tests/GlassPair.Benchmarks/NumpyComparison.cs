using System.Diagnostics;
using System.Globalization;
using System.Text;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;

namespace GlassPair.Benchmarks;

/// <summary>The figures of every pair here and in numpy/all_pairs.py, turn by turn in one run: CPU times of one thread, so that only their ratio counts.</summary>
internal static class NumpyComparison
{
    private const int Turns = 7;
    private const int FillsPerTurn = 5;

    /// <summary>Two sums of a million figures in another order of adding agree better than this; another figure would not.</summary>
    private const double LargestDifference = 1e-9;

    /// <summary>Runs both and says how they compare, in Markdown.</summary>
    /// <exception cref="InvalidOperationException">The script fails, or the two disagree on what they computed.</exception>
    public static string Run()
    {
        var request = new ShortlistRequest(BenchmarkGlasses.Objective, GlassLimits.None, DataQuality.UsualSupply, RankBy.ColorResidual, 1);
        var glasses = new GlassColumns(
            request.Requirement, request.Quality, GlassSelection.From(BenchmarkGlasses.Table(BenchmarkGlasses.All.Count), request).Distinct);
        string table = Path.Combine(Path.GetTempPath(), $"glasspair-{Environment.ProcessId}.csv");
        File.WriteAllText(table, TableOf(glasses));
        try
        {
            List<(double Numpy, double Own)> seconds = [];
            for (int turn = 0; turn < Turns; turn++)
            {
                (double numpy, double[] numpySums) = RunNumpy(table);
                (double own, double[] ownSums) = RunOwn(glasses);
                if (!numpySums.Zip(ownSums).All(s => Math.Abs(s.First - s.Second) <= LargestDifference * s.Second))
                {
                    throw new InvalidOperationException($"numpy sums {string.Join(", ", numpySums)}; the kernel {string.Join(", ", ownSums)}.");
                }

                seconds.Add((numpy, own));
            }

            double[] ratios = [.. seconds.Select(s => s.Numpy / s.Own).Order()];
            long pairs = (long)glasses.Count * (glasses.Count - 1) / 2;
            return string.Create(
                CultureInfo.InvariantCulture,
                $"""
                | {pairs:N0} pairs, CPU time of one thread, {Turns} turns | best | ratio, median | ratio, least to most |
                |---|---|---|---|
                | plain numpy | {1e3 * seconds.Min(s => s.Numpy):0.#} ms | 1 | |
                | vector kernel | {1e3 * seconds.Min(s => s.Own):0.##} ms | {ratios[Turns / 2]:0} | {ratios[0]:0} to {ratios[^1]:0} |
                """);
        }
        finally
        {
            File.Delete(table);
        }
    }

    private static string TableOf(GlassColumns glasses)
    {
        var text = new StringBuilder();
        Append([glasses.Requirement.FocalLength, 0.0, 0.0, .. glasses.Weights]);
        for (int j = 0; j < glasses.Count; j++)
        {
            Append([glasses.Floor[j], glasses.ShortChange[j], glasses.LongChange[j], .. glasses.Changes.Select(c => c[j])]);
        }

        return text.ToString();

        void Append(double[] row) => text.AppendJoin(',', row.Select(v => v.ToString("R", CultureInfo.InvariantCulture))).Append('\n');
    }

    private static (double Seconds, double[] Sums) RunNumpy(string table)
    {
        var start = new ProcessStartInfo(
            Environment.GetEnvironmentVariable("GLASSPAIR_PYTHON") ?? "python3",
            [BenchmarkGlasses.PathOf("tests/GlassPair.Benchmarks/numpy/all_pairs.py"), table, "2"])
        {
            RedirectStandardOutput = true,
            Environment = { ["OMP_NUM_THREADS"] = "1", ["OPENBLAS_NUM_THREADS"] = "1" },
        };
        using Process process = Process.Start(start) ?? throw new InvalidOperationException("Python does not start.");
        string[] words = process.StandardOutput.ReadToEnd().Split([' ', '\n'], StringSplitOptions.RemoveEmptyEntries);
        process.WaitForExit();
        if (process.ExitCode != 0)
        {
            throw new InvalidOperationException("numpy/all_pairs.py failed: it needs Python 3 with numpy; GLASSPAIR_PYTHON names one that has it.");
        }

        double[] values = [.. words.Select(w => double.Parse(w, CultureInfo.InvariantCulture))];
        return (values[0], values[1..]);
    }

    private static (double Seconds, double[] Sums) RunOwn(GlassColumns glasses)
    {
        var row = new RowFigures(glasses, 2);
        double best = double.PositiveInfinity;
        for (int fill = 0; fill < FillsPerTurn; fill++)
        {
            TimeSpan start = Environment.CpuUsage.TotalTime;
            for (int first = 0; first < glasses.Count; first++)
            {
                PairKernel.Fill(glasses, first, row);
            }

            best = Math.Min(best, (Environment.CpuUsage.TotalTime - start).TotalSeconds);
        }

        double[] sums = new double[4];
        for (int first = 0; first < glasses.Count; first++)
        {
            PairKernel.Fill(glasses, first, row);
            for (int rear = first + 1; rear < glasses.Count; rear++)
            {
                if (!double.IsNaN(row.Powers[0][rear]))
                {
                    sums[0] += row.Rms[rear];
                    sums[1] += row.PeakToValley[rear];
                    sums[2] += Math.Abs(row.SecondarySpectrum[rear]);
                    sums[3] += row.ExpectedRms[rear];
                }
            }
        }

        return (best, sums);
    }
}
