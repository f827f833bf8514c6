using System.Collections.Immutable;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Rankings;

/// <summary>The indices of a list of glasses over one band.</summary>
public sealed class IndexTable
{
    private IndexTable(Band band, ImmutableArray<GlassIndices> rows, ImmutableArray<Glass> uncovered)
    {
        (Band, Rows, Uncovered) = (band, rows, uncovered);
        Dictionary<DispersionFormula, int> first = [];
        for (int i = 0; i < rows.Length; i++)
        {
            first.TryAdd(rows[i].Glass.Formula, i);
        }

        FirstTwins = [.. rows.Select(r => first[r.Glass.Formula])];
    }

    /// <summary>Gets the band.</summary>
    public Band Band { get; }

    /// <summary>Gets the glasses that cover the band, in ordinal order of their ids.</summary>
    public ImmutableArray<GlassIndices> Rows { get; }

    /// <summary>Gets for each row the first row of identical coefficients: its own where it has no twin before it.</summary>
    public ImmutableArray<int> FirstTwins { get; }

    /// <summary>Gets the glasses that do not cover the band.</summary>
    public ImmutableArray<Glass> Uncovered { get; }

    /// <summary>Evaluates every glass that covers the band.</summary>
    public static IndexTable Of(IEnumerable<Glass> glasses, Band band)
    {
        ILookup<bool, Glass> covered = glasses.OrderBy(g => g.Id, StringComparer.Ordinal).ToLookup(g => g.Covers(band));
        return new IndexTable(band, [.. covered[true].Select(g => GlassIndices.Of(g, band))], [.. covered[false]]);
    }
}
