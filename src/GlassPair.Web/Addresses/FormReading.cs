using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Catalogue;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Api;

namespace GlassPair.Web.Addresses;

/// <summary>What the form amounts to: a request to rank, or what stands in the way of one.</summary>
public sealed class FormReading
{
    private readonly Dictionary<NumberField, double> _numbers = [];
    private readonly Dictionary<NumberField, string> _problems = [];

    private FormReading(WorkbenchState state, Stock stock)
    {
        foreach (NumberField field in NumberField.All)
        {
            if (field != NumberField.AirSpace || state.AirSpaced)
            {
                Read(field, state.TextOf(field));
            }
        }

        IsStarted = !IsBlank(state, NumberField.FocalLength) && !IsBlank(state, NumberField.FNumber);
        CheckBand();
        CheckTemperature(state);
        if (Number(NumberField.AirSpace) is { } space && Number(NumberField.FocalLength) is { } focal && space >= focal)
        {
            _problems[NumberField.AirSpace] = Text($"The air space, {space:0.####} mm, must be less than the focal length, {focal:0.####} mm.");
        }

        GlassProblem = FindGlassProblem(state, stock);
        Request = IsStarted && _problems.Count == 0 && GlassProblem is null ? Build(state, stock) : null;
    }

    /// <summary>Gets what to rank; null where something is missing or wrong.</summary>
    public ShortlistRequest? Request { get; }

    /// <summary>Gets whether focal length and f-number have been given, without which nothing can be ranked.</summary>
    public bool IsStarted { get; }

    /// <summary>Gets what is wrong with the glasses and makers asked for; null where nothing is.</summary>
    public string? GlassProblem { get; }

    /// <summary>Gets the diameter of the entrance pupil, mm; null where it does not follow yet.</summary>
    public double? ApertureDiameter => Number(NumberField.FocalLength) / Number(NumberField.FNumber);

    /// <summary>Gets the height of the image at the edge of the field, mm; null where it does not follow yet.</summary>
    public double? ImageHeight => Number(NumberField.FocalLength) * Math.Tan(Number(NumberField.HalfField).GetValueOrDefault() * Math.PI / 180.0);

    /// <summary>Gets the quarter-wave depth of focus, ± this many mm; null where it does not follow yet. Source: [depth-of-focus].</summary>
    public double? DepthOfFocus => 2.0 * Number(NumberField.Design) * 1e-6 * Number(NumberField.FNumber) * Number(NumberField.FNumber);

    /// <summary>Gets what is wrong in the order of the form.</summary>
    public IEnumerable<(NumberField Field, string Problem)> Problems =>
        NumberField.All.Where(_problems.ContainsKey).Select(f => (f, _problems[f]));

    /// <summary>Reads the form against a stock. Never throws.</summary>
    public static FormReading Of(WorkbenchState state, Stock stock) => new(state, stock);

    /// <summary>Gets what is wrong with a field, as a sentence that says what is allowed; null where nothing is.</summary>
    public string? ProblemWith(NumberField field) => _problems.GetValueOrDefault(field);

    /// <summary>Gets the number in a field, wavelengths in nm; null where there is none that can be used.</summary>
    public double? Number(NumberField field) => _numbers.TryGetValue(field, out double value) ? value : null;

