using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Addresses;
using GlassPair.Web.Components.Glasses;
using GlassPair.Web.Figures;
using GlassPair.Web.Work;
using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Forms;
using Microsoft.AspNetCore.Components.Routing;
using Microsoft.AspNetCore.Components.Web;

namespace GlassPair.Web.Components.Pages;

/// <summary>Fits a dispersion formula to measured indices as they are typed: what was read, how well it fits, and what each line says.</summary>
public sealed partial class FitPage : ComponentBase
{
    private const string Placeholder = "404.66  1.530240\n435.83  1.526690\n546.07  1.518720\n…";
    private static readonly TimeSpan _pause = TimeSpan.FromMilliseconds(120);
    private static readonly TimeSpan _addressPause = TimeSpan.FromMilliseconds(400);

    private static readonly (WavelengthUnit?, string)[] _units =
        [(null, "as found"), (WavelengthUnit.Nanometers, "nm"), (WavelengthUnit.Micrometers, "µm")];

    private static readonly (FieldSeparator?, string)[] _separators =
        [(null, "as found"), .. Enum.GetValues<FieldSeparator>().Select(s => ((FieldSeparator?)s, TableForm.NameOf(s)))];

    private static readonly (DecimalMark?, string)[] _marks = [(null, "as found"), (DecimalMark.Point, "point"), (DecimalMark.Comma, "comma")];

    private static readonly (DispersionForm?, string)[] _forms =
        [(null, "the best"), (DispersionForm.Sellmeier, "Sellmeier"), (DispersionForm.PowerSeries, "power series")];

    private readonly Latest _typing = new();
    private readonly Latest _work = new();
    private FitState _state = FitState.Empty;
    private FitAnswer _answer = FitAnswer.Of(FitState.Empty);
    private ImmutableArray<string> _notices = [];
    private string? _fileProblem;
    private string _shownQuery = "";
    private ErrorBoundary? _chartBoundary;
    private string? _failure;
    private bool _isWorking;

    [Inject] private WorkGate Gate { get; set; } = null!;

    [Inject] private LastRequirement Last { get; set; } = null!;

    [Inject] private NavigationManager Navigation { get; set; } = null!;

    private string Title => (_answer.Glass is { } glass && _state.Name.Length > 0 ? $"Fit of {glass.Name}" : "Fit of measured indices") + " · GlassPair";

    private string Link => Navigation.BaseUri + "fit" + FitAddress.Write(_state);

    private IEnumerable<int> TermChoices => Enumerable.Range(1, _state.Form is { } form ? DispersionFitter.MaxTerms(form) : 0);

    private string CatalogueRow => _answer.CatalogueText().Split('\n') is [_, var row, ..] ? row : "";

    private string LeftOutSentence => _answer.LeftOutCount == 0 ? ""
        : $"{Counted(_answer.LeftOutCount, "line")} left out by you" + (_answer.WithAll is { } all ? $"; with all of them the RMS is {FigureText.PowerOfTen(all.RmsResidual, 1)}." : ".");

    /// <inheritdoc/>
    public void Dispose()
    {
        Navigation.LocationChanged -= OnLocationChanged;
        _typing.Dispose();
        _work.Dispose();
    }

    /// <inheritdoc/>
    protected override Task OnInitializedAsync()
    {
        Navigation.LocationChanged += OnLocationChanged;
        return ReadAddressAsync();
    }

    private static string Counted(int count, string noun) => count == 1 ? $"1 {noun}" : $"{FigureText.Count(count)} {noun}s";

    private static string Number(double? value, int decimals) => value is { } v ? FigureText.Fixed(v, decimals) : GlassColumn.Unknown;

    private static string Cut(string? text, int length) => text is null ? "" : text.Length <= length ? text : text[..length];

    private static T? Chosen<T>((T? Value, string Text)[] options, ChangeEventArgs e)
        where T : struct, Enum => options.FirstOrDefault(o => o.Value?.ToString() == e.Value as string).Value;

