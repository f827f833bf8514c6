using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Components.Charts;

/// <summary>What a wavelength is called in a chart.</summary>
internal static class LineNames
{
    private const double NearNanometers = 0.01;

    private static readonly SpectralLine[] Lines =
    [
        SpectralLine.MercuryG, SpectralLine.CadmiumFPrime, SpectralLine.HydrogenF, SpectralLine.MercuryE,
        SpectralLine.HeliumD, SpectralLine.CadmiumCPrime, SpectralLine.HydrogenC,
    ];

    /// <summary>Gets the trade's letter of a named line, or the nanometers.</summary>
    public static string Of(Wavelength wavelength) =>
        Lines.FirstOrDefault(l => Math.Abs(l.Wavelength.Nanometers - wavelength.Nanometers) <= NearNanometers)?.Symbol
        ?? NumberText.Fixed(wavelength.Nanometers, 0);
}
