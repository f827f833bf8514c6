using System.Collections.Immutable;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Color;

/// <summary>What solving a thin lens came to: a <see cref="ThinSolution"/>, or <see cref="NoThinSolution"/> with the reason.</summary>
public abstract record ThinOutcome;

/// <summary>Why glasses make no lens of the required kind.</summary>
public enum NoThinSolutionReason
{
    /// <summary>The dispersions are so alike that the powers would exceed <see cref="ThinSolution.LargestPower"/>.</summary>
    DispersionsAlike,

    /// <summary>No powers unite the colors at this air space.</summary>
    AirSpaceTooLarge,
}

/// <summary>Glasses that make no lens of the required kind.</summary>
/// <param name="Reason">The reason.</param>
/// <param name="Sentence">The reason in words, with the numbers.</param>
/// <param name="LargestAirSpace">The largest air space that has a solution, mm; null where the air space is not the reason.</param>
public sealed record NoThinSolution(NoThinSolutionReason Reason, string Sentence, double? LargestAirSpace = null) : ThinOutcome;

/// <summary>Thin elements whose powers bring a band to one focus, and the color that is left.</summary>
/// <remarks>
/// Focus is where the light comes to: for elements in contact its shift is that of the focal length, for an air-spaced pair that of
/// the image behind the rear element. Shifts are counted from the focus of the design wavelength, positive away from the lens.
/// Sources: [thin-achromat], [band-balance].
/// </remarks>
public sealed record ThinSolution : ThinOutcome
{
    /// <summary>Powers past this size, in units of the whole power, mean that no balance exists.</summary>
    public const double LargestPower = 1e4;

    private readonly double _variance;

    internal ThinSolution(Requirement requirement, ImmutableArray<GlassIndices> elements, ImmutableArray<double> relativePowers)
    {
        (Requirement, Elements, RelativePowers) = (requirement, elements, relativePowers);
        double[] shifts = [.. Enumerable.Range(0, requirement.Band.Samples.Length).Select(i => RelativeShift([.. elements.Select(e => e.Changes[i])]))];
        FocalShifts = [.. shifts.Select(shift => requirement.FocalLength * shift)];
        ShortShift = requirement.FocalLength * RelativeShift([.. elements.Select(e => e.ShortChange)]);
        LongShift = requirement.FocalLength * RelativeShift([.. elements.Select(e => e.LongChange)]);
        _variance = requirement.Band.VarianceOf(shifts);
        RmsFocalShift = requirement.FocalLength * Math.Sqrt(_variance);
    }

    /// <summary>Gets what was asked for.</summary>
    public Requirement Requirement { get; }

    /// <summary>Gets the glasses over the band, in the order in which light meets them.</summary>
    public ImmutableArray<GlassIndices> Elements { get; }

    /// <summary>Gets φᵢ/Φ at the design wavelength.</summary>
    public ImmutableArray<double> RelativePowers { get; }

    /// <summary>Gets the focal shift at each sample of the band, mm.</summary>
    public ImmutableArray<double> FocalShifts { get; }

    /// <summary>Gets the focal shift at the short end, mm.</summary>
    public double ShortShift { get; }

    /// <summary>Gets the focal shift at the long end, mm.</summary>
    public double LongShift { get; }

    /// <summary>Gets the primary axial color, f(short) − f(long), mm.</summary>
    public double PrimaryAxialColor => ShortShift - LongShift;

    /// <summary>Gets the secondary spectrum, f(design) − ½[f(short) + f(long)], mm: negative where the design wavelength focuses nearer than the ends.</summary>
    public double SecondarySpectrum => -0.5 * (ShortShift + LongShift);

    /// <summary>Gets the weighted standard deviation of the focal shift over the samples, mm: the color residual.</summary>
    public double RmsFocalShift { get; }

    /// <summary>Gets the largest minus the smallest focal shift over the samples, mm.</summary>
    public double PeakToValleyFocalShift => FocalShifts.Max() - FocalShifts.Min();

    /// <summary>Gets the color residual as waves of defocus at the edge of the pupil, δf/(8 N² λ). Source: [depth-of-focus].</summary>
    public double ColorWavefrontWaves =>
        RmsFocalShift / (8.0 * Requirement.FNumber * Requirement.FNumber * Requirement.Band.Design.Millimeters);

    /// <summary>Gets the fastest f-number at which half the peak-to-valley focal shift stays inside the quarter wave, √(½ δf/(2 λ)).</summary>
    public double ColorLimitedFNumber => Math.Sqrt(0.5 * PeakToValleyFocalShift / (2.0 * Requirement.Band.Design.Millimeters));

    /// <summary>Gets whether the color residual stays inside the quarter wave at the required f-number.</summary>
    public bool Holds => ColorLimitedFNumber <= Requirement.FNumber;

    /// <summary>Gets the Petzval radius, −1/Σ(φᵢ/nᵢ), mm: negative where the image curves towards the lens. Source: [petzval].</summary>
    public double PetzvalRadius
    {
        get
        {
            double sum = 0.0;
            for (int i = 0; i < Elements.Length; i++)
            {
                sum += RelativePowers[i] / Elements[i].DesignIndex;
            }

            return -Requirement.FocalLength / sum;
        }
    }

    /// <summary>Gets Σ|φᵢ|/Φ, by which ties are broken.</summary>
    public double SumOfPowers => RelativePowers.Sum(Math.Abs);

    /// <summary>Gets the largest |φᵢ|/Φ.</summary>
    public double LargestElementPower => RelativePowers.Max(Math.Abs);

    /// <summary>Gets the focal length of each element at the design wavelength, mm.</summary>
    public ImmutableArray<double> FocalLengths => [.. RelativePowers.Select(p => Requirement.FocalLength / p)];

    /// <summary>Gets the focal shift at any wavelength that all glasses cover, mm.</summary>
    /// <exception cref="Glasses.WavelengthOutOfRangeException">A glass has no index there.</exception>
    public double FocalShiftAt(Wavelength wavelength) =>
        Requirement.FocalLength * RelativeShift([.. Elements.Select(e => e.ChangeAt(wavelength))]);

    /// <summary>Gets the part of the color residual that cannot be known from index data and melts, mm. Source: [data-floor].</summary>
    public double DataFloor(DataQuality quality) => Requirement.FocalLength * Math.Sqrt(UnknownVariance(quality));

    /// <summary>Gets the color residual to be expected of the glass really delivered, mm: residual and data floor, root-sum-square.</summary>
    public double ExpectedRmsFocalShift(DataQuality quality) => Requirement.FocalLength * Math.Sqrt(_variance + UnknownVariance(quality));

    private double UnknownVariance(DataQuality quality)
    {
        double sum = 0.0;
        for (int i = 0; i < Elements.Length; i++)
        {
            double weight = ColorWeight(i);
            sum += weight * weight * ThinFloor.Of(Elements[i], Requirement.Band, quality);
        }

        return sum;
    }

    /// <summary>How much of element i's relative power change moves the focus: its power, by the square of the ray height where it stands.</summary>
    private double ColorWeight(int i)
    {
        double height = i == 0 || Requirement.AirSpace is not { } space ? 1.0 : 1.0 - (space / Requirement.FocalLength * RelativePowers[0]);
        return height * height * RelativePowers[i];
    }

    /// <summary>The focal shift in units of the focal length.</summary>
    private double RelativeShift(ReadOnlySpan<double> changes) =>
        FocalShift.Of(RelativePowers.AsSpan(), changes, Requirement.AirSpace.GetValueOrDefault() / Requirement.FocalLength);
}
