using System.Collections.Immutable;
using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;
using static GlassPair.Web.Figures.FigureText;

namespace GlassPair.Web.Figures;

/// <summary>What a pair's figures mean, in sentences: the number, the limit and the consequence.</summary>
public static class PairFindings
{
    /// <summary>Gets the findings, the most weighty first.</summary>
    public static ImmutableArray<Finding> Of(RankedPair pair, DataQuality quality)
    {
        var findings = ImmutableArray.CreateBuilder<Finding>();
        findings.Add(Color(pair));
        return findings.ToImmutable();
    }

    private static Finding Color(RankedPair pair)
    {
        ThinSolution solution = pair.Solution;
        Requirement requirement = solution.Requirement;
        int digits = MicrometerDecimals(requirement);
        string half = Fixed(0.5e3 * pair.PeakToValley, digits);
        string depth = Fixed(1e3 * requirement.DepthOfFocus, digits);
        string n = "f/" + Plain(requirement.FNumber);
        string limit = FNumber(pair.ColorLimitedFNumber);
        return pair.Verdict switch
        {
            Verdict.Holds => new Finding(Verdict.Holds, "Color holds", $"The band stays within ±{half} µm of one focus where {n} allows ±{depth} µm; it would hold down to {limit}."),
            Verdict.Tight => new Finding(Verdict.Tight, "Color is tight", $"The band stays within ±{half} µm of one focus where {n} allows ±{depth} µm; at {limit} nothing is left for other errors."),
            _ => new Finding(Verdict.Exceeds, "Color exceeds", $"The band spreads ±{half} µm about one focus where {n} allows ±{depth} µm; it holds from {limit} on."),
        };
    }
}
