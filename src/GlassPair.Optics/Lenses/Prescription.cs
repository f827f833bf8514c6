using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Lenses;

/// <summary>Centered surfaces in air, in the order in which light from the left meets them.</summary>
/// <remarks>Immutable; checked when made.</remarks>
public sealed class Prescription
{
    /// <summary>The most surfaces.</summary>
    public const int MaxSurfaces = 200;

    /// <summary>Makes a prescription.</summary>
    /// <param name="surfaces">1 to 200 surfaces; the last stands in air.</param>
    /// <param name="stop">Which surface is the stop, from 0.</param>
    /// <param name="objectDistance">Distance from the object to the first vertex, mm, above 0; null for an object at infinity.</param>
    /// <exception cref="ArgumentException">Something cannot be; the message names the surface, from 1.</exception>
    public Prescription(IEnumerable<Surface> surfaces, int stop = 0, double? objectDistance = null)
    {
        Surfaces = [.. surfaces];
        (Stop, ObjectDistance) = (stop, objectDistance);
        if (FindFault() is { } fault)
        {
            throw new ArgumentException(fault.Message, nameof(surfaces));
        }
    }

    /// <summary>Gets the surfaces.</summary>
    public ImmutableArray<Surface> Surfaces { get; }

    /// <summary>Gets which surface is the stop, from 0.</summary>
    public int Stop { get; }

    /// <summary>Gets the distance from the object to the first vertex, mm; null for an object at infinity.</summary>
    public double? ObjectDistance { get; }

    /// <summary>Gets the glasses, each once, in the order of the surfaces.</summary>
    public IEnumerable<Glass> Glasses => Surfaces.Select(s => s.Then).OfType<Glass>().DistinctBy(g => g.Id);

    /// <summary>Gets the distance from the first to the last vertex, mm.</summary>
    public double Length => Surfaces.Take(Surfaces.Length - 1).Sum(s => s.Thickness);

    /// <summary>Finds what is wrong with surfaces before a prescription is made of them; null where nothing is.</summary>
    public static PrescriptionFault? FindFault(IReadOnlyList<Surface> surfaces, int stop = 0, double? objectDistance = null)
    {
        if (surfaces.Count is < 1 or > MaxSurfaces)
        {
            return new PrescriptionFault(0, "surfaces", $"A prescription has 1 to {MaxSurfaces} surfaces; this one has {surfaces.Count}.");
        }

        if (stop < 0 || stop >= surfaces.Count)
        {
            return new PrescriptionFault(0, "stop", $"The stop must be one of the {surfaces.Count} surfaces.");
        }

        if (objectDistance is { } distance && !(distance > 0.0 && double.IsFinite(distance)))
        {
            return new PrescriptionFault(0, "objectDistance", "The object must stand at a finite distance above 0 before the first surface, or at infinity.");
        }

        for (int i = 0; i < surfaces.Count; i++)
        {
            Surface surface = surfaces[i];
            if (!double.IsFinite(surface.Curvature))
            {
                return new PrescriptionFault(i, "radius", $"Surface {i + 1}: the radius must be a number other than 0.");
            }

            if (i < surfaces.Count - 1 && !(surface.Thickness >= 0.0 && double.IsFinite(surface.Thickness)))
            {
                return new PrescriptionFault(i, "thickness", $"Surface {i + 1}: the distance to the next surface must be 0 or more.");
            }

            if (!double.IsFinite(surface.ConicConstant + surface.Fourth + surface.Sixth + surface.Eighth))
            {
                return new PrescriptionFault(i, "conicConstant", $"Surface {i + 1}: the conic constant and the aspheric terms must be finite.");
            }
        }

        return surfaces[^1].Then is { } last
            ? new PrescriptionFault(surfaces.Count - 1, "glass", $"Surface {surfaces.Count}: the last surface must stand in air, not in {last.Id}.")
            : null;
    }

    /// <summary>Finds the first surface that crosses the next one within a height from the axis; null where none does.</summary>
    public PrescriptionFault? FindCrossing(double height)
    {
        const int steps = 24;
        for (int i = 0; i + 1 < Surfaces.Length; i++)
        {
            for (int k = 0; k <= steps; k++)
            {
                double y = height * k / steps;
                if (Surfaces[i].SagAt(y) is { } here && Surfaces[i + 1].SagAt(y) is { } next && Surfaces[i].Thickness + next - here < -1e-9)
                {
                    return new PrescriptionFault(i, "thickness", FormattableString.Invariant(
                        $"Surfaces {i + 1} and {i + 2} cross at {y:0.###} mm from the axis, inside the clear aperture: part them or flatten them."));
                }
            }
        }

        return null;
    }

    /// <summary>Puts the lens into light of one wavelength.</summary>
    /// <exception cref="WavelengthOutOfRangeException">A glass has no index there.</exception>
    public MonochromaticLens At(Wavelength wavelength) => new(this, wavelength);

    private PrescriptionFault? FindFault() => FindFault(Surfaces, Stop, ObjectDistance);
}

/// <summary>What is wrong with a prescription.</summary>
/// <param name="Surface">The surface, from 0.</param>
/// <param name="Field">Which of its values: radius, thickness, conicConstant, glass, stop, surfaces.</param>
/// <param name="Message">What is wrong and what is allowed; it counts surfaces from 1.</param>
public sealed record PrescriptionFault(int Surface, string Field, string Message);
