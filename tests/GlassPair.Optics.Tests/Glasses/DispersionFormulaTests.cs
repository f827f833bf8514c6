using CsCheck;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Glasses;

public sealed class DispersionFormulaTests
{
    private static readonly Gen<(Glass Glass, double Share)> s_glassAndPlace =
        Gen.Select(Gen.Int[0, TestGlasses.All.Count - 1], Gen.Double[0.001, 0.999]).Select(t => (TestGlasses.All[t.Item1], t.Item2));

    [Fact]
    public void DispersionAt_AnyGlassAndWavelength_IsTheLimitOfDifferences() => Law.Holds(s_glassAndPlace, sample =>
    {
        // a central difference of step h is off by h² n‴/6, and by rounding of n over h; extrapolated to h = 0 the first goes with h⁴
        double place = PlaceIn(sample.Glass.Range, sample.Share).Micrometers;
        double Difference(double h) => (Index(sample.Glass, place + h) - Index(sample.Glass, place - h)) / (2.0 * h);
        const double step = 2e-4;
        double extrapolated = ((4.0 * Difference(step / 2.0)) - Difference(step)) / 3.0;

        double slope = sample.Glass.DispersionAt(Wavelength.FromNanometers(place * 1000.0));

        Assert.Equal(extrapolated, slope, 1e-10 + (1e-8 * Math.Abs(slope)));
    });

    [Fact]
    public void DispersionAt_EveryGlassOfTheCatalogue_IsNegativeInTheVisible() =>
        Assert.All(TestGlasses.All, g => Assert.True(g.DispersionAt(SpectralLine.MercuryE.Wavelength) < 0.0));

    [Fact]
    public void IndexAt_OutsideTheRange_ThrowsAndNamesGlassWavelengthAndRange() => Law.Holds(s_glassAndPlace, sample =>
    {
        Glass glass = sample.Glass;
        foreach (double nanometers in new[] { Math.BitDecrement(glass.Range.Shortest.Nanometers), Math.BitIncrement(glass.Range.Longest.Nanometers) })
        {
            Wavelength outside = Wavelength.FromNanometers(nanometers);
            WavelengthOutOfRangeException e = Assert.Throws<WavelengthOutOfRangeException>(() => glass.IndexAt(outside));
            Assert.Equal((glass.Id, outside, glass.Range), (e.Glass, e.Wavelength, e.Range));
            Assert.Contains(glass.Id, e.Message, StringComparison.Ordinal);
            Assert.Contains(glass.Range.ToString(), e.Message, StringComparison.Ordinal);
            Assert.Throws<WavelengthOutOfRangeException>(() => glass.DispersionAt(outside));
            Assert.Throws<WavelengthOutOfRangeException>(() => IndexAtTemperature.TryOf(glass, outside, 20.0));
        }

        Assert.True(glass.IndexAt(glass.Range.Shortest) > glass.IndexAt(glass.Range.Longest));
    });

    [Fact]
    public void Of_BandPastTheRange_ThrowsEverywhere()
    {
        Glass glass = TestGlasses.Named("schott/N-SF6"); // from 370 nm
        Band band = Band.Even(SpectralLine.MercuryI.Wavelength, SpectralLine.MercuryE.Wavelength, SpectralLine.HydrogenC.Wavelength, 9);

        Assert.False(glass.Covers(band));
        Assert.Throws<WavelengthOutOfRangeException>(() => AbbeNumber.Of(glass, band));
        Assert.Throws<WavelengthOutOfRangeException>(() => PartialDispersion.Of(glass, band));
        Assert.Throws<WavelengthOutOfRangeException>(() => GlassIndices.Of(glass, band));
        Assert.Null(PartialDispersion.TryOf(glass, SpectralLine.MercuryI.Wavelength, SpectralLine.MercuryG.Wavelength));
    }

    [Fact]
    public void AbbeNumberAndPartialDispersion_OfABand_AreTheirDefinitions() => Law.Holds(s_glassAndPlace, sample =>
    {
        Band band = Band.Even(SpectralLine.CadmiumFPrime.Wavelength, SpectralLine.MercuryE.Wavelength, SpectralLine.CadmiumCPrime.Wavelength, 3);
        (double s, double m, double l) = (sample.Glass.IndexAt("F'"), sample.Glass.IndexAt("e"), sample.Glass.IndexAt("C'"));

        Assert.Equal((m - 1.0) / (s - l), AbbeNumber.Of(sample.Glass, band), 1e-12 * 100);
        Assert.Equal(AbbeNumber.TryE(sample.Glass)!.Value, AbbeNumber.Of(sample.Glass, band), 1e-12 * 100);
        Assert.Equal((s - m) / (s - l), PartialDispersion.Of(sample.Glass, band), 1e-14);
    });

    [Fact]
    public void Constructor_FormulaWithAPoleInTheRange_Throws()
    {
        var formula = new SellmeierFormula([new(1.0, 0.25)]);

        Assert.Equal(500.0, formula.FindPole(WavelengthRange.FromNanometers(400, 700))!.Value.Nanometers, 1e-9);
        Assert.Null(formula.FindPole(WavelengthRange.FromNanometers(510, 700)));
        Assert.Contains("500 nm", Assert.Throws<ArgumentException>(() => new Glass("x", "y", formula, WavelengthRange.FromNanometers(400, 700))).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Constructor_FormulaThatFallsToOne_Throws() =>
        Assert.Throws<ArgumentException>(() => new Glass("x", "y", new PowerSeriesFormula(1.5, [new(2, -1.0)]), WavelengthRange.FromNanometers(400, 900)));

    [Fact]
    public void Equals_SameCoefficientsOnOtherTerms_Differs()
    {
        var second = new PowerSeriesFormula(2.25, [new(2, -0.01)]);
        var minusSecond = new PowerSeriesFormula(2.25, [new(-2, -0.01)]);

        Assert.NotEqual<DispersionFormula>(second, minusSecond);
        Assert.Equal<DispersionFormula>(second, new PowerSeriesFormula(2.25, [new(2, -0.01)]));
        Assert.NotEqual<DispersionFormula>(new SellmeierFormula([new(2.25, -0.01)]), second);
    }

    [Fact]
    public void Constructor_TermsThatTheFormHasNot_Throws()
    {
        Assert.Throws<ArgumentException>(() => new PowerSeriesFormula(2.25, [new(3, 0.1)]));
        Assert.Throws<ArgumentException>(() => new PowerSeriesFormula(2.25, [new(2, 0.1), new(2, 0.2)]));
        Assert.Throws<ArgumentException>(() => new PowerSeriesFormula(double.NaN, []));
        Assert.Throws<ArgumentOutOfRangeException>(() => new SellmeierFormula([]));
        Assert.Throws<ArgumentOutOfRangeException>(() => new SellmeierFormula(Enumerable.Repeat(new SellmeierTerm(0.1, 0.01), 7)));
        Assert.Throws<ArgumentException>(() => new SellmeierFormula([new(double.NaN, 0.01)]));
    }

    private static Wavelength PlaceIn(WavelengthRange range, double share) =>
        Wavelength.FromNanometers(double.Lerp(range.Shortest.Nanometers + 1.0, range.Longest.Nanometers - 1.0, share));

    private static double Index(Glass glass, double micrometers) => glass.IndexAt(Wavelength.FromNanometers(micrometers * 1000.0));
}
