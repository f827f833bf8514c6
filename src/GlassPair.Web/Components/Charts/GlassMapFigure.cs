using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Components.Charts;

/// <summary>Draws the glass map, and keeps every part of it that has not changed since the last time.</summary>
internal sealed class GlassMapFigure
{
    private const int WedgeSteps = 24;
    private IndexTable? _table;
    private MapAxes _axes;
    private PlotTrace _all = Dots([], "--dot-2", 3.5);
    private PlotTrace _usable = Dots([], "--dot", 4.0);
    private PlotTrace _partners = Dots([], "--accent", 5.5);
    private MapWindow? _window;
    private (IndexTable, Requirement, GlassLimits, Glass?) _sought;

    /// <summary>Gets the glass whose partners are shown; null where none is.</summary>
    public GlassIndices? Glass { get; private set; }

    /// <summary>Gets the glasses that hold the requirement together with <see cref="Glass"/>.</summary>
    public ImmutableArray<GlassIndices> Partners { get; private set; } = [];

    /// <summary>Draws the map.</summary>
    public PlotFigure Draw(GlassMap map, IReadOnlyList<Candidate> drawn)
    {
        if (!ReferenceEquals(_table, map.Table) || _axes != map.Axes)
        {
            bool isOtherView = _table is null || !_table.Band.Equals(map.Table.Band) || _axes != map.Axes;
            (_table, _axes) = (map.Table, map.Axes);
            _all = Dots(map.Table.Rows.Select(Place), "--dot-2", 3.5) with { IsPickable = true };
            _window = isOtherView ? null : _window;
        }

        Requirement requirement = map.Requirement;
        Glass = map.ChosenGlass is { } chosen ? map.Table.Rows.FirstOrDefault(r => r.Glass.Id == chosen.Id) : map.Chosen?.Elements.MaxBy(e => e.AbbeNumber);
        var sought = (map.Table, requirement, map.Limits, Glass?.Glass);
        if (sought != _sought)
        {
            _sought = sought;
            Partners = Glass is null ? [] : Optics.Rankings.Partners.HoldingWith(map.Table, requirement, map.Limits, Glass);
        }

        _usable = Kept(_usable, Dots(map.Table.Rows.Where(r => map.Limits.ReasonAgainst(r.Glass) is null).Select(Place), "--dot", 4.0));
        _partners = Kept(_partners, Dots(Partners.Select(Place), "--accent", 5.5));

        List<(double X, double Y)> seen = [.. drawn.Select(c => c.Solution).Concat(Solutions(map)).SelectMany(s => s.Elements).Select(Place)];
        if (Glass is not null)
        {
            seen.Add(Place(Glass));
        }

        MapWindow whole = MapWindow.Around([.. map.Table.Rows.Select(Place)]) ?? new MapWindow(100.0, 0.0, 0.0, 1.0);
        MapWindow next = MapWindow.Around(seen) ?? whole;
        _window = _window?.MovedTo(next) ?? next;
        PartnerWedge? wedge = Glass is null || _axes == MapAxes.Index ? null : PartnerWedge.Of(requirement, Glass);
        Band band = map.Table.Band;
        return new PlotFigure
        {
            X = new PlotAxis(AbbeTitle(band), _window.Left, _window.Right),
            Y = new PlotAxis(_axes == MapAxes.Index ? IndexTitle(band) : PartialTitle(band), _window.Bottom, _window.Top, _axes == MapAxes.Index ? ".2f" : ".3f"),
            View = string.Create(CultureInfo.InvariantCulture, $"{_axes} {band.ShortEnd} {band.Design} {band.LongEnd}"),
            Traces = [_all, _usable, _partners],
            Paths = [.. WedgePaths(wedge, whole), .. ChordPaths(map, drawn)],
            Disks = [.. PairDisks(map.Pinned, isThick: false), .. GlassDisk(map), .. PairDisks(map.Chosen, isThick: true)],
            Labels = [.. PairLabels(map.Chosen, isChosen: true), .. GlassLabel(map), .. PairLabels(map.Pinned, isChosen: false)],
            Note = wedge is null ? [] : [$"shaded: where partners of {wedge.Glass.Glass.Name}", "stay within the limits of focus and power"],
        };
    }

