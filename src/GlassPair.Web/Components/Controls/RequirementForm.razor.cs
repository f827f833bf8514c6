using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Addresses;
using GlassPair.Web.Figures;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>The requirement: what the lens must do, and what may be bought for it.</summary>
public sealed partial class RequirementForm : ComponentBase
{
    private static readonly ImmutableArray<NumberField> _lensFields = [NumberField.FocalLength, NumberField.FNumber, NumberField.HalfField];
    private static readonly ImmutableArray<NumberField> _bandFields = [NumberField.ShortEnd, NumberField.Design, NumberField.LongEnd, NumberField.Samples];

    private static readonly ImmutableArray<NumberField> _buildFields =
    [
        NumberField.AirSpace, NumberField.ElementPower, NumberField.ExpansionDifference, NumberField.FromCelsius, NumberField.ToCelsius, NumberField.Housing,
    ];

    private static readonly ImmutableArray<NumberField> _qualityFields = [NumberField.AbbeTolerance, NumberField.IndexPrecision];

    private static readonly (ColorBalance Value, string Text)[] _balances =
        [(ColorBalance.EndsUnited, "Ends united"), (ColorBalance.BandBalanced, "Band balanced")];

    private static readonly (PowerSign? Value, string Text)[] _signs = [(null, "either"), (PowerSign.Positive, "positive"), (PowerSign.Negative, "negative")];

    private static readonly (bool Value, string Text)[] _constructions = [(false, "Cemented"), (true, "Air-spaced")];

    private static readonly ImmutableArray<(string Value, string Text)> _grades =
        [("0.5", "±0.5 %"), ("0.3", "±0.3 %"), ("0.2", "±0.2 %"), ("0.1", "±0.1 %"), ("0", "melt measured")];

    /// <summary>Gets or sets what the form shows.</summary>
    [Parameter, EditorRequired] public required WorkbenchState State { get; set; }

    /// <summary>Gets or sets what it amounts to.</summary>
    [Parameter, EditorRequired] public required FormReading Reading { get; set; }

    /// <summary>Gets or sets the makers of the stock.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<string> Makers { get; set; }

    /// <summary>Gets or sets the glasses of the stock.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<Glass> Glasses { get; set; }

    /// <summary>Called with the new state at each keystroke.</summary>
    [Parameter] public EventCallback<WorkbenchState> Typed { get; set; }

    /// <summary>Called with the new state at each choice.</summary>
    [Parameter] public EventCallback<WorkbenchState> Picked { get; set; }

    private BandPreset? Preset => BandPreset.Of(State);

    private IEnumerable<(string Value, string Text)> Grades
    {
        get
        {
            string typed = State.TextOf(NumberField.AbbeTolerance);
            return _grades.Any(g => g.Value == typed) ? _grades : _grades.Append((typed, $"±{TypedNumber.Shorten(typed)} %"));
        }
    }

    private static ImmutableSortedSet<string> Add(ImmutableSortedSet<string> set, string id) =>
        set.Count < WorkbenchState.MaxNamedGlasses ? set.Add(id) : set;

    private static string Derived(double? value, double scale, int decimals) =>
        value is { } v ? FigureText.Fixed(v * scale, decimals) : RankingColumn.Unknown;

    private Task PresetAsync(ChangeEventArgs e) =>
        BandPreset.All.FirstOrDefault(p => p.Key == e.Value as string) is { } preset ? Picked.InvokeAsync(preset.In(State)) : Task.CompletedTask;

    private WorkbenchState WithMaker(string maker, bool on)
    {
        ImmutableSortedSet<string> all = [.. Makers];
        ImmutableSortedSet<string> kept = State.Makers ?? all;
        kept = on ? kept.Add(maker) : kept.Remove(maker);
        return State with { Makers = kept.IsSupersetOf(all) ? null : kept };
    }

    /// <summary>A wavelength typed as a line shows its number, and a number that is a line shows its name.</summary>
    private string? UnitOf(NumberField field)
    {
        if (!field.IsWavelength || Reading.Number(field) is not { } nanometers)
        {
            return null;
        }

        SpectralLine? line = WavelengthText.LineAt(Wavelength.FromNanometers(nanometers));
        return WavelengthText.FindLine(State.TextOf(field)) is not null ? $"{FigureText.Fixed(nanometers, 1)} nm" : line is null ? "nm" : $"nm, {line.Symbol}";
    }
}
