using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Components.Charts;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Addresses;

/// <summary>What an address says.</summary>
/// <param name="State">The state, with what could not be understood left at its default.</param>
/// <param name="IsBlank">Whether it says nothing at all about the page, as on a first visit.</param>
/// <param name="Notices">What was not understood, and what was done about it, as sentences.</param>
public sealed record AddressReading(WorkbenchState State, bool IsBlank, ImmutableArray<string> Notices);

/// <summary>Writes the working page's state as the query of its address, and reads it back.</summary>
/// <remarks>
/// Format 1: <c>?v=1&amp;f=240&amp;n=6&amp;short=g&amp;long=C&amp;makers=hoya,ohara&amp;pair=hoya/FCD10A,hoya/LAC14&amp;stock=4f1c09ab12cd</c>.
/// Defaults are left out; the order is fixed. Old formats stay readable for ever.
/// </remarks>
public static class WorkbenchAddress
{
    /// <summary>The format written.</summary>
    public const int Format = 1;

    private const string Any = "any";
    private const int LongestName = 80;

    private static readonly ImmutableArray<string> _known =
    [
        "v", .. NumberField.All.Select(f => f.Key), "balance", "space", "makers", "supply", "lead", "molding", "include", "as", "exclude",
        "rank", "each", "take", "sort", "columns", "filter", "pair", "pin", "glass", "map", "stock",
    ];

    private static readonly ImmutableArray<(string Word, Supply Value)> _supplyWords =
    [
        ("recommended", Supply.Recommended), ("listed", Supply.Listed), ("on-request", Supply.OnRequest),
        ("unconfirmed", Supply.Unconfirmed), ("discontinued", Supply.Discontinued),
    ];

    private static readonly ImmutableArray<(string Word, RankBy Value)> _rankWords =
    [
        ("expected", RankBy.ExpectedResidual), ("residual", RankBy.ColorResidual), ("secondary", RankBy.SecondarySpectrum),
    ];

    /// <summary>Writes a state as a query, from the question mark on.</summary>
    public static string Write(WorkbenchState state)
    {
        var query = new QueryWriter();
        query.Add("v", Whole(Format));
        foreach (NumberField field in NumberField.All)
        {
            query.Add(field.Key, state.TextOf(field), field.Default);
        }

        return query
            .Add("balance", state.Balance == ColorBalance.EndsUnited ? "ends" : null)
            .Add("space", state.AirSpaced ? "air" : null)
            .AddList("makers", state.Makers)
            .AddList("supply", state.Supply.SetEquals(WorkbenchState.UsualSupply) ? null : _supplyWords.Where(w => state.Supply.Contains(w.Value)).Select(w => w.Word))
            .Add("lead", state.AllowLead ? null : "no")
            .Add("molding", state.AllowMolding ? null : "no")
            .AddList("include", state.Include.IsEmpty ? null : state.Include)
            .Add("as", state.IncludeAs switch { PowerSign.Positive => "positive", PowerSign.Negative => "negative", _ => null })
            .AddList("exclude", state.Exclude.IsEmpty ? null : state.Exclude)
            .Add("rank", _rankWords.First(w => w.Value == state.RankBy).Word, "expected")
            .Add("each", state.PairsPerGlass is { } each ? Whole(each) : Any, Whole(WorkbenchState.DefaultPairsPerGlass))
            .Add("take", Whole(state.Take), Whole(WorkbenchState.DefaultTake))
            .Add("sort", state.SortBy is { } column ? (state.SortDescending ? "-" : "") + column : null)
            .AddList("columns", state.Columns)
            .Add("filter", state.Filter)
            .AddList("pair", Names(state.Chosen))
            .AddList("pin", Names(state.Pinned))
            .Add("glass", state.ChosenGlass)
            .Add("map", state.Axes == MapAxes.Index ? "index" : null)
            .Add("stock", state.StockId)
            .ToString();
    }

