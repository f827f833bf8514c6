using BenchmarkDotNet.Attributes;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;

namespace GlassPair.Benchmarks;

/// <summary>The 200 best triplets of the whole catalogue, more than 500 million.</summary>
public class TripletBenchmarks
{
    private readonly IndexTable _table = BenchmarkGlasses.Table(BenchmarkGlasses.All.Count);

    [Benchmark(Baseline = true)]
    public Shortlist BandBalanced() => Rank(BenchmarkGlasses.Objective);

    [Benchmark]
    public Shortlist EndsUnited() => Rank(BenchmarkGlasses.Objective with { Balance = ColorBalance.EndsUnited });

    private Shortlist Rank(Requirement requirement) => TripletRanking.Rank(
        _table, new ShortlistRequest(requirement, GlassLimits.None, DataQuality.UsualSupply, RankBy.ColorResidual, 200) { Elements = 3 });
}
