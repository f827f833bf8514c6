using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>One term c λᵉ of the power series.</summary>
/// <param name="Exponent">e: an even number from −12 to 4, not 0.</param>
/// <param name="Coefficient">c, with the wavelength in micrometers.</param>
public readonly record struct PowerTerm(int Exponent, double Coefficient);

/// <summary>n² = a₀ + Σ aₑ λᵉ, e ∈ {4, 2, −2, …, −12}: the Schott form. Source: [power-series].</summary>
public sealed class PowerSeriesFormula : DispersionFormula
{
    /// <summary>Makes the formula from its constant and its terms.</summary>
    /// <exception cref="ArgumentException">An exponent that the form does not have or that occurs twice, or a coefficient that is not finite.</exception>
    public PowerSeriesFormula(double constant, IEnumerable<PowerTerm> terms)
    {
        Constant = constant;
        Terms = [.. terms.OrderByDescending(t => t.Exponent)];
        if (!double.IsFinite(constant) || Terms.Any(t => !double.IsFinite(t.Coefficient)))
        {
            throw new ArgumentException("Every coefficient must be finite.", nameof(terms));
        }

        if (Terms.Any(t => !Exponents.Contains(t.Exponent)) || Terms.DistinctBy(t => t.Exponent).Count() != Terms.Length)
        {
            throw new ArgumentException($"Each exponent must be one of {string.Join(", ", Exponents)}, once.", nameof(terms));
        }

        Coefficients = [constant, .. Terms.Select(t => t.Coefficient)];
    }

    /// <summary>Gets the exponents that the form has, falling.</summary>
    public static ImmutableArray<int> Exponents { get; } = [4, 2, -2, -4, -6, -8, -10, -12];

    /// <summary>Gets a₀.</summary>
    public double Constant { get; }

    /// <summary>Gets the terms in falling exponent.</summary>
    public ImmutableArray<PowerTerm> Terms { get; }

    /// <summary>Gets a₀, then the coefficients in falling exponent.</summary>
    public override ImmutableArray<double> Coefficients { get; }

    /// <inheritdoc/>
    public override double IndexSquaredAt(double micrometers)
    {
        double sum = Constant;
        foreach (PowerTerm term in Terms)
        {
            sum += term.Coefficient * EvenPower(micrometers, term.Exponent);
        }

        return sum;
    }

    /// <inheritdoc/>
    public override double SlopeOfIndexSquaredAt(double micrometers)
    {
        double sum = 0.0;
        foreach (PowerTerm term in Terms)
        {
            sum += term.Exponent * term.Coefficient * EvenPower(micrometers, term.Exponent) / micrometers;
        }

        return sum;
    }

    /// <summary>The series has no pole above zero wavelength.</summary>
    public override Wavelength? FindPole(WavelengthRange range) => null;

    /// <inheritdoc/>
    protected override bool HasSameTermsAs(DispersionFormula other) => Terms.SequenceEqual(((PowerSeriesFormula)other).Terms);

    private static double EvenPower(double micrometers, int exponent)
    {
        double squared = exponent < 0 ? 1.0 / (micrometers * micrometers) : micrometers * micrometers;
        double power = squared;
        for (int i = 2; i < Math.Abs(exponent); i += 2)
        {
            power *= squared;
        }

        return power;
    }
}
