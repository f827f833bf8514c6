namespace GlassPair.Optics.Lenses;

/// <summary>Rays through a point of the entrance pupil at a field angle.</summary>
public static class PupilRay
{
    /// <summary>Makes the ray before the first surface.</summary>
    /// <param name="lens">The lens.</param>
    /// <param name="entrancePupil">The plane of the pupil, mm from the first vertex: 0 where the stop is the first surface.</param>
    /// <param name="pupilRadius">Radius of the pupil, mm.</param>
    /// <param name="fieldDegrees">The field angle in the meridian, degrees: the chief ray climbs by its tangent.</param>
    /// <param name="pupilX">Height in the pupil across the meridian, in units of its radius.</param>
    /// <param name="pupilY">Height in the pupil in the meridian, in units of its radius.</param>
    /// <remarks>Paths count from the plane through the middle of the pupil across the chief ray (object at infinity), or from the object point.</remarks>
    public static Ray At(MonochromaticLens lens, double entrancePupil, double pupilRadius, double fieldDegrees, double pupilX, double pupilY)
    {
        double angle = fieldDegrees * Math.PI / 180.0;
        (double x, double y) = (pupilX * pupilRadius, pupilY * pupilRadius);
        if (lens.Prescription.ObjectDistance is not { } distance)
        {
            (double m, double n) = (Math.Sin(angle), Math.Cos(angle));
            return new Ray(x, y, entrancePupil, 0.0, m, n, y * m);
        }

        double objectHeight = -(distance + entrancePupil) * Math.Tan(angle);
        (double dx, double dy, double dz) = (x, y - objectHeight, distance + entrancePupil);
        double length = Math.Sqrt((dx * dx) + (dy * dy) + (dz * dz));
        return new Ray(x, y, entrancePupil, dx / length, dy / length, dz / length, length);
    }
}
