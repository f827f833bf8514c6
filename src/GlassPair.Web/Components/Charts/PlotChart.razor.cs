using System.Collections.Immutable;
using Microsoft.AspNetCore.Components;
using Microsoft.JSInterop;
using Plotly.Blazor;

namespace GlassPair.Web.Components.Charts;

/// <summary>The one component that draws charts: a picture with its text, its buttons and what happens while it loads or when it cannot.</summary>
public sealed partial class PlotChart : ComponentBase, IAsyncDisposable
{
    private readonly string _id = $"plot-{Guid.NewGuid():N}";
    private readonly Config _config = new() { DisplayModeBar = Plotly.Blazor.ConfigLib.DisplayModeBarEnum.False, DoubleClick = Plotly.Blazor.ConfigLib.DoubleClickEnum.False };
    private readonly Plotly.Blazor.Layout _layout = new();
    private readonly List<ITrace> _data = [];
    private IJSObjectReference? _module;
    private DotNetObjectReference<PlotChart>? _self;
    private ChartState _state;
    private bool _showsText;
    private PlotFigure? _shown;
    private int _serial;

    private enum ChartState
    {
        Loading,
        Ready,
        Failed,
    }

    /// <summary>Gets or sets what is shown.</summary>
    [Parameter, EditorRequired] public required PlotFigure Figure { get; set; }

    /// <summary>Gets or sets what the picture shows, in one sentence for those who cannot see it.</summary>
    [Parameter, EditorRequired] public required string Label { get; set; }

    /// <summary>Gets or sets the name of a saved picture, without ending.</summary>
    [Parameter] public string FileName { get; set; } = "chart";

    /// <summary>Gets or sets further CSS classes, which set the height.</summary>
    [Parameter] public string Class { get; set; } = "";

    /// <summary>Gets or sets the title above the picture.</summary>
    [Parameter] public RenderFragment? Heading { get; set; }

    /// <summary>Gets or sets the key to the marks.</summary>
    [Parameter] public RenderFragment? Key { get; set; }

    /// <summary>Gets or sets the same data as text; shown in place of the picture on demand.</summary>
    [Parameter] public RenderFragment? AsText { get; set; }

    /// <summary>Gets or sets what is said beside the thing pointed at.</summary>
    [Parameter] public RenderFragment? Tip { get; set; }

    /// <summary>Gets or sets whether the user can zoom.</summary>
    [Parameter] public bool ShowZoom { get; set; }

    /// <summary>Called when a thing is clicked or tapped.</summary>
    [Parameter] public EventCallback<PlotPick> Picked { get; set; }

    /// <summary>Called when a thing is pointed at; with null when none is any more.</summary>
    [Parameter] public EventCallback<PlotPick?> Hovered { get; set; }

    private string FrameId => _id + "-frame";

    private string FailureText => AsText is null
        ? "The chart cannot be drawn in this browser. Reload the page to try again."
        : "The chart cannot be drawn in this browser. “List as text” holds the same data; reload the page to try again.";

    /// <summary>Called by the script when a thing is clicked or tapped.</summary>
    [JSInvokable]
    public Task OnPick(int serial, PlotPickKind kind, int index) =>
        serial == _serial ? Picked.InvokeAsync(new PlotPick(kind, index)) : Task.CompletedTask;

    /// <summary>Called by the script when another thing is pointed at; <paramref name="index"/> is −1 where none is.</summary>
    [JSInvokable]
    public Task OnHover(int serial, PlotPickKind kind, int index) =>
        serial == _serial ? Hovered.InvokeAsync(index < 0 ? null : new PlotPick(kind, index)) : Task.CompletedTask;

    /// <inheritdoc/>
    public async ValueTask DisposeAsync()
    {
        try
        {
            if (_module is { } module)
            {
                await module.InvokeVoidAsync("close", _id);
                await module.DisposeAsync();
            }
        }
        catch (JSDisconnectedException)
        {
            // The browser has gone, and the chart with it.
        }

        _self?.Dispose();
    }

    /// <inheritdoc/>
    protected override Task OnAfterRenderAsync(bool firstRender) =>
        _state == ChartState.Ready && !ReferenceEquals(Figure, _shown) ? ShowAsync() : Task.CompletedTask;

    /// <summary>Takes over the chart that the library has made. The library's callback cannot be awaited: nothing may escape from here.</summary>
    private async void AdoptAsync()
    {
        if (_self is not null)
        {
            return;
        }

        _self = DotNetObjectReference.Create(this);
        try
        {
            _module = await JS.InvokeAsync<IJSObjectReference>("import", "./js/plot.js");
            await _module.InvokeVoidAsync("open", _id, FrameId, _self);
            await ShowAsync();
            _state = ChartState.Ready;
        }
        catch (JSDisconnectedException)
        {
            return;
        }
        catch (Exception fault) when (fault is JSException or OperationCanceledException)
        {
            _state = ChartState.Failed;
        }

        await InvokeAsync(StateHasChanged);
    }

    private async Task ShowAsync()
    {
        PlotFigure figure = Figure;
        PlotFigure? before = _shown;
        _shown = figure;
        bool isLike = before is not null && before.Traces.Length == figure.Traces.Length;
        var change = new FigureChange(
            ++_serial,
            figure with { Traces = [] },
            [.. figure.Traces.Select((trace, i) => isLike && ReferenceEquals(before!.Traces[i], trace) ? null : trace)]);
        await _module!.InvokeVoidAsync("show", _id, change);
    }

    private async Task ZoomAsync(double factor) => await _module!.InvokeVoidAsync("zoom", _id, factor);

    private async Task DownloadAsync(string format) => await _module!.InvokeVoidAsync("download", _id, format, FileName);

    /// <summary>What is sent to the script: the figure, with null for each trace that it has already.</summary>
    internal sealed record FigureChange(int Serial, PlotFigure Figure, ImmutableArray<PlotTrace?> Traces);
}
