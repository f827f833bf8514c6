using System.Collections.Immutable;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Addresses;
using GlassPair.Web.Api;
using GlassPair.Web.Components.Glasses;
using GlassPair.Web.Figures;
using GlassPair.Web.Stocks;
using GlassPair.Web.Work;
using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Routing;

namespace GlassPair.Web.Components.Pages;

/// <summary>One glass: what its coefficients give, what the maker states, what else is known of it, and which glasses come near.</summary>
public sealed partial class GlassPage : ComponentBase
{
    private static readonly TimeSpan _pause = TimeSpan.FromMilliseconds(300);

    private readonly Latest _typing = new();
    private GlassPageState _state = GlassPageState.Empty;
    private GlassPageReading _reading = GlassPageReading.Of(GlassPageState.Empty);
    private double _thickness = 10.0;
    private ImmutableArray<string> _notices = [];
    private ImmutableArray<LineFigure> _lines = [];
    private ImmutableArray<StatedFigure> _stated = [];
    private GlassFigures? _figures;
    private IndexTable? _table;
    private string _shown = "";

    /// <summary>Gets or sets the maker, as the address says.</summary>
    [Parameter] public string Maker { get; set; } = "";

    /// <summary>Gets or sets the name of the glass, as the address says.</summary>
    [Parameter] public string Name { get; set; } = "";

    [CascadingParameter] private HttpContext? Http { get; set; }

    [Inject] private StockLibrary Library { get; set; } = null!;

    [Inject] private ShortlistService Shortlists { get; set; } = null!;

    [Inject] private LastRequirement Last { get; set; } = null!;

    [Inject] private NavigationManager Navigation { get; set; } = null!;

    private Stock Stock { get; set; } = null!;

    private string? Ready => RendererInfo.IsInteractive ? "true" : null;

    private Glass Glass => _figures!.Glass;

    private IEnumerable<Glass> Closest => ClosestGlasses.To(Stock, $"{Maker}/{Name}").Select(id => Stock.TryFind(id, out Glass? glass) ? glass : null).OfType<Glass>();

    private Glass? Successor => Glass.ReplacedBy is { } name && Stock.TryFind($"{Glass.Maker}/{name}", out Glass? glass) ? glass : null;

    private string Title => (_figures is null ? "No such glass" : $"{Glass.Name}, {Glass.Maker}") + " · GlassPair";

    private string Description =>
        $"{Glass.Name} of {Glass.Maker}: nd {Number(_figures!.Nd, 5)}, vd {Number(_figures.AbbeD, 2)}, Pg,F {Number(_figures.PartialGF, 4)}, {FigureText.Of(Glass.Supply)}.";

    private string Link => Navigation.BaseUri + GlassPageAddress.Of(Glass, _state with { StockId = Stock.Id });

    private string SupplyMark => Glass.Supply switch { Supply.Recommended or Supply.Listed => "holds", Supply.Discontinued => "exceeds", _ => "tight" };

    private string SupplySentence => (Glass.Edition is { } edition ? $"As the maker’s list of {edition} said: " : "The catalogue gives no edition: ") + "confirm with the maker before ordering.";

    private string LeftOutCount => Glass.Fit is { LeftOut.Length: > 0 and var count } ? $"{Counted(count, "line")} left out, shown below." : "";

    private string ThermalSentence => Glass.Thermal is null ? ""
        : $"dn/dT at {FigureText.Plain(GlassReport.Celsius)} °C: in air, glass and air warming together; in vacuum, the glass alone.";

    private string NormalSentence => _figures is { DeltaGF: { } delta, AbbeD: { } abbe }
        ? $"Pg,F lies {FigureText.Fixed(Math.Abs(delta), 4)} {(delta >= 0.0 ? "above" : "below")} the normal line, 0.6438 − 0.001682 vd = {FigureText.Fixed(PartialDispersion.NormalGF(abbe), 4)}."
        : "The formula does not reach all the lines that Pg,F and vd need.";

    private string TransmittanceSentence
    {
        get
        {
            ImmutableArray<(Wavelength Wavelength, double Value)> values = GlassReport.Transmittances(Glass, _thickness);
            if (values.IsEmpty)
            {
                return "";
            }

            (Wavelength wavelength, double best) = values.MaxBy(v => v.Value);
            string start = values[0].Value >= 0.9 ? $"more than 90 % at every stated wavelength from {values[0].Wavelength}"
                : values.SkipWhile(v => v.Value < 0.9).Select(v => (Wavelength?)v.Wavelength).FirstOrDefault() is { } first ? $"more than 90 % from {first} on, among the stated wavelengths"
                : "less than 90 % at every stated wavelength";
            return $"Through {FigureText.Plain(_thickness)} mm inside the glass: {start}; at best {FigureText.Fixed(best * 100.0, 1)} % at {wavelength}. Losses at the surfaces come on top.";
        }
    }

