using System.Collections.Immutable;
using GlassPair.Optics.Requirements;
using MathNet.Numerics.Integration;

namespace GlassPair.Optics.Rankings;

/// <summary>Neighbors in a ranking that the data cannot tell apart.</summary>
/// <param name="First">The rank of the first, from 1.</param>
/// <param name="Last">The rank of the last, included.</param>
public readonly record struct Tie(int First, int Last);

/// <summary>Finds which candidates tie: those that, once made, have a fair chance to turn out better than the one ranked first of them.</summary>
/// <remarks>
/// The rule: a candidate ties with the first of its group if the chance that its color, once made, is smaller than that of the first is
/// <see cref="FairChance"/> or more. The model is that of the data floor: a made pair has R² = r² + F² z², with r its color residual,
/// F its data floor, and z a normal deviate of its own melts. Source: [data-floor].
/// </remarks>
public static class Ties
{
    /// <summary>The chance from which on a lower rank means nothing: one in three.</summary>
    public const double FairChance = 1.0 / 3.0;

    private const int Nodes = 32;

    /// <summary>Gets the groups of two and more that tie, in order of rank; none overlap.</summary>
    public static ImmutableArray<Tie> Of(IReadOnlyList<Candidate> candidates, DataQuality quality)
    {
        var ties = ImmutableArray.CreateBuilder<Tie>();
        (double Residual, double Floor)[] figures = [.. candidates.Select(c => (c.Solution.RmsFocalShift, c.Solution.DataFloor(quality)))];
        int next;
        for (int first = 0; first < candidates.Count; first = next)
        {
            (double residual, double floor) = figures[first];
            next = first + 1;
            while (next < candidates.Count && ChanceOfBeingBetter(figures[next].Residual, figures[next].Floor, residual, floor) >= FairChance)
            {
                next++;
            }

            if (next - first > 1)
            {
                ties.Add(new Tie(candidates[first].Rank, candidates[next - 1].Rank));
            }
        }

        return ties.ToImmutable();
    }

    /// <summary>Gets the chance, 0 to 1, that one pair turns out with less color than another, from their residuals and data floors in one unit.</summary>
    public static double ChanceOfBeingBetter(double residual, double floor, double otherResidual, double otherFloor)
    {
        double behind = (residual - otherResidual) * (residual + otherResidual);
        if (behind < 0.0)
        {
            return 1.0 - ChanceOfBeingBetter(otherResidual, otherFloor, residual, floor);
        }

        if (behind == 0.0 && floor == 0.0 && otherFloor == 0.0)
        {
            return 0.5;
        }

        // With (z, z') = ρ (sin θ, cos θ), ρ² is exponential of mean 2 and θ even, so that
        // P(F'² z'² − F² z² > r² − r'²) = 2/π ∫ exp(−(r² − r'²)/(2 (F'² cos² θ − F² sin² θ))) dθ from 0 to atan(F'/F).
        return 2.0 / Math.PI * GaussLegendreRule.Integrate(Share, 0.0, Math.Atan2(otherFloor, floor), Nodes);

        double Share(double angle)
        {
            (double sine, double cosine) = Math.SinCos(angle);
            double gain = ((otherFloor * cosine) - (floor * sine)) * ((otherFloor * cosine) + (floor * sine));
            return behind == 0.0 ? 1.0 : gain > 0.0 ? Math.Exp(-0.5 * behind / gain) : 0.0;
        }
    }
}
