using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Color;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Tests.Rankings;

/// <summary>The ranking as its words define it: solve every combination, drop what the limits drop, sort all, pick from the top.</summary>
internal sealed class PlainRanking
{
    private PlainRanking(List<ThinSolution> solutions, SortedDictionary<PairDropReason, long> dropped, long examined) =>
        (Solutions, Dropped, Examined) = (solutions, dropped, examined);

    /// <summary>Gets the feasible combinations in the order of the ranking.</summary>
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
        IEnumerable<List<GlassIndices>[]> combinations = request.Elements == 2
            ? groups.SelectMany((a, i) => groups.Skip(i + 1).Select(b => new[] { a, b }))
            : groups.SelectMany((a, i) => groups.SelectMany((b, j) => j > i ? groups.Skip(j + 1).Select(c => new[] { a, b, c }) : []));
        foreach (List<GlassIndices>[] combination in combinations)
        {
            examined++;
            if (ReasonAgainst(combination, request, out ThinSolution? solution) is { } reason)
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

    private static PairDropReason? ReasonAgainst(List<GlassIndices>[] combination, ShortlistRequest request, out ThinSolution? solution)
    {
        solution = null;
        List<GlassIndices>[] ordered = [.. combination.OrderByDescending(g => g[0].AbbeNumber).ThenBy(g => g[0].Glass.Id, StringComparer.Ordinal)];
        List<GlassIndices>[] demandable = combination.Length > 2 ? combination : request.Limits.IncludeAs switch
        {
            PowerSign.Positive => ordered[..1],
            PowerSign.Negative => ordered[1..],
            _ => combination,
        };
        if (request.Limits.Include.Count > 0 && !demandable.SelectMany(g => g).Any(g => request.Limits.Include.Contains(g.Glass.Id)))
        {
            return PairDropReason.NotIncluded;
        }

        GlassIndices[] glasses = [.. ordered.Select(g => g[0])];
        if (request.Limits.ExpansionDifference is { } most)
        {
            double?[] expansions = [.. glasses.Select(g => g.Glass.ExpansionPerKelvin)];
            if (expansions.Any(e => e is null))
            {
                return PairDropReason.ExpansionUnknown;
            }

            if (expansions.Any(a => expansions.Any(b => a - b > most)))
            {
                return PairDropReason.ExpansionDifference;
            }
        }

        ThinOutcome outcome = Solve(request.Requirement, glasses);
        if (outcome is ThinSolution first && request.Requirement.AirSpace is null)
        {
            outcome = Solve(request.Requirement, [.. first.Elements.Zip(first.RelativePowers).OrderByDescending(e => e.Second).Select(e => e.First)]);
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

    private static ThinOutcome Solve(Requirement requirement, GlassIndices[] glasses) => glasses.Length == 2
        ? ThinPair.Solve(requirement, glasses[0], glasses[1])
        : ThinTriplet.Solve(requirement, glasses[0], glasses[1], glasses[2]);

    private static double KeyOf(ThinSolution solution, ShortlistRequest request) => request.RankBy switch
    {
        RankBy.ColorResidual => solution.RmsFocalShift,
        RankBy.ExpectedResidual => solution.ExpectedRmsFocalShift(request.Quality),
        RankBy.SecondarySpectrum => Math.Abs(solution.SecondarySpectrum),
        _ => throw new ArgumentOutOfRangeException(nameof(request)),
    };

    private static double Twelve(double value) => double.Parse(value.ToString("E11", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
}
