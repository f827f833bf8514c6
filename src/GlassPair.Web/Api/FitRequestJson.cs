using System.ComponentModel.DataAnnotations;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Api;

/// <summary>Measured indices to fit a dispersion formula to.</summary>
public sealed record FitRequestJson
{
    /// <summary>Gets the form of the formula.</summary>
    public required DispersionForm Form { get; init; }

    /// <summary>Gets the number of terms: 1 to 6 of the Sellmeier form, 1 to 8 beside the constant of the power series; left out, the number that describes the indices best.</summary>
    [Range(1, 8)]
    public int? Terms { get; init; }

    /// <summary>Gets the wavelengths, nm, 3 to 1,000, each once, in any order.</summary>
    [MinLength(DispersionFitter.MinPoints)]
    [MaxLength(DispersionFitter.MaxPoints)]
    [ItemRange(Wavelength.MinNanometers, Wavelength.MaxNanometers)]
    public required double[] Nm { get; init; }

    /// <summary>Gets the index measured at each wavelength, above 1, at most 5.</summary>
    [MinLength(DispersionFitter.MinPoints)]
    [MaxLength(DispersionFitter.MaxPoints)]
    [ItemRange(DispersionFitter.MinIndex, DispersionFitter.MaxIndex)]
    public required double[] Index { get; init; }
}