    /// <summary>What the horizontal axis shows.</summary>
    public static string AbbeTitle(Band band) =>
        $"Abbe number of the band V = (n<sub>{Line(band.Design)}</sub>−1)/(n<sub>{Line(band.ShortEnd)}</sub>−n<sub>{Line(band.LongEnd)}</sub>)";

    private static IEnumerable<ThinSolution> Solutions(GlassMap map) => new[] { map.Chosen, map.Pinned }.OfType<ThinSolution>();

    private static string PartialTitle(Band band) =>
        $"partial dispersion P = (n<sub>{Line(band.ShortEnd)}</sub>−n<sub>{Line(band.Design)}</sub>)/(n<sub>{Line(band.ShortEnd)}</sub>−n<sub>{Line(band.LongEnd)}</sub>)";

    private static string IndexTitle(Band band) => $"index n<sub>{Line(band.Design)}</sub>";

    private static string Line(Wavelength wavelength) => wavelength.Nanometers.ToString("F0", CultureInfo.InvariantCulture);

    private static PlotTrace Dots(IEnumerable<(double X, double Y)> places, string color, double size)
    {
        (double X, double Y)[] points = [.. places];
        return new PlotTrace([.. points.Select(p => p.X)], [.. points.Select(p => p.Y)]) { Color = color, Mark = PlotMark.Disk, Size = size };
    }

    private static PlotTrace Kept(PlotTrace before, PlotTrace now) => before.X.SequenceEqual(now.X) && before.Y.SequenceEqual(now.Y) ? before : now;

    private static PlotPath Chords(IEnumerable<(ImmutableArray<double> Line, int Pick)> chords)
    {
        (ImmutableArray<double> Line, int Pick)[] all = [.. chords];
        return new PlotPath([.. all.Select(c => c.Line)]) { Picks = [.. all.Where(c => c.Pick >= 0).Select(c => c.Pick)] };
    }

    private static IEnumerable<PlotPath> WedgePaths(PartnerWedge? wedge, MapWindow whole)
    {
        if (wedge is null)
        {
            yield break;
        }

        ImmutableArray<double>[] areas =
        [
            .. new[] { (From: wedge.NegativePartnersBelow, To: whole.Right), (From: wedge.PositivePartnersAbove, To: whole.Left) }
                .Where((side, i) => i == 0 ? side.From > side.To : side.From < side.To)
                .Select(side => Area(wedge, side.From, side.To)),
        ];
        yield return new PlotPath([.. areas]) { Fill = "--depth", Color = "--line-strong", Width = 1.0, Dash = "2px,3px", IsBehind = true };
    }

    private static ImmutableArray<double> Area(PartnerWedge wedge, double from, double to)
    {
        double[] abbes = [.. Enumerable.Range(0, WedgeSteps + 1).Select(i => from + (i * (to - from) / WedgeSteps))];
        double middle = wedge.Glass.PartialDispersion;
        IEnumerable<(double X, double Y)> Edge(int side) => abbes
            .Select(v => (X: v, Half: wedge.HalfWidthAt(v)))
            .Where(e => e.Half is not null)
            .Select(e => (X: Math.Round(e.X, 3), Y: Math.Round(middle + (side * e.Half!.Value), 6)));
        return [.. Edge(1).Concat(Edge(-1).Reverse()).SelectMany(p => new[] { p.X, p.Y })];
    }

