using System.Text.Json.Serialization;
using GlassPair.Optics.Lenses;

namespace GlassPair.Web.Api;

/// <summary>Exact rays through a prescription, its first-order values, and its third-order sums.</summary>
public sealed record TraceJson
{
    /// <summary>Gets the image plane, mm from the last vertex.</summary>
    public required double ImagePlaneMm { get; init; }

    /// <summary>Gets the focal length at the first wavelength, mm; null where the lens has no power.</summary>
    public required double? EffectiveFocalLengthMm { get; init; }

    /// <summary>Gets the distance from the last vertex to the rear focal point at the first wavelength, mm; null where the lens has no power.</summary>
    public required double? BackFocalLengthMm { get; init; }

    /// <summary>Gets the third-order sums for the aperture and field.</summary>
    public required ThirdOrderJson ThirdOrder { get; init; }

    /// <summary>Gets the rays: wavelength by wavelength, in the order of the pupil points.</summary>
    public required TracedRayJson[] Rays { get; init; }
}

/// <summary>The Seidel sums S_I to S_V, C_I, and C_II, mm, with Welford's signs.</summary>
public record SeidelTermsJson
{
    /// <summary>Writes the terms.</summary>
    public SeidelTermsJson(SeidelTerms terms)
    {
        (Spherical, Coma, Astigmatism, Petzval) = (terms.Spherical, terms.Coma, terms.Astigmatism, terms.Petzval);
        (Distortion, AxialColor, LateralColor) = (terms.Distortion, terms.AxialColor, terms.LateralColor);
    }

    /// <summary>Gets S_I.</summary>
    public double Spherical { get; }

    /// <summary>Gets S_II.</summary>
    public double Coma { get; }

    /// <summary>Gets S_III.</summary>
    public double Astigmatism { get; }

    /// <summary>Gets S_IV.</summary>
    public double Petzval { get; }

    /// <summary>Gets S_V.</summary>
    public double Distortion { get; }

    /// <summary>Gets C_I between the shortest and the longest wavelength; 0 with fewer than three wavelengths.</summary>
    public double AxialColor { get; }

    /// <summary>Gets C_II between the shortest and the longest wavelength; 0 with fewer than three wavelengths.</summary>
    public double LateralColor { get; }
}

/// <summary>The third-order sums of a lens and of each of its surfaces.</summary>
public sealed record ThirdOrderJson : SeidelTermsJson
{
    /// <summary>Writes the sums.</summary>
    public ThirdOrderJson(SeidelSums sums)
        : base(sums.Total) => PerSurface = [.. sums.PerSurface.Select(t => new SeidelTermsJson(t))];

    /// <summary>Gets the terms surface by surface.</summary>
    public SeidelTermsJson[] PerSurface { get; }
}

/// <summary>A ray in the image plane, or the reason why it did not get there.</summary>
/// <param name="Nm">Its wavelength, nm.</param>
/// <param name="Pupil">Where it crossed the plane through the first vertex, in units of half the aperture.</param>
/// <param name="PointMm">Where it meets the image plane, [x, y].</param>
/// <param name="Direction">Its direction cosines there, [x, y, z].</param>
/// <param name="PathMm">Its optical path to there, from the plane through the first vertex across the incoming light.</param>
/// <param name="PathDifferenceWaves">Its path less that of the chief ray of its wavelength, in waves, on the reference sphere about the first wavelength's image; null where there is no such ray.</param>
/// <param name="Failed">Why it failed: it misses a surface, or is totally reflected.</param>
/// <param name="AtSurface">The surface where it failed, counted from 1.</param>
public sealed record TracedRayJson(
    double Nm,
    double[] Pupil,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] double[]? PointMm = null,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] double[]? Direction = null,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] double? PathMm = null,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] double? PathDifferenceWaves = null,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] RayFailure? Failed = null,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] int? AtSurface = null);
