using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;

namespace GlassPair.Optics.Rankings;

/// <summary>Ranks every pair of a table of glasses for one requirement.</summary>
public static class PairRanking
{
    /// <summary>Ranks the pairs: exact figures, ties (equal to 12 digits) broken by the smaller sum of powers, then by name, ordinal.</summary>
    /// <param name="table">The glasses over the requirement's band.</param>
    /// <param name="request">What to rank.</param>
    /// <param name="cancellation">Stops the work.</param>
    /// <exception cref="ArgumentException">The table was made for another band.</exception>
    public static Shortlist Rank(IndexTable table, ShortlistRequest request, CancellationToken cancellation = default)
    {
        if (!table.Band.Equals(request.Requirement.Band))
        {
            throw new ArgumentException("The table was made for another band.", nameof(table));
        }

        GlassLimits limits = request.Limits;
        List<GlassIndices> considered = [];
        List<DroppedGlass> dropped = [.. table.Uncovered.Select(g => new DroppedGlass(g, GlassDropReason.Band))];
        foreach (GlassIndices row in table.Rows)
        {
            if (limits.ReasonAgainst(row.Glass) is { } reason)
            {
                dropped.Add(new DroppedGlass(row.Glass, reason));
            }
            else
            {
                considered.Add(row);
            }
        }

        // Twins are ranked once, under the name that comes first.
        List<IGrouping<DispersionFormula, GlassIndices>> groups = [.. considered.GroupBy(g => g.Glass.Formula)];
        Dictionary<string, ImmutableArray<string>> twins = groups.ToDictionary(
            g => g.First().Glass.Id, g => g.Skip(1).Select(t => t.Glass.Id).ToImmutableArray());
        GlassIndices[] distinct = [.. groups.Select(g => g.First())];
        bool[] included = [.. groups.Select(g => g.Any(t => limits.Include.Contains(t.Glass.Id)))];

        var reasons = new SortedDictionary<PairDropReason, long>();
        void Drop(PairDropReason reason) => reasons[reason] = reasons.GetValueOrDefault(reason) + 1;
        List<ThinSolution> solutions = [];
        long holding = 0;
        for (int i = 0; i < distinct.Length; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            for (int j = i + 1; j < distinct.Length; j++)
            {
                if (limits.Include.Count > 0 && !included[i] && !included[j])
                {
                    Drop(PairDropReason.NotIncluded);
                    continue;
                }

                if (limits.ReasonAgainst(distinct[i].Glass, distinct[j].Glass) is { } reason)
                {
                    Drop(reason);
                    continue;
                }

                // The glass of larger Abbe number takes the positive power.
                bool firstPositive = distinct[i].AbbeNumber >= distinct[j].AbbeNumber;
                switch (ThinPair.Solve(request.Requirement, distinct[firstPositive ? i : j], distinct[firstPositive ? j : i]))
                {
                    case ThinSolution solution when request.Requirement.ElementPowerLimit is { } most && solution.LargestElementPower > most:
                        Drop(PairDropReason.ElementPower);
                        break;
                    case ThinSolution solution:
                        holding += solution.Holds ? 1 : 0;
                        solutions.Add(solution);
                        break;
                    case NoThinSolution { Reason: NoThinSolutionReason.AirSpaceTooLarge }:
                        Drop(PairDropReason.AirSpace);
                        break;
                    default:
                        Drop(PairDropReason.DispersionsAlike);
                        break;
                }
            }
        }

        return new Shortlist(
            request,
            considered.Count,
            distinct.Length,
            (long)distinct.Length * (distinct.Length - 1) / 2,
            solutions.Count,
            holding,
            [.. Best(solutions, request).Select((s, i) => new Candidate(i + 1, s, [.. s.Elements.SelectMany(e => twins[e.Glass.Id])]))],
            [.. dropped],
            reasons.ToImmutableSortedDictionary());
    }

    /// <summary>Gets the figure that a request ranks by.</summary>
    public static double KeyOf(ThinSolution solution, ShortlistRequest request) => request.RankBy switch
    {
        RankBy.ColorResidual => solution.RmsFocalShift,
        RankBy.ExpectedResidual => solution.ExpectedRmsFocalShift(request.Quality),
        _ => Math.Abs(solution.SecondarySpectrum),
    };

    private static IEnumerable<ThinSolution> Best(List<ThinSolution> solutions, ShortlistRequest request)
    {
        IEnumerable<ThinSolution> ordered = solutions
            .OrderBy(s => TwelveDigits(KeyOf(s, request)))
            .ThenBy(s => TwelveDigits(s.SumOfPowers))
            .ThenBy(s => string.Join(' ', s.Elements.Select(e => e.Glass.Id)), StringComparer.Ordinal);
        var uses = new Dictionary<string, int>();
        return ordered.Where(s => request.PairsPerGlass is not { } most || Allowed(s, most)).Take(request.Take);

        bool Allowed(ThinSolution solution, int most)
        {
            if (solution.Elements.Any(e => uses.GetValueOrDefault(e.Glass.Id) >= most))
            {
                return false;
            }

            foreach (GlassIndices element in solution.Elements)
            {
                uses[element.Glass.Id] = uses.GetValueOrDefault(element.Glass.Id) + 1;
            }

            return true;
        }
    }

    private static double TwelveDigits(double value) =>
        double.Parse(value.ToString("E11", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
}
