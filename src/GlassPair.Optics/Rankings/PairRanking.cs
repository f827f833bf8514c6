using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Rankings;

/// <summary>Ranks every pair of a table of glasses for one requirement.</summary>
public static class PairRanking
{
    private const int PoolPerPick = 16;

    /// <summary>Ranks the pairs: exact figures, ties (equal to 12 digits) broken by the smaller sum of powers, then by name, ordinal.</summary>
    /// <param name="table">The glasses over the requirement's band.</param>
    /// <param name="request">What to rank.</param>
    /// <param name="cancellation">Stops the work.</param>
    /// <exception cref="ArgumentException">The table was made for another band, or the request asks for three elements.</exception>
    /// <exception cref="ArgumentOutOfRangeException">The candidates asked for are not 1 to 5,000, or a glass may stand in none.</exception>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    public static Shortlist Rank(IndexTable table, ShortlistRequest request, CancellationToken cancellation = default)
    {
        if (request.Elements != 2)
        {
            throw new ArgumentException("A pair has two elements.", nameof(request));
        }

        return ShortlistMaker.Make(table, request, PoolPerPick, SolveRows, glasses => Solve(request.Requirement, glasses[0], glasses[1]), cancellation);
    }

    /// <summary>Solves a pair in the order in which a shortlist shows it: in contact the glass of more power first, spaced the one of larger Abbe number.</summary>
    internal static ThinOutcome Solve(Requirement requirement, GlassIndices largerAbbe, GlassIndices smallerAbbe)
    {
        ThinOutcome outcome = ThinPair.Solve(requirement, largerAbbe, smallerAbbe);
        return outcome is ThinSolution solution && requirement.AirSpace is null or 0.0 && solution.RelativePowers[1] > solution.RelativePowers[0]
            ? ThinPair.Solve(requirement, smallerAbbe, largerAbbe)
            : outcome;
    }

    private static void SolveRows(GlassColumns glasses, RowFigures figures, Action<Row> whenSolved)
    {
        for (int first = 0; first < glasses.Count; first++)
        {
            PairKernel.Fill(glasses, first, figures);
            whenSolved(new Row(first));
        }
    }
}
