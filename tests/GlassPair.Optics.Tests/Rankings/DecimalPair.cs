using System.Globalization;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Rankings;

/// <summary>A thin pair in contact computed from the dispersion formulas in 28 decimal digits, by the textbook's formulas as printed.</summary>
internal static class DecimalPair
{
    /// <summary>Gets the RMS focal shift and the size of the secondary spectrum in units of the focal length; null where no powers balance the pair.</summary>
    public static (decimal Rms, decimal SecondarySpectrum)? Of(Glass a, Glass b, Band band, ColorBalance balance)
    {
        decimal[] weights = [.. band.Samples.Select(s => Exactly(s.Weight))];
        decimal[] ratioA = [.. band.Samples.Select(s => Ratio(a, s.Wavelength, band))];
        decimal[] ratioB = [.. band.Samples.Select(s => Ratio(b, s.Wavelength, band))];
        decimal power;
        if (balance == ColorBalance.EndsUnited)
        {
            (decimal va, decimal vb) = (Abbe(a, band), Abbe(b, band));
            if (va == vb)
            {
                return null;
            }

            power = va / (va - vb);
        }
        else
        {
            // φ₁ = (G₂₂ − G₁₂)/(G₁₁ + G₂₂ − 2 G₁₂), G the weighted covariances of (n(λ) − 1)/(n_m − 1)
            (decimal aa, decimal ab, decimal bb) = (Covariance(ratioA, ratioA, weights), Covariance(ratioA, ratioB, weights), Covariance(ratioB, ratioB, weights));
            decimal denominator = aa + bb - (2 * ab);
            if (denominator == 0)
            {
                return null;
            }

            power = (bb - ab) / denominator;
        }

        decimal Focus(decimal ratio1, decimal ratio2) => 1 / ((power * ratio1) + ((1 - power) * ratio2));
        decimal[] focus = [.. ratioA.Zip(ratioB, Focus)];
        decimal ends = Focus(Ratio(a, band.ShortEnd, band), Ratio(b, band.ShortEnd, band)) + Focus(Ratio(a, band.LongEnd, band), Ratio(b, band.LongEnd, band));
        return (SquareRoot(Covariance(focus, focus, weights)), Math.Abs(1 - (ends / 2)));
    }

    private static decimal Abbe(Glass glass, Band band) => (Index(glass, band.Design) - 1) / (Index(glass, band.ShortEnd) - Index(glass, band.LongEnd));

    private static decimal Ratio(Glass glass, Wavelength wavelength, Band band) => (Index(glass, wavelength) - 1) / (Index(glass, band.Design) - 1);

    private static decimal Index(Glass glass, Wavelength wavelength)
    {
        decimal squared = Exactly(wavelength.Micrometers) * Exactly(wavelength.Micrometers);
        return SquareRoot(glass.Formula switch
        {
            SellmeierFormula f => 1 + f.Terms.Sum(t => Exactly(t.Strength) * squared / (squared - Exactly(t.ResonanceSquared))),
            PowerSeriesFormula f => Exactly(f.Constant) + f.Terms.Sum(t => Exactly(t.Coefficient) * Power(squared, t.Exponent / 2)),
            _ => throw new ArgumentException($"{glass.Id} has a form that this check does not know.", nameof(glass)),
        });
    }

    private static decimal Power(decimal value, int exponent) =>
        exponent == 0 ? 1 : exponent > 0 ? value * Power(value, exponent - 1) : Power(value, exponent + 1) / value;

    private static decimal Covariance(decimal[] left, decimal[] right, decimal[] weights)
    {
        decimal leftMean = left.Zip(weights, (v, w) => v * w).Sum();
        decimal rightMean = right.Zip(weights, (v, w) => v * w).Sum();
        return left.Zip(right, weights).Sum(t => t.Third * (t.First - leftMean) * (t.Second - rightMean));
    }

    /// <summary>Newton's method from the double's root.</summary>
    private static decimal SquareRoot(decimal value)
    {
        if (value <= 0)
        {
            return 0;
        }

        decimal root = (decimal)Math.Sqrt((double)value);
        for (int i = 0; i < 3; i++)
        {
            root = (root + (value / root)) / 2;
        }

        return root;
    }

    /// <summary>All 17 digits of a double: a cast keeps 15.</summary>
    private static decimal Exactly(double value) => decimal.Parse(value.ToString("R", CultureInfo.InvariantCulture), NumberStyles.Float, CultureInfo.InvariantCulture);
}
