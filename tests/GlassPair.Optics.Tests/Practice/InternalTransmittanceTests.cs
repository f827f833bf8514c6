using CsCheck;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Practice;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Practice;

public sealed class InternalTransmittanceTests
{
    private static readonly Glass[] s_withTable = [.. TestGlasses.All.Where(g => g.Extinction.Length > 1)];

    private static readonly Gen<(Glass Glass, double Share, double Thickness)> s_glassAndPath =
        Gen.Select(Gen.Int[0, s_withTable.Length - 1], Gen.Double[0.0, 1.0], Gen.Double[0.0, 100.0]).Select(t => (s_withTable[t.Item1], t.Item2, t.Item3));

    public static TheoryData<PublishedRow> Examples => Published.Theory("transmittance.csv");

    [Theory, MemberData(nameof(Examples))]
    public void TryOf_PublishedExample_Agrees(PublishedRow row)
    {
        Wavelength wavelength = Wavelength.FromNanometers(row.Number("nanometers"));
        double thickness = row.Number("thickness");
        double internalTransmittance = row.Number("external") / row.Number("reflection_factor");
        double extinction = -Math.Log(internalTransmittance) * wavelength.Millimeters / (4.0 * Math.PI * thickness);
        Glass glass = WithTable((wavelength.Nanometers, extinction));

        row.AssertPrints("internal", InternalTransmittance.TryOf(glass, wavelength, thickness)!.Value);
        double other = InternalTransmittance.TryOf(glass, wavelength, row.Number("other_thickness"))!.Value;
        row.AssertPrints("other_internal", other);
        row.AssertPrints("other_external", other * row.Number("reflection_factor"));
    }

    [Fact]
    public void TryOf_BorosilicateCrown_HasTheTransmittanceOfItsDataSheet()
    {
        // τᵢ at 400 nm: 0.997 through 10 mm, 0.992 through 25 mm; the maker's data sheet, from memory
        Glass glass = TestGlasses.Named("schott/N-BK7");

        Assert.Equal(0.997, InternalTransmittance.TryOf(glass, Wavelength.FromNanometers(400), 10.0)!.Value, 0.0005);
        Assert.Equal(0.992, InternalTransmittance.TryOf(glass, Wavelength.FromNanometers(400), 25.0)!.Value, 0.0005);
    }

    [Fact]
    public void TryOf_PathsOneAfterTheOther_Multiply() => Law.Holds(s_glassAndPath, path =>
    {
        Wavelength wavelength = PlaceIn(path.Glass, path.Share);
        double once = InternalTransmittance.TryOf(path.Glass, wavelength, path.Thickness)!.Value;
        double twice = InternalTransmittance.TryOf(path.Glass, wavelength, 2.0 * path.Thickness)!.Value;

        Assert.Equal(once * once, twice, 1e-12);
        Assert.InRange(once, 0.0, 1.0);
        Assert.Equal(1.0, InternalTransmittance.TryOf(path.Glass, wavelength, 0.0));
    });

    [Fact]
    public void TryOf_OutsideTheTableOrWithoutOne_IsNull() => Law.Holds(s_glassAndPath, path =>
    {
        Glass glass = path.Glass;
        Assert.Null(InternalTransmittance.TryOf(glass, Wavelength.FromNanometers(Math.BitDecrement(glass.Extinction[0].Wavelength.Nanometers)), 10.0));
        Assert.Null(InternalTransmittance.TryOf(glass, Wavelength.FromNanometers(Math.BitIncrement(glass.Extinction[^1].Wavelength.Nanometers)), 10.0));
        Assert.NotNull(InternalTransmittance.TryOf(glass, glass.Extinction[0].Wavelength, 10.0));
        Assert.NotNull(InternalTransmittance.TryOf(glass, glass.Extinction[^1].Wavelength, 10.0));
        Assert.Null(InternalTransmittance.TryOf(WithTable(), SpectralLine.HeliumD.Wavelength, 10.0));
    });

    [Fact]
    public void TryOf_BetweenTwoWavelengths_GoesStraightInTheLogarithm()
    {
        Glass glass = WithTable((400.0, 1e-6), (500.0, 1e-8), (600.0, 0.0), (700.0, 4e-8));
        double Extinction(double nanometers) =>
            -Math.Log(InternalTransmittance.TryOf(glass, Wavelength.FromNanometers(nanometers), 10.0)!.Value) * nanometers * 1e-6 / (4.0 * Math.PI * 10.0);

        Assert.Equal(1e-7, Extinction(450.0), 1e-15); // the geometric mean
        Assert.Equal(0.5e-8, Extinction(550.0), 1e-15); // towards zero, the arithmetic one
        Assert.Equal(2e-8, Extinction(650.0), 1e-15);
        Assert.Equal(1.0, InternalTransmittance.TryOf(glass, Wavelength.FromNanometers(600), 10.0));
    }

    [Theory]
    [InlineData(-0.001)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void TryOf_NoThickness_Throws(double thickness) => Assert.Throws<ArgumentOutOfRangeException>(
        () => InternalTransmittance.TryOf(s_withTable[0], SpectralLine.HeliumD.Wavelength, thickness));

    private static Wavelength PlaceIn(Glass glass, double share) => Wavelength.FromNanometers(
        double.Lerp(glass.Extinction[0].Wavelength.Nanometers, glass.Extinction[^1].Wavelength.Nanometers, share));

    private static Glass WithTable(params (double Nanometers, double Extinction)[] table) =>
        new("test", "filter", new PowerSeriesFormula(2.25, []), WavelengthRange.FromNanometers(300, 2000))
        {
            Extinction = [.. table.Select(t => new ExtinctionSample(Wavelength.FromNanometers(t.Nanometers), t.Extinction))],
        };
}
