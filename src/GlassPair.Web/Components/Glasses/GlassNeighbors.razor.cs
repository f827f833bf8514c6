using System.Collections.Immutable;
using GlassPair.Catalogue;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Web.Addresses;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Glasses;

/// <summary>The glasses that could stand in for one: the same under other names, and the nearest in V and P over a band.</summary>
public sealed partial class GlassNeighbors : ComponentBase
{
    /// <summary>How many near glasses are listed.</summary>
    public const int Count = 12;

    private static readonly ImmutableArray<NumberField> _fields = [GlassPageState.ShortField, GlassPageState.DesignField, GlassPageState.LongField];

    private ImmutableArray<Glass> _twins = [];
    private GlassIndices? _indices;
    private ImmutableArray<NearGlass> _near = [];

    /// <summary>Gets or sets the glass.</summary>
    [Parameter, EditorRequired] public required Glass Glass { get; set; }

    /// <summary>Gets or sets the stock.</summary>
    [Parameter, EditorRequired] public required Stock Stock { get; set; }

    /// <summary>Gets or sets the glasses of the stock over the band; null where the band cannot be read.</summary>
    [Parameter] public IndexTable? Table { get; set; }

    /// <summary>Gets or sets what the page is asked for.</summary>
    [Parameter, EditorRequired] public required GlassPageState State { get; set; }

    /// <summary>Gets or sets what that amounts to.</summary>
    [Parameter, EditorRequired] public required GlassPageReading Reading { get; set; }

    /// <summary>Called with the new state at each keystroke.</summary>
    [Parameter] public EventCallback<GlassPageState> Typed { get; set; }

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        _twins = GlassReport.Twins(Glass, Stock);
        _indices = Table?.Rows.FirstOrDefault(r => r.Glass.Id == Glass.Id);
        _near = _indices is null ? []
            : [.. NearestGlasses.Of(_indices, Table!, Count + _twins.Length).Where(n => !n.Glass.Glass.Formula.Equals(Glass.Formula)).Take(Count)];
    }

    private string? Problem(NumberField field) => Reading.Problems.GetValueOrDefault(field.Key);
}
