using System.Collections.Immutable;

namespace GlassPair.Optics.Lenses;

/// <summary>Exact skew rays through centered surfaces. Source: [ray-trace].</summary>
public static class RayTrace
{
    private const int MostSteps = 40;

    /// <summary>Traces a ray to behind the last surface.</summary>
    /// <param name="lens">The lens in the light of the ray.</param>
    /// <param name="ray">The ray before the first surface, z from the first vertex.</param>
    public static TracedRay Through(MonochromaticLens lens, Ray ray)
    {
        ImmutableArray<Surface> surfaces = lens.Prescription.Surfaces;
        for (int i = 0; i < surfaces.Length; i++)
        {
            if (i > 0)
            {
                ray = ray with { Z = ray.Z - surfaces[i - 1].Thickness };
            }

            RayFailure failure = Refract(surfaces[i], lens.Indices[i], lens.Indices[i + 1], ref ray);
            if (failure != RayFailure.None)
            {
                return new TracedRay(ray, failure, i);
            }
        }

        return new TracedRay(ray, RayFailure.None, 0);
    }

    /// <summary>Carries a ray in air on to a plane across the axis.</summary>
    /// <param name="ray">The ray, z from the last vertex.</param>
    /// <param name="z">The plane, mm from the last vertex.</param>
    public static Ray ToPlane(Ray ray, double z)
    {
        double length = (z - ray.Z) / ray.N;
        return ray with { X = ray.X + (length * ray.L), Y = ray.Y + (length * ray.M), Z = z, Path = ray.Path + length };
    }

    /// <summary>Finds where the ray meets the surface and refracts it there.</summary>
    /// <remarks>
    /// The conic c (x² + y² + (1 + K) z²) = 2 z is met at the root s = C/(B + √(B² − A C)) of A s² − 2 B s + C = 0, the one by the vertex;
    /// aspheric terms are added by Newton's method. Refraction: k' = μ k + (cos I' − μ cos I) ν.
    /// </remarks>
    internal static RayFailure Refract(Surface surface, double before, double behind, ref Ray ray)
    {
        double c = surface.Curvature;
        double k = 1.0 + surface.ConicConstant;
        double a = c * (1.0 + (surface.ConicConstant * ray.N * ray.N));
        double b = ray.N - (c * ((ray.X * ray.L) + (ray.Y * ray.M) + (k * ray.Z * ray.N)));
        double free = (c * ((ray.X * ray.X) + (ray.Y * ray.Y) + (k * ray.Z * ray.Z))) - (2.0 * ray.Z);
        double discriminant = (b * b) - (a * free);
        if (!(discriminant >= 0.0))
        {
            return RayFailure.MissesSurface;
        }

        double length = free / (b + Math.Sqrt(discriminant));
        double x = ray.X + (length * ray.L);
        double y = ray.Y + (length * ray.M);
        double z = ray.Z + (length * ray.N);
        (double nx, double ny, double nz) = (-c * x, -c * y, 1.0 - (c * k * z));
        if (!(nz > 0.0))
        {
            return RayFailure.MissesSurface;
        }

        if (surface.IsAspheric)
        {
            for (int step = 0; ; step++)
            {
                double squared = (x * x) + (y * y);
                double root = 1.0 - (k * c * c * squared);
                if (!(root > 0.0) || step == MostSteps)
                {
                    return RayFailure.MissesSurface;
                }

                root = Math.Sqrt(root);
                double sag = (c * squared / (1.0 + root)) + (squared * squared * (surface.Fourth + (squared * (surface.Sixth + (squared * surface.Eighth)))));

                // dz/dr / r
                double slope = (c / root) + (squared * ((4.0 * surface.Fourth) + (squared * ((6.0 * surface.Sixth) + (squared * 8.0 * surface.Eighth)))));
                (nx, ny, nz) = (-slope * x, -slope * y, 1.0);
                double move = (sag - z) / ((nx * ray.L) + (ny * ray.M) + ray.N);
                if (!double.IsFinite(move))
                {
                    return RayFailure.MissesSurface;
                }

                length += move;
                x = ray.X + (length * ray.L);
                y = ray.Y + (length * ray.M);
                z = ray.Z + (length * ray.N);
                if (Math.Abs(move) <= 1e-14 * (1.0 + Math.Abs(length)))
                {
                    break;
                }
            }
        }

        double scale = 1.0 / Math.Sqrt((nx * nx) + (ny * ny) + (nz * nz));
        (nx, ny, nz) = (nx * scale, ny * scale, nz * scale);
        double cosine = (nx * ray.L) + (ny * ray.M) + (nz * ray.N);
        double ratio = before / behind;
        double radicand = 1.0 - (ratio * ratio * (1.0 - (cosine * cosine)));
        if (!(radicand >= 0.0))
        {
            return RayFailure.TotalReflection;
        }

        double turn = Math.Sqrt(radicand) - (ratio * cosine);
        ray = new Ray(
            x, y, z,
            (ratio * ray.L) + (turn * nx),
            (ratio * ray.M) + (turn * ny),
            (ratio * ray.N) + (turn * nz),
            ray.Path + (before * length));
        return RayFailure.None;
    }
}
