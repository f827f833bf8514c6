namespace GlassPair.Optics.Spectrum;

/// <summary>A named line of a lamp or laser that the trade measures glass with.</summary>
/// <param name="Symbol">The trade's letter, such as <c>d</c> or <c>F'</c>.</param>
/// <param name="Source">What emits it, such as <c>helium</c>.</param>
/// <param name="Wavelength">Its wavelength in air.</param>
public sealed record SpectralLine(string Symbol, string Source, Wavelength Wavelength)
{
    /// <summary>The mercury g line, 435.8343 nm. Source: [spectral-lines].</summary>
    public static SpectralLine MercuryG { get; } = Of("g", "mercury", 435.8343);

    /// <summary>The cadmium F' line, 479.9914 nm. Source: [spectral-lines].</summary>
    public static SpectralLine CadmiumFPrime { get; } = Of("F'", "cadmium", 479.9914);

    /// <summary>The hydrogen F line, 486.1327 nm. Source: [spectral-lines].</summary>
    public static SpectralLine HydrogenF { get; } = Of("F", "hydrogen", 486.1327);

    /// <summary>The mercury e line, 546.0740 nm. Source: [spectral-lines].</summary>
    public static SpectralLine MercuryE { get; } = Of("e", "mercury", 546.0740);

    /// <summary>The helium d line, 587.5618 nm. Source: [spectral-lines].</summary>
    public static SpectralLine HeliumD { get; } = Of("d", "helium", 587.5618);

    /// <summary>The cadmium C' line, 643.8469 nm. Source: [spectral-lines].</summary>
    public static SpectralLine CadmiumCPrime { get; } = Of("C'", "cadmium", 643.8469);

    /// <summary>The hydrogen C line, 656.2725 nm. Source: [spectral-lines].</summary>
    public static SpectralLine HydrogenC { get; } = Of("C", "hydrogen", 656.2725);

    private static SpectralLine Of(string symbol, string source, double nanometers) =>
        new(symbol, source, Wavelength.FromNanometers(nanometers));
}