    private bool IsWorst(FitLine line) => line.IsUsed && _answer.Made is { } fit && line.Row.Measured is { } measured && measured.Wavelength == fit.Worst.Wavelength;

    private string RemarkOn(FitLine line) =>
        line.IsUsed ? IsWorst(line) ? "worst line" : ""
        : _answer.Made is not null && line.Residual is null ? "left out by you; outside the range fitted, where the formula says nothing"
        : "left out by you";

    private Task ReadAddressAsync()
    {
        _shownQuery = new Uri(Navigation.Uri).Query;
        (_state, _notices) = FitAddress.Read(_shownQuery);
        return AnswerAsync();
    }

    /// <summary>Fits off the page's own thread, so that a long table does not hold up the typing; the answer before it stays until then.</summary>
    private async Task AnswerAsync()
    {
        (FitState asked, CancellationToken cancellation) = (_state, _work.Next());
        _isWorking = true;
        try
        {
            FitAnswer answer = await Gate.RunAsync(_ => FitAnswer.Of(asked), cancellation);
            if (!cancellation.IsCancellationRequested)
            {
                (_answer, _failure, _isWorking) = (answer, null, false);
                _chartBoundary?.Recover();
            }
        }
        catch (OperationCanceledException)
        {
            // A newer table took over, or the page was closed.
        }
        catch (ServerBusyException busy)
        {
            (_failure, _isWorking) = (busy.Message, false);
        }
    }

    private void OnLocationChanged(object? sender, LocationChangedEventArgs e) => _ = InvokeAsync(async () =>
    {
        if (new Uri(e.Location) is { AbsolutePath: var path, Query: var query } && query != _shownQuery && path == new Uri(new Uri(Navigation.BaseUri), "fit").AbsolutePath)
        {
            await ReadAddressAsync();
            StateHasChanged();
        }
    });

    /// <summary>The field follows at once, the fit after a pause in which the next letter may come, the address after a longer one.</summary>
    private async Task TypeAsync(FitState next)
    {
        (_state, _fileProblem) = (next, null);
        CancellationToken cancellation = _typing.Next();
        if (await Latest.PauseAsync(_pause, cancellation))
        {
            await AnswerAsync();
            StateHasChanged();
        }

        if (await Latest.PauseAsync(_addressPause, cancellation))
        {
            Navigate(replace: true);
        }
    }

    private async Task PickAsync(FitState next)
    {
        (_state, _fileProblem) = (next, null);
        _typing.Next();
        Navigate(replace: false);
        await AnswerAsync();
    }

    private Task TermsAsync(ChangeEventArgs e) =>
        PickAsync(_state with
        {
            Terms = int.TryParse(e.Value as string, NumberStyles.None, CultureInfo.InvariantCulture, out int terms) && TermChoices.Contains(terms) ? terms : null,
        });

    private async Task OpenAsync(InputFileChangeEventArgs e)
    {
        if (e.File.Size > MeasuredTable.MaxLength)
        {
            _fileProblem = string.Create(CultureInfo.InvariantCulture, $"The file holds {e.File.Size:#,0} bytes; up to {MeasuredTable.MaxLength:#,0} are read. Send a longer table to the API at /api/v1/fit.");
            return;
        }

        try
        {
            await using Stream stream = e.File.OpenReadStream(MeasuredTable.MaxLength);
            CatalogueFile file = await CatalogueFile.FromStreamAsync(e.File.Name, stream, CancellationToken.None);
            if (file.TryReadText(out string? problem) is { } text)
            {
                await PickAsync(_state with { Text = Cut(text, MeasuredTable.MaxLength), LeftOut = [] });
            }
            else
            {
                _fileProblem = $"{file.Name}: {problem}";
            }
        }
        catch (IOException)
        {
            _fileProblem = "The file could not be read to its end: open it again.";
        }
    }

    private void Navigate(bool replace)
    {
        string query = FitAddress.Write(_state);
        if (query != _shownQuery)
        {
            _shownQuery = query;
            Navigation.NavigateTo("fit" + query, new NavigationOptions { ReplaceHistoryEntry = replace });
        }
    }
}
