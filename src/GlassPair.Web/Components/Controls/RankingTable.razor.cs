using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Rankings;
using GlassPair.Web.Addresses;
using GlassPair.Web.Figures;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>The ranked pairs as a table.</summary>
public sealed partial class RankingTable : ComponentBase
{
    private static readonly (RankBy Value, string Text)[] _rankings =
    [
        (RankBy.ExpectedResidual, "expected residual"), (RankBy.ColorResidual, "color residual"), (RankBy.SecondarySpectrum, "secondary spectrum"),
    ];

    private static readonly ImmutableArray<int> _takes = [100, 500, 2_000, ShortlistRequest.MaxTake];
    private static readonly ImmutableArray<int> _each = [1, 2, 3, 5, 10];

    private readonly DraftText _filter = new();
    private bool _isChanged;

    /// <summary>Gets or sets what the page shows.</summary>
    [Parameter, EditorRequired] public required WorkbenchState State { get; set; }

    /// <summary>Gets or sets the pairs in order of rank.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<RankedPair> Pairs { get; set; }

    /// <summary>Gets or sets which of them tie.</summary>
    [Parameter] public IReadOnlyList<Tie> Ties { get; set; } = [];

    /// <summary>Gets or sets how many pairs are within the limits, ranked or not.</summary>
    [Parameter] public long Feasible { get; set; }

    /// <summary>Gets or sets the chosen pair.</summary>
    [Parameter] public PairName? Chosen { get; set; }

    /// <summary>Gets or sets the pair kept on top for comparison.</summary>
    [Parameter] public RankedPair? Pinned { get; set; }

    /// <summary>Gets or sets what the answer shown was made for, as a sentence; null where it is the answer to what was asked.</summary>
    [Parameter] public string? Staleness { get; set; }

    /// <summary>Called with the new state at each choice.</summary>
    [Parameter] public EventCallback<WorkbenchState> Picked { get; set; }

    /// <summary>Called with the new state at each keystroke in the filter.</summary>
    [Parameter] public EventCallback<WorkbenchState> FilterTyped { get; set; }

    /// <summary>Called with the pair that was chosen.</summary>
    [Parameter] public EventCallback<RankedPair> PairChosen { get; set; }

    /// <summary>Called with the pair to pin, or no longer to pin.</summary>
    [Parameter] public EventCallback<RankedPair> PinToggled { get; set; }

    /// <summary>Called with the pair pointed at; null when none is any more.</summary>
    [Parameter] public EventCallback<RankedPair?> PointedAt { get; set; }

    private IReadOnlyList<RankedPair> Visible { get; set; } = [];

    private IReadOnlyDictionary<int, string> Headings { get; set; } = ImmutableDictionary<int, string>.Empty;

    private IReadOnlyList<DataColumn<RankedPair>> Columns { get; set; } = [];

    private IReadOnlyList<RankingColumn> Shown { get; set; } = RankingColumn.Usual;

    /// <summary>The bar is full at twice the best expectation.</summary>
    private double BarFull { get; set; }

    private string Counted => Visible.Count < Pairs.Count
        ? $"{FigureText.Count(Visible.Count)} of {FigureText.Count(Pairs.Count)} match"
        : $"{FigureText.Count(Pairs.Count)} shown of {FigureText.Count(Feasible)}";

    private string EachValue => State.PairsPerGlass?.ToString(CultureInfo.InvariantCulture) ?? "any";

    private IEnumerable<(string Value, string Text)> EachOptions =>
    [
        .. _each.Append(State.PairsPerGlass ?? 1).Distinct().Order().Select(e => (e.ToString(CultureInfo.InvariantCulture), $"{e} {(e == 1 ? "pair" : "pairs")} per glass")),
        ("any", "all pairs"),
    ];

    private IEnumerable<int> Takes => _takes.Append(State.Take).Distinct().Order();

    private string ExportAddress => "export/shortlist.csv" + WorkbenchAddress.Write(State);

    private string CopyAddress => "export/shortlist.tsv" + WorkbenchAddress.Write(State);

    private string Editions => Pairs.SelectMany(p => new[] { p.Positive.Glass.Edition, p.Negative.Glass.Edition }).OfType<string>().Distinct().Order(StringComparer.Ordinal).ToArray() switch
    {
        [] => "unknown year",
        [var one] => one,
        [var first, .., var last] => $"{first} to {last}",
    };

