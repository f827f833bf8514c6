using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Addresses;

/// <summary>Reads a wavelength as people type it: a number in nanometers, or a spectral line by name.</summary>
public static class WavelengthText
{
    /// <summary>Gets the lines that have a letter, in rising wavelength; the same as in <c>data/spectral-lines.csv</c>. Source: [spectral-lines].</summary>
    public static ImmutableArray<SpectralLine> Lines { get; } =
    [
        new("i", "mercury", Wavelength.FromNanometers(365.0146)),
        new("h", "mercury", Wavelength.FromNanometers(404.6561)),
        SpectralLine.MercuryG,
        SpectralLine.CadmiumFPrime,
        SpectralLine.HydrogenF,
        SpectralLine.MercuryE,
        SpectralLine.HeliumD,
        new("D", "sodium", Wavelength.FromNanometers(589.2938)),
        SpectralLine.CadmiumCPrime,
        SpectralLine.HydrogenC,
        new("r", "helium", Wavelength.FromNanometers(706.5188)),
        new("A'", "potassium", Wavelength.FromNanometers(768.2)),
        new("s", "cesium", Wavelength.FromNanometers(852.11)),
        new("t", "mercury", Wavelength.FromNanometers(1013.98)),
    ];

    /// <summary>Finds a line by its symbol, upper and lower case apart; the typographic prime counts as a prime.</summary>
    public static SpectralLine? FindLine(string text) =>
        Lines.FirstOrDefault(l => l.Symbol == text.Trim().Replace('′', '\'').Replace('’', '\''));

    /// <summary>Finds the line at a wavelength, to the digits that are printed.</summary>
    public static SpectralLine? LineAt(Wavelength wavelength) =>
        Lines.FirstOrDefault(l => Math.Abs(l.Wavelength.Nanometers - wavelength.Nanometers) < 5e-5);
}
