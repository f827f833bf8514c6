using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Addresses;
using GlassPair.Web.Figures;
using GlassPair.Web.Hosting;
using GlassPair.Web.Stocks;
using GlassPair.Web.Work;
using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Routing;

namespace GlassPair.Web.Components.Pages;

/// <summary>The working page: requirement, glass map, chosen pair, ranking; one selection, and all of it in the address.</summary>
public sealed partial class Workbench : ComponentBase
{
    private static readonly TimeSpan _pause = TimeSpan.FromMilliseconds(15);
    private static readonly TimeSpan _patience = TimeSpan.FromMilliseconds(300);
    private static readonly TimeSpan _rest = TimeSpan.FromMilliseconds(80);
    private static readonly TimeSpan _addressPause = TimeSpan.FromMilliseconds(400);

    private readonly Latest _ranking = new();
    private readonly Latest _addressing = new();
    private readonly Latest _pointing = new();
    private WorkbenchState _state = WorkbenchState.Empty;
    private ImmutableArray<string> _misread = [];
    private bool _isDemo;
    private bool _isSet;
    private Stock _stock = null!;
    private FormReading _reading = null!;
    private WorkbenchAnswer? _answer;
    private RankedPair? _chosen;
    private RankedPair? _pinned;
    private string? _chosenProblem;
    private string? _pinnedProblem;
    private Candidate? _pointedAt;
    private string? _failure;
    private bool _stale;
    private ImmutableArray<WorkbenchRelaxation> _relaxations = [];
    private ImmutableArray<(string Sentence, long? Holding)> _costs = [];
    private string _shownQuery = "";

    [Inject] private StockLibrary Library { get; set; } = null!;

    [Inject] private WorkbenchAnswers Answers { get; set; } = null!;

    [Inject] private LastRequirement Last { get; set; } = null!;

    [Inject] private NavigationManager Navigation { get; set; } = null!;

    [Inject] private DemoRequirement Demo { get; set; } = null!;

    [Inject] private CircuitPresence Presence { get; set; } = null!;

    private IReadOnlyList<string> Makers => [.. _stock.Glasses.Select(g => g.Maker).Distinct()];

    private string Link => Navigation.BaseUri + WorkbenchAddress.Write(_state with { StockId = _stock.Id });

    private Glass? ChosenGlass => _state.ChosenGlass is { } id && _stock.TryFind(id, out Glass? glass) ? glass : null;

    /// <summary>The requirement as typed; while it cannot be read, that of the answer shown.</summary>
    private Requirement? Asked => (_reading.Request ?? _answer?.Shortlist.Request)?.Requirement;

    private string AskedFor => Asked is { } asked ? RequirementText.NameOf(asked) : "No requirement yet";

    private string AskedDetails => Asked is { } asked ? RequirementText.DetailsOf(asked) : "";

    private string Title => (Asked is null ? "" : $"{AskedFor}, {RequirementText.Of(Asked.Band)}")
        + (_chosen is null ? "" : $": {_chosen.Positive.Glass.Name} + {_chosen.Negative.Glass.Name}") is { Length: > 0 } text ? text + " · GlassPair" : "GlassPair";

    private string Description => _answer is null || _chosen is null
        ? "Which glasses bring a band of wavelengths to one focus well enough for an aperture, out of everything on sale."
        : $"{AskedFor} {AskedDetails}. {_chosen.Positive.Glass.Name} ({_chosen.Positive.Glass.Maker}) and {_chosen.Negative.Glass.Name} ({_chosen.Negative.Glass.Maker}): {PairFindings.Of(_chosen)[0].Title}, {PairFindings.Of(_chosen)[0].Sentence}. "
            + $"{FigureText.Count(_answer.Shortlist.CombinationsHolding)} of {FigureText.Count(_answer.Shortlist.CombinationsFeasible)} pairs hold.";

    /// <summary>Called for each row that the pointer enters: without a receiver, so that nothing is drawn until it rests.</summary>
    private EventCallback<RankedPair?> RowPointedAt => new(null, (RankedPair? pair) => PointAtAsync(pair?.Candidate));

    /// <summary>What the answer shown was made for, where that is no longer what the form says.</summary>
    private string? Staleness => !_stale || _answer is null ? null
        : $"Shown for {RequirementText.Of(_answer.Shortlist.Request.Requirement)}"
            + (_reading.Request is { } request ? $"; {RequirementText.Of(request.Requirement)} is being computed." : "; correct what is marked to go on.");

    private string Waiting => _failure
        ?? (!_reading.IsStarted ? "Give a focal length and an f-number: the pairs appear as you type."
        : _reading.Request is null ? "Correct what is marked in the requirement: the pairs appear as you type."
        : "Ranking every pair of the stock…");

