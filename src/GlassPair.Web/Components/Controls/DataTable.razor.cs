using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Web;

namespace GlassPair.Web.Components.Controls;

/// <summary>A sortable, virtualized table with one tab stop among its rows; arrows, Home and End move between them (keys.js).</summary>
/// <typeparam name="TItem">What a row shows.</typeparam>
public sealed partial class DataTable<TItem> : ComponentBase
    where TItem : notnull
{
    private const int AlwaysThere = 60;
    private List<Line> _lines = [];
    private List<Line> _rest = [];
    private object? _tabStop;
    private bool _isChanged;

    /// <summary>Gets or sets what the table shows, for those who cannot see it.</summary>
    [Parameter, EditorRequired] public required string Label { get; set; }

    /// <summary>Gets or sets the rows in order.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<TItem> Items { get; set; }

    /// <summary>Gets or sets the columns in order.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<DataColumn<TItem>> Columns { get; set; }

    /// <summary>Gets or sets the key of the column that names a row; its cells are the rows' buttons or links.</summary>
    [Parameter, EditorRequired] public required string RowHeader { get; set; }

    /// <summary>Gets or sets what tells one row from another.</summary>
    [Parameter, EditorRequired] public required Func<TItem, object> KeyOf { get; set; }

    /// <summary>Gets or sets where the name of a row leads; null makes it a button that chooses the row.</summary>
    [Parameter] public Func<TItem, string>? AddressOf { get; set; }

    /// <summary>Gets or sets rows that stay on top for comparison.</summary>
    [Parameter] public IReadOnlyList<TItem> Pinned { get; set; } = [];

    /// <summary>Gets or sets the headings that stand before a row, by its index; none by default.</summary>
    [Parameter] public IReadOnlyDictionary<int, string> Headings { get; set; } = new Dictionary<int, string>();

    /// <summary>Gets or sets which row is the chosen one.</summary>
    [Parameter] public Func<TItem, bool> IsCurrent { get; set; } = _ => false;

    /// <summary>Gets or sets the key of the column sorted by.</summary>
    [Parameter] public string? SortBy { get; set; }

    /// <summary>Gets or sets whether the largest stands first.</summary>
    [Parameter] public bool SortDescending { get; set; }

    /// <summary>Gets or sets the height of a row, pixels.</summary>
    [Parameter] public float RowHeight { get; set; } = 24;

    /// <summary>Gets or sets what stands where there are no rows.</summary>
    [Parameter] public string Empty { get; set; } = "Nothing to show.";

    /// <summary>Called with the column's key and the direction that a heading asks for.</summary>
    [Parameter] public EventCallback<(string Key, bool Descending)> Sorted { get; set; }

    /// <summary>Called with the row that was chosen.</summary>
    [Parameter] public EventCallback<TItem> Chosen { get; set; }

    /// <summary>Called with the row that should be pinned, or no longer be.</summary>
    [Parameter] public EventCallback<TItem> PinToggled { get; set; }

    /// <summary>Called with the row pointed at; default when none is any more.</summary>
    [Parameter] public EventCallback<TItem?> PointedAt { get; set; }

    /// <summary>Nothing is drawn anew but for new parameters: a pointer that passes over rows costs nothing.</summary>
    protected override bool ShouldRender() => _isChanged;

    /// <inheritdoc/>
    protected override void OnAfterRender(bool firstRender) => _isChanged = false;

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        _isChanged = true;
        _lines = new List<Line>(Items.Count + Headings.Count);
        for (int i = 0; i < Items.Count; i++)
        {
            if (Headings.TryGetValue(i, out string? heading))
            {
                _lines.Add(new Line(default, heading, _lines.Count));
            }

            _lines.Add(new Line(Items[i], null, _lines.Count));
        }

        _rest = _lines.Count > AlwaysThere ? _lines[AlwaysThere..] : [];
        _tabStop = Items.Count == 0 ? null : KeyOf(Items.FirstOrDefault(IsCurrent) ?? Items[0]);
    }

    private static string ClassOf(DataColumn<TItem> column) => (column.IsNumber ? "num " : "") + column.Class;

    private string? SortOf(DataColumn<TItem> column) =>
        column.Key != SortBy ? null : SortDescending ? "descending" : "ascending";

    /// <summary>The chosen row, or the first where none is.</summary>
    private bool IsTabStop(Line line) => !line.IsPinned && KeyOf(line.Item!).Equals(_tabStop);

    private Task SortAsync(DataColumn<TItem> column) => Sorted.InvokeAsync((column.Key, column.Key == SortBy && !SortDescending));

    private Task ChosenAsync(TItem item) => Chosen.InvokeAsync(item);

    private Task KeyAsync(KeyboardEventArgs e, TItem item) =>
        e is { Key: "p" or "P", CtrlKey: false, AltKey: false, MetaKey: false } ? PinToggled.InvokeAsync(item) : Task.CompletedTask;

    private sealed record Line(TItem? Item, string? Heading, int Index, bool IsPinned = false);
}
