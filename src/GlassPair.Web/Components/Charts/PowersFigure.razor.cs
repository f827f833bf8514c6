using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Color;
using Microsoft.AspNetCore.Components;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Components.Charts;

/// <summary>The powers of the elements to scale: each bar begins where the one before ends, and the last ends at the power of the lens.</summary>
public sealed partial class PowersFigure : ComponentBase
{
    private const string Subscripts = "₁₂₃₄₅₆₇₈₉";
    private ImmutableArray<Bar> _bars = [];
    private double _zero;

    /// <summary>Gets or sets the combination shown.</summary>
    [Parameter, EditorRequired] public required ThinSolution Solution { get; set; }

    private string ZeroLine => $"M{Coordinate(_zero)} 0V10";

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        double[] ends = [0.0, .. Ends()];
        double low = Math.Min(0.0, ends.Min());
        double scale = 100.0 / (Math.Max(1.0, ends.Max()) - low);
        _zero = -low * scale;
        double At(double power) => _zero + (power * scale);
        _bars =
        [
            .. Solution.Elements.Select((element, i) => new Bar(
                element.Glass.Name,
                $"φ{Subscripts[i]}",
                Solution.RelativePowers[i] > 0.0 ? "positive" : "negative",
                At(Math.Min(ends[i], ends[i + 1])),
                At(Math.Max(ends[i], ends[i + 1])),
                FigureText.WithSign(Solution.RelativePowers[i], 2) + "\u00A0Φ")),
            new Bar("lens", "Φ", "lens", _zero, At(ends[^1]), $"1/({FigureText.Fixed(Solution.Requirement.FocalLength, 1)}\u00A0mm)"),
        ];
    }

    private static string Coordinate(double value) => Math.Round(value, 2).ToString(CultureInfo.InvariantCulture);

    private IEnumerable<double> Ends()
    {
        double sum = 0.0;
        foreach (double power in Solution.RelativePowers)
        {
            sum += power;
            yield return sum;
        }
    }

    private sealed record Bar(string Name, string Symbol, string Kind, double From, double To, string Text);
}
