using System.ComponentModel.DataAnnotations;
using GlassPair.Optics.Lenses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Api;

/// <summary>Rays to trace exactly through centered surfaces, from an object at infinity, the stop at the first surface.</summary>
public sealed record TraceRequestJson
{
    /// <summary>The most rays of one question.</summary>
    public const int MaxRays = 50_000;

    /// <summary>Gets the surfaces in the order in which light meets them, 1 to 200; the last stands in air.</summary>
    [MinLength(1)]
    [MaxLength(Prescription.MaxSurfaces)]
    public required SurfaceJson[] Surfaces { get; init; }

    /// <summary>Gets the wavelengths, nm, 1 to 41; first-order values are those of the first.</summary>
    [MinLength(1)]
    [MaxLength(Band.MaxSamples)]
    [ItemRange(Wavelength.MinNanometers, Wavelength.MaxNanometers)]
    public required double[] Nm { get; init; }

    /// <summary>Gets the diameter of the aperture on the plane through the first vertex, mm.</summary>
    [Range(1e-6, 1e5)]
    public required double ApertureDiameterMm { get; init; }

    /// <summary>Gets the field angle in the meridian (y), degrees.</summary>
    [Range(-89.0, 89.0)]
    public required double FieldDeg { get; init; }

    /// <summary>Gets the points [x, y] where rays cross the plane through the first vertex, in units of half the aperture.</summary>
    [MinLength(1)]
    [MaxLength(10_000)]
    [ItemRange(-100.0, 100.0)]
    public required double[][] Pupil { get; init; }

    /// <summary>Gets the image plane, mm from the last vertex; left out, the paraxial focus of the first wavelength.</summary>
    [Range(-1e7, 1e7)]
    public double? ImagePlaneMm { get; init; }

    /// <summary>Gets the stock's id; left out, the default stock.</summary>
    public string? Stock { get; init; }
}

/// <summary>A surface of a prescription.</summary>
public sealed record SurfaceJson
{
    /// <summary>Gets the radius of curvature, mm, positive where its center lies to the right; null for a plane.</summary>
    [Range(-1e9, 1e9)]
    public double? RadiusMm { get; init; }

    /// <summary>Gets the conic constant; left out, 0: a sphere.</summary>
    [Range(-1e6, 1e6)]
    public double? ConicConstant { get; init; }

    /// <summary>Gets the distance to the next vertex, mm, 0 or more; left out for the last surface.</summary>
    [Range(0.0, 1e6)]
    public double? ThicknessMm { get; init; }

    /// <summary>Gets the glass behind the surface, <c>maker/name</c>; left out for air.</summary>
    public string? Glass { get; init; }
}
