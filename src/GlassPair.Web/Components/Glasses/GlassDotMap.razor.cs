using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Components.Charts;
using GlassPair.Web.Figures;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Glasses;

/// <summary>All glasses as dots over the Abbe number v_d, which falls to the right; those of the list strong, the others faint.</summary>
public sealed partial class GlassDotMap : ComponentBase
{
    private const int Digits = 5;
    private static readonly (GlassMapHeight, string)[] _heights = [(GlassMapHeight.Index, "n"), (GlassMapHeight.Partial, "P"), (GlassMapHeight.Delta, "ΔP")];

    private PlotFigure _figure = null!;
    private ImmutableArray<GlassFigures> _pickable = [];
    private (object All, object Shown, GlassFigures? Chosen, GlassMapHeight Height)? _drawn;

    /// <summary>Gets or sets every glass of the stock.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<GlassFigures> All { get; set; }

    /// <summary>Gets or sets the glasses of the list.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<GlassFigures> Shown { get; set; }

    /// <summary>Gets or sets the chosen glass.</summary>
    [Parameter] public GlassFigures? Chosen { get; set; }

    /// <summary>Gets or sets what stands on the vertical axis.</summary>
    [Parameter] public GlassMapHeight Height { get; set; }

    /// <summary>Called with what should stand there instead.</summary>
    [Parameter] public EventCallback<GlassMapHeight> HeightChanged { get; set; }

    /// <summary>Called with the glass whose dot was clicked or tapped.</summary>
    [Parameter] public EventCallback<GlassFigures> Picked { get; set; }

    private string Label =>
        $"Glass map: {NameOf(Height)} over the Abbe number of {FigureText.Count(_pickable.Length)} glasses; the list holds the same glasses in numbers"
        + (Chosen is { AbbeD: { } abbe } chosen && HeightOf(chosen) is { } height ? $". Chosen: {chosen.Glass.Name} at {FigureText.Fixed(abbe, 2)}, {FigureText.Fixed(height, Decimals)}" : "");

    private int Decimals => Height == GlassMapHeight.Index ? 5 : 4;

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        if (_drawn is { } drawn && ReferenceEquals(drawn.All, All) && ReferenceEquals(drawn.Shown, Shown) && drawn.Height == Height)
        {
            if (drawn.Chosen != Chosen)
            {
                _figure = WithChosen(_figure);
            }
        }
        else
        {
            Draw();
        }

        _drawn = (All, Shown, Chosen, Height);
    }

    private static string NameOf(GlassMapHeight height) => height switch
    {
        GlassMapHeight.Index => "index n_d",
        GlassMapHeight.Partial => "partial dispersion P_g,F",
        _ => "ΔP_g,F, the distance from the normal line,",
    };

    private static double? HeightOf(GlassFigures glass, GlassMapHeight height) => height switch
    {
        GlassMapHeight.Index => glass.Nd,
        GlassMapHeight.Partial => glass.PartialGF,
        _ => glass.DeltaGF,
    };

    private double? HeightOf(GlassFigures glass) => HeightOf(glass, Height);

    private void Draw()
    {
        GlassFigures[] drawable = [.. All.Where(g => g.AbbeD is not null && HeightOf(g) is not null)];
        HashSet<GlassFigures> shown = [.. Shown];
        _pickable = [.. drawable.Where(shown.Contains)];
        string title = Height switch
        {
            GlassMapHeight.Index => "index n<sub>d</sub>",
            GlassMapHeight.Partial => "partial dispersion P<sub>g,F</sub>",
            _ => "ΔP<sub>g,F</sub> from the normal line",
        };
        _figure = WithChosen(new PlotFigure
        {
            View = Height.ToString(),
            X = new PlotAxis("Abbe number v<sub>d</sub>, falling to the right: more dispersion", Limit(drawable, g => g.AbbeD, 1.0), Limit(drawable, g => g.AbbeD, -1.0)),
            Y = new PlotAxis(title, Limit(drawable, HeightOf, -1.0), Limit(drawable, HeightOf, 1.0)),
            Traces =
            [
                Dots([.. drawable.Where(g => !shown.Contains(g))], "--dot-2", 4.0),
                Dots(_pickable, "--dot", 5.0) with { IsPickable = true, Tips = [.. _pickable.Select(TipOf)] },
            ],
            Paths = Height == GlassMapHeight.Index ? [] : [NormalLine(drawable)],
        });
    }

    private PlotFigure WithChosen(PlotFigure figure) =>
        Chosen is { AbbeD: { } abbe } chosen && HeightOf(chosen) is { } height
            ? figure with
            {
                Disks = [new PlotDisk(abbe, height, 5.5, "--accent", "--pane")],
                Labels = [new PlotLabel(abbe, height, chosen.Glass.Name) { IsBold = true }],
            }
            : figure with { Disks = [], Labels = [] };

    private PlotTrace Dots(ImmutableArray<GlassFigures> glasses, string color, double size) =>
        new([.. glasses.Select(g => Math.Round(g.AbbeD!.Value, Digits))], [.. glasses.Select(g => Math.Round(HeightOf(g)!.Value, Digits))])
        {
            Color = color,
            Mark = PlotMark.Disk,
            Size = size,
        };

    private string TipOf(GlassFigures glass) =>
        $"{glass.Glass.Name} {glass.Glass.Maker}: v<sub>d</sub> {FigureText.Fixed(glass.AbbeD!.Value, 2)}, {FigureText.Fixed(HeightOf(glass)!.Value, Decimals)}";

    private PlotPath NormalLine(GlassFigures[] glasses)
    {
        double from = glasses.Select(g => g.AbbeD!.Value).DefaultIfEmpty(80.0).Max(), to = glasses.Select(g => g.AbbeD!.Value).DefaultIfEmpty(20.0).Min();
        return new PlotPath([Height == GlassMapHeight.Partial ? [from, PartialDispersion.NormalGF(from), to, PartialDispersion.NormalGF(to)] : [from, 0.0, to, 0.0]])
        {
            Color = "--line-strong",
            Dash = "6px,3px",
            IsBehind = true,
        };
    }

    /// <summary>The largest value, or with a sign of −1 the smallest, and a little room beyond it.</summary>
    private static double Limit(GlassFigures[] glasses, Func<GlassFigures, double?> value, double sign)
    {
        double[] values = [.. glasses.Select(g => value(g)!.Value).DefaultIfEmpty(0.0)];
        double room = Math.Max(0.04 * (values.Max() - values.Min()), 1e-3);
        return (sign > 0.0 ? values.Max() : values.Min()) + (sign * room);
    }

    private Task PickAsync(PlotPick pick) =>
        pick.Kind == PlotPickKind.Point && pick.Index >= 0 && pick.Index < _pickable.Length ? Picked.InvokeAsync(_pickable[pick.Index]) : Task.CompletedTask;
}
