using GlassPair.Web.Addresses;

namespace GlassPair.Web.Figures;

/// <summary>The part of a ranking that a state shows, in the order that it asks for.</summary>
public static class RankingView
{
    /// <summary>The key of the rank, which every table can be sorted by.</summary>
    public const string RankKey = "rank";

    /// <summary>Filters and sorts; pairs without a value in the sorted column stand last, pairs alike in it in order of rank.</summary>
    public static IReadOnlyList<RankedPair> Of(IReadOnlyList<RankedPair> pairs, WorkbenchState state)
    {
        string[] words = state.Filter.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries);
        IEnumerable<RankedPair> kept = words.Length == 0 ? pairs : pairs.Where(p => words.All(w => Matches(p, w)));
        Func<RankedPair, double?>? value = state.SortBy is null ? null
            : state.SortBy == RankKey ? p => p.Candidate?.Rank
            : RankingColumn.Find(state.SortBy)?.Value;
        if (value is null)
        {
            return words.Length == 0 ? pairs : [.. kept];
        }

        IOrderedEnumerable<RankedPair> known = kept.OrderBy(p => value(p) is null);
        return [.. state.SortDescending ? known.ThenByDescending(value) : known.ThenBy(value)];
    }

    private static bool Matches(RankedPair pair, string word) =>
        pair.Solution.Elements.Any(e => e.Glass.Id.Contains(word, StringComparison.OrdinalIgnoreCase))
        || (pair.Candidate?.SameAs.Any(s => s.Contains(word, StringComparison.OrdinalIgnoreCase)) ?? false);
}
