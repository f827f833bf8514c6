using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>How a glass's refractive index depends on wavelength. Two formulas with equal coefficients are equal.</summary>
public abstract class DispersionFormula : IEquatable<DispersionFormula>
{
    /// <summary>Gets the coefficients in the order of the catalogue, wavelengths in micrometers.</summary>
    public abstract ImmutableArray<double> Coefficients { get; }

    /// <summary>Gets the square of the index at a wavelength in micrometers; NaN, infinite or below 1 where the formula does not hold.</summary>
    public abstract double IndexSquaredAt(double micrometers);

    /// <summary>Gets d(n²)/dλ per micrometer at a wavelength in micrometers.</summary>
    public abstract double SlopeOfIndexSquaredAt(double micrometers);

    /// <summary>Finds the first wavelength of a range at which the formula gives no index above 1; null where it is sound.</summary>
    /// <remarks>Poles are found analytically; the index itself is looked at on 200 points from end to end.</remarks>
    public Wavelength? FindFault(WavelengthRange range)
    {
        const int steps = 200;
        if (FindPole(range) is { } pole)
        {
            return pole;
        }

        for (int i = 0; i <= steps; i++)
        {
            double nanometers = range.Shortest.Nanometers + ((range.Longest.Nanometers - range.Shortest.Nanometers) * i / steps);
            double squared = IndexSquaredAt(nanometers / 1000.0);
            if (!(squared > 1.0 && double.IsFinite(squared)))
            {
                return Wavelength.FromNanometers(Math.Clamp(nanometers, range.Shortest.Nanometers, range.Longest.Nanometers));
            }
        }

        return null;
    }

    /// <summary>Finds the first pole in a range, ends included; null where there is none.</summary>
    public abstract Wavelength? FindPole(WavelengthRange range);

    /// <inheritdoc/>
    public bool Equals(DispersionFormula? other) =>
        other is not null && GetType() == other.GetType() && Coefficients.SequenceEqual(other.Coefficients) && HasSameTermsAs(other);

    /// <inheritdoc/>
    public override bool Equals(object? obj) => Equals(obj as DispersionFormula);

    /// <inheritdoc/>
    public override int GetHashCode()
    {
        var hash = default(HashCode);
        foreach (double coefficient in Coefficients)
        {
            hash.Add(coefficient);
        }

        return hash.ToHashCode();
    }

    /// <summary>Tells whether the other formula, of the same type and with equal coefficients, also applies them to the same terms.</summary>
    protected virtual bool HasSameTermsAs(DispersionFormula other) => true;
}
