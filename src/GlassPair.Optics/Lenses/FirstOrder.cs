namespace GlassPair.Optics.Lenses;

/// <summary>First-order values of a lens in air at one wavelength, mm. Source: [paraxial].</summary>
/// <param name="FocalLength">Effective focal length; infinite for an afocal lens.</param>
/// <param name="BackFocus">From the last vertex to the rear focal point.</param>
/// <param name="FrontFocus">From the first vertex to the front focal point; negative where it lies before the lens.</param>
/// <param name="ImageDistance">From the last vertex to the paraxial image of the object.</param>
/// <param name="EntrancePupil">From the first vertex to the entrance pupil.</param>
/// <param name="ExitPupil">From the last vertex to the exit pupil; infinite where the lens is telecentric.</param>
/// <param name="PetzvalRadius">Radius of the Petzval surface; infinite where it is flat.</param>
public sealed record FirstOrder(
    double FocalLength, double BackFocus, double FrontFocus, double ImageDistance, double EntrancePupil, double ExitPupil, double PetzvalRadius)
{
    /// <summary>Gets the distance from the last vertex to the rear principal plane, mm.</summary>
    public double RearPrincipalPlane => BackFocus - FocalLength;

    /// <summary>Gets the distance from the first vertex to the front principal plane, mm.</summary>
    public double FrontPrincipalPlane => FrontFocus + FocalLength;

    /// <summary>Computes the first-order values of a lens.</summary>
    public static FirstOrder Of(MonochromaticLens lens)
    {
        Prescription prescription = lens.Prescription;
        ParaxialRay parallel = ParaxialRay.Trace(lens, 1.0, 0.0);
        ParaxialRay oblique = ParaxialRay.Trace(lens, 0.0, 1.0);
        double focalLength = -1.0 / parallel.LastSlope;

        // A ray through the rear focal point backwards: the ray of any height and slope that leaves parallel to the axis.
        double frontFocus = oblique.LastSlope / parallel.LastSlope;
        double imageDistance = prescription.ObjectDistance is { } distance
            ? ParaxialRay.Trace(lens, distance, 1.0).AxisCrossing
            : parallel.AxisCrossing;

        // The chief ray passes the middle of the stop: y = a·y₁ + b·u₁ = 0 there.
        double entrancePupil = parallel.Heights[prescription.Stop] == 0.0 ? double.PositiveInfinity
            : oblique.Heights[prescription.Stop] / parallel.Heights[prescription.Stop];
        double exitPupil = ParaxialRay.Trace(lens, -entrancePupil, 1.0) switch
        {
            { LastSlope: 0.0 } => double.PositiveInfinity,
            var chief => chief.AxisCrossing,
        };

        double petzval = 0.0;
        for (int i = 0; i < prescription.Surfaces.Length; i++)
        {
            (double n, double next) = (lens.Indices[i], lens.Indices[i + 1]);
            petzval += prescription.Surfaces[i].Curvature * (next - n) / (n * next);
        }

        return new FirstOrder(focalLength, parallel.AxisCrossing, frontFocus, imageDistance, entrancePupil, exitPupil, -1.0 / petzval);
    }
}
