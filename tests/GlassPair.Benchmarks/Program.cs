using BenchmarkDotNet.Running;
using GlassPair.Benchmarks;

// "record" measures everything and writes results/<processor>.md; "numpy" compares with numpy alone; all else goes to BenchmarkDotNet,
// such as --filter '*Shortlist*'.
switch (args)
{
    case ["record"]:
        ResultsFile.Write();
        break;
    case ["numpy"]:
        Console.WriteLine(NumpyComparison.Run());
        break;
    default:
        BenchmarkSwitcher.FromAssembly(typeof(ResultsFile).Assembly).Run(args, ResultsFile.Config);
        break;
}
