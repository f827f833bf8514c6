using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Color;

/// <summary>The focus at one wavelength.</summary>
/// <param name="Wavelength">The wavelength.</param>
/// <param name="Shift">The focal shift from the middle focus, mm.</param>
/// <param name="DepthOfFocus">The quarter-wave depth of focus at this wavelength, ± this many mm: 2 λ N². Source: [depth-of-focus].</param>
public readonly record struct FocalShiftPoint(Wavelength Wavelength, double Shift, double DepthOfFocus);

/// <summary>The focal shift of a thin lens against wavelength, counted from the middle focus.</summary>
/// <remarks>
/// The middle focus lies halfway between the nearest and the farthest focus of the samples, so that a lens holds
/// (<see cref="ThinSolution.Holds"/>) where every sample lies within ± the depth of focus at the design wavelength.
/// </remarks>
/// <param name="MiddleFocus">The middle focus, counted from the focus of the design wavelength, mm.</param>
/// <param name="Curve">A smooth curve over the band and a little beyond, as far as all glasses reach.</param>
/// <param name="Samples">The samples of the band.</param>
public sealed record FocalShiftCurve(double MiddleFocus, ImmutableArray<FocalShiftPoint> Curve, ImmutableArray<FocalShiftPoint> Samples)
{
    private const int Steps = 96;
    private const double Beyond = 0.12;

    /// <summary>Draws the curve of a solution.</summary>
    public static FocalShiftCurve Of(ThinSolution solution)
    {
        Band band = solution.Requirement.Band;
        double middle = 0.5 * (solution.FocalShifts.Max() + solution.FocalShifts.Min());
        FocalShiftPoint Point(Wavelength wavelength, double shift) =>
            new(wavelength, shift - middle, 2.0 * wavelength.Millimeters * solution.Requirement.FNumber * solution.Requirement.FNumber);

        double width = band.LongEnd.Nanometers - band.ShortEnd.Nanometers;
        double from = Math.Max(band.ShortEnd.Nanometers - (Beyond * width), solution.Elements.Max(e => e.Glass.Range.Shortest.Nanometers));
        double to = Math.Min(band.LongEnd.Nanometers + (Beyond * width), solution.Elements.Min(e => e.Glass.Range.Longest.Nanometers));
        IEnumerable<Wavelength> wavelengths = Enumerable.Range(0, Steps + 1)
            .Select(i => Wavelength.FromNanometers(i == Steps ? to : from + (i * (to - from) / Steps)));
        return new FocalShiftCurve(
            middle,
            [.. wavelengths.Select(w => Point(w, solution.FocalShiftAt(w)))],
            [.. band.Samples.Select((s, i) => Point(s.Wavelength, solution.FocalShifts[i]))]);
    }
}
