using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Components.Charts;
using Microsoft.AspNetCore.WebUtilities;
using Microsoft.Extensions.Primitives;

namespace GlassPair.Web.Addresses;

/// <summary>What an address says.</summary>
/// <param name="State">The state, with what could not be understood left at its default.</param>
/// <param name="IsBlank">Whether it says nothing at all about the page, as on a first visit.</param>
/// <param name="Notices">What was not understood, and what was done about it, as sentences.</param>
public sealed record AddressReading(WorkbenchState State, bool IsBlank, ImmutableArray<string> Notices);

/// <summary>Writes the working page's state as the query of its address, and reads it back.</summary>
/// <remarks>
/// Format 1: <c>?v=1&amp;f=240&amp;n=6&amp;short=g&amp;design=e&amp;long=C&amp;makers=hoya,ohara&amp;pair=hoya/FCD10A,hoya/LAC14&amp;stock=4f1c09ab12cd</c>.
/// Defaults are left out; the order is fixed. Old formats stay readable for ever.
/// </remarks>
public static class WorkbenchAddress
{
    /// <summary>The format written.</summary>
    public const int Format = 1;

    private const string PairsPerGlassKey = "each";
    private const int MostColumns = 40;
    private const int LongestName = 80;

    private static readonly ImmutableArray<string> _known =
    [
        "v", .. NumberField.All.Select(f => f.Key), "balance", "space", "makers", "supply", "lead", "molding", "include", "exclude",
        "rank", PairsPerGlassKey, "take", "sort", "columns", "filter", "pair", "pin", "glass", "map", "stock",
    ];

    private static readonly ImmutableArray<(Supply Supply, string Word)> _supplyWords =
    [
        (Supply.Recommended, "recommended"), (Supply.Listed, "listed"), (Supply.OnRequest, "on-request"),
        (Supply.Unconfirmed, "unconfirmed"), (Supply.Discontinued, "discontinued"),
    ];

    private static readonly ImmutableArray<(RankBy RankBy, string Word)> _rankWords =
    [
        (RankBy.ExpectedResidual, "expected"), (RankBy.ColorResidual, "residual"), (RankBy.SecondarySpectrum, "secondary"),
    ];

    /// <summary>Writes a state as a query, from the question mark on.</summary>
    public static string Write(WorkbenchState state)
    {
        var query = new StringBuilder("?v=").Append(Format.ToString(CultureInfo.InvariantCulture));
        WorkbenchState empty = WorkbenchState.Empty;
        foreach (NumberField field in NumberField.All)
        {
            Add(field.Key, state.TextOf(field), field.Default);
        }

        Add("balance", state.Balance == ColorBalance.EndsUnited ? "ends" : "", "");
        Add("space", state.AirSpaced ? "air" : "", "");
        AddList("makers", state.Makers);
        AddList("supply", state.Supply.SetEquals(empty.Supply) ? null : _supplyWords.Where(w => state.Supply.Contains(w.Supply)).Select(w => w.Word));
        Add("lead", state.AllowLead ? "" : "no", "");
        Add("molding", state.AllowMolding ? "" : "no", "");
        AddList("include", state.Include.IsEmpty ? null : state.Include);
        AddList("exclude", state.Exclude.IsEmpty ? null : state.Exclude);
        Add("rank", _rankWords.First(w => w.RankBy == state.RankBy).Word, "expected");
        Add(PairsPerGlassKey, state.PairsPerGlass is { } each ? Whole(each) : "any", Whole(WorkbenchState.DefaultPairsPerGlass));
        Add("take", Whole(state.Take), Whole(WorkbenchState.DefaultTake));
        Add("sort", state.SortBy is { } column ? (state.SortDescending ? "-" : "") + column : "", "");
        AddList("columns", state.Columns);
        Add("filter", state.Filter, "");
        AddList("pair", Names(state.Chosen));
        AddList("pin", Names(state.Pinned));
        Add("glass", state.ChosenGlass ?? "", "");
        Add("map", state.Axes == MapAxes.Index ? "index" : "", "");
        Add("stock", state.StockId ?? "", "");
        return query.ToString();

        void Add(string key, string text, string usual)
        {
            if (text != usual)
            {
                query.Append('&').Append(key).Append('=').Append(Escape(text));
            }
        }

        void AddList(string key, IEnumerable<string>? items)
        {
            if (items is not null)
            {
                query.Append('&').Append(key).Append('=').AppendJoin(',', items.Select(i => Escape(EscapeItem(i))));
            }
        }
    }

