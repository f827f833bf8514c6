using System.Collections.Immutable;
using GlassPair.Catalogue;
using GlassPair.Optics.Color;
using GlassPair.Optics.Rankings;
using GlassPair.Web.Addresses;
using GlassPair.Web.Figures;
using GlassPair.Web.Work;

namespace GlassPair.Web.Components.Pages;

/// <summary>A ranking as the working page shows it. Immutable; shared between the circuits that ask the same.</summary>
public sealed class WorkbenchAnswer
{
    /// <summary>Makes the answer from a ranking.</summary>
    public WorkbenchAnswer(ShortlistAnswer ranked, IndexTable table)
    {
        (Stock, Shortlist, Elapsed, Table) = (ranked.Stock, ranked.Shortlist, ranked.Elapsed, table);
        Pairs = [.. Shortlist.Candidates.Select(c => new RankedPair(c.Solution, Shortlist.Request.Quality, c))];
        Ties = Shortlist.Request.RankBy == RankBy.SecondarySpectrum ? [] : Optics.Rankings.Ties.Of(Shortlist.Candidates, Shortlist.Request.Quality);
    }

    /// <summary>Gets the stock.</summary>
    public Stock Stock { get; }

    /// <summary>Gets the ranking.</summary>
    public Shortlist Shortlist { get; }

    /// <summary>Gets how long the ranking took.</summary>
    public TimeSpan Elapsed { get; }

    /// <summary>Gets the glasses over the band.</summary>
    public IndexTable Table { get; }

    /// <summary>Gets the ranked pairs with their figures.</summary>
    public ImmutableArray<RankedPair> Pairs { get; }

    /// <summary>Gets which of them tie.</summary>
    public ImmutableArray<Tie> Ties { get; }

    /// <summary>Finds a glass over the band; null where the stock has none of that name that covers it.</summary>
    public GlassIndices? Find(string id) =>
        Stock.TryFind(id, out Optics.Glasses.Glass? glass) ? Table.Rows.FirstOrDefault(r => ReferenceEquals(r.Glass, glass)) : null;

    /// <summary>Finds a pair by its glasses, ranked or not, in either order; the glass of larger Abbe number takes the positive power.</summary>
    /// <param name="name">The glasses.</param>
    /// <param name="problem">Why there is no such pair, as a sentence; null where there is.</param>
    public RankedPair? Find(PairName name, out string? problem)
    {
        problem = null;
        foreach (string id in new[] { name.Positive, name.Negative })
        {
            if (!Stock.TryFind(id, out Optics.Glasses.Glass? glass))
            {
                problem = $"{TypedNumber.Shorten(id)} is not in this stock.";
                return null;
            }

            if (!glass.Covers(Table.Band))
            {
                problem = $"{glass.Id} has no index over the whole band: its data go from {glass.Range}.";
                return null;
            }
        }

        (GlassIndices first, GlassIndices second) = (Find(name.Positive)!, Find(name.Negative)!);
        (GlassIndices positive, GlassIndices negative) = first.AbbeNumber >= second.AbbeNumber ? (first, second) : (second, first);
        PairName named = new(positive.Glass.Id, negative.Glass.Id);
        if (Pairs.FirstOrDefault(p => PairName.Of(p.Solution) == named) is { } ranked)
        {
            return ranked;
        }

        switch (ThinPair.Solve(Shortlist.Request.Requirement, positive, negative))
        {
            case ThinSolution solution:
                return new RankedPair(solution, Shortlist.Request.Quality, null);
            case NoThinSolution none:
                problem = none.Sentence;
                return null;
            default:
                return null;
        }
    }
}
