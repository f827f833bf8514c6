using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;
using Microsoft.AspNetCore.Components;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Components.Charts;

/// <summary>The index of one glass against wavelength, with the named lines.</summary>
public sealed partial class DispersionChart : ComponentBase
{
    private const int Steps = 160;
    private ImmutableArray<SpectralLine> _lines = [];
    private Glass? _shown;
    private PlotFigure _figure = null!;
    private string _label = "";

    /// <summary>Gets or sets the glass.</summary>
    [Parameter, EditorRequired] public required Glass Glass { get; set; }

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        if (ReferenceEquals(_shown, Glass))
        {
            return;
        }

        _shown = Glass;
        _lines = [.. SpectralLine.All.Where(l => Glass.Range.Contains(l.Wavelength))];
        (double from, double to) = (Glass.Range.Shortest.Nanometers, Glass.Range.Longest.Nanometers);

        // Steps that grow with the wavelength: the index bends most at the short end.
        Wavelength[] wavelengths =
        [
            Glass.Range.Shortest,
            .. Enumerable.Range(1, Steps - 1).Select(i => Wavelength.FromNanometers(from * Math.Pow(to / from, (double)i / Steps))),
            Glass.Range.Longest,
        ];
        double[] indices = [.. wavelengths.Select(w => Math.Round(Glass.IndexAt(w), 6))];
        double room = 0.06 * (indices.Max() - indices.Min());
        _label = $"Index of {Glass.Name} against wavelength from {FigureText.Fixed(from, 0)} to {FigureText.Fixed(to, 0)} nm, "
            + $"from {FigureText.Fixed(indices[0], 4)} to {FigureText.Fixed(indices[^1], 4)}.";
        _figure = new PlotFigure
        {
            X = new PlotAxis("wavelength, nm", from, to),
            Y = new PlotAxis("index, relative to air", indices.Min() - room, indices.Max() + room),
            View = Glass.Id,
            Traces =
            [
                new PlotTrace([.. wavelengths.Select(w => Math.Round(w.Nanometers, 2))], [.. indices]) { Width = 2.0 },
                new PlotTrace([.. _lines.Select(l => l.Wavelength.Nanometers)], [.. _lines.Select(l => Glass.IndexAt(l.Wavelength))])
                {
                    Mark = PlotMark.Ring,
                    Tips = [.. _lines.Select(l => $"{l.Symbol}, {l.Source}, {FigureText.Fixed(l.Wavelength.Nanometers, 2)} nm: n = {FigureText.Fixed(Glass.IndexAt(l.Wavelength), 6)}")],
                },
            ],
            Labels = [.. _lines.Select(l => new PlotLabel(l.Wavelength.Nanometers, Glass.IndexAt(l.Wavelength), l.Symbol) { Color = "--ink-2" })],
        };
    }
}
