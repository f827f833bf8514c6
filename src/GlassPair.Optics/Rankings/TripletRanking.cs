using System.Collections.Immutable;
using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Rankings;

/// <summary>Ranks every triplet of a table of glasses for one requirement.</summary>
public static class TripletRanking
{
    /// <summary>The limit on |φᵢ|/Φ where a requirement sets none: without one most of the best triplets have powers that nobody would make.</summary>
    public const double UsualPowerLimit = 4.0;

    private const int PoolPerPick = 512;

    /// <summary>Ranks the triplets as <see cref="PairRanking.Rank"/> ranks pairs.</summary>
    /// <param name="table">The glasses over the requirement's band.</param>
    /// <param name="request">What to rank, with three elements. Where the requirement has no limit on power, the shortlist's has <see cref="UsualPowerLimit"/>.</param>
    /// <param name="cancellation">Stops the work.</param>
    /// <exception cref="ArgumentException">The table was made for another band, the request does not ask for three elements, or <see cref="FindFault"/> finds a fault.</exception>
    /// <exception cref="ArgumentOutOfRangeException">The candidates asked for are not 1 to 5,000, or a glass may stand in none.</exception>
    /// <exception cref="OperationCanceledException">The work was stopped.</exception>
    public static Shortlist Rank(IndexTable table, ShortlistRequest request, CancellationToken cancellation = default)
    {
        if (request.Elements != 3)
        {
            throw new ArgumentException("A triplet has three elements.", nameof(request));
        }

        if (FindFault(request) is { } fault)
        {
            throw new ArgumentException(fault, nameof(request));
        }

        Requirement limited = request.Requirement.ElementPowerLimit is null
            ? request.Requirement with { ElementPowerLimit = UsualPowerLimit }
            : request.Requirement;
        return ShortlistMaker.Make(table, request with { Requirement = limited }, PoolPerPick, SolveRows, glasses => Solve(limited, glasses), cancellation);
    }

    /// <summary>Says in a sentence why triplets cannot be ranked for a request; null where they can.</summary>
    public static string? FindFault(ShortlistRequest request) =>
        request.Requirement.AirSpace is > 0.0 ? "Triplets are ranked in contact: leave the air space out."
        : request.Requirement.Balance == ColorBalance.BandBalanced && request.Requirement.Band.Samples.Count(s => s.Weight > 0.0) <= 3
            ? "Three elements null three samples whatever their glasses: give the band four samples of some weight, or unite its ends."
        : null;

    /// <summary>Solves a triplet in the order in which a shortlist shows it: by falling power.</summary>
    internal static ThinOutcome Solve(Requirement requirement, GlassIndices[] glasses)
    {
        ThinOutcome outcome = ThinTriplet.Solve(requirement, glasses[0], glasses[1], glasses[2]);
        if (outcome is not ThinSolution solution)
        {
            return outcome;
        }

        ImmutableArray<GlassIndices> ordered = [.. glasses.Zip(solution.RelativePowers).OrderByDescending(e => e.Second).Select(e => e.First)];
        return ThinTriplet.Solve(requirement, ordered[0], ordered[1], ordered[2]);
    }

    private static void SolveRows(GlassColumns glasses, RowFigures figures, Action<Row> whenSolved)
    {
        var kernel = new TripletKernel(glasses);
        for (int first = 0; first < glasses.Count; first++)
        {
            for (int second = first + 1; second < glasses.Count - 1; second++)
            {
                var row = new Row(first, second);
                kernel.Fill(row, figures);
                whenSolved(row);
            }
        }
    }
}
