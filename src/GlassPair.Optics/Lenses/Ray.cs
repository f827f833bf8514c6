namespace GlassPair.Optics.Lenses;

/// <summary>A ray: a point, mm, the cosines of its direction, and the optical path that it has run, mm.</summary>
/// <param name="X">Across the meridian.</param>
/// <param name="Y">In the meridian.</param>
/// <param name="Z">Along the axis, from the vertex of the surface at hand.</param>
/// <param name="L">Direction cosine along x.</param>
/// <param name="M">Direction cosine along y.</param>
/// <param name="N">Direction cosine along z, above 0.</param>
/// <param name="Path">Optical path, index times length.</param>
public readonly record struct Ray(double X, double Y, double Z, double L, double M, double N, double Path);

/// <summary>Why a ray did not come through.</summary>
public enum RayFailure
{
    /// <summary>It came through.</summary>
    None,

    /// <summary>It passes beside a surface.</summary>
    MissesSurface,

    /// <summary>It is totally reflected.</summary>
    TotalReflection,
}

/// <summary>Where a traced ray ended: behind the last surface, or at the surface where it failed.</summary>
/// <param name="Ray">The ray at the last surface, z from the last vertex; meaningless where it failed.</param>
/// <param name="Failure">Why it failed, if it did.</param>
/// <param name="AtSurface">The surface where it failed, from 0.</param>
public readonly record struct TracedRay(Ray Ray, RayFailure Failure, int AtSurface)
{
    /// <summary>Gets whether the ray came through.</summary>
    public bool Passed => Failure == RayFailure.None;
}
