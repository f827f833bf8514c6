using GlassPair.Optics.Color;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;

namespace GlassPair.Web.Figures;

/// <summary>A pair with the figures that table, panel and export show. Lengths in mm, as everywhere inside.</summary>
public sealed class RankedPair
{
    /// <summary>Computes the figures of a solved pair.</summary>
    /// <param name="solution">The pair.</param>
    /// <param name="quality">How well its glasses are known.</param>
    /// <param name="candidate">Its place in the ranking; null where it is not among the ranked.</param>
    public RankedPair(ThinSolution solution, DataQuality quality, Candidate? candidate)
    {
        (Solution, Candidate) = (solution, candidate);
        DataFloor = solution.DataFloor(quality);
        Expected = solution.ExpectedRmsFocalShift(quality);
        PeakToValley = solution.PeakToValleyFocalShift;
        ColorLimitedFNumber = solution.ColorLimitedFNumber;
    }

    /// <summary>Gets the pair.</summary>
    public ThinSolution Solution { get; }

    /// <summary>Gets its place in the ranking; null where it is not among the ranked.</summary>
    public Candidate? Candidate { get; }

    /// <summary>Gets the glass of positive power over the band.</summary>
    public GlassIndices Positive => Solution.Elements[0];

    /// <summary>Gets the other glass over the band.</summary>
    public GlassIndices Negative => Solution.Elements[1];

    /// <summary>Gets the part of the color residual that cannot be known, mm.</summary>
    public double DataFloor { get; }

    /// <summary>Gets the color residual to be expected, mm RMS.</summary>
    public double Expected { get; }

    /// <summary>Gets the largest minus the smallest focal shift, mm.</summary>
    public double PeakToValley { get; }

    /// <summary>Gets the fastest f-number at which the color stays inside the quarter wave.</summary>
    public double ColorLimitedFNumber { get; }

    /// <summary>Gets whether it stays inside at the required f-number.</summary>
    public Verdict Verdict => Verdicts.Of(ColorLimitedFNumber, Solution.Requirement.FNumber);

    /// <summary>Gets the difference in expansion, positive minus negative glass, per kelvin; null where one is not known.</summary>
    public double? ExpansionDifference => Positive.Glass.ExpansionPerKelvin - Negative.Glass.ExpansionPerKelvin;
}
