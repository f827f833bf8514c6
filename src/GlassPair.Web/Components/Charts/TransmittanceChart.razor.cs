using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Practice;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Figures;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Charts;

/// <summary>The internal transmittance of one glass against wavelength.</summary>
public sealed partial class TransmittanceChart : ComponentBase
{
    private ImmutableArray<(Wavelength Wavelength, double Value)> _stated = [];
    private (Glass, double) _shown;
    private PlotFigure? _figure;
    private string _label = "";

    /// <summary>Gets or sets the glass.</summary>
    [Parameter, EditorRequired] public required Glass Glass { get; set; }

    /// <summary>Gets or sets the path through the glass, mm.</summary>
    [Parameter] public double Thickness { get; set; } = 10.0;

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        if (_shown == (Glass, Thickness))
        {
            return;
        }

        _shown = (Glass, Thickness);
        _stated =
        [
            .. Glass.Extinction
                .Select(e => (e.Wavelength, Value: InternalTransmittance.TryOf(Glass, e.Wavelength, Thickness)))
                .Where(e => e.Value is not null)
                .Select(e => (e.Wavelength, e.Value!.Value)),
        ];
        _figure = _stated.Length < 2 ? null : Draw();
    }

    private PlotFigure Draw()
    {
        const int steps = 240;
        (double from, double to) = (_stated[0].Wavelength.Nanometers, _stated[^1].Wavelength.Nanometers);

        // The edge of transmission is steep and lies at the short end: steps that grow with the wavelength, and every stated value.
        (double X, double Y)[] curve =
        [
            .. Enumerable.Range(1, steps - 1).Select(i => Wavelength.FromNanometers(from * Math.Pow(to / from, (double)i / steps)))
                .Concat(_stated.Select(s => s.Wavelength))
                .Order()
                .Select(w => (w.Nanometers, InternalTransmittance.TryOf(Glass, w, Thickness)!.Value)),
        ];
        double least = _stated.Min(s => s.Value);
        _label = $"Internal transmittance of {Glass.Name} through {FigureText.Plain(Thickness)} mm against wavelength from {FigureText.Fixed(from, 0)} to "
            + $"{FigureText.Fixed(to, 0)} nm: {FigureText.Fixed(_stated[0].Value, 3)} at the short end, at most {FigureText.Fixed(_stated.Max(s => s.Value), 3)}.";
        return new PlotFigure
        {
            X = new PlotAxis("wavelength, nm", from, to),
            Y = new PlotAxis("internal transmittance", least - (0.04 * (1.0 - least)) - 1e-4, 1.0 + (0.04 * (1.0 - least)) + 1e-4),
            View = Glass.Id,
            Traces =
            [
                new PlotTrace([.. curve.Select(p => Math.Round(p.X, 2))], [.. curve.Select(p => Math.Round(p.Y, 5))]) { Width = 2.0 },
                new PlotTrace([.. _stated.Select(s => s.Wavelength.Nanometers)], [.. _stated.Select(s => Math.Round(s.Value, 5))])
                {
                    Mark = PlotMark.Ring,
                    Size = 5.0,
                    Tips = [.. _stated.Select(s => $"{FigureText.Plain(s.Wavelength.Nanometers)} nm: {FigureText.Fixed(s.Value, 4)}")],
                },
            ],
        };
    }
}
