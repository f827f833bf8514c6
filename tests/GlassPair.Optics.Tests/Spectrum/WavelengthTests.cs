using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Spectrum;

public sealed class WavelengthTests
{
    [Theory]
    [InlineData(double.NaN)]
    [InlineData(99.999)]
    [InlineData(20_000.001)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(-550.0)]
    public void FromNanometers_OutsideTheRange_Throws(double nanometers)
    {
        ArgumentOutOfRangeException e = Assert.Throws<ArgumentOutOfRangeException>(() => Wavelength.FromNanometers(nanometers));
        Assert.Contains("Must lie in [100, 20000].", e.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(100.0)]
    [InlineData(20_000.0)]
    public void FromNanometers_EndOfTheRange_IsAllowed(double nanometers) =>
        Assert.Equal(nanometers, Wavelength.FromNanometers(nanometers).Nanometers);

    [Fact]
    public void Units_OfOneWavelength_Agree()
    {
        Wavelength wavelength = Wavelength.FromNanometers(546.074);

        Assert.Equal(0.546074, wavelength.Micrometers, 1e-15);
        Assert.Equal(0.000546074, wavelength.Millimeters, 1e-18);
        Assert.Equal("546.074 nm", wavelength.ToString());
    }

    [Fact]
    public void WavelengthRange_EndsInWrongOrder_Throws()
    {
        Assert.Throws<ArgumentException>(() => WavelengthRange.FromNanometers(700, 400));
        Assert.Throws<ArgumentException>(() => WavelengthRange.FromNanometers(500, 500));
    }

    [Fact]
    public void WavelengthRange_Contains_IncludesBothEnds()
    {
        WavelengthRange range = WavelengthRange.FromNanometers(400, 700);

        Assert.True(range.Contains(Wavelength.FromNanometers(400)) && range.Contains(Wavelength.FromNanometers(700)));
        Assert.False(range.Contains(Wavelength.FromNanometers(Math.BitDecrement(400))) || range.Contains(Wavelength.FromNanometers(Math.BitIncrement(700))));
        Assert.False(default(WavelengthRange).Contains(Wavelength.FromNanometers(500)));
    }
}
