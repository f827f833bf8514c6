using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Practice;

/// <summary>How much of the light that entered a glass comes through it.</summary>
public static class InternalTransmittance
{
    private static readonly Comparer<ExtinctionSample> s_byWavelength =
        Comparer<ExtinctionSample>.Create((left, right) => left.Wavelength.CompareTo(right.Wavelength));

    /// <summary>Gets the internal transmittance, 0 to 1; null where the glass has no extinction data that reach the wavelength.</summary>
    /// <remarks>
    /// τ = exp(−4π k t/λ). Between two stated wavelengths log k goes in a straight line; where one of them is 0, which says that the maker prints a
    /// transmittance of 1, k itself does. Source: [transmittance].
    /// </remarks>
    /// <param name="glass">The glass.</param>
    /// <param name="wavelength">The wavelength.</param>
    /// <param name="thickness">The path through the glass, 0 mm or more.</param>
    /// <exception cref="ArgumentOutOfRangeException">The thickness is negative or not finite.</exception>
    public static double? TryOf(Glass glass, Wavelength wavelength, double thickness)
    {
        Guard.InRange(thickness, 0.0, double.MaxValue);
        return ExtinctionAt(glass.Extinction, wavelength) is { } extinction
            ? Math.Exp(-4.0 * Math.PI * extinction * thickness / wavelength.Millimeters)
            : null;
    }

    /// <summary>Gets k at a wavelength; null outside the stated wavelengths.</summary>
    private static double? ExtinctionAt(ImmutableArray<ExtinctionSample> samples, Wavelength wavelength)
    {
        int after = samples.BinarySearch(new ExtinctionSample(wavelength, 0.0), s_byWavelength);
        if (after >= 0)
        {
            return samples[after].Coefficient;
        }

        after = ~after;
        if (after == 0 || after == samples.Length)
        {
            return null;
        }

        (ExtinctionSample left, ExtinctionSample right) = (samples[after - 1], samples[after]);
        double share = (wavelength.Nanometers - left.Wavelength.Nanometers) / (right.Wavelength.Nanometers - left.Wavelength.Nanometers);
        return left.Coefficient > 0.0 && right.Coefficient > 0.0
            ? left.Coefficient * Math.Pow(right.Coefficient / left.Coefficient, share)
            : double.Lerp(left.Coefficient, right.Coefficient, share);
    }
}
