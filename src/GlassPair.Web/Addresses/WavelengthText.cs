using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Addresses;

/// <summary>Reads a wavelength as people type it: a number in nanometers, or a spectral line by name.</summary>
public static class WavelengthText
{
    /// <summary>Finds a line by its symbol, upper and lower case apart; the typographic prime counts as a prime.</summary>
    public static SpectralLine? FindLine(string text) =>
        SpectralLine.All.FirstOrDefault(l => l.Symbol == text.Trim().Replace('′', '\'').Replace('’', '\''));

    /// <summary>Finds the line at a wavelength, to the digits that are printed.</summary>
    public static SpectralLine? LineAt(Wavelength wavelength) =>
        SpectralLine.All.FirstOrDefault(l => Math.Abs(l.Wavelength.Nanometers - wavelength.Nanometers) < 5e-5);
}
