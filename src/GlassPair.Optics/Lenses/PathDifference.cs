namespace GlassPair.Optics.Lenses;

/// <summary>How far a ray's light is ahead of or behind that of the chief ray where it is to form the image.</summary>
/// <remarks>
/// Measured on the reference sphere, centered in the image and passing through the middle of the exit pupil. Positive where the ray has the longer path.
/// Source: [wavefront].
/// </remarks>
/// <param name="CenterX">The image point in the image plane, mm.</param>
/// <param name="CenterY">The image point in the image plane, mm.</param>
/// <param name="Curvature">1/R of the sphere, 1/mm: positive where the exit pupil lies before the image, 0 for a pupil at infinity.</param>
public readonly record struct ReferenceSphere(double CenterX, double CenterY, double Curvature)
{
    /// <summary>Makes the sphere about the point where the chief ray meets the image plane.</summary>
    /// <param name="chief">The chief ray in the image plane.</param>
    /// <param name="exitPupil">The exit pupil, mm from the last vertex; infinite where the lens is telecentric.</param>
    public static ReferenceSphere About(Ray chief, double exitPupil)
    {
        double distance = chief.Z - exitPupil;
        return new ReferenceSphere(chief.X, chief.Y, double.IsFinite(distance) && distance != 0.0
            ? Math.CopySign(1.0 / Math.Sqrt((distance * distance) + (chief.X * chief.X) + (chief.Y * chief.Y)), distance)
            : 0.0);
    }

    /// <summary>Gets the path of a ray to the sphere, less the radius; null where the ray misses the sphere.</summary>
    /// <param name="ray">The ray in the image plane.</param>
    /// <remarks>
    /// With d from the center to the ray's point, k its direction and q = d² − (d·k)²: −d·k + q/(R + √(R² − q)).
    /// It is the intersection with the sphere freed of the difference of two large numbers.
    /// </remarks>
    public double? PathOf(Ray ray)
    {
        (double dx, double dy) = (ray.X - CenterX, ray.Y - CenterY);
        double along = (dx * ray.L) + (dy * ray.M);
        double across = (dx * dx) + (dy * dy) - (along * along);
        double radicand = 1.0 - (across * Curvature * Curvature);
        return radicand >= 0.0 ? ray.Path - along + (across * Curvature / (1.0 + Math.Sqrt(radicand))) : null;
    }
}
