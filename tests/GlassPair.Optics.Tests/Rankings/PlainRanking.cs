using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Color;
using GlassPair.Optics.Rankings;

namespace GlassPair.Optics.Tests.Rankings;

/// <summary>The ranking as its words define it: solve every pair, drop what the limits drop, sort all, pick from the top.</summary>
internal sealed class PlainRanking
{
    private PlainRanking(List<ThinSolution> solutions, SortedDictionary<PairDropReason, long> dropped, long examined) =>
        (Solutions, Dropped, Examined) = (solutions, dropped, examined);

    /// <summary>Gets the feasible pairs in the order of the ranking.</summary>
    public List<ThinSolution> Solutions { get; }

    public SortedDictionary<PairDropReason, long> Dropped { get; }

    public long Examined { get; }

    public static PlainRanking Of(IndexTable table, ShortlistRequest request)
    {
        GlassLimits limits = request.Limits;
        List<List<GlassIndices>> groups =
            [.. table.Rows.Where(r => limits.ReasonAgainst(r.Glass) is null).GroupBy(r => r.Glass.Formula).Select(g => g.OrderBy(r => r.Glass.Id, StringComparer.Ordinal).ToList())];
        List<ThinSolution> solutions = [];
        SortedDictionary<PairDropReason, long> dropped = [];
        long examined = 0;
        foreach ((List<GlassIndices> a, List<GlassIndices> b) in groups.SelectMany((a, i) => groups.Skip(i + 1).Select(b => (a, b))))
        {
            examined++;
            if (ReasonAgainst(a, b, request, out ThinSolution? solution) is { } reason)
            {
                dropped[reason] = dropped.GetValueOrDefault(reason) + 1;
            }
            else
            {
                solutions.Add(solution!);
            }
        }

        return new PlainRanking(
            [.. solutions.OrderBy(s => Twelve(KeyOf(s, request))).ThenBy(s => Twelve(s.SumOfPowers)).ThenBy(NameOf, StringComparer.Ordinal)], dropped, examined);
    }

    public static string NameOf(ThinSolution solution) => string.Join(' ', solution.Elements.Select(e => e.Glass.Id));

    /// <summary>Picks from the top, no glass more often than the request allows.</summary>
    public IEnumerable<ThinSolution> Best(ShortlistRequest request)
    {
        Dictionary<string, int> uses = [];
        return Solutions.Where(MayStand).Take(request.Take);

        bool MayStand(ThinSolution solution)
        {
            ImmutableArray<string> ids = [.. solution.Elements.Select(e => e.Glass.Id)];
            if (ids.Any(id => uses.GetValueOrDefault(id) >= (request.PairsPerGlass ?? int.MaxValue)))
            {
                return false;
            }

            foreach (string id in ids)
            {
                uses[id] = uses.GetValueOrDefault(id) + 1;
            }

            return true;
        }
    }

    private static PairDropReason? ReasonAgainst(List<GlassIndices> a, List<GlassIndices> b, ShortlistRequest request, out ThinSolution? solution)
    {
        solution = null;
        bool isOrdered = a[0].AbbeNumber > b[0].AbbeNumber
            || (a[0].AbbeNumber == b[0].AbbeNumber && string.CompareOrdinal(a[0].Glass.Id, b[0].Glass.Id) < 0);
        IEnumerable<GlassIndices> demandable = request.Limits.IncludeAs is not { } sign ? a.Concat(b) : isOrdered == (sign == PowerSign.Positive) ? a : b;
        if (request.Limits.Include.Count > 0 && !demandable.Any(g => request.Limits.Include.Contains(g.Glass.Id)))
        {
            return PairDropReason.NotIncluded;
        }

        if (request.Limits.ReasonAgainst(a[0].Glass, b[0].Glass) is { } reason)
        {
            return reason;
        }

        (GlassIndices front, GlassIndices rear) = isOrdered ? (a[0], b[0]) : (b[0], a[0]);
        ThinOutcome outcome = ThinPair.Solve(request.Requirement, front, rear);
        if (outcome is ThinSolution first && request.Requirement.AirSpace is null && first.RelativePowers[1] > first.RelativePowers[0])
        {
            outcome = ThinPair.Solve(request.Requirement, rear, front);
        }

        solution = outcome as ThinSolution;
        return outcome switch
        {
            NoThinSolution { Reason: NoThinSolutionReason.AirSpaceTooLarge } => PairDropReason.AirSpace,
            NoThinSolution => PairDropReason.DispersionsAlike,
            ThinSolution s when s.LargestElementPower > request.Requirement.ElementPowerLimit => PairDropReason.ElementPower,
            _ => null,
        };
    }

    private static double KeyOf(ThinSolution solution, ShortlistRequest request) => request.RankBy switch
    {
        RankBy.ColorResidual => solution.RmsFocalShift,
        RankBy.ExpectedResidual => solution.ExpectedRmsFocalShift(request.Quality),
        RankBy.SecondarySpectrum => Math.Abs(solution.SecondarySpectrum),
        _ => throw new ArgumentOutOfRangeException(nameof(request)),
    };

    private static double Twelve(double value) => double.Parse(value.ToString("E11", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
}
