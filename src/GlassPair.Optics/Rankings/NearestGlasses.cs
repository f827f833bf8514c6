using System.Collections.Immutable;
using GlassPair.Optics.Color;

namespace GlassPair.Optics.Rankings;

/// <summary>A glass that disperses much like another.</summary>
/// <param name="Glass">The glass over the band.</param>
/// <param name="Distance">How differently an element of unit power would focus the two ends of the band, in units of its focal length.</param>
public readonly record struct NearGlass(GlassIndices Glass, double Distance);

/// <summary>The glasses nearest in V and P.</summary>
public static class NearestGlasses
{
    /// <summary>Finds the glasses nearest to one, nearest first; ties in ordinal order of their ids.</summary>
    /// <remarks>
    /// V and P have no common unit; P/V and (1 − P)/V have: the relative change of power from the design wavelength to the short and to the long end.
    /// The distance is √((Δ P/V)² + (Δ (1 − P)/V)²), zero only for equal V and P.
    /// </remarks>
    /// <param name="glass">The glass; it is left out itself.</param>
    /// <param name="table">The glasses to choose from, over the same band.</param>
    /// <param name="count">The most to return, 0 or more.</param>
    public static ImmutableArray<NearGlass> Of(GlassIndices glass, IndexTable table, int count) =>
        [.. table.Rows
            .Where(row => row.Glass.Id != glass.Glass.Id)
            .Select(row => new NearGlass(row, double.Hypot(row.ShortChange - glass.ShortChange, row.LongChange - glass.LongChange)))
            .OrderBy(near => near.Distance)
            .Take(count)];
}
