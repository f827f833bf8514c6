using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Color;

/// <summary>What one element of unit power adds to the variance of the focus because its glass is not exactly known. Source: [data-floor].</summary>
internal static class ThinFloor
{
    /// <summary>(σ_V/V)² G + σ_n²/(n − 1)², with G the weighted variance of t over the band; per square of the focal length.</summary>
    public static double Of(GlassIndices glass, Band band, DataQuality quality)
    {
        double precision = quality.IndexPrecision / (glass.DesignIndex - 1.0);
        return (quality.AbbeTolerance * quality.AbbeTolerance * band.VarianceOf(glass.Changes.AsSpan())) + (precision * precision);
    }
}
