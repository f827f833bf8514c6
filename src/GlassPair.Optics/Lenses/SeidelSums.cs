using System.Collections.Immutable;

namespace GlassPair.Optics.Lenses;

/// <summary>The third-order sums of one surface or of a lens, mm, with Welford's signs. Source: [seidel].</summary>
/// <param name="Spherical">S_I.</param>
/// <param name="Coma">S_II.</param>
/// <param name="Astigmatism">S_III.</param>
/// <param name="Petzval">S_IV.</param>
/// <param name="Distortion">S_V.</param>
/// <param name="AxialColor">C_I; 0 where one wavelength alone was given.</param>
/// <param name="LateralColor">C_II; 0 where one wavelength alone was given.</param>
public readonly record struct SeidelTerms(
    double Spherical, double Coma, double Astigmatism, double Petzval, double Distortion, double AxialColor, double LateralColor)
{
    /// <summary>Adds term by term.</summary>
    public static SeidelTerms operator +(SeidelTerms a, SeidelTerms b) => new(
        a.Spherical + b.Spherical, a.Coma + b.Coma, a.Astigmatism + b.Astigmatism, a.Petzval + b.Petzval,
        a.Distortion + b.Distortion, a.AxialColor + b.AxialColor, a.LateralColor + b.LateralColor);
}

/// <summary>Third-order aberrations surface by surface, and their sums.</summary>
/// <param name="PerSurface">The terms of each surface.</param>
/// <param name="Total">Their sums.</param>
public sealed record SeidelSums(ImmutableArray<SeidelTerms> PerSurface, SeidelTerms Total)
{
    /// <summary>Computes the sums of a lens.</summary>
    /// <param name="lens">The lens in the design wavelength.</param>
    /// <param name="pupilRadius">Radius of the entrance pupil, mm.</param>
    /// <param name="fieldSlope">Tangent of the field angle: u of the chief ray before the lens.</param>
    /// <param name="shortEnd">The lens at the short end, for the color sums.</param>
    /// <param name="longEnd">The lens at the long end.</param>
    /// <exception cref="InvalidOperationException">The entrance pupil lies at infinity.</exception>
    public static SeidelSums Of(
        MonochromaticLens lens, double pupilRadius, double fieldSlope, MonochromaticLens? shortEnd = null, MonochromaticLens? longEnd = null)
    {
        FirstOrder first = FirstOrder.Of(lens);
        if (!double.IsFinite(first.EntrancePupil))
        {
            throw new InvalidOperationException("The third-order sums need an entrance pupil at a finite distance.");
        }

        Prescription prescription = lens.Prescription;
        ParaxialRay marginal = prescription.ObjectDistance is { } distance
            ? ParaxialRay.Trace(lens, distance * pupilRadius / (distance + first.EntrancePupil), pupilRadius / (distance + first.EntrancePupil))
            : ParaxialRay.Trace(lens, pupilRadius, 0.0);
        ParaxialRay chief = ParaxialRay.Trace(lens, -first.EntrancePupil * fieldSlope, fieldSlope);
        double lagrange = (chief.Slopes[0] * marginal.Heights[0]) - (marginal.Slopes[0] * chief.Heights[0]);

        var terms = ImmutableArray.CreateBuilder<SeidelTerms>(prescription.Surfaces.Length);
        SeidelTerms total = default;
        for (int i = 0; i < prescription.Surfaces.Length; i++)
        {
            Surface surface = prescription.Surfaces[i];
            (double n, double next) = (lens.Indices[i], lens.Indices[i + 1]);
            (double h, double chiefHeight) = (marginal.Heights[i], chief.Heights[i]);
            (double c, double jump) = (surface.Curvature, next - n);

            // A = n (h c + u), the refraction invariant of the marginal ray; Ā, that of the chief ray
            double a = n * ((h * c) + marginal.Slopes[i]);
            double aBar = n * ((chiefHeight * c) + chief.Slopes[i]);
            double aplanatic = (marginal.Slopes[i + 1] / next) - (marginal.Slopes[i] / n);
            double power = c * ((1.0 / next) - (1.0 / n));

            // Aspheric part: departure from the sphere, (K c³ + 8 A₄) r⁴/8
            double figure = ((surface.ConicConstant * c * c * c) + (8.0 * surface.Fourth)) * jump;
            double inverseSquares = (1.0 / (next * next)) - (1.0 / (n * n));
            var term = new SeidelTerms(
                (-a * a * h * aplanatic) + (figure * h * h * h * h),
                (-a * aBar * h * aplanatic) + (figure * h * h * h * chiefHeight),
                (-aBar * aBar * h * aplanatic) + (figure * h * h * chiefHeight * chiefHeight),
                -lagrange * lagrange * power,
                (-aBar * ((aBar * aBar * inverseSquares * h) - ((lagrange + (aBar * h)) * chiefHeight * power))) + (figure * h * chiefHeight * chiefHeight * chiefHeight),
                0.0,
                0.0);
            if (shortEnd is not null && longEnd is not null)
            {
                // C_I = Σ A h Δ(δn/n), δn = n(short) − n(long)
                double dispersion = ((shortEnd.Indices[i + 1] - longEnd.Indices[i + 1]) / next) - ((shortEnd.Indices[i] - longEnd.Indices[i]) / n);
                term = term with { AxialColor = a * h * dispersion, LateralColor = aBar * h * dispersion };
            }

            terms.Add(term);
            total += term;
        }

        return new SeidelSums(terms.MoveToImmutable(), total);
    }
}
