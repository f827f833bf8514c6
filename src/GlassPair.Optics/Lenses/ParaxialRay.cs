using System.Collections.Immutable;

namespace GlassPair.Optics.Lenses;

/// <summary>A ray near the axis: its height and slope before each surface, and behind the last. Source: [paraxial].</summary>
/// <param name="Heights">y at each surface, mm.</param>
/// <param name="Slopes">u before the first surface, then behind each surface.</param>
public readonly record struct ParaxialRay(ImmutableArray<double> Heights, ImmutableArray<double> Slopes)
{
    /// <summary>Gets the slope behind the last surface.</summary>
    public double LastSlope => Slopes[^1];

    /// <summary>Gets where the ray crosses the axis, mm from the last vertex; infinite where it runs parallel.</summary>
    public double AxisCrossing => -Heights[^1] / LastSlope;

    /// <summary>Traces a paraxial ray: n' u' = n u − y c (n' − n), y ← y + t u'.</summary>
    /// <param name="lens">The lens.</param>
    /// <param name="height">y at the first surface, mm.</param>
    /// <param name="slope">u before it.</param>
    public static ParaxialRay Trace(MonochromaticLens lens, double height, double slope)
    {
        ImmutableArray<Surface> surfaces = lens.Prescription.Surfaces;
        var heights = ImmutableArray.CreateBuilder<double>(surfaces.Length);
        var slopes = ImmutableArray.CreateBuilder<double>(surfaces.Length + 1);
        (double y, double u) = (height, slope);
        slopes.Add(u);
        for (int i = 0; i < surfaces.Length; i++)
        {
            (double n, double next) = (lens.Indices[i], lens.Indices[i + 1]);
            heights.Add(y);
            u = ((n * u) - (y * surfaces[i].Curvature * (next - n))) / next;
            slopes.Add(u);
            y += surfaces[i].Thickness * u;
        }

        return new ParaxialRay(heights.MoveToImmutable(), slopes.MoveToImmutable());
    }
}
