using System.Collections.Immutable;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Color;

/// <summary>Powers of three thin elements in contact that bring a band to one focus.</summary>
public static class ThinTriplet
{
    /// <summary>Solves the triplet: the least variance over the band, or short end, design wavelength and long end united.</summary>
    /// <exception cref="ArgumentException">The requirement asks for an air space.</exception>
    public static ThinOutcome Solve(Requirement requirement, GlassIndices first, GlassIndices second, GlassIndices third)
    {
        if (requirement.AirSpace is > 0.0)
        {
            throw new ArgumentException("A thin triplet is solved in contact: leave the air space out.", nameof(requirement));
        }

        // Always solved in the same order, so that the powers are the same to the last bit in whatever order the glasses come.
        ImmutableArray<GlassIndices> glasses = [first, second, third];
        ImmutableArray<GlassIndices> ordered = [.. glasses.OrderByDescending(g => g.AbbeNumber).ThenBy(g => g.Glass.Id, StringComparer.Ordinal)];
        (double p2, double p3) = requirement.Balance == ColorBalance.EndsUnited
            ? ThreeUnited(ordered[0], ordered[1], ordered[2])
            : BandBalanced(ordered[0], ordered[1], ordered[2], requirement.Band);
        double[] powers = [1.0 - p2 - p3, p2, p3];
        return powers.All(p => Math.Abs(p) <= ThinSolution.LargestPower)
            ? new ThinSolution(requirement, glasses, [.. glasses.Select(g => powers[ordered.IndexOf(g)])])
            : new NoThinSolution(
                NoThinSolutionReason.DispersionsAlike,
                $"{first.Glass.Id}, {second.Glass.Id} and {third.Glass.Id} disperse too much alike over this band: no finite powers balance them.");
    }

    /// <summary>Σ pᵢ = 1 with Σ pᵢ tᵢ = 0 at the short and at the long end, by Cramer's rule on differences from the first glass.</summary>
    private static (double Second, double Third) ThreeUnited(GlassIndices a, GlassIndices b, GlassIndices c)
    {
        (double bs, double cs) = (b.ShortChange - a.ShortChange, c.ShortChange - a.ShortChange);
        (double bl, double cl) = (b.LongChange - a.LongChange, c.LongChange - a.LongChange);
        double determinant = (bs * cl) - (cs * bl);
        return (((cs * a.LongChange) - (cl * a.ShortChange)) / determinant, ((bl * a.ShortChange) - (bs * a.LongChange)) / determinant);
    }

    /// <summary>Least squares of c₁ + p₂ (c₂ − c₁) + p₃ (c₃ − c₁) by orthogonalization, c the deviations of t.</summary>
    private static (double Second, double Third) BandBalanced(GlassIndices a, GlassIndices b, GlassIndices c, Band band)
    {
        double[] target = band.DeviationsOf(a.Changes.AsSpan());
        double[] u = Subtract(band.DeviationsOf(b.Changes.AsSpan()), target);
        double[] v = Subtract(band.DeviationsOf(c.Changes.AsSpan()), target);
        double uu = Dot(u, u);
        double projection = Dot(u, v) / uu;
        double[] w = [.. v.Select((value, i) => value - (projection * u[i]))];
        double third = -Dot(w, target) / Dot(w, w);
        double second = -(Dot(u, target) / uu) - (third * projection);
        return (second, third);
    }

    private static double[] Subtract(double[] left, double[] right) => [.. left.Select((value, i) => value - right[i])];

    private static double Dot(double[] left, double[] right)
    {
        double sum = 0.0;
        for (int i = 0; i < left.Length; i++)
        {
            sum += left[i] * right[i];
        }

        return sum;
    }
}
