using System.Collections.Immutable;
using System.Text.Json.Serialization;

namespace GlassPair.Web.Components.Charts;

/// <summary>What a <see cref="PlotChart"/> shows. Immutable; a part that stays the same object from one figure to the next is not sent again.</summary>
/// <remarks>
/// Data that seldom change stand in <see cref="Traces"/>. What follows every keystroke stands in <see cref="Paths"/>, <see cref="Disks"/>,
/// <see cref="Guides"/> and <see cref="Labels"/>, which are redrawn without touching the traces. Colors are custom properties of
/// <c>tokens.css</c>, such as <c>--ink</c>, so that one figure serves the light and the dark scheme.
/// </remarks>
public sealed record PlotFigure
{
    /// <summary>Gets the horizontal axis.</summary>
    public required PlotAxis X { get; init; }

    /// <summary>Gets the vertical axis.</summary>
    public required PlotAxis Y { get; init; }

    /// <summary>Gets the name of what the axes show. A zoom of the user lasts until it changes.</summary>
    public string View { get; init; } = "";

    /// <summary>Gets the data, drawn in order.</summary>
    public ImmutableArray<PlotTrace> Traces { get; init; } = [];

    /// <summary>Gets the lines and areas drawn over the data, or behind them.</summary>
    public ImmutableArray<PlotPath> Paths { get; init; } = [];

    /// <summary>Gets the disks and rings drawn over the paths.</summary>
    public ImmutableArray<PlotDisk> Disks { get; init; } = [];

    /// <summary>Gets the vertical lines from edge to edge.</summary>
    public ImmutableArray<PlotGuide> Guides { get; init; } = [];

    /// <summary>Gets the labels, the most important first; each is put where it covers least, and left out where its anchor is not in view.</summary>
    public ImmutableArray<PlotLabel> Labels { get; init; } = [];

    /// <summary>Gets the lines of a note in the emptiest corner.</summary>
    public ImmutableArray<string> Note { get; init; } = [];
}

/// <summary>An axis and the part of it that is first seen.</summary>
/// <param name="Title">The quantity with its unit; may hold &lt;sub&gt; and &lt;sup&gt;.</param>
/// <param name="From">The value at the left or lower end.</param>
/// <param name="To">The value at the right or upper end; less than <paramref name="From"/> on an axis that falls.</param>
/// <param name="Format">How its numbers are written, in the notation of d3-format.</param>
public sealed record PlotAxis(string Title, double From, double To, string Format = "");

/// <summary>The mark of a point.</summary>
[JsonConverter(typeof(JsonStringEnumConverter<PlotMark>))]
public enum PlotMark
{
    /// <summary>No mark.</summary>
    None,

    /// <summary>A filled disk.</summary>
    Disk,

    /// <summary>An open ring.</summary>
    Ring,

    /// <summary>A cross.</summary>
    Cross,
}

/// <summary>Points, or a line through them, or both.</summary>
/// <param name="X">Where each point stands on the horizontal axis.</param>
/// <param name="Y">Where each point stands on the vertical axis.</param>
public sealed record PlotTrace(ImmutableArray<double> X, ImmutableArray<double> Y)
{
    /// <summary>Gets the color of line and marks.</summary>
    public string Color { get; init; } = "--ink";

    /// <summary>Gets the mark of each point.</summary>
    public PlotMark Mark { get; init; }

    /// <summary>Gets the diameter of the marks, pixels.</summary>
    public double Size { get; init; } = 6.0;

    /// <summary>Gets the width of the line, pixels; 0 draws none.</summary>
    public double Width { get; init; }

    /// <summary>Gets the dashes of the line, such as <c>6px,3px</c>; empty where it is solid.</summary>
    public string Dash { get; init; } = "";

    /// <summary>Gets what is said of each point when it is pointed at; empty says nothing.</summary>
    public ImmutableArray<string> Tips { get; init; } = [];

    /// <summary>Gets whether its points can be picked.</summary>
    public bool IsPickable { get; init; }
}

/// <summary>Lines of one style.</summary>
/// <param name="Lines">The corners of each line, x and y in turn.</param>
public sealed record PlotPath(ImmutableArray<ImmutableArray<double>> Lines)
{
    /// <summary>Gets the color.</summary>
    public string Color { get; init; } = "--ink";

    /// <summary>Gets the width, pixels; 0 draws no line.</summary>
    public double Width { get; init; } = 1.0;

    /// <summary>Gets the dashes, such as <c>6px,3px</c>; empty where the line is solid.</summary>
    public string Dash { get; init; } = "";

    /// <summary>Gets the opacity, 0 to 1.</summary>
    public double Opacity { get; init; } = 1.0;

    /// <summary>Gets the color of the area inside each line; null leaves it empty.</summary>
    public string? Fill { get; init; }

    /// <summary>Gets whether it is drawn behind the data.</summary>
    public bool IsBehind { get; init; }

    /// <summary>Gets whether labels keep clear of it.</summary>
    public bool RepelsLabels { get; init; }

    /// <summary>Gets the number under which each line is picked; empty where they cannot be.</summary>
    public ImmutableArray<int> Picks { get; init; } = [];
}

/// <summary>A disk of fixed size on the screen.</summary>
/// <param name="X">Its center on the horizontal axis.</param>
/// <param name="Y">Its center on the vertical axis.</param>
/// <param name="Radius">Its radius, pixels.</param>
/// <param name="Fill">The color inside.</param>
/// <param name="Color">The color of its edge.</param>
/// <param name="Width">The width of its edge, pixels.</param>
public sealed record PlotDisk(double X, double Y, double Radius, string Fill, string Color, double Width = 1.5);

/// <summary>A vertical line from edge to edge.</summary>
/// <param name="X">Where it stands.</param>
/// <param name="Text">What is written at its upper end.</param>
/// <param name="Dash">Its dashes.</param>
public sealed record PlotGuide(double X, string Text, string Dash = "1.5px,2.5px");

/// <summary>A label beside a point or along a line.</summary>
/// <param name="X">Its anchor on the horizontal axis.</param>
/// <param name="Y">Its anchor on the vertical axis.</param>
/// <param name="Title">The first line.</param>
public sealed record PlotLabel(double X, double Y, string Title)
{
    /// <summary>Gets the other end of the line that the label belongs to; null where it belongs to a point.</summary>
    public double? ToX { get; init; }

    /// <summary>Gets the other end of the line that the label belongs to; null where it belongs to a point.</summary>
    public double? ToY { get; init; }

    /// <summary>Gets the further lines.</summary>
    public ImmutableArray<string> Notes { get; init; } = [];

    /// <summary>Gets the color of the first line.</summary>
    public string Color { get; init; } = "--ink";

    /// <summary>Gets whether the first line is bold.</summary>
    public bool IsBold { get; init; }
}

/// <summary>What was picked or pointed at in a chart.</summary>
/// <param name="Kind">A point of a trace, or a line of a path.</param>
/// <param name="Index">The place of the point in its trace, or the number under which the line is picked.</param>
public sealed record PlotPick(PlotPickKind Kind, int Index);

/// <summary>The kinds of things that can be picked.</summary>
public enum PlotPickKind
{
    /// <summary>A point of the trace with <see cref="PlotTrace.IsPickable"/>.</summary>
    Point,

    /// <summary>A line of a path with <see cref="PlotPath.Picks"/>.</summary>
    Line,
}
