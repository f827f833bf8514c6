using System.Collections.Immutable;

namespace GlassPair.Optics.Spectrum;

/// <summary>A named line of a lamp that the trade measures glass with. Source: [spectral-lines].</summary>
/// <param name="Symbol">The trade's letter, such as <c>d</c> or <c>F'</c>; <c>d</c> and <c>D</c> are two lines.</param>
/// <param name="Source">What emits it, such as <c>helium</c>.</param>
/// <param name="Wavelength">Its wavelength in air.</param>
public sealed record SpectralLine(string Symbol, string Source, Wavelength Wavelength)
{
    /// <summary>The mercury i line, 365.0146 nm.</summary>
    public static SpectralLine MercuryI { get; } = Of("i", "mercury", 365.0146);

    /// <summary>The mercury h line, 404.6561 nm.</summary>
    public static SpectralLine MercuryH { get; } = Of("h", "mercury", 404.6561);

    /// <summary>The mercury g line, 435.8343 nm.</summary>
    public static SpectralLine MercuryG { get; } = Of("g", "mercury", 435.8343);

    /// <summary>The cadmium F' line, 479.9914 nm.</summary>
    public static SpectralLine CadmiumFPrime { get; } = Of("F'", "cadmium", 479.9914);

    /// <summary>The hydrogen F line, 486.1327 nm.</summary>
    public static SpectralLine HydrogenF { get; } = Of("F", "hydrogen", 486.1327);

    /// <summary>The mercury e line, 546.0740 nm.</summary>
    public static SpectralLine MercuryE { get; } = Of("e", "mercury", 546.0740);

    /// <summary>The helium d line, 587.5618 nm.</summary>
    public static SpectralLine HeliumD { get; } = Of("d", "helium", 587.5618);

    /// <summary>The middle of the sodium D lines, 589.2938 nm.</summary>
    public static SpectralLine SodiumD { get; } = Of("D", "sodium", 589.2938);

    /// <summary>The cadmium C' line, 643.8469 nm.</summary>
    public static SpectralLine CadmiumCPrime { get; } = Of("C'", "cadmium", 643.8469);

    /// <summary>The hydrogen C line, 656.2725 nm.</summary>
    public static SpectralLine HydrogenC { get; } = Of("C", "hydrogen", 656.2725);

    /// <summary>The helium r line, 706.5188 nm.</summary>
    public static SpectralLine HeliumR { get; } = Of("r", "helium", 706.5188);

    /// <summary>The potassium A' line, 768.2 nm.</summary>
    public static SpectralLine PotassiumAPrime { get; } = Of("A'", "potassium", 768.2);

    /// <summary>The cesium s line, 852.11 nm.</summary>
    public static SpectralLine CesiumS { get; } = Of("s", "cesium", 852.11);

    /// <summary>The mercury t line, 1013.98 nm.</summary>
    public static SpectralLine MercuryT { get; } = Of("t", "mercury", 1013.98);

    /// <summary>Gets every line, in rising wavelength.</summary>
    public static ImmutableArray<SpectralLine> All { get; } =
    [
        MercuryI, MercuryH, MercuryG, CadmiumFPrime, HydrogenF, MercuryE, HeliumD, SodiumD,
        CadmiumCPrime, HydrogenC, HeliumR, PotassiumAPrime, CesiumS, MercuryT,
    ];

    private static SpectralLine Of(string symbol, string source, double nanometers) =>
        new(symbol, source, Wavelength.FromNanometers(nanometers));
}
