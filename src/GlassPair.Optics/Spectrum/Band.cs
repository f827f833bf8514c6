using System.Collections.Immutable;

namespace GlassPair.Optics.Spectrum;

/// <summary>A wavelength of a band and its share of the whole weight.</summary>
/// <param name="Wavelength">The wavelength.</param>
/// <param name="Weight">Its share, from 0 to 1; the shares of a band sum to 1.</param>
public readonly record struct BandSample(Wavelength Wavelength, double Weight);

/// <summary>The wavelengths that matter: short end, design wavelength, long end, and weighted samples between the ends.</summary>
/// <remarks>Immutable; made by <see cref="Even"/> or <see cref="FromSamples"/>, which check.</remarks>
public sealed class Band : IEquatable<Band>
{
    /// <summary>The fewest samples that tell a curve from a line.</summary>
    public const int MinSamples = 3;

    /// <summary>The most samples.</summary>
    public const int MaxSamples = 41;

    private Band(Wavelength shortEnd, Wavelength design, Wavelength longEnd, ImmutableArray<BandSample> samples, bool isEven)
    {
        (ShortEnd, Design, LongEnd, Samples, IsEven) = (shortEnd, design, longEnd, samples, isEven);
    }

    /// <summary>Gets the short end.</summary>
    public Wavelength ShortEnd { get; }

    /// <summary>Gets the design wavelength, strictly between the ends.</summary>
    public Wavelength Design { get; }

    /// <summary>Gets the long end.</summary>
    public Wavelength LongEnd { get; }

    /// <summary>Gets the samples in rising wavelength; their weights sum to 1.</summary>
    public ImmutableArray<BandSample> Samples { get; }

    /// <summary>Gets whether the samples are spaced evenly from end to end with equal weights.</summary>
    public bool IsEven { get; }

    /// <summary>Gets the range from end to end.</summary>
    public WavelengthRange Range => new(ShortEnd, LongEnd);

    /// <summary>Makes a band with samples spaced evenly in wavelength from end to end, with equal weights.</summary>
    /// <exception cref="ArgumentException">The three wavelengths do not rise.</exception>
    /// <exception cref="ArgumentOutOfRangeException">The count lies outside 3 to 41.</exception>
    public static Band Even(Wavelength shortEnd, Wavelength design, Wavelength longEnd, int count)
    {
        CheckOrder(shortEnd, design, longEnd);
        Guard.InRange(count, MinSamples, MaxSamples);
        double step = (longEnd.Nanometers - shortEnd.Nanometers) / (count - 1);
        var samples = ImmutableArray.CreateBuilder<BandSample>(count);
        for (int i = 0; i < count; i++)
        {
            Wavelength wavelength = i == count - 1 ? longEnd : Wavelength.FromNanometers(shortEnd.Nanometers + (i * step));
            samples.Add(new BandSample(wavelength, 1.0 / count));
        }

        return new Band(shortEnd, design, longEnd, samples.MoveToImmutable(), isEven: true);
    }

    /// <summary>Makes a band with samples of one's own.</summary>
    /// <param name="shortEnd">The short end.</param>
    /// <param name="design">The design wavelength, strictly between the ends.</param>
    /// <param name="longEnd">The long end.</param>
    /// <param name="samples">3 to 41 wavelengths in rising order, none outside the ends, with weights that are not negative; they are scaled to sum to 1.</param>
    /// <exception cref="ArgumentException">Any of this does not hold; the message says which.</exception>
    public static Band FromSamples(Wavelength shortEnd, Wavelength design, Wavelength longEnd, IReadOnlyList<BandSample> samples)
    {
        CheckOrder(shortEnd, design, longEnd);
        Guard.InRange(samples.Count, MinSamples, MaxSamples);
        double sum = 0.0;
        for (int i = 0; i < samples.Count; i++)
        {
            (Wavelength wavelength, double weight) = (samples[i].Wavelength, samples[i].Weight);
            if (!(weight >= 0.0 && double.IsFinite(weight)))
            {
                throw new ArgumentException($"The weight at {wavelength} must be zero or more.", nameof(samples));
            }

            if (i > 0 && !(wavelength > samples[i - 1].Wavelength))
            {
                throw new ArgumentException($"Samples must rise in wavelength; {wavelength} follows {samples[i - 1].Wavelength}.", nameof(samples));
            }

            if (wavelength < shortEnd || wavelength > longEnd)
            {
                throw new ArgumentException($"The sample at {wavelength} lies outside the band, {shortEnd} to {longEnd}.", nameof(samples));
            }

            sum += weight;
        }

        if (!(sum > 0.0 && double.IsFinite(sum)))
        {
            throw new ArgumentException("The weights must have a finite sum above zero.", nameof(samples));
        }

        return new Band(shortEnd, design, longEnd, [.. samples.Select(s => new BandSample(s.Wavelength, s.Weight / sum))], isEven: false);
    }

    /// <summary>Gets the weighted mean of one value for each sample.</summary>
    /// <exception cref="ArgumentException">There are more or fewer values than samples.</exception>
    public double MeanOf(ReadOnlySpan<double> values)
    {
        Guard.SameLength(Samples.Length, values.Length);
        double mean = 0.0;
        for (int i = 0; i < values.Length; i++)
        {
            mean += Samples[i].Weight * values[i];
        }

        return mean;
    }

    /// <summary>Gets the weighted variance of one value for each sample about their weighted mean.</summary>
    /// <exception cref="ArgumentException">There are more or fewer values than samples.</exception>
    public double VarianceOf(ReadOnlySpan<double> values)
    {
        double mean = MeanOf(values);
        double variance = 0.0;
        for (int i = 0; i < values.Length; i++)
        {
            double off = values[i] - mean;
            variance += Samples[i].Weight * off * off;
        }

        return variance;
    }

    /// <summary>Gets √w times the distance from the weighted mean, of one value for each sample: the dot product of two such lists is a weighted covariance.</summary>
    /// <exception cref="ArgumentException">There are more or fewer values than samples.</exception>
    public double[] DeviationsOf(ReadOnlySpan<double> values)
    {
        double mean = MeanOf(values);
        double[] deviations = new double[values.Length];
        for (int i = 0; i < values.Length; i++)
        {
            deviations[i] = Math.Sqrt(Samples[i].Weight) * (values[i] - mean);
        }

        return deviations;
    }

    /// <inheritdoc/>
    public bool Equals(Band? other) =>
        other is not null && ShortEnd == other.ShortEnd && Design == other.Design && LongEnd == other.LongEnd && Samples.SequenceEqual(other.Samples);

    /// <inheritdoc/>
    public override bool Equals(object? obj) => Equals(obj as Band);

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(ShortEnd, Design, LongEnd, Samples.Length);

    private static void CheckOrder(Wavelength shortEnd, Wavelength design, Wavelength longEnd)
    {
        if (!(shortEnd < design && design < longEnd))
        {
            throw new ArgumentException($"The design wavelength, {design}, must lie between the short end, {shortEnd}, and the long end, {longEnd}.", nameof(design));
        }
    }
}
