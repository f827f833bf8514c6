namespace GlassPair.Web.Components.Glasses;

/// <summary>The part of a stock that a state shows, in the order that it asks for.</summary>
public static class GlassListView
{
    /// <summary>Filters and sorts; glasses without a value in the sorted column stand last, glasses alike in it by name.</summary>
    public static IReadOnlyList<GlassFigures> Of(IReadOnlyList<GlassFigures> glasses, GlassListState state)
    {
        string[] words = state.Search.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries);
        IEnumerable<GlassFigures> kept = glasses.Where(g =>
            state.Makers?.Contains(g.Glass.Maker) != false && state.Supply?.Contains(g.Glass.Supply) != false && words.All(w => Matches(g, w)));
        GlassColumn column = GlassColumn.Find(state.SortBy ?? GlassColumn.NameKey) ?? GlassColumn.All[0];
        IOrderedEnumerable<GlassFigures> known = kept.OrderBy(g => column.Value(g) is null);
        return
        [
            .. (state.SortDescending ? known.ThenByDescending(column.Value) : known.ThenBy(column.Value))
                .ThenBy(g => g.NameInOrder, StringComparer.Ordinal).ThenBy(g => g.Glass.Maker, StringComparer.Ordinal),
        ];
    }

    /// <summary>Dashes and blanks do not count: <c>nbk7</c> finds N-BK7.</summary>
    private static bool Matches(GlassFigures figures, string word) =>
        figures.Glass.Id.Contains(word, StringComparison.OrdinalIgnoreCase)
        || Bare(figures.Glass.Name).Contains(Bare(word), StringComparison.OrdinalIgnoreCase)
        || figures.Glass.Stated.Code?.StartsWith(word, StringComparison.Ordinal) == true;

    private static string Bare(string text) => text.Replace("-", "", StringComparison.Ordinal).Replace(" ", "", StringComparison.Ordinal);
}
