using BenchmarkDotNet.Attributes;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;

namespace GlassPair.Benchmarks;

/// <summary>The 200 best pairs of the whole catalogue, as a page asks for them, and the indices over a new band.</summary>
public class ShortlistBenchmarks
{
    private readonly IndexTable _table = BenchmarkGlasses.Table(BenchmarkGlasses.All.Count);

    [Benchmark(Baseline = true)]
    public Shortlist Contact() => Rank(BenchmarkGlasses.Objective with { ElementPowerLimit = 3.0 }, null);

    [Benchmark]
    public Shortlist ContactThreePairsPerGlass() => Rank(BenchmarkGlasses.Objective with { ElementPowerLimit = 3.0 }, 3);

    [Benchmark]
    public Shortlist ContactAnyPower() => Rank(BenchmarkGlasses.Objective, null);

    [Benchmark]
    public Shortlist AirSpaced() => Rank(BenchmarkGlasses.Objective with { ElementPowerLimit = 3.0, AirSpace = 2.0 }, null);

    [Benchmark]
    public IndexTable IndicesOfANewBand() => IndexTable.Of(BenchmarkGlasses.All, _table.Band);

    private Shortlist Rank(Requirement requirement, int? pairsPerGlass) => PairRanking.Rank(
        _table, new ShortlistRequest(requirement, GlassLimits.None, DataQuality.UsualSupply, RankBy.ColorResidual, 200, pairsPerGlass));
}
