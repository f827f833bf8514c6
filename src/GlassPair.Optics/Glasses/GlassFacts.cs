using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>What the maker states, rounded: kept to be checked against the formula, never computed with.</summary>
/// <param name="Nd">Index at the d line.</param>
/// <param name="Vd">Abbe number of the d line.</param>
/// <param name="DeltaPgF">Distance from the maker's own normal line.</param>
/// <param name="Code">The six-digit code, with density digits where the maker adds them.</param>
public sealed record StatedValues(double? Nd = null, double? Vd = null, double? DeltaPgF = null, string? Code = null);

/// <summary>The coefficients of the change of absolute index with temperature. Source: [dn-dt].</summary>
/// <param name="D0">Per kelvin.</param>
/// <param name="D1">Per kelvin squared.</param>
/// <param name="D2">Per kelvin cubed.</param>
/// <param name="E0">Square micrometers per kelvin.</param>
/// <param name="E1">Square micrometers per kelvin squared.</param>
/// <param name="ResonanceMicrometers">λ_TK, micrometers; it enters squared.</param>
public sealed record ThermalIndex(double D0, double D1, double D2, double E0, double E1, double ResonanceMicrometers);

/// <summary>The extinction coefficient k at a wavelength; internal transmittance of thickness t is exp(−4π k t/λ).</summary>
/// <param name="Wavelength">The wavelength.</param>
/// <param name="Coefficient">k, without unit; 0 means that the maker prints a transmittance of 1.</param>
public readonly record struct ExtinctionSample(Wavelength Wavelength, double Coefficient);

/// <summary>Resistance classes as the maker states them; the tests differ between makers, so compare inside one maker only.</summary>
/// <param name="Climatic">Climatic resistance.</param>
/// <param name="Stain">Stain resistance.</param>
/// <param name="Acid">Acid resistance.</param>
/// <param name="Alkali">Alkali resistance.</param>
/// <param name="Phosphate">Phosphate resistance.</param>
public sealed record ResistanceClasses(
    double? Climatic = null, double? Stain = null, double? Acid = null, double? Alkali = null, double? Phosphate = null);

/// <summary>How a glass could be had, read from the maker's remarks in the edition of the catalogue.</summary>
public enum Supply
{
    /// <summary>The maker prefers it for new designs.</summary>
    Recommended,

    /// <summary>In the maker's list.</summary>
    Listed,

    /// <summary>Made on request.</summary>
    OnRequest,

    /// <summary>The edition does not say.</summary>
    Unconfirmed,

    /// <summary>No longer made.</summary>
    Discontinued,
}
