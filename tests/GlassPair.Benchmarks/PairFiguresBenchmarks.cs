using BenchmarkDotNet.Attributes;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;

namespace GlassPair.Benchmarks;

/// <summary>Powers, RMS, peak to valley, secondary spectrum and expected residual of every pair of the catalogue, without any limit.</summary>
public class PairFiguresBenchmarks
{
    private GlassColumns _glasses = null!;
    private RowFigures _row = null!;

    [GlobalSetup]
    public void SetUp()
    {
        var request = new ShortlistRequest(BenchmarkGlasses.Objective, GlassLimits.None, DataQuality.UsualSupply, RankBy.ColorResidual, 1);
        _glasses = new GlassColumns(
            request.Requirement, request.Quality, GlassSelection.From(BenchmarkGlasses.Table(BenchmarkGlasses.All.Count), request).Distinct);
        _row = new RowFigures(_glasses, 2);
    }

    [Benchmark(Baseline = true)]
    public void Scalar()
    {
        for (int first = 0; first < _glasses.Count; first++)
        {
            PairKernel.FillScalar(_glasses, first, _row);
        }
    }

    [Benchmark]
    public void FourLanes()
    {
        for (int first = 0; first < _glasses.Count; first++)
        {
            PairKernel.FillVector<Lanes256>(_glasses, first, _row);
        }
    }

    [Benchmark]
    public void EightLanes()
    {
        for (int first = 0; first < _glasses.Count; first++)
        {
            PairKernel.FillVector<Lanes512>(_glasses, first, _row);
        }
    }
}
