using System.Collections.Immutable;

namespace GlassPair.Catalogue;

/// <summary>What reading a catalogue came to: a stock, or null with the issues that stopped it. All or nothing.</summary>
/// <param name="Stock">The stock; null where an issue of severity <see cref="IssueSeverity.Error"/> was found.</param>
/// <param name="Issues">The first 100 issues, errors before notes.</param>
public sealed record StockReading(Stock? Stock, ImmutableArray<StockIssue> Issues)
{
    /// <summary>Gets how many issues were found beyond those listed.</summary>
    public int FurtherIssues { get; init; }
}
