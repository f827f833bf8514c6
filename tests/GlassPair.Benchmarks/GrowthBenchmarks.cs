using BenchmarkDotNet.Attributes;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;

namespace GlassPair.Benchmarks;

/// <summary>The 200 best pairs of more and more glasses: four times the work for twice the glasses.</summary>
public class GrowthBenchmarks
{
    private IndexTable _table = null!;

    [Params(400, 800, 1_600, 3_200)]
    public int Glasses { get; set; }

    [GlobalSetup]
    public void SetUp() => _table = BenchmarkGlasses.Table(Glasses);

    [Benchmark]
    public Shortlist Pairs() => PairRanking.Rank(
        _table, new ShortlistRequest(BenchmarkGlasses.Objective, GlassLimits.None, DataQuality.UsualSupply, RankBy.ColorResidual, 200));
}