    /// <summary>Nothing is drawn anew but for new parameters.</summary>
    protected override bool ShouldRender() => _isChanged;

    /// <inheritdoc/>
    protected override void OnAfterRender(bool firstRender) => _isChanged = false;

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        _isChanged = true;
        _filter.Receive(State.Filter);
        Shown = State.Columns is { } keys ? [.. RankingColumn.All.Where(c => keys.Contains(c.Key))] : RankingColumn.Usual;
        Columns =
        [
            new DataColumn<RankedPair>("rank", "#", "", "Rank for the requirement; P pins the row in focus.", RankCell, true, true, "place"),
            new DataColumn<RankedPair>("positive", "Positive", "", "The glass of positive power.", PositiveCell, false, false),
            new DataColumn<RankedPair>("negative", "Negative", "", "The glass of negative power.", NegativeCell, false, false, "c2"),
            .. Shown.Select(c => new DataColumn<RankedPair>(c.Key, c.Title, c.Unit, c.Meaning, CellOf(c), c.Value is not null, c.Value is not null && c.Key is not (RankingColumn.BarKey or RankingColumn.SupplyKey), ClassOf(c))),
        ];
        Visible = RankingView.Of(Pairs, State);
        BarFull = Pairs.Count > 0 ? 2.0 * Pairs.Min(p => p.Expected) : 0.0;
        Headings = State.SortBy is null && State.Filter.Length == 0 ? HeadingsOf(Ties) : ImmutableDictionary<int, string>.Empty;
    }

    private static string ClassOf(RankingColumn column) => column.Key is "expected" or RankingColumn.HoldsKey ? "keep" : "c3";

    private static RenderFragment<RankedPair> RankCell => pair => builder =>
        builder.AddContent(0, pair.Candidate?.Rank.ToString(CultureInfo.InvariantCulture) ?? "–");

    private static string SupplyWords(RankedPair pair) => $"{FigureText.Of(pair.Positive.Glass.Supply)}, {FigureText.Of(pair.Negative.Glass.Supply)}";

    private Task FilterAsync(string? text) => FilterTyped.InvokeAsync(State with { Filter = _filter.Text = Cut(text) });

    private static string Cut(string? text) => text is null ? "" : text.Length > WorkbenchState.MaxFilterLength ? text[..WorkbenchState.MaxFilterLength] : text;

    private static ImmutableDictionary<int, string> HeadingsOf(IReadOnlyList<Tie> ties) => ties.ToImmutableDictionary(
        t => t.First - 1,
        t => $"{t.First}–{t.Last} tie: once made, any may prove better than rank {t.First} (chance ⅓ or more). Decide by what stands to the right.");

    private Task SortAsync((string Key, bool Descending) sort) =>
        Picked.InvokeAsync(State with { SortBy = sort.Key == "rank" && !sort.Descending ? null : sort.Key, SortDescending = sort.Descending });

    private Task ColumnAsync(RankingColumn column, bool on)
    {
        ImmutableArray<string> keys = [.. RankingColumn.All.Where(c => c == column ? on : Shown.Contains(c)).Select(c => c.Key)];
        return Picked.InvokeAsync(State with { Columns = keys.SequenceEqual(RankingColumn.Usual.Select(c => c.Key)) ? null : keys });
    }

    private Task EachAsync(ChangeEventArgs e) => e.Value as string == "any" ? Picked.InvokeAsync(State with { PairsPerGlass = null })
        : WholeOf(e) is { } each ? Picked.InvokeAsync(State with { PairsPerGlass = each }) : Task.CompletedTask;

    private Task TakeAsync(ChangeEventArgs e) => WholeOf(e) is { } take ? Picked.InvokeAsync(State with { Take = take }) : Task.CompletedTask;

    private Task RankByAsync(ChangeEventArgs e) =>
        Enum.TryParse(e.Value as string, out RankBy by) && Enum.IsDefined(by) ? Picked.InvokeAsync(State with { RankBy = by }) : Task.CompletedTask;

    private static int? WholeOf(ChangeEventArgs e) =>
        int.TryParse(e.Value as string, NumberStyles.None, CultureInfo.InvariantCulture, out int value) && value is >= 1 and <= ShortlistRequest.MaxTake ? value : null;
}
