using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Color;

public sealed class FocalShiftCurveTests
{
    private static readonly Band s_band = Band.Even(TestGlasses.Line("g").Wavelength, TestGlasses.Line("e").Wavelength, TestGlasses.Line("C").Wavelength, 9);

    [Fact]
    public void Of_AnySolution_IsCountedFromTheMiddleOfTheSamples()
    {
        FocalShiftCurve curve = FocalShiftCurve.Of(Solve(8.0, "schott/N-BK7", "schott/F2"));
        Assert.Equal(curve.Samples.Max(s => s.Shift), -curve.Samples.Min(s => s.Shift), 1e-12);
    }

    [Fact]
    public void Of_PairsOnEitherSideOfTheLimit_ZoneSaysTheSameAsTheVerdict()
    {
        foreach (double fNumber in new[] { 5.0, 8.0, 11.0, 13.0, 16.0 })
        {
            ThinSolution solution = Solve(fNumber, "schott/N-BK7", "schott/F2");
            FocalShiftCurve curve = FocalShiftCurve.Of(solution);
            Assert.Equal(solution.Holds, curve.Samples.All(s => Math.Abs(s.Shift) <= solution.Requirement.DepthOfFocus));
        }
    }

    [Fact]
    public void Of_AnySolution_CurveGoesThroughTheSolutionAndBeyondTheBand()
    {
        ThinSolution solution = Solve(8.0, "schott/N-BK7", "schott/F2");
        FocalShiftCurve curve = FocalShiftCurve.Of(solution);
        Assert.True(curve.Curve[0].Wavelength < s_band.ShortEnd && curve.Curve[^1].Wavelength > s_band.LongEnd);
        Assert.All(curve.Curve, p => Assert.Equal(solution.FocalShiftAt(p.Wavelength), p.Shift + curve.MiddleFocus, 1e-12));
    }

    [Fact]
    public void Of_GlassThatEndsInsideTheMargin_StopsWhereTheGlassDoes()
    {
        Glass whole = TestGlasses.Named("schott/N-BK7");
        var narrow = new Glass("test", "narrow", whole.Formula, WavelengthRange.FromNanometers(430.0, 656.2725));
        FocalShiftCurve curve = FocalShiftCurve.Of(Assert.IsType<ThinSolution>(ThinPair.Solve(
            new Requirement(100.0, 8.0, s_band), GlassIndices.Of(narrow, s_band), GlassIndices.Of(TestGlasses.Named("schott/F2"), s_band))));
        Assert.Equal(430.0, curve.Curve[0].Wavelength.Nanometers);
        Assert.Equal(656.2725, curve.Curve[^1].Wavelength.Nanometers);
    }

    private static ThinSolution Solve(double fNumber, string front, string rear) => Assert.IsType<ThinSolution>(ThinPair.Solve(
        new Requirement(100.0, fNumber, s_band), GlassIndices.Of(TestGlasses.Named(front), s_band), GlassIndices.Of(TestGlasses.Named(rear), s_band)));
}
