using System.Collections.Immutable;
using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Rankings;

/// <summary>Ranks every pair of a table of glasses for one requirement.</summary>
public static class PairRanking
{
    /// <summary>Ranks the pairs: exact figures, ties (equal to 12 digits) broken by the smaller sum of powers, then by name, ordinal.</summary>
    /// <param name="table">The glasses over the requirement's band.</param>
    /// <param name="request">What to rank.</param>
    /// <param name="cancellation">Stops the work.</param>
    /// <exception cref="ArgumentException">The table was made for another band.</exception>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    public static Shortlist Rank(IndexTable table, ShortlistRequest request, CancellationToken cancellation = default)
    {
        GlassSelection selection = GlassSelection.From(table, request);
        var picks = new CandidatePicks(request);
        var screen = new PairScreen(new PairColumns(request.Requirement, request.Quality, selection.Distinct), selection.MustInclude, request);
        CandidatePool pool = new(picks.PoolSize, double.NegativeInfinity);
        screen.Run(pool, cancellation);
        PairScreen counted = screen;
        while (!picks.TakeFrom(pool, c => [screen.Glasses[c.First], screen.Glasses[c.Second]], g => Solve(request.Requirement, g[0], g[1])) && pool.IsCut)
        {
            // What is left must come from glasses that may stand in more pairs.
            screen = new PairScreen(
                new PairColumns(request.Requirement, request.Quality, selection.Distinct.Where(picks.MayUse)), selection.MustInclude, request);
            pool = new CandidatePool(picks.PoolSize, pool.LastKey);
            screen.Run(pool, cancellation);
        }

        return new Shortlist(
            request,
            selection.Considered,
            selection.Distinct.Length,
            (long)selection.Distinct.Length * (selection.Distinct.Length - 1) / 2,
            counted.Feasible,
            counted.Holding,
            [.. picks.Solutions.Select((s, i) => new Candidate(i + 1, s, [.. s.Elements.SelectMany(e => selection.TwinsOf(e))]))],
            selection.Dropped,
            counted.Dropped.ToImmutableSortedDictionary());
    }

    /// <summary>Solves a pair in the order in which a shortlist shows it: in contact the glass of more power first, spaced the one of larger Abbe number.</summary>
    internal static ThinOutcome Solve(Requirement requirement, GlassIndices largerAbbe, GlassIndices smallerAbbe)
    {
        ThinOutcome outcome = ThinPair.Solve(requirement, largerAbbe, smallerAbbe);
        return outcome is ThinSolution solution && requirement.AirSpace is null or 0.0 && solution.RelativePowers[1] > solution.RelativePowers[0]
            ? ThinPair.Solve(requirement, smallerAbbe, largerAbbe)
            : outcome;
    }
}
