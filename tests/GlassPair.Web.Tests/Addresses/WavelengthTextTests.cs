using GlassPair.Optics.Spectrum;
using GlassPair.Web.Addresses;

namespace GlassPair.Web.Tests.Addresses;

public sealed class WavelengthTextTests
{
    [Theory]
    [InlineData("F'", 479.9914)]
    [InlineData("F′", 479.9914)]
    [InlineData(" C’ ", 643.8469)]
    [InlineData("d", 587.5618)]
    [InlineData("D", 589.2938)]
    public void FindLine_Symbol_IsTheLine(string text, double nanometers) => Assert.Equal(nanometers, WavelengthText.FindLine(text)!.Wavelength.Nanometers);

    [Theory]
    [InlineData("f")]
    [InlineData("")]
    [InlineData("587.5618")]
    public void FindLine_NoSymbol_IsNone(string text) => Assert.Null(WavelengthText.FindLine(text));

    [Fact]
    public void LineAt_PrintedDigits_IsTheLine() => Assert.Equal("e", WavelengthText.LineAt(Wavelength.FromNanometers(546.0740))!.Symbol);
}
