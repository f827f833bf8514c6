namespace GlassPair.Optics.Practice;

/// <summary>How much light a bare surface lets through at normal incidence. Source: [fresnel].</summary>
public static class FresnelTransmittance
{
    /// <summary>Gets 1 − ((n₁ − n₂)/(n₁ + n₂))².</summary>
    /// <param name="before">The index before the surface, 1 or more.</param>
    /// <param name="after">The index behind the surface, 1 or more.</param>
    public static double OfSurface(double before, double after)
    {
        double amplitude = (before - after) / (before + after);
        return 1.0 - (amplitude * amplitude);
    }

    /// <summary>Gets 2 n/(n² + 1), that of a plate in air with all reflections to and fro.</summary>
    /// <param name="index">The index of the plate, 1 or more.</param>
    public static double OfPlate(double index) => 2.0 * index / ((index * index) + 1.0);
}
