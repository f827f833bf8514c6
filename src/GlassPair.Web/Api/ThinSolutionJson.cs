using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;

namespace GlassPair.Web.Api;

/// <summary>Thin elements whose powers bring the band to one focus, and the color that is left.</summary>
public record ThinSolutionJson
{
    /// <summary>Writes a solution.</summary>
    public ThinSolutionJson(ThinSolution solution, DataQuality quality)
    {
        double perFocalLength = 1.0 / solution.Requirement.FocalLength;
        Glasses = [.. solution.Elements.Select(e => e.Glass.Id)];
        PowersPerMm = [.. solution.RelativePowers.Select(p => p * perFocalLength)];
        RelativePowers = [.. solution.RelativePowers];
        FocalLengthsMm = [.. solution.FocalLengths.Select(Finite)];
        AbbeNumbers = [.. solution.Elements.Select(e => e.AbbeNumber)];
        PartialDispersions = [.. solution.Elements.Select(e => e.PartialDispersion)];
        PrimaryAxialColorMm = solution.PrimaryAxialColor;
        SecondarySpectrumMm = solution.SecondarySpectrum;
        SamplesNm = [.. solution.Requirement.Band.Samples.Select(s => s.Wavelength.Nanometers)];
        FocalShiftMm = [.. solution.FocalShifts];
        RmsFocalShiftMm = solution.RmsFocalShift;
        PeakToValleyFocalShiftMm = solution.PeakToValleyFocalShift;
        ExpectedRmsFocalShiftMm = solution.ExpectedRmsFocalShift(quality);
        ColorWavefrontWaves = solution.ColorWavefrontWaves;
        ColorLimitedFNumber = solution.ColorLimitedFNumber;
        PetzvalRadiusMm = Finite(solution.PetzvalRadius);
        Holds = solution.Holds;
        LargestElementPower = solution.LargestElementPower;
    }

    /// <summary>Gets the glasses, <c>maker/name</c>, in the order in which light meets them.</summary>
    public string[] Glasses { get; }

    /// <summary>Gets the power of each element at the design wavelength, per mm.</summary>
    public double[] PowersPerMm { get; }

    /// <summary>Gets the power of each element over that of the whole lens.</summary>
    public double[] RelativePowers { get; }

    /// <summary>Gets the focal length of each element at the design wavelength, mm; null for an element without power.</summary>
    public double?[] FocalLengthsMm { get; }

    /// <summary>Gets the Abbe number of each glass for the band, (n_m − 1)/(n_s − n_l).</summary>
    public double[] AbbeNumbers { get; }

    /// <summary>Gets the partial dispersion of each glass for the band, (n_s − n_m)/(n_s − n_l).</summary>
    public double[] PartialDispersions { get; }

    /// <summary>Gets f(short) − f(long), mm.</summary>
    public double PrimaryAxialColorMm { get; }

    /// <summary>Gets f(design) − ½[f(short) + f(long)], mm.</summary>
    public double SecondarySpectrumMm { get; }

    /// <summary>Gets the samples of the band, nm.</summary>
    public double[] SamplesNm { get; }

    /// <summary>Gets f(λ) − f(design) at each sample, mm; for an air-spaced pair the shift of the image behind the rear element.</summary>
    public double[] FocalShiftMm { get; }

    /// <summary>Gets the weighted standard deviation of the focal shift over the samples, mm.</summary>
    public double RmsFocalShiftMm { get; }

    /// <summary>Gets the largest minus the smallest focal shift over the samples, mm.</summary>
    public double PeakToValleyFocalShiftMm { get; }

    /// <summary>Gets the RMS focal shift to be expected of the glass really delivered, mm: residual and data floor, root-sum-square.</summary>
    public double ExpectedRmsFocalShiftMm { get; }

    /// <summary>Gets the RMS focal shift as waves of defocus at the edge of the pupil, δf/(8 N² λ).</summary>
    public double ColorWavefrontWaves { get; }

    /// <summary>Gets the fastest f-number at which half the peak-to-valley focal shift stays inside the quarter wave.</summary>
    public double ColorLimitedFNumber { get; }

    /// <summary>Gets the Petzval radius, mm; negative where the image curves towards the lens, null where it is flat.</summary>
    public double? PetzvalRadiusMm { get; }

    /// <summary>Gets whether the color stays inside the quarter wave at the required f-number.</summary>
    public bool Holds { get; }

    /// <summary>Gets the largest |φᵢ|/Φ, to compare with a limit on element power.</summary>
    public double LargestElementPower { get; }

    private static double? Finite(double value) => double.IsFinite(value) ? value : null;
}