    private IEnumerable<Notice> Notices
    {
        get
        {
            if (_isDemo)
            {
                yield return new Notice("info", $"This is an example: {Demo.Title}, an invented scenario. Change any value; the address keeps everything you set.", [("Start from an empty requirement", WorkbenchAddress.Write(WorkbenchState.Empty))]);
            }

            if (_state.StockId is { } asked && asked != _stock.Id)
            {
                yield return new Notice("tight", $"The stock {TypedNumber.Shorten(asked)} that this link was made on is not kept here. Shown is today’s, {_stock.Id}: ranks and figures can differ.", []);
            }
            else if (_stock.Id != Library.Current.Id)
            {
                yield return new Notice("info", $"This link was made on an older stock, {_stock.Id}, and shows what it showed then. Today’s is {Library.Current.Id}.", [("Rank again on today’s stock", WorkbenchAddress.Write(_state with { StockId = Library.Current.Id }))]);
            }

            if (Library.Problem is { } problem)
            {
                yield return new Notice("tight", string.Create(CultureInfo.InvariantCulture, $"The catalogue’s folder cannot be used since {problem.Since.UtcDateTime:yyyy-MM-dd HH:mm} UTC; the stock read before is served. {problem.Issues[0]}"), []);
            }

            foreach (string sentence in _misread)
            {
                yield return new Notice("tight", sentence, []);
            }

            if (_chosenProblem is { } chosen)
            {
                yield return new Notice("tight", $"The pair in the address cannot be shown. {chosen}", []);
            }

            if (_pinnedProblem is { } pinned)
            {
                yield return new Notice("tight", $"The pinned pair cannot be shown. {pinned}", []);
            }

            if (_answer is not null && _failure is { } failure)
            {
                yield return new Notice("exceeds", failure, []);
            }
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        Navigation.LocationChanged -= OnLocationChanged;
        Library.Changed -= OnStockChanged;
        Presence.Returned -= OnReturned;
        _ranking.Dispose();
        _addressing.Dispose();
        _pointing.Dispose();
    }

    /// <summary>The page takes no parameters: when the router shows it again after its own change of address, there is nothing to draw.</summary>
    public override Task SetParametersAsync(ParameterView parameters)
    {
        if (_isSet)
        {
            return Task.CompletedTask;
        }

        _isSet = true;
        return base.SetParametersAsync(parameters);
    }

    /// <inheritdoc/>
    protected override async Task OnInitializedAsync()
    {
        Navigation.LocationChanged += OnLocationChanged;
        Library.Changed += OnStockChanged;
        Presence.Returned += OnReturned;
        ReadAddress();
        await AnswerAsync(TimeSpan.Zero);
    }

    private void ReadAddress()
    {
        _shownQuery = new Uri(Navigation.Uri).Query;
        AddressReading read = WorkbenchAddress.Read(_shownQuery);
        (_state, _misread, _isDemo) = (read.IsBlank ? Demo.State : read.State, read.Notices, read.IsBlank);
        _stock = _state.StockId is { } id && Library.TryFind(id, out Stock? stock) ? stock : Library.Current;
        _reading = FormReading.Of(_state, _stock);
        Last.State = _state;
    }

    private void OnStockChanged() => _ = InvokeAsync(StateHasChanged);

    private void OnReturned(object? sender, EventArgs e) => _ = InvokeAsync(async () =>
    {
        await AnswerAsync(TimeSpan.Zero);
        StateHasChanged();
    });

    private void OnLocationChanged(object? sender, LocationChangedEventArgs e) => _ = InvokeAsync(async () =>
    {
        if (new Uri(e.Location) is { AbsolutePath: var path, Query: var query } && query != _shownQuery && path == new Uri(Navigation.BaseUri).AbsolutePath)
        {
            ReadAddress();
            StateHasChanged();
            await AnswerAsync(TimeSpan.Zero);
            StateHasChanged();
        }
    });

    private async Task TypeAsync(WorkbenchState next)
    {
        Set(next);
        _ = ReplaceAddressAsync();
        await AnswerAsync(_pause);
    }

    private async Task PickAsync(WorkbenchState next)
    {
        Set(next);
        Navigate(replace: false);
        await AnswerAsync(TimeSpan.Zero);
    }

    private Task ChooseAsync(PairName name) => PickAsync(_state with { Chosen = name });

    private Task PinAsync(RankedPair pair) =>
        PickAsync(_state with { Pinned = PairName.Of(pair.Solution) == _state.Pinned ? null : PairName.Of(pair.Solution) });

    private Task PickGlassAsync(Glass glass) => PickAsync(_state with { ChosenGlass = _state.ChosenGlass == glass.Id ? null : glass.Id });

    /// <summary>Thickens the chord of a row where the pointer rests; rows that it only passes over cost nothing.</summary>
    private async Task PointAtAsync(Candidate? candidate)
    {
        if (await _pointing.PauseAsync(_rest) && !ReferenceEquals(_pointedAt, candidate))
        {
            _pointedAt = candidate;
            StateHasChanged();
        }
    }

    private void Set(WorkbenchState next)
    {
        _state = next with { StockId = _stock.Id };
        (_misread, _isDemo) = ([], false);
        _reading = FormReading.Of(_state, _stock);
        Last.State = _state;
    }

    private async Task ReplaceAddressAsync()
    {
        if (await _addressing.PauseAsync(_addressPause))
        {
            Navigate(replace: true);
        }
    }

    private void Navigate(bool replace)
    {
        _addressing.Stop();
        string query = WorkbenchAddress.Write(_state);
        if (query != _shownQuery)
        {
            _shownQuery = query;
            Navigation.NavigateTo(query, new NavigationOptions { ReplaceHistoryEntry = replace });
        }
    }

    /// <summary>Ranks for the state, after a pause in which the next keystroke may come; the answer before it stays until then.</summary>
    private async Task AnswerAsync(TimeSpan pause)
    {
        CancellationToken cancellation = _ranking.Next(Presence.WhilePresent);
        if (_reading.Request is not { } request)
        {
            _stale = _answer is not null;
            Choose();
            return;
        }

        try
        {
            if (Answers.Find(_state, _stock) is { } kept)
            {
                Show(kept);
                await CountCostsAsync(kept, cancellation);
                return;
            }

            await Task.Delay(pause, cancellation);
            Task<WorkbenchAnswer> work = Answers.AnswerAsync(_state, request, _stock, cancellation);
            if (await Task.WhenAny(work, Task.Delay(_patience, cancellation)) != work && !cancellation.IsCancellationRequested)
            {
                _stale = true;
                StateHasChanged();
            }

            WorkbenchAnswer answer = await work;

            // It may have been ready before it could be stopped: a newer one may be shown already.
            cancellation.ThrowIfCancellationRequested();
            Show(answer);
            await CountCostsAsync(answer, cancellation);
        }
        catch (Exception e) when (e is OperationCanceledException or ServerBusyException && cancellation.IsCancellationRequested)
        {
            // A newer requirement took over, or the page was closed.
        }
        catch (ServerBusyException busy)
        {
            (_failure, _stale) = (busy.Message, _answer is not null);
        }
    }

    private void Show(WorkbenchAnswer answer)
    {
        (_answer, _stale, _failure) = (answer, false, null);
        Choose();
    }

    /// <summary>Where no pair holds, counts what each limit costs, one after the other.</summary>
    private async Task CountCostsAsync(WorkbenchAnswer answer, CancellationToken cancellation)
    {
        ImmutableArray<WorkbenchRelaxation> relaxations = answer.Shortlist.CombinationsHolding == 0 ? WorkbenchRelaxation.Of(_state, answer) : [];
        (_relaxations, _costs) = (relaxations, [.. relaxations.Select(r => (r.Sentence, (long?)null))]);
        for (int i = 0; i < relaxations.Length && RendererInfo.IsInteractive; i++)
        {
            StateHasChanged();
            long? holding = await Answers.CountHoldingAsync(relaxations[i].State, answer.Stock, cancellation);
            cancellation.ThrowIfCancellationRequested();
            _costs = _costs.SetItem(i, (relaxations[i].Sentence, holding));
        }
    }

    private Task RelaxAsync(string sentence) =>
        _relaxations.FirstOrDefault(r => r.Sentence == sentence) is { } relaxation ? PickAsync(relaxation.State) : Task.CompletedTask;

    /// <summary>Finds the chosen and the pinned pair in the answer shown.</summary>
    private void Choose()
    {
        (_chosenProblem, _pinnedProblem) = (null, null);
        if (_answer is null)
        {
            (_chosen, _pinned) = (null, null);
            return;
        }

        _chosen = (_state.Chosen is { } name ? _answer.Find(name, out _chosenProblem) : null) ?? _answer.Pairs.FirstOrDefault();
        _pinned = _state.Pinned is { } pin ? _answer.Find(pin, out _pinnedProblem) : null;
        _pointedAt = null;
    }

    private sealed record Notice(string Kind, string Text, ImmutableArray<(string Text, string Href)> Links);
}
