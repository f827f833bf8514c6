using GlassPair.Optics.Color;
using Microsoft.AspNetCore.Components;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Components.Charts;

/// <summary>The focal shift of a combination against wavelength, over the depth of focus.</summary>
public sealed partial class FocalShiftChart : ComponentBase
{
    private (ThinSolution? Chosen, ThinSolution? Pinned) _shown;
    private FocalShiftCurve _chosen = null!;
    private FocalShiftCurve? _pinned;
    private PlotFigure? _figure;
    private string _label = "";

    /// <summary>Gets or sets the combination shown.</summary>
    [Parameter, EditorRequired] public required ThinSolution Chosen { get; set; }

    /// <summary>Gets or sets the combination pinned for comparison, drawn dashed.</summary>
    [Parameter] public ThinSolution? Pinned { get; set; }

    /// <summary>Gets or sets whether a newer answer is being computed: the picture is dimmed.</summary>
    [Parameter] public bool Stale { get; set; }

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        if (_shown is var (chosen, pinned) && ReferenceEquals(chosen, Chosen) && ReferenceEquals(pinned, Pinned))
        {
            return;
        }

        _shown = (Chosen, Pinned);
        _chosen = FocalShiftCurve.Of(Chosen);
        _pinned = Pinned is null ? null : FocalShiftCurve.Of(Pinned);
        _figure = FocalShiftFigure.Draw(_chosen, _pinned, Chosen.Requirement, Pinned is null ? "" : Name(Pinned), _figure);
        _label = Description();
    }

    private static string Name(ThinSolution solution) => string.Join(" + ", solution.Elements.Select(e => e.Glass.Name));

    private string Description() =>
        $"Focal shift of {Name(Chosen)} against wavelength, counted from the middle focus: within ±{FigureText.ShortLength(_chosen.Samples.Max(s => Math.Abs(s.Shift)))} "
        + $"over the band, where f/{FigureText.Fixed(Chosen.Requirement.FNumber, 1)} allows ±{FigureText.ShortLength(Chosen.Requirement.DepthOfFocus)} at the design wavelength"
        + (_pinned is null ? "." : $"; {Name(Pinned!)}, pinned, within ±{FigureText.ShortLength(_pinned.Samples.Max(s => Math.Abs(s.Shift)))}.");
}
