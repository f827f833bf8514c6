using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Color;

/// <summary>Powers of two thin elements, in contact or air-spaced, that bring a band to one focus.</summary>
public static class ThinPair
{
    /// <summary>Between this share of the largest air space and the whole, the band may have no least residual though its ends can be united.</summary>
    internal const double SureAirSpace = 0.999;

    /// <summary>Newton's method for an air-spaced pair takes no more steps than these.</summary>
    internal const int MostSteps = 60;

    /// <summary>A relative step so small that the next, about its square, would be lost in rounding.</summary>
    internal const double SmallStep = 1e-9;

    /// <summary>Solves the pair in the order in which light meets it.</summary>
    public static ThinOutcome Solve(Requirement requirement, GlassIndices front, GlassIndices rear)
    {
        double space = requirement.AirSpace.GetValueOrDefault() / requirement.FocalLength;
        double? power = requirement.Balance switch
        {
            ColorBalance.EndsUnited => EndsUnited(front.AbbeNumber, rear.AbbeNumber, space),
            _ => BandBalanced(front, rear, requirement.Band, space),
        };
        if (power is not { } first || !(Math.Abs(first) <= ThinSolution.LargestPower))
        {
            return Explain(requirement, front, rear);
        }

        // Σ yᵢ φᵢ = Φ with y₂ = 1 − δ p₁
        double second = (1.0 - first) / (1.0 - (space * first));
        return new ThinSolution(requirement, [front, rear], [first, second]);
    }

    /// <summary>Gets the largest air space at which two Abbe numbers can be balanced, mm: f (1 − √(V₂/V₁))². Source: [air-spaced-achromat].</summary>
    public static double LargestAirSpace(double focalLength, double frontAbbe, double rearAbbe)
    {
        double root = 1.0 - Math.Sqrt(rearAbbe / frontAbbe);
        return focalLength * Math.Min(1.0, root * root);
    }

    /// <summary>Tells whether an air space is why a pair has no solution; equal Abbe numbers, whose largest is zero, have none in contact either.</summary>
    internal static bool IsTooLarge(double airSpace, double largest) => largest > 0.0 && airSpace > SureAirSpace * largest;

    /// <summary>p₁ of the classical achromat: the root of δ p² − (1 − V₂/V₁ + δ) p + 1 = 0 that goes over to V₁/(V₁ − V₂) in contact; null where none is real.</summary>
    internal static double? EndsUnited(double frontAbbe, double rearAbbe, double space)
    {
        if (space == 0.0)
        {
            return frontAbbe == rearAbbe ? null : frontAbbe / (frontAbbe - rearAbbe);
        }

        double b = 1.0 - (rearAbbe / frontAbbe) + space;
        double discriminant = (b * b) - (4.0 * space);
        return discriminant >= 0.0 && b != 0.0 ? 2.0 / (b + Math.CopySign(Math.Sqrt(discriminant), b)) : null;
    }

    /// <summary>p₁ of least variance of p₁ t₁ + y₂² p₂ t₂ over the samples; null where there is no such minimum near the achromat.</summary>
    internal static double? BandBalanced(GlassIndices front, GlassIndices rear, Band band, double space)
    {
        double[] c1 = band.DeviationsOf(front.Changes.AsSpan());
        double[] c2 = band.DeviationsOf(rear.Changes.AsSpan());
        double along = 0.0;
        double gap = 0.0;
        double rearVariance = 0.0;
        for (int i = 0; i < c2.Length; i++)
        {
            double difference = c2[i] - c1[i];
            along += c2[i] * difference;
            gap += difference * difference;
            rearVariance += c2[i] * c2[i];
        }

        // p₁ = c₂·(c₂ − c₁)/|c₂ − c₁|²: equal to (G₂₂ − G₁₂)/(G₁₁ + G₂₂ − 2 G₁₂), without its cancellation
        return space == 0.0 ? gap > 0.0 ? along / gap : null
            : EndsUnited(front.AbbeNumber, rear.AbbeNumber, space) is { } start ? AirSpacedBalance(along, gap, rearVariance, space, start) : null;
    }

    /// <summary>
    /// The p that minimizes |p c₁ + (1 − δ p)(1 − p) c₂|² by Newton's method from the ends united; null where it leads to no minimum.
    /// With d = c₂ − c₁ and a = 1 − δ p + δ p² the vector is a c₂ − p d, so that little is lost to cancellation where the glasses are much alike.
    /// </summary>
    /// <param name="along">c₂·d.</param>
    /// <param name="gap">d·d.</param>
    /// <param name="rearVariance">c₂·c₂.</param>
    /// <param name="space">δ.</param>
    /// <param name="start">p with the ends united.</param>
    internal static double? AirSpacedBalance(double along, double gap, double rearVariance, double space, double start)
    {
        double p = start;
        for (int step = 0; step < MostSteps; step++)
        {
            double a = 1.0 - (space * p) + (space * p * p);
            double slope = (2.0 * space * p) - space;
            double gradient = (a * slope * rearVariance) - ((a + (p * slope)) * along) + (p * gap);
            double curvature = (((slope * slope) + (2.0 * space * a)) * rearVariance) - (((2.0 * slope) + (2.0 * space * p)) * along) + gap;
            double change = gradient / curvature;
            if (!(curvature > 0.0 && Math.Abs(p - change) <= ThinSolution.LargestPower))
            {
                return null;
            }

            p -= change;
            if (Math.Abs(change) <= SmallStep * Math.Abs(p))
            {
                return p;
            }
        }

        return p;
    }

    private static NoThinSolution Explain(Requirement requirement, GlassIndices front, GlassIndices rear)
    {
        double largest = LargestAirSpace(requirement.FocalLength, front.AbbeNumber, rear.AbbeNumber);
        return IsTooLarge(requirement.AirSpace.GetValueOrDefault(), largest)
            ? new NoThinSolution(
                NoThinSolutionReason.AirSpaceTooLarge,
                FormattableString.Invariant($"{front.Glass.Id} and {rear.Glass.Id} cannot be balanced {requirement.AirSpace:0.###} mm apart: the largest air space for them is {largest:G4} mm."),
                largest)
            : new NoThinSolution(
                NoThinSolutionReason.DispersionsAlike,
                $"{front.Glass.Id} and {rear.Glass.Id} disperse too much alike over this band: no finite powers balance them.");
    }
}