    /// <summary>Reads a query, with or without the question mark. Never throws.</summary>
    public static AddressReading Read(string query)
    {
        Dictionary<string, StringValues> pairs = QueryHelpers.ParseQuery(query);
        var notices = ImmutableArray.CreateBuilder<string>();
        foreach ((string key, StringValues values) in pairs.OrderBy(p => p.Key, StringComparer.Ordinal))
        {
            if (!_known.Contains(key, StringComparer.OrdinalIgnoreCase))
            {
                notices.Add($"The address holds “{TypedNumber.Shorten(key)}”, which means nothing here; it was left out.");
            }
            else if (values.Count > 1)
            {
                notices.Add($"The address gives “{key}” {values.Count.ToString(CultureInfo.InvariantCulture)} times; the first counts.");
            }
        }

        if (Text("v") is { } format && format != Whole(Format))
        {
            notices.Add(int.TryParse(format, NumberStyles.None, CultureInfo.InvariantCulture, out int newer) && newer > Format
                ? $"This link was written by a newer GlassPair (format {Whole(newer)}; this one reads {Whole(Format)}). What is understood is shown."
                : $"The link's format “{TypedNumber.Shorten(format)}” is not known; it was read as format {Whole(Format)}.");
        }

        WorkbenchState state = WorkbenchState.Empty;
        foreach (NumberField field in NumberField.All)
        {
            if (Text(field.Key) is { } text)
            {
                if (text.Length > NumberField.MaxLength)
                {
                    notices.Add($"{field.Label} was cut to {Whole(NumberField.MaxLength)} characters.");
                }

                state = state.With(field, text);
            }
        }

        (string? sort, bool descending) = Text("sort") is { Length: > 0 } by ? (by.TrimStart('-'), by[0] == '-') : (null, false);
        state = state with
        {
            Balance = Word("balance", ColorBalance.BandBalanced, ("band", ColorBalance.BandBalanced), ("ends", ColorBalance.EndsUnited)),
            AirSpaced = Word("space", false, ("air", true), ("cemented", false)),
            Makers = List("makers") is { } makers ? [.. makers] : null,
            Supply = List("supply") is { } words ? SupplyOf(words) : state.Supply,
            AllowLead = Word("lead", true, ("yes", true), ("no", false)),
            AllowMolding = Word("molding", true, ("yes", true), ("no", false)),
            Include = Glasses("include"),
            Exclude = Glasses("exclude"),
            RankBy = Word("rank", RankBy.ExpectedResidual, [.. _rankWords.Select(w => (w.Word, w.RankBy))]),
            PairsPerGlass = string.Equals(Text(PairsPerGlassKey), "any", StringComparison.OrdinalIgnoreCase)
                ? null
                : Count(PairsPerGlassKey, WorkbenchState.DefaultPairsPerGlass, ShortlistRequest.MaxTake),
            Take = Count("take", WorkbenchState.DefaultTake, ShortlistRequest.MaxTake),
            SortBy = sort is null ? null : Known(sort, "sort"),
            SortDescending = descending && sort is not null && Known(sort, null) is not null,
            Columns = List("columns") is { } columns ? [.. columns.Distinct().Take(MostColumns).Select(c => Known(c, "columns")).OfType<string>()] : null,
            Filter = Text("filter") is { } filter ? Cut(filter, WorkbenchState.MaxFilterLength) : "",
            Chosen = Pair("pair"),
            Pinned = Pair("pin"),
            ChosenGlass = Text("glass") is { Length: > 0 } glass ? Cut(glass, LongestName) : null,
            Axes = Word("map", MapAxes.PartialDispersion, ("partial", MapAxes.PartialDispersion), ("index", MapAxes.Index)),
            StockId = Text("stock") is { Length: > 0 } stock ? Cut(stock, NumberField.MaxLength) : null,
        };
        return new AddressReading(state, !pairs.Keys.Any(k => _known.Contains(k, StringComparer.OrdinalIgnoreCase)), notices.ToImmutable());

        string? Text(string key) => pairs.TryGetValue(key, out StringValues values) && values.Count > 0 ? values[0] ?? "" : null;

        ImmutableArray<string>? List(string key) =>
            Text(key) is { } text ? [.. text.Split(',', StringSplitOptions.RemoveEmptyEntries).Select(UnescapeItem).Select(i => Cut(i, LongestName))] : null;

        T Word<T>(string key, T usual, params ReadOnlySpan<(string Word, T Value)> words)
        {
            if (Text(key) is not { Length: > 0 } text)
            {
                return usual;
            }

            foreach ((string word, T value) in words)
            {
                if (string.Equals(word, text, StringComparison.OrdinalIgnoreCase))
                {
                    return value;
                }
            }

            notices.Add($"“{TypedNumber.Shorten(text)}” is no choice for “{key}”; the usual one is shown.");
            return usual;
        }

        int Count(string key, int usual, int most)
        {
            if (Text(key) is not { Length: > 0 } text)
            {
                return usual;
            }

            if (!TypedNumber.TryRead(text, out double value, out _))
            {
                notices.Add($"“{TypedNumber.Shorten(text)}” is no number for “{key}”; {Whole(usual)} is used.");
                return usual;
            }

            int kept = (int)Math.Clamp(Math.Floor(value), 1.0, most);
            if (kept != value)
            {
                notices.Add($"“{key}” takes whole numbers from 1 to {Whole(most)}; {Whole(kept)} is used instead of {TypedNumber.Shorten(text)}.");
            }

            return kept;
        }

        ImmutableSortedSet<Supply> SupplyOf(ImmutableArray<string> words)
        {
            ImmutableSortedSet<Supply>.Builder kept = ImmutableSortedSet.CreateBuilder<Supply>();
            foreach (string word in words)
            {
                if (_supplyWords.FirstOrDefault(w => string.Equals(w.Word, word, StringComparison.OrdinalIgnoreCase)) is { Word: not null } known)
                {
                    kept.Add(known.Supply);
                }
                else
                {
                    notices.Add($"“{TypedNumber.Shorten(word)}” is no supply state; it was left out.");
                }
            }

            return kept.ToImmutable();
        }

        ImmutableSortedSet<string> Glasses(string key)
        {
            ImmutableArray<string> ids = List(key) ?? [];
            if (ids.Length > WorkbenchState.MaxNamedGlasses)
            {
                notices.Add($"“{key}” takes {Whole(WorkbenchState.MaxNamedGlasses)} glasses; the rest were left out.");
            }

            return WorkbenchState.NoGlasses.Union(ids.Take(WorkbenchState.MaxNamedGlasses));
        }

        PairName? Pair(string key)
        {
            switch (List(key))
            {
                case null or []:
                    return null;
                case [var positive, var negative]:
                    return new PairName(positive, negative);
                default:
                    notices.Add($"“{key}” must name two glasses, such as schott/N-BK7,schott/F2; it was left out.");
                    return null;
            }
        }

        string? Known(string column, string? key)
        {
            if (key != "columns" && string.Equals(column, Figures.RankingView.RankKey, StringComparison.OrdinalIgnoreCase))
            {
                return Figures.RankingView.RankKey;
            }

            if (Figures.RankingColumn.Find(column) is { } found)
            {
                return found.Key;
            }

            if (key is not null)
            {
                notices.Add($"“{TypedNumber.Shorten(column)}” is no column for “{key}”; it was left out.");
            }

            return null;
        }
    }

    private static string[]? Names(PairName? pair) => pair is null ? null : [pair.Positive, pair.Negative];

    private static string Whole(int value) => value.ToString(CultureInfo.InvariantCulture);

    private static string Cut(string text, int length) => text.Length <= length ? text : text[..length];

    // What a list's own comma would break, and nothing else.
    private static string EscapeItem(string item) =>
        item.Replace("%", "%25", StringComparison.Ordinal).Replace(",", "%2C", StringComparison.Ordinal);

    private static string UnescapeItem(string item) =>
        item.Replace("%2C", ",", StringComparison.OrdinalIgnoreCase).Replace("%25", "%", StringComparison.Ordinal);

    /// <summary>Escapes a value, leaving readable what a query may hold as it is (RFC 3986, section 3.4).</summary>
    private static string Escape(string text) => Uri.EscapeDataString(text)
        .Replace("%2F", "/", StringComparison.Ordinal)
        .Replace("%2C", ",", StringComparison.Ordinal)
        .Replace("%3A", ":", StringComparison.Ordinal)
        .Replace("%28", "(", StringComparison.Ordinal)
        .Replace("%29", ")", StringComparison.Ordinal);
}
