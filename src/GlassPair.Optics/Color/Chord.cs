using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Color;

/// <summary>The straight line between two glasses where partial dispersion stands over Abbe number. Source: [thin-achromat].</summary>
public static class Chord
{
    /// <summary>Gets (P₁ − P₂)/(V₁ − V₂), without unit; null where the Abbe numbers are equal.</summary>
    public static double? SlopeOf(GlassIndices a, GlassIndices b) =>
        a.AbbeNumber == b.AbbeNumber ? null : (a.PartialDispersion - b.PartialDispersion) / (a.AbbeNumber - b.AbbeNumber);

    /// <summary>
    /// Gets the secondary spectrum of the pair with the ends of the band united, mm, with the sign of <see cref="ThinSolution.SecondarySpectrum"/>;
    /// null where the pair has no such solution.
    /// </summary>
    /// <remarks>f (P₁ − P₂) p₁/V₁, to first order in the change of power. In contact p₁/V₁ = 1/(V₁ − V₂): the focal length times the slope.</remarks>
    public static double? SecondarySpectrum(Requirement requirement, GlassIndices a, GlassIndices b)
    {
        (GlassIndices positive, GlassIndices negative) = a.AbbeNumber >= b.AbbeNumber ? (a, b) : (b, a);
        double space = requirement.AirSpace.GetValueOrDefault() / requirement.FocalLength;
        return ThinPair.EndsUnited(positive.AbbeNumber, negative.AbbeNumber, space) is { } power
            ? requirement.FocalLength * (positive.PartialDispersion - negative.PartialDispersion) * power / positive.AbbeNumber
            : null;
    }
}
