using GlassPair.Optics.Glasses;

namespace GlassPair.Optics.Lenses;

/// <summary>A centered refracting surface: z = c r²/(1 + √(1 − (1 + K) c² r²)) + A₄ r⁴ + A₆ r⁶ + A₈ r⁸. Source: [conic-surface].</summary>
/// <param name="Curvature">c, 1/mm: positive where the center lies to the right, 0 for a plane.</param>
/// <param name="Thickness">The distance along the axis to the next vertex, mm, 0 or more; not used behind the last surface.</param>
/// <param name="Then">The glass behind the surface; null for air.</param>
public sealed record Surface(double Curvature, double Thickness, Glass? Then)
{
    /// <summary>Gets the conic constant K: 0 for a sphere, −1 for a paraboloid.</summary>
    public double ConicConstant { get; init; }

    /// <summary>Gets A₄, 1/mm³.</summary>
    public double Fourth { get; init; }

    /// <summary>Gets A₆, 1/mm⁵.</summary>
    public double Sixth { get; init; }

    /// <summary>Gets A₈, 1/mm⁷.</summary>
    public double Eighth { get; init; }

    /// <summary>Gets the radius of curvature, mm; infinite for a plane.</summary>
    public double Radius => Curvature == 0.0 ? double.PositiveInfinity : 1.0 / Curvature;

    /// <summary>Gets whether the surface has terms beyond the conic.</summary>
    public bool IsAspheric => Fourth != 0.0 || Sixth != 0.0 || Eighth != 0.0;

    /// <summary>Makes a surface from its radius, mm; null or infinite for a plane.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The radius is 0 or not a number.</exception>
    public static Surface FromRadius(double? radius, double thickness, Glass? then) => radius switch
    {
        null => new Surface(0.0, thickness, then),
        { } r when double.IsInfinity(r) => new Surface(0.0, thickness, then),
        { } r when r == 0.0 || double.IsNaN(r) => throw new ArgumentOutOfRangeException(nameof(radius), r, "Must not be 0."),
        { } r => new Surface(1.0 / r, thickness, then),
    };

    /// <summary>Gets the sag at a height from the axis, mm; null where the surface does not reach that far.</summary>
    public double? SagAt(double height)
    {
        double squared = height * height;
        double radicand = 1.0 - ((1.0 + ConicConstant) * Curvature * Curvature * squared);
        return radicand < 0.0 ? null
            : (Curvature * squared / (1.0 + Math.Sqrt(radicand))) + (squared * squared * (Fourth + (squared * (Sixth + (squared * Eighth)))));
    }
}
