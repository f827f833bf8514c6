using System.Collections.Immutable;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Addresses;
using GlassPair.Web.Components.Controls;
using GlassPair.Web.Components.Glasses;
using GlassPair.Web.Figures;
using GlassPair.Web.Stocks;
using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Routing;

namespace GlassPair.Web.Components.Pages;

/// <summary>All glasses of the stock: a list to filter and sort beside the map of them, one selection, all of it in the address.</summary>
public sealed partial class GlassListPage : ComponentBase
{
    private static readonly TimeSpan _pause = TimeSpan.FromMilliseconds(300);

    private readonly Latest _typing = new();
    private GlassListState _state = GlassListState.Empty;
    private ImmutableArray<string> _notices = [];
    private IReadOnlyList<GlassFigures> _all = [];
    private IReadOnlyList<GlassFigures> _shown = [];
    private IReadOnlyList<GlassFigures> _mapped = [];
    private GlassFigures? _chosen;
    private string _shownQuery = "";

    [Inject] private StockLibrary Library { get; set; } = null!;

    [Inject] private LastRequirement Last { get; set; } = null!;

    [Inject] private NavigationManager Navigation { get; set; } = null!;

    /// <summary>The stock that the page was made from; a newer one does not change a page while it is read.</summary>
    private Stock Stock { get; set; } = null!;

    private IReadOnlyList<string> Makers { get; set; } = [];

    private string Editions { get; set; } = "";

    private bool IsFiltered => _state.Search.Length > 0 || _state.Makers is not null || _state.Supply is not null;

    private string Counted => IsFiltered ? $"{FigureText.Count(_shown.Count)} of {FigureText.Count(_all.Count)} glasses" : $"{FigureText.Count(_all.Count)} glasses";

    private string Title => (_state.Search.Trim() is { Length: > 0 } search ? $"Glasses: {search}" : "Glasses") + " · GlassPair";

    private string Link => Navigation.BaseUri + "glasses" + GlassListAddress.Write(_state with { StockId = _state.StockId ?? Stock.Id });

    private string ExportAddress => "export/glasses.csv" + GlassListAddress.Write(_state with { StockId = _state.StockId ?? Stock.Id });

    private static ImmutableArray<DataColumn<GlassFigures>> Columns { get; } =
    [
        .. GlassColumn.All.Select(c => new DataColumn<GlassFigures>(
            c.Key, c.Title, c.Unit, c.Meaning,
            c.Key switch
            {
                GlassColumn.NameKey => NameCell,
                GlassColumn.SupplyKey => SupplyCell,
                _ => figures => builder => builder.AddContent(0, c.Text(figures)),
            },
            CanSort: true, c.IsNumber, c.Class)),
    ];

    /// <inheritdoc/>
    public void Dispose()
    {
        Navigation.LocationChanged -= OnLocationChanged;
        _typing.Dispose();
    }

    /// <inheritdoc/>
    protected override void OnInitialized()
    {
        Navigation.LocationChanged += OnLocationChanged;
        ReadAddress();
    }

    private void ReadAddress()
    {
        _shownQuery = new Uri(Navigation.Uri).Query;
        (_state, _notices) = GlassListAddress.Read(_shownQuery);
        Stock = Library.Current;
        if (_state.StockId is { } id)
        {
            if (Library.TryFind(id, out Stock? stock))
            {
                Stock = stock;
            }
            else
            {
                _notices = _notices.Add($"The stock {TypedNumber.Shorten(id)} of this link is no longer served; today’s is shown.");
                _state = _state with { StockId = null };
            }
        }

        _all = GlassFigures.Of(Stock);
        Makers = [.. Stock.Glasses.Select(g => g.Maker).Distinct()];
        Editions = string.Join(", ", Stock.Glasses.Select(g => g.Edition).OfType<string>().Distinct().Order(StringComparer.Ordinal));
        if (_state.Chosen is { } chosen && !Stock.TryFind(chosen, out _))
        {
            _notices = _notices.Add($"{TypedNumber.Shorten(chosen)} is not in this stock.");
        }

        Show();
        _mapped = _shown;
    }

    private void OnLocationChanged(object? sender, LocationChangedEventArgs e) => _ = InvokeAsync(() =>
    {
        if (new Uri(e.Location) is { AbsolutePath: var path, Query: var query } && query != _shownQuery && path == new Uri(new Uri(Navigation.BaseUri), "glasses").AbsolutePath)
        {
            ReadAddress();
            StateHasChanged();
        }
    });

    private void Show()
    {
        _shown = GlassListView.Of(_all, _state);
        _chosen = _state.Chosen is { } id && Stock.TryFind(id, out Glass? glass) ? _all.First(g => g.Glass == glass) : null;
    }

    /// <summary>The list follows at once; the map and the address follow when the typing pauses.</summary>
    private async Task TypeAsync(string? text)
    {
        string search = text ?? "";
        _state = _state with { Search = search.Length > GlassListState.MaxSearchLength ? search[..GlassListState.MaxSearchLength] : search };
        Show();
        if (await _typing.PauseAsync(_pause))
        {
            _mapped = _shown;
            Navigate(replace: true);
        }
    }

    private void Pick(GlassListState next)
    {
        _state = next;
        Show();
        _mapped = _shown;
        Navigate(replace: false);
    }

    private Task PickAsync(GlassListState next)
    {
        Pick(next);
        return Task.CompletedTask;
    }

    private Task ChooseAsync(GlassFigures figures) => PickAsync(_state with { Chosen = figures.Glass.Id });

    private Task SortAsync((string Key, bool Descending) sort) => PickAsync(_state with { SortBy = sort.Key, SortDescending = sort.Descending });

    private Task KeepMakerAsync(string maker, bool on)
    {
        ImmutableSortedSet<string> all = ImmutableSortedSet.CreateRange(StringComparer.OrdinalIgnoreCase, Makers);
        ImmutableSortedSet<string> kept = _state.Makers ?? all;
        kept = on ? kept.Add(maker) : kept.Remove(maker);
        return PickAsync(_state with { Makers = kept.IsSupersetOf(all) ? null : kept });
    }

    private Task KeepSupplyAsync(Supply supply, bool on)
    {
        ImmutableSortedSet<Supply> all = [.. Enum.GetValues<Supply>()];
        ImmutableSortedSet<Supply> kept = _state.Supply ?? all;
        kept = on ? kept.Add(supply) : kept.Remove(supply);
        return PickAsync(_state with { Supply = kept.IsSupersetOf(all) ? null : kept });
    }

    private void Navigate(bool replace)
    {
        string query = GlassListAddress.Write(_state);
        if (query != _shownQuery)
        {
            _shownQuery = query;
            Navigation.NavigateTo("glasses" + query, new NavigationOptions { ReplaceHistoryEntry = replace });
        }
    }
}