    private string OriginSentence =>
        $"From the stock “{Stock.Title}”, whose content has the hash {Stock.Id}"
        + (Glass.Edition is { } edition ? $", the maker’s list of {edition}." : ".")
        + " The shipped catalogue holds the makers’ published data sheet values as collected in M. N. Polyanskiy, “Refractiveindex.info database of optical constants”, Scientific Data 11, 94 (2024), CC0.";

    private string FitLink => "fit" + FitAddress.Write(new FitState
    {
        Text = FitAddress.TextOf(Glass.Fit!),
        LeftOut = [.. Glass.Fit!.LeftOut.Select(l => l.Measured.Wavelength.Nanometers)],
        Form = Glass.Formula is SellmeierFormula ? DispersionForm.Sellmeier : DispersionForm.PowerSeries,
        Terms = Glass.Formula is SellmeierFormula sellmeier ? sellmeier.Terms.Length : Glass.Formula.Coefficients.Length - 1,
        Name = Glass.Id,
    });

    /// <inheritdoc/>
    public void Dispose()
    {
        Navigation.LocationChanged -= OnLocationChanged;
        _typing.Dispose();
    }

    /// <inheritdoc/>
    protected override void OnInitialized() => Navigation.LocationChanged += OnLocationChanged;

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        ReadAddress();
        if (_figures is null && Http is { Response.HasStarted: false } context)
        {
            context.Response.StatusCode = StatusCodes.Status404NotFound;
        }
    }

    private static string Number(double? value, int decimals) => value is { } v ? FigureText.Fixed(v, decimals) : GlassColumn.Unknown;

    private static string Class(double? value) => value is { } v ? FigureText.Plain(v) : GlassColumn.Unknown;

    private static string Counted(int count, string noun) => count == 1 ? $"1 {noun}" : $"{FigureText.Count(count)} {noun}s";

    private static ImmutableArray<(string Symbol, double Value, string Unit)> ThermalRows(ThermalIndex thermal) =>
    [
        ("D₀", thermal.D0, "1/K"), ("D₁", thermal.D1, "1/K²"), ("D₂", thermal.D2, "1/K³"), ("E₀", thermal.E0, "µm²/K"), ("E₁", thermal.E1, "µm²/K²"), ("λTK", thermal.ResonanceMicrometers, "µm"),
    ];

    private string? Problem(NumberField field) => _reading.Problems.GetValueOrDefault(field.Key);

    private void ReadAddress()
    {
        _shown = Navigation.ToBaseRelativePath(Navigation.Uri);
        (_state, _notices) = GlassPageAddress.Read(new Uri(Navigation.Uri).Query);
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

        _figures = Stock.TryFind($"{Maker}/{Name}", out Glass? glass) ? GlassFigures.Of(glass, Stock) : null;
        _lines = glass is null ? [] : GlassReport.Lines(glass);
        _stated = _figures is null ? [] : GlassReport.Stated(_figures);
        Read();
    }

    private void Read()
    {
        _reading = GlassPageReading.Of(_state);
        _thickness = _reading.Thickness ?? _thickness;
        _table = _reading.Band is { } band ? Shortlists.TableOf(Stock, band) : null;
    }

    private void OnLocationChanged(object? sender, LocationChangedEventArgs e) => _ = InvokeAsync(() =>
    {
        // Another glass comes as another parameter; here only the query of the same one can be new.
        string path = Navigation.ToBaseRelativePath(e.Location);
        if (path != _shown && _figures is not null && path.Split('?')[0] == _shown.Split('?')[0])
        {
            ReadAddress();
            StateHasChanged();
        }
    });

    /// <summary>The page follows at once, the address when the typing pauses.</summary>
    private async Task TypeAsync(GlassPageState next)
    {
        _state = next;
        Read();
        bool isLatest = await _typing.PauseAsync(_pause);
        string path = GlassPageAddress.Of(Glass, _state);
        if (isLatest && path != _shown)
        {
            _shown = path;
            Navigation.NavigateTo(path, new NavigationOptions { ReplaceHistoryEntry = true });
        }
    }
}