    private static bool IsBlank(WorkbenchState state, NumberField field) => string.IsNullOrWhiteSpace(state.TextOf(field));

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);

    private static string? FindGlassProblem(WorkbenchState state, Stock stock)
    {
        if (state.Include.Concat(state.Exclude).FirstOrDefault(id => !stock.TryFind(id, out _)) is { } unknown)
        {
            return $"{TypedNumber.Shorten(unknown)} is not in this stock: take it off the list.";
        }

        if (state.Include.Intersect(state.Exclude).FirstOrDefault() is { } both)
        {
            return $"{TypedNumber.Shorten(both)} is both demanded and excluded: take it off one of the lists.";
        }

        return state.Makers is { IsEmpty: true } && state.Include.IsEmpty ? "No maker is kept: choose at least one."
            : state.Supply.IsEmpty && state.Include.IsEmpty ? "No supply state is kept: choose at least one."
            : null;
    }

    private void Read(NumberField field, string text)
    {
        if (string.IsNullOrWhiteSpace(text))
        {
            // An untouched form asks for nothing yet; it is not wrong.
            if (!field.IsOptional && field.Default.Length > 0)
            {
                _problems[field] = $"A value is needed. Allowed: {field.AllowedRange}.";
            }
        }
        else if (field.FindProblem(text, out double value) is { } problem)
        {
            _problems[field] = problem;
        }
        else if (field == NumberField.Samples && value != Math.Floor(value))
        {
            _problems[field] = $"{TypedNumber.Shorten(text.Trim())} is not a whole number. Allowed: {field.AllowedRange}.";
        }
        else
        {
            _numbers[field] = value;
        }
    }

    private void CheckBand()
    {
        if (Number(NumberField.ShortEnd) is not { } shortEnd || Number(NumberField.Design) is not { } design || Number(NumberField.LongEnd) is not { } longEnd)
        {
            return;
        }

        if (!(shortEnd < design))
        {
            _problems[NumberField.ShortEnd] = Text($"The short end, {shortEnd:0.####} nm, must lie below the design wavelength, {design:0.####} nm.");
        }

        if (!(design < longEnd))
        {
            _problems[NumberField.LongEnd] = Text($"The long end, {longEnd:0.####} nm, must lie above the design wavelength, {design:0.####} nm.");
        }
        else if (shortEnd < design && longEnd - shortEnd < RequirementReading.NarrowestBand)
        {
            _problems[NumberField.LongEnd] = Text($"The band must be at least {RequirementReading.NarrowestBand:0.##} nm wide.");
        }
    }

    private void CheckTemperature(WorkbenchState state)
    {
        (double? from, double? to) = (Number(NumberField.FromCelsius), Number(NumberField.ToCelsius));
        if (from > to)
        {
            _problems[NumberField.FromCelsius] = Text($"The coldest, {from:0.##} °C, must not lie above the hottest, {to:0.##} °C.");
        }
        else if (from is not null && IsBlank(state, NumberField.ToCelsius))
        {
            _problems[NumberField.ToCelsius] = "A coldest temperature needs a hottest one.";
        }
        else if (to is not null && IsBlank(state, NumberField.FromCelsius))
        {
            _problems[NumberField.FromCelsius] = "A hottest temperature needs a coldest one.";
        }
    }

    private ShortlistRequest Build(WorkbenchState state, Stock stock)
    {
        var band = Band.Even(Nanometers(NumberField.ShortEnd), Nanometers(NumberField.Design), Nanometers(NumberField.LongEnd), (int)_numbers[NumberField.Samples]);
        var requirement = new Requirement(_numbers[NumberField.FocalLength], _numbers[NumberField.FNumber], band)
        {
            HalfFieldDegrees = _numbers[NumberField.HalfField],
            Balance = state.Balance,
            AirSpace = state.AirSpaced ? _numbers[NumberField.AirSpace] : null,
            ElementPowerLimit = Number(NumberField.ElementPower),
            Temperature = Number(NumberField.FromCelsius) is { } from && Number(NumberField.ToCelsius) is { } to
                ? new TemperatureSpan(from, to, _numbers[NumberField.Housing] * 1e-6)
                : null,
        };
        var limits = new GlassLimits
        {
            Makers = state.Makers,
            Supply = state.Supply.Count == Enum.GetValues<Optics.Glasses.Supply>().Length ? null : state.Supply,
            AllowLead = state.AllowLead,
            AllowMolding = state.AllowMolding,
            Include = Canonical(state.Include, stock),
            IncludeAs = state.IncludeAs,
            Exclude = Canonical(state.Exclude, stock),
            ExpansionDifference = Number(NumberField.ExpansionDifference) * 1e-6,
        };
        var quality = new DataQuality(_numbers[NumberField.AbbeTolerance] / 100.0, _numbers[NumberField.IndexPrecision] * 1e-6);
        return new ShortlistRequest(requirement, limits, quality, state.RankBy, state.Take, state.PairsPerGlass);
    }

    private Wavelength Nanometers(NumberField field) => Wavelength.FromNanometers(_numbers[field]);

    private static System.Collections.Immutable.ImmutableSortedSet<string> Canonical(IEnumerable<string> ids, Stock stock) =>
        WorkbenchState.NoGlasses.Union(ids.Select(id => stock.TryFind(id, out Optics.Glasses.Glass? glass) ? glass.Id : id));
}