    /// <summary>Reads a query, with or without the question mark. Never throws.</summary>
    public static AddressReading Read(string query)
    {
        var reader = new QueryReader(query, _known);
        reader.CheckFormat(Format);
        WorkbenchState state = WorkbenchState.Empty;
        foreach (NumberField field in NumberField.All)
        {
            state = reader.Text(field.Key, NumberField.MaxLength) is { } text ? state.With(field, text) : state;
        }

        string? sort = reader.Text("sort", NumberField.MaxLength);
        string? column = sort is { Length: > 0 } ? Column(sort.TrimStart('-'), "sort") : null;
        return new AddressReading(
            state with
            {
                Balance = reader.Word("balance", ColorBalance.BandBalanced, ("band", ColorBalance.BandBalanced), ("ends", ColorBalance.EndsUnited)),
                AirSpaced = reader.Word("space", false, ("air", true), ("cemented", false)),
                Makers = reader.List("makers", WorkbenchState.MaxNamedGlasses) is { } makers ? [.. makers] : null,
                Supply = reader.List("supply", _supplyWords.Length) is { } words ? [.. words.Select(SupplyOf).OfType<Supply>()] : state.Supply,
                AllowLead = reader.Word("lead", true, ("yes", true), ("no", false)),
                AllowMolding = reader.Word("molding", true, ("yes", true), ("no", false)),
                Include = WorkbenchState.NoGlasses.Union(reader.List("include", WorkbenchState.MaxNamedGlasses) ?? []),
                IncludeAs = reader.Word<PowerSign?>("as", null, ("positive", PowerSign.Positive), ("negative", PowerSign.Negative)),
                Exclude = WorkbenchState.NoGlasses.Union(reader.List("exclude", WorkbenchState.MaxNamedGlasses) ?? []),
                RankBy = reader.Word("rank", RankBy.ExpectedResidual, _rankWords),
                PairsPerGlass = Count("each", WorkbenchState.DefaultPairsPerGlass, orAny: true),
                Take = Count("take", WorkbenchState.DefaultTake, orAny: false) ?? WorkbenchState.DefaultTake,
                SortBy = column,
                SortDescending = column is not null && sort!.StartsWith('-'),
                Columns = reader.List("columns", RankingColumn.All.Length) is { } columns ? [.. columns.Select(c => Column(c, "columns")).OfType<string>().Distinct()] : null,
                Filter = reader.Text("filter", WorkbenchState.MaxFilterLength) ?? "",
                Chosen = Pair("pair"),
                Pinned = Pair("pin"),
                ChosenGlass = reader.Text("glass", LongestName) is { Length: > 0 } glass ? glass : null,
                Axes = reader.Word("map", MapAxes.PartialDispersion, ("partial", MapAxes.PartialDispersion), ("index", MapAxes.Index)),
                StockId = reader.Text("stock", NumberField.MaxLength) is { Length: > 0 } stock ? stock : null,
            },
            reader.IsBlank,
            reader.Notices);

        int? Count(string key, int usual, bool orAny)
        {
            if (reader.Text(key, NumberField.MaxLength) is not { Length: > 0 } text)
            {
                return usual;
            }

            if (orAny && string.Equals(text, Any, StringComparison.OrdinalIgnoreCase))
            {
                return null;
            }

            if (!TypedNumber.TryRead(text, out double value, out _))
            {
                reader.Notice($"“{TypedNumber.Shorten(text)}” is no number for “{key}”; {Whole(usual)} is used.");
                return usual;
            }

            int kept = (int)Math.Clamp(Math.Floor(value), 1.0, ShortlistRequest.MaxTake);
            if (kept != value)
            {
                reader.Notice($"“{key}” takes whole numbers from 1 to {Whole(ShortlistRequest.MaxTake)}; {Whole(kept)} is used instead of {TypedNumber.Shorten(text)}.");
            }

            return kept;
        }

        Supply? SupplyOf(string word)
        {
            foreach ((string known, Supply value) in _supplyWords)
            {
                if (string.Equals(known, word, StringComparison.OrdinalIgnoreCase))
                {
                    return value;
                }
            }

            reader.Notice($"“{TypedNumber.Shorten(word)}” is no supply state; it was left out.");
            return null;
        }

        PairName? Pair(string key)
        {
            switch (reader.List(key, 2, LongestName))
            {
                case null or []:
                    return null;
                case [var positive, var negative]:
                    return new PairName(positive, negative);
                default:
                    reader.Notice($"“{key}” must name two glasses, such as schott/N-BK7,schott/F2; it was left out.");
                    return null;
            }
        }

        string? Column(string name, string key)
        {
            if (key == "sort" && string.Equals(name, RankingView.RankKey, StringComparison.OrdinalIgnoreCase))
            {
                return RankingView.RankKey;
            }

            if (RankingColumn.Find(name) is { } found)
            {
                return found.Key;
            }

            reader.Notice($"“{TypedNumber.Shorten(name)}” is no column for “{key}”; it was left out.");
            return null;
        }
    }

    private static string[]? Names(PairName? pair) => pair is null ? null : [pair.Positive, pair.Negative];

    private static string Whole(int value) => value.ToString(CultureInfo.InvariantCulture);
}
