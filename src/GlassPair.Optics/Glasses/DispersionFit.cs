using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>An index measured at a wavelength.</summary>
/// <param name="Wavelength">The wavelength.</param>
/// <param name="Index">The index.</param>
public readonly record struct MeasuredIndex(Wavelength Wavelength, double Index);

/// <summary>A measured index that a fit left out, and why.</summary>
/// <param name="Measured">The value as given.</param>
/// <param name="Residual">Measured index minus that of the formula fitted to the others.</param>
/// <param name="Reason">Why it was left out, in words.</param>
public sealed record LeftOutIndex(MeasuredIndex Measured, double Residual, string Reason);

/// <summary>A dispersion formula fitted to measured indices, and how well it fits. Made by <see cref="DispersionFitter"/>.</summary>
/// <param name="Formula">The fitted formula.</param>
/// <param name="Measured">The indices that the formula was fitted to, in rising wavelength.</param>
/// <param name="Residuals">Measured minus fitted index, one for each of <paramref name="Measured"/>.</param>
/// <param name="LeftOut">Indices left out, in rising wavelength, with the reason.</param>
/// <param name="Warnings">What a user should know before trusting the fit, in words.</param>
public sealed record DispersionFit(
    DispersionFormula Formula,
    ImmutableArray<MeasuredIndex> Measured,
    ImmutableArray<double> Residuals,
    ImmutableArray<LeftOutIndex> LeftOut,
    ImmutableArray<string> Warnings) : FitOutcome
{
    /// <summary>Gets the wavelengths for which the fit holds: those it was made from.</summary>
    public WavelengthRange Range => new(Measured[0].Wavelength, Measured[^1].Wavelength);

    /// <summary>Gets the root mean square of the residuals.</summary>
    public double RmsResidual => Math.Sqrt(Residuals.Average(r => r * r));

    /// <summary>Gets the residual of largest size, with its sign.</summary>
    public double WorstResidual => Residuals.MaxBy(Math.Abs);

    /// <summary>Gets the measured index with the residual of largest size.</summary>
    public MeasuredIndex Worst => Measured[Residuals.IndexOf(WorstResidual)];

    /// <summary>Gets how far a measured index lies from the fitted one; null outside <see cref="Range"/>, where the formula says nothing.</summary>
    public double? ResidualOf(MeasuredIndex measured) =>
        Range.Contains(measured.Wavelength) ? measured.Index - Math.Sqrt(Formula.IndexSquaredAt(measured.Wavelength.Micrometers)) : null;
}
