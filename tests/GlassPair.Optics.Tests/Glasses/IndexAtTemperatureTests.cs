using CsCheck;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Glasses;

public sealed class IndexAtTemperatureTests
{
    private static readonly Glass[] s_withData = [.. TestGlasses.All.Where(g => IndexAtTemperature.TryOf(g, SpectralLine.MercuryE.Wavelength, 20.0) is not null)];

    private static readonly Gen<(Glass Glass, double Celsius)> s_glassAndTemperature =
        Gen.Select(Gen.Int[0, s_withData.Length - 1], Gen.Double[-99.0, 139.0]).Select(t => (s_withData[t.Item1], t.Item2));

    public static TheoryData<PublishedRow> Coefficients => Published.Theory("temperature-coefficients.csv");

    [Theory, MemberData(nameof(Coefficients))]
    public void TryOf_PublishedCoefficient_Agrees(PublishedRow row)
    {
        // the data sheet prints the change over an interval of 20 K, per kelvin
        Glass glass = TestGlasses.Named(row["glass"]);
        Wavelength wavelength = Wavelength.FromNanometers(row.Number("nanometers"));
        IndexAtTemperature from = IndexAtTemperature.TryOf(glass, wavelength, row.Number("from_celsius"))!;
        IndexAtTemperature to = IndexAtTemperature.TryOf(glass, wavelength, row.Number("to_celsius"))!;

        row.AssertPrints("relative_1e-6_per_k", (to.Relative - from.Relative) / 20.0, 1e-6);
        row.AssertPrints("absolute_1e-6_per_k", (to.Absolute - from.Absolute) / 20.0, 1e-6);
    }

    [Fact]
    public void TryOf_ReferenceTemperature_IsTheIndexOfTheCatalogue() => Assert.All(s_withData, glass =>
    {
        Wavelength wavelength = SpectralLine.MercuryE.Wavelength;
        IndexAtTemperature index = IndexAtTemperature.TryOf(glass, wavelength, glass.ReferenceCelsius!.Value)!;

        Assert.Equal(glass.IndexAt(wavelength), index.Relative, 1e-14);
        Assert.Equal(glass.IndexAt(wavelength) * AirIndex.Of(wavelength, glass.ReferenceCelsius!.Value), index.Absolute, 1e-14);
    });

    [Fact]
    public void TryOf_AnyGlassAndTemperature_RatesAreTheLimitsOfDifferences() => Law.Holds(s_glassAndTemperature, sample =>
    {
        Wavelength wavelength = SpectralLine.MercuryE.Wavelength;
        const double step = 0.5;
        IndexAtTemperature below = IndexAtTemperature.TryOf(sample.Glass, wavelength, sample.Celsius - step)!;
        IndexAtTemperature above = IndexAtTemperature.TryOf(sample.Glass, wavelength, sample.Celsius + step)!;
        IndexAtTemperature here = IndexAtTemperature.TryOf(sample.Glass, wavelength, sample.Celsius)!;

        Assert.Equal((above.Absolute - below.Absolute) / (2.0 * step), here.AbsoluteRatePerKelvin, 1e-10);
        Assert.Equal((above.Relative - below.Relative) / (2.0 * step), here.RelativeRatePerKelvin, 1e-10);
    });

    [Fact]
    public void TryOf_NoPressure_RelativeAndAbsoluteAreOne() => Law.Holds(s_glassAndTemperature, sample =>
    {
        IndexAtTemperature index = IndexAtTemperature.TryOf(sample.Glass, SpectralLine.MercuryE.Wavelength, sample.Celsius, 0.0)!;

        Assert.Equal(index.Absolute, index.Relative);
        Assert.Equal(index.AbsoluteRatePerKelvin, index.RelativeRatePerKelvin);
    });

    [Fact]
    public void TryOf_NoCoefficientsOrTooNearTheirResonance_IsNull()
    {
        Assert.Null(IndexAtTemperature.TryOf(TestGlasses.All.First(g => g.Thermal is null), SpectralLine.HeliumD.Wavelength, 40.0));

        Glass glass = TestGlasses.Named("schott/N-SK5"); // λ_TK 278 nm, index from 300 nm
        Assert.Null(IndexAtTemperature.TryOf(glass, Wavelength.FromNanometers(305.0), 40.0));
        Assert.NotNull(IndexAtTemperature.TryOf(glass, Wavelength.FromNanometers(306.0), 40.0));
    }

    [Theory]
    [InlineData(-100.5)]
    [InlineData(140.5)]
    [InlineData(double.NaN)]
    public void TryOf_TemperatureOutsideTheRange_Throws(double celsius) => Assert.Throws<ArgumentOutOfRangeException>(
        () => IndexAtTemperature.TryOf(TestGlasses.Named("schott/N-BK7"), SpectralLine.HeliumD.Wavelength, celsius));
}
