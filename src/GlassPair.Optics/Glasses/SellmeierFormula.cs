using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>One resonance of the Sellmeier formula.</summary>
/// <param name="Strength">B, without unit.</param>
/// <param name="ResonanceSquared">C, the square of the resonance wavelength, in square micrometers.</param>
public readonly record struct SellmeierTerm(double Strength, double ResonanceSquared);

/// <summary>n² − 1 = Σ Bᵢ λ²/(λ² − Cᵢ), with 1 to 6 terms. Source: [sellmeier].</summary>
public sealed class SellmeierFormula : DispersionFormula
{
    /// <summary>The most terms.</summary>
    public const int MaxTerms = 6;

    /// <summary>Makes the formula from its terms.</summary>
    /// <exception cref="ArgumentException">No term, more than six, or one that is not finite.</exception>
    public SellmeierFormula(IEnumerable<SellmeierTerm> terms)
    {
        Terms = [.. terms];
        Guard.InRange(Terms.Length, 1, MaxTerms, nameof(terms));
        if (Terms.Any(t => !double.IsFinite(t.Strength) || !double.IsFinite(t.ResonanceSquared)))
        {
            throw new ArgumentException("Every coefficient must be finite.", nameof(terms));
        }

        Coefficients = [.. Terms.SelectMany(t => new[] { t.Strength, t.ResonanceSquared })];
    }

    /// <summary>Gets the terms.</summary>
    public ImmutableArray<SellmeierTerm> Terms { get; }

    /// <summary>Gets B₁, C₁, B₂, C₂, …</summary>
    public override ImmutableArray<double> Coefficients { get; }

    /// <inheritdoc/>
    public override double IndexSquaredAt(double micrometers)
    {
        double squared = micrometers * micrometers;
        double sum = 1.0;
        foreach (SellmeierTerm term in Terms)
        {
            sum += term.Strength * squared / (squared - term.ResonanceSquared);
        }

        return sum;
    }

    /// <inheritdoc/>
    public override double SlopeOfIndexSquaredAt(double micrometers)
    {
        // d/dλ [B λ²/(λ² − C)] = −2 B C λ/(λ² − C)²
        double squared = micrometers * micrometers;
        double sum = 0.0;
        foreach (SellmeierTerm term in Terms)
        {
            double gap = squared - term.ResonanceSquared;
            sum -= 2.0 * term.Strength * term.ResonanceSquared * micrometers / (gap * gap);
        }

        return sum;
    }

    /// <inheritdoc/>
    public override Wavelength? FindPole(WavelengthRange range)
    {
        Wavelength? first = null;
        foreach (SellmeierTerm term in Terms)
        {
            double nanometers = 1000.0 * Math.Sqrt(Math.Max(term.ResonanceSquared, 0.0));
            if (term.Strength != 0.0 && nanometers >= range.Shortest.Nanometers && nanometers <= range.Longest.Nanometers
                && (first is null || nanometers < first.Value.Nanometers))
            {
                first = Wavelength.FromNanometers(nanometers);
            }
        }

        return first;
    }
}
