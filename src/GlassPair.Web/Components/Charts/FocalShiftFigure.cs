using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Addresses;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Components.Charts;

/// <summary>Draws the focal shift of a combination against wavelength.</summary>
internal static class FocalShiftFigure
{
    private const double Room = 1.15;
    private const double MostOfDepth = 4.0;

    /// <summary>Draws the curve of the chosen combination over the depth of focus, and the pinned one dashed.</summary>
    /// <param name="chosen">The chosen combination.</param>
    /// <param name="pinned">The pinned one; null where none is.</param>
    /// <param name="requirement">What the lens must do.</param>
    /// <param name="pinnedName">What the pinned one is called.</param>
    /// <param name="before">The figure shown so far, whose scale stays while it serves; null where there is none.</param>
    public static PlotFigure Draw(FocalShiftCurve chosen, FocalShiftCurve? pinned, Requirement requirement, string pinnedName, PlotFigure? before)
    {
        Band band = requirement.Band;
        double shifts = chosen.Samples.Max(s => Math.Abs(s.Shift));
        double depth = chosen.Samples.Max(s => s.DepthOfFocus);

        // A curve far inside the depth of focus would be a flat line: then the zone fills the picture.
        double half = Room * Math.Max(1.2 * shifts, Math.Min(depth, MostOfDepth * shifts));
        half = half > 0.0 ? half : depth;
        bool isLarge = half >= 1.0;
        double scale = isLarge ? 1.0 : 1e3;
        string unit = isLarge ? "mm" : "µm";
        double[] wavelengths = [.. chosen.Curve.Select(p => Math.Round(p.Wavelength.Nanometers, 2))];
        double Height(double millimeters) => Math.Round(millimeters * scale, 3);

        var zone = new PlotPath(
        [
            [.. chosen.Curve.Select(p => (p.Wavelength, p.DepthOfFocus)).Concat(chosen.Curve.Reverse().Select(p => (p.Wavelength, DepthOfFocus: -p.DepthOfFocus)))
                .SelectMany(p => new[] { Math.Round(p.Wavelength.Nanometers, 2), Height(p.DepthOfFocus) })],
        ])
        {
            Width = 0.0,
            Fill = "--depth",
            IsBehind = true,
        };
        var samples = new PlotTrace(
            [.. chosen.Samples.Select(p => Math.Round(p.Wavelength.Nanometers, 2))],
            [.. chosen.Samples.Select(p => Height(p.Shift))])
        {
            Mark = PlotMark.Ring,
            Size = 6.0,
            Tips = [.. chosen.Samples.Select(p =>
                $"{FigureText.Fixed(p.Wavelength.Nanometers, 1)} nm: {FigureText.ShortLength(p.Shift)}, depth of focus ±{FigureText.ShortLength(p.DepthOfFocus)}")],
        };
        PlotTrace[] traces = pinned is null
            ? [Curve(chosen) with { Width = 2.0 }, samples]
            : [Curve(pinned) with { Color = "--ink-2", Width = 1.3, Dash = "6px,3px" }, Curve(chosen) with { Width = 2.0 }, samples];
        var scaleNow = new PlotAxis($"focal shift, {unit}", -half * scale, half * scale);
        FocalShiftPoint? seen = pinned?.Curve.Where(p => Math.Abs(p.Shift) < half * 0.9).Cast<FocalShiftPoint?>().FirstOrDefault();
        return new PlotFigure
        {
            X = new PlotAxis("wavelength, nm", wavelengths[0], wavelengths[^1]),
            Y = before is not null && Serves(before.Y, scaleNow) ? before.Y : scaleNow,
            Traces = [.. traces],
            Paths = [zone],
            Guides =
            [
                new PlotGuide(band.ShortEnd.Nanometers, LineName(band.ShortEnd)),
                new PlotGuide(band.Design.Nanometers, LineName(band.Design), ""),
                new PlotGuide(band.LongEnd.Nanometers, LineName(band.LongEnd)),
            ],
            Labels = seen is { } at
                ? [new PlotLabel(at.Wavelength.Nanometers, Height(at.Shift), pinnedName + ", pinned") { Color = "--ink-2" }]
                : [],
            Note = [depth <= half ? "green: depth of focus ±2λN² at each wavelength" : $"all inside the depth of focus, ±{FigureText.ShortLength(requirement.DepthOfFocus)} at {WavelengthText.LineAt(band.Design)?.Symbol ?? band.Design.ToString()}"],
        };

        static string LineName(Wavelength wavelength) => WavelengthText.LineAt(wavelength)?.Symbol ?? FigureText.Fixed(wavelength.Nanometers, 0);

        static bool Serves(PlotAxis before, PlotAxis now) => before.Title == now.Title && now.To <= before.To && now.To >= 0.5 * before.To;

        PlotTrace Curve(FocalShiftCurve curve) => new(
            [.. curve.Curve.Select(p => Math.Round(p.Wavelength.Nanometers, 2))], [.. curve.Curve.Select(p => Height(p.Shift))]);
    }
}