    private IEnumerable<PlotPath> ChordPaths(GlassMap map, IReadOnlyList<Candidate> drawn)
    {
        ILookup<bool, (ImmutableArray<double> Line, int Pick)> chords = drawn
            .Select((c, i) => (c.Solution, Chord: (Line(c.Solution), i)))
            .ToLookup(c => c.Solution.Holds, c => c.Chord);
        yield return Chords(chords[false]) with { Color = "--dot", Dash = "3px,3px", Opacity = 0.8 };
        yield return Chords(chords[true]) with { Color = "--accent", Opacity = 0.45 };
        if (map.Pinned is { } pinned)
        {
            yield return Chords([(Line(pinned), -1)]) with { Color = "--ink-2", Width = 1.5, Dash = "6px,3px", RepelsLabels = true };
        }

        if (map.Highlighted is { } pointed)
        {
            yield return Chords([(Line(pointed.Solution), -1)]) with { Color = "--accent", Width = 2.5 };
        }

        if (map.Chosen is { } chosen)
        {
            yield return Chords([(Line(chosen), -1)]) with { Color = "--ink", Width = 2.5, RepelsLabels = true };
        }
    }

    private IEnumerable<PlotDisk> PairDisks(ThinSolution? solution, bool isThick) =>
        solution is null ? [] : solution.Elements.Zip(solution.RelativePowers, (element, power) =>
        {
            (double x, double y) = Place(element);
            return power > 0.0
                ? new PlotDisk(x, y, isThick ? 6.0 : 3.5, "--positive", "--pane", isThick ? 1.5 : 1.0)
                : new PlotDisk(x, y, isThick ? 5.0 : 3.0, "--pane", "--negative", isThick ? 2.5 : 1.8);
        });

    private IEnumerable<PlotLabel> PairLabels(ThinSolution? solution, bool isChosen)
    {
        if (solution is null)
        {
            yield break;
        }

        foreach ((GlassIndices element, double power) in solution.Elements.Zip(solution.RelativePowers))
        {
            (double x, double y) = Place(element);
            yield return new PlotLabel(x, y, isChosen ? element.Glass.Name : element.Glass.Name + ", pinned")
            {
                Color = isChosen ? power > 0.0 ? "--positive" : "--negative" : "--ink-2",
                IsBold = isChosen,
            };
        }

        if (_axes == MapAxes.PartialDispersion && solution.Elements.Length == 2
            && Chord.SlopeOf(solution.Elements[0], solution.Elements[1]) is { } slope)
        {
            (double x, double y) = Place(solution.Elements[0]);
            (double toX, double toY) = Place(solution.Elements[1]);
            string title = "slope " + FigureText.PowerOfTen(slope, 2);
            yield return isChosen
                ? new PlotLabel(x, y, title) { ToX = toX, ToY = toY, IsBold = true, Notes = ["secondary spectrum " + FigureText.ShortLength(solution.SecondarySpectrum)] }
                : new PlotLabel(x, y, title) { ToX = toX, ToY = toY, Color = "--ink-2" };
        }
    }

    /// <summary>Marks the glass whose partners are shown, where the chosen combination does not do so.</summary>
    private IEnumerable<PlotDisk> GlassDisk(GlassMap map) =>
        IsGlassUnmarked(map, out (double X, double Y) place) ? [new PlotDisk(place.X, place.Y, 5.0, "--accent", "--pane")] : [];

    private IEnumerable<PlotLabel> GlassLabel(GlassMap map) =>
        IsGlassUnmarked(map, out (double X, double Y) place) ? [new PlotLabel(place.X, place.Y, Glass!.Glass.Name) { Color = "--accent", IsBold = true }] : [];

    private bool IsGlassUnmarked(GlassMap map, out (double X, double Y) place)
    {
        place = Glass is null ? default : Place(Glass);
        return Glass is not null && map.Chosen?.Elements.Any(e => e.Glass.Id == Glass.Glass.Id) != true;
    }

    private ImmutableArray<double> Line(ThinSolution solution) => [.. solution.Elements.SelectMany(e =>
    {
        (double x, double y) = Place(e);
        return new[] { x, y };
    })];

    /// <summary>Where a glass stands, rounded to a hundredth of a pixel at tenfold zoom.</summary>
    private (double X, double Y) Place(GlassIndices glass) => (
        Math.Round(glass.AbbeNumber, 4),
        Math.Round(_axes == MapAxes.Index ? glass.DesignIndex : glass.PartialDispersion, 6));
}
