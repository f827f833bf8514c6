using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using Microsoft.AspNetCore.Components;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Components.Charts;

/// <summary>Measured minus fitted index at each line of a fit; lines left out are crossed.</summary>
public sealed partial class ResidualChart : ComponentBase
{
    private const double MostOfKept = 3.0;
    private ImmutableArray<Residual> _residuals = [];
    private DispersionFit? _shown;
    private PlotFigure _figure = null!;
    private string _label = "";

    /// <summary>Gets or sets the fit.</summary>
    [Parameter, EditorRequired] public required DispersionFit Fit { get; set; }

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        if (ReferenceEquals(_shown, Fit))
        {
            return;
        }

        _shown = Fit;
        Residual[] kept = [.. Fit.Measured.Zip(Fit.Residuals, (measured, value) => new Residual(measured, value, null))];
        Residual[] leftOut = [.. Fit.LeftOut.Select(l => new Residual(l.Measured, l.Residual, l.Reason))];
        _residuals = [.. kept.Concat(leftOut).OrderBy(r => r.Measured.Wavelength)];
        double largest = kept.Max(r => Math.Abs(r.Value));

        // A misprint can be a thousand times larger than the rest: it is then drawn at the edge, and its label says how far off it is.
        double half = leftOut.Select(r => Math.Abs(r.Value)).Append(largest).Max();
        half = 1.2 * Math.Max(Math.Min(half, MostOfKept * largest), 1e-8);
        int exponent = (int)Math.Floor(Math.Log10(half));
        double unit = Math.Pow(10.0, exponent);
        double Height(double value) => Math.Round(Math.Clamp(value, -half * 0.93, half * 0.93) / unit, 4);
        PlotTrace Marks(Residual[] residuals) => new(
            [.. residuals.Select(r => r.Measured.Wavelength.Nanometers)], [.. residuals.Select(r => Height(r.Value))])
        {
            Tips = [.. residuals.Select(r => $"{FigureText.Fixed(r.Measured.Wavelength.Nanometers, 2)} nm: {FigureText.PowerOfTen(r.Value, 1)}")],
        };

        (double from, double to) = (_residuals[0].Measured.Wavelength.Nanometers, _residuals[^1].Measured.Wavelength.Nanometers);
        double margin = 0.04 * (to - from);
        _label = $"Measured minus fitted index at {Fit.Measured.Length} wavelengths: RMS {FigureText.PowerOfTen(Fit.RmsResidual, 1)}, "
            + $"worst {FigureText.PowerOfTen(Fit.WorstResidual, 1)} at {Fit.Worst.Wavelength}"
            + (leftOut.Length == 0 ? "." : $"; {leftOut.Length} left out.");
        _figure = new PlotFigure
        {
            X = new PlotAxis("wavelength, nm", from - margin, to + margin),
            Y = new PlotAxis($"measured − fitted index, {FigureText.PowerOfTen(unit, 0)[2..]}", -half / unit, half / unit),
            Traces = [Marks(kept) with { Mark = PlotMark.Disk }, Marks(leftOut) with { Mark = PlotMark.Cross, Size = 9.0, Color = "--exceeds" }],
            Paths =
            [
                new PlotPath([.. kept.Select(r => ImmutableArray.Create(r.Measured.Wavelength.Nanometers, 0.0, r.Measured.Wavelength.Nanometers, Height(r.Value)))])
                {
                    Color = "--ink-2",
                },
            ],
            Labels =
            [
                .. leftOut.Select(r => new PlotLabel(r.Measured.Wavelength.Nanometers, Height(r.Value), "left out") { Color = "--exceeds", Notes = [FigureText.PowerOfTen(r.Value, 1)] }),
                new PlotLabel(Fit.Worst.Wavelength.Nanometers, Height(Fit.WorstResidual), "worst") { Color = "--ink-2" },
            ],
        };
    }

    private sealed record Residual(MeasuredIndex Measured, double Value, string? LeftOutBecause);
}
