using System.Collections.Immutable;
using GlassPair.Optics.Color;

namespace GlassPair.Optics.Rankings;

/// <summary>Solves rows of combinations: puts the figures of every row into the same place, and then calls back.</summary>
internal delegate void RowSolver(GlassColumns glasses, RowFigures figures, Action<Row> whenSolved);

/// <summary>Makes a shortlist: screens every combination, and picks from the best.</summary>
internal static class ShortlistMaker
{
    /// <summary>Makes the shortlist of a request.</summary>
    /// <param name="table">The glasses over the requirement's band.</param>
    /// <param name="request">What to rank.</param>
    /// <param name="poolPerPick">See <see cref="CandidatePicks"/>.</param>
    /// <param name="solveRows">Solves every row.</param>
    /// <param name="solve">Solves one combination, given in the order of the columns, as a shortlist shows it; its figures are those of the row to the last bit.</param>
    /// <param name="cancellation">Stops the work.</param>
    /// <exception cref="ArgumentOutOfRangeException">The request asks for too few or too many candidates, or for glasses that may stand in none.</exception>
    public static Shortlist Make(
        IndexTable table, ShortlistRequest request, int poolPerPick, RowSolver solveRows, Func<GlassIndices[], ThinOutcome> solve, CancellationToken cancellation)
    {
        Guard.InRange(request.Take, 1, ShortlistRequest.MaxTake);
        Guard.InRange(request.PairsPerGlass ?? 1, 1, int.MaxValue, nameof(request.PairsPerGlass));
        GlassSelection selection = GlassSelection.From(table, request);
        var picks = new CandidatePicks(request, poolPerPick);
        (GlassColumns glasses, RowScreen all, CandidatePool pool) = ScreenAll(selection.Distinct, double.NegativeInfinity);
        while (!picks.TakeFrom(pool, c => [.. c.Places.Select(place => glasses.Glasses[place])], solve) && pool.IsCut)
        {
            // What is left must come from glasses that may stand in more candidates.
            (glasses, _, pool) = ScreenAll(selection.Distinct.Where(picks.MayUse), pool.LastKey);
        }

        long count = selection.Distinct.Length;
        return new Shortlist(
            request,
            selection.Considered,
            selection.Distinct.Length,
            request.Elements == 2 ? count * (count - 1) / 2 : count * (count - 1) * (count - 2) / 6,
            all.Feasible,
            all.Holding,
            [.. picks.Solutions.Select((s, i) => new Candidate(i + 1, s, [.. s.Elements.SelectMany(e => selection.TwinsOf(e))]))],
            selection.Dropped,
            all.Dropped.ToImmutableSortedDictionary());

        (GlassColumns Glasses, RowScreen Screen, CandidatePool Pool) ScreenAll(IEnumerable<GlassIndices> from, double above)
        {
            var columns = new GlassColumns(request.Requirement, request.Quality, from);
            var figures = new RowFigures(columns, request.Elements);
            var screen = new RowScreen(columns, figures, selection.MustInclude, request);
            var candidates = new CandidatePool(picks.PoolSize, above);
            solveRows(columns, figures, row =>
            {
                cancellation.ThrowIfCancellationRequested();
                screen.Screen(row, candidates);
            });
            return (columns, screen, candidates);
        }
    }
}
