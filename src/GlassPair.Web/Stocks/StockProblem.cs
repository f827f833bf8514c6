using System.Collections.Immutable;
using GlassPair.Catalogue;

namespace GlassPair.Web.Stocks;

/// <summary>The catalogue's folder as it is now cannot be used; a stock read before, or the shipped one, is served instead.</summary>
/// <param name="Issues">Why, at least one error; the first 100 issues.</param>
/// <param name="FurtherIssues">How many more were found.</param>
/// <param name="Since">When it was first found.</param>
public sealed record StockProblem(ImmutableArray<StockIssue> Issues, int FurtherIssues, DateTimeOffset Since);
