using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Addresses;

namespace GlassPair.Web.Components.Glasses;

/// <summary>What an address of the list of glasses says.</summary>
/// <param name="State">The state, with what could not be understood left at its default.</param>
/// <param name="Notices">What was not understood, as sentences.</param>
public sealed record GlassListReading(GlassListState State, ImmutableArray<string> Notices);

/// <summary>Writes the state of the list of glasses as the query of its address, and reads it back.</summary>
/// <remarks>Format 1: <c>?v=1&amp;find=bk7&amp;makers=hoya,ohara&amp;supply=recommended&amp;sort=-vd&amp;map=partial&amp;glass=schott/N-BK7&amp;stock=4f1c09ab12cd</c>. Defaults are left out.</remarks>
public static class GlassListAddress
{
    /// <summary>The format written.</summary>
    public const int Format = 1;

    private const int MostMakers = 100;
    private const int LongestName = 80;

    private static readonly (string Word, Supply Value)[] _supplies =
    [
        ("recommended", Supply.Recommended), ("listed", Supply.Listed), ("on-request", Supply.OnRequest), ("unconfirmed", Supply.Unconfirmed), ("discontinued", Supply.Discontinued),
    ];

    private static readonly (string Word, GlassMapHeight Value)[] _maps =
        [("index", GlassMapHeight.Index), ("partial", GlassMapHeight.Partial), ("delta", GlassMapHeight.Delta)];

    /// <summary>Writes a state as a query; empty for an untouched page.</summary>
    public static string Write(GlassListState state)
    {
        string query = new QueryWriter()
            .Add("v", Format.ToString(CultureInfo.InvariantCulture))
            .Add("find", state.Search)
            .AddList("makers", state.Makers)
            .AddList("supply", state.Supply is null ? null : _supplies.Where(s => state.Supply.Contains(s.Value)).Select(s => s.Word))
            .Add("sort", state.SortBy is { } key ? (state.SortDescending ? "-" : "") + key : null)
            .Add("map", _maps.First(m => m.Value == state.Map).Word, _maps[0].Word)
            .Add("glass", state.Chosen)
            .Add("stock", state.StockId)
            .ToString();
        return query.Contains('&', StringComparison.Ordinal) ? query : "";
    }

    /// <summary>Reads a query, with or without the question mark. Never throws.</summary>
    public static GlassListReading Read(string query)
    {
        var reader = new QueryReader(query, "v", "find", "makers", "supply", "sort", "map", "glass", "stock");
        reader.CheckFormat(Format);
        (string? sort, bool descending) = Sort();
        GlassListState state = new()
        {
            Search = reader.Text("find", GlassListState.MaxSearchLength) ?? "",
            Makers = reader.List("makers", MostMakers) is { } makers ? ImmutableSortedSet.CreateRange(StringComparer.OrdinalIgnoreCase, makers) : null,
            Supply = reader.List("supply", _supplies.Length) is { } supply ? [.. supply.Select(SupplyOf).OfType<Supply>()] : null,
            SortBy = sort,
            SortDescending = descending,
            Map = reader.Word("map", GlassMapHeight.Index, _maps),
            Chosen = reader.Text("glass", LongestName) is { Length: > 0 } glass ? glass : null,
            StockId = reader.Text("stock", NumberField.MaxLength) is { Length: > 0 } stock ? stock : null,
        };
        return new GlassListReading(state, reader.Notices);

        Supply? SupplyOf(string word)
        {
            foreach ((string known, Supply value) in _supplies)
            {
                if (string.Equals(known, word, StringComparison.OrdinalIgnoreCase))
                {
                    return value;
                }
            }

            reader.Notice($"“{TypedNumber.Shorten(word)}” is no supply state; it was left out.");
            return null;
        }

        (string? Key, bool Descending) Sort()
        {
            if (reader.Text("sort", NumberField.MaxLength) is not { Length: > 0 } text)
            {
                return (null, false);
            }

            if (GlassColumn.Find(text.TrimStart('-')) is { } column)
            {
                return (column.Key, text[0] == '-');
            }

            reader.Notice($"“{TypedNumber.Shorten(text)}” is no column to sort by; the list stands in the order of names.");
            return (null, false);
        }
    }
}
