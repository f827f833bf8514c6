using System.Globalization;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Addresses;

namespace GlassPair.Web.Tests.Addresses;

public sealed class WavelengthTextTests
{
    /// <summary>The lines that have a letter in <c>data/spectral-lines.csv</c>, whose source stands beside each.</summary>
    private static IEnumerable<(string Symbol, double Nanometers)> Published =>
        File.ReadLines(Path.Combine(AppContext.BaseDirectory, "data", "spectral-lines.csv"))
            .Where(l => l.Length > 0 && l[0] != '#').Skip(1)
            .Select(l => l.Split(','))
            .Where(c => !char.IsDigit(c[0][0]))
            .Select(c => (c[0], double.Parse(c[1], CultureInfo.InvariantCulture)));

    [Fact]
    public void Lines_AreThoseOfTheTable() =>
        Assert.Equal(Published, WavelengthText.Lines.Select(l => (l.Symbol, l.Wavelength.Nanometers)));

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
