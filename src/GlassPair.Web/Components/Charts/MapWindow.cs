namespace GlassPair.Web.Components.Charts;

/// <summary>The part of the glass map that is first seen. Abbe numbers fall to the right.</summary>
/// <param name="Left">The largest Abbe number.</param>
/// <param name="Right">The smallest Abbe number.</param>
/// <param name="Bottom">The lower end of the vertical axis.</param>
/// <param name="Top">The upper end of the vertical axis.</param>
internal sealed record MapWindow(double Left, double Right, double Bottom, double Top)
{
    private const double Margin = 0.09;
    private const double TooWide = 2.2;

    /// <summary>Frames points with a margin; null where there are none.</summary>
    public static MapWindow? Around(IReadOnlyCollection<(double X, double Y)> points)
    {
        if (points.Count == 0)
        {
            return null;
        }

        (double right, double left) = Widened(points.Min(p => p.X), points.Max(p => p.X), 4.0);
        (double bottom, double top) = Widened(points.Min(p => p.Y), points.Max(p => p.Y), 0.002);
        return new MapWindow(left, right, bottom, top);
    }

    /// <summary>Stays where it is while the new window lies inside and fills enough of it, so that typing does not make the map jump.</summary>
    public MapWindow MovedTo(MapWindow next) =>
        next.Left <= Left && next.Right >= Right && next.Bottom >= Bottom && next.Top <= Top
        && (Left - Right) <= TooWide * (next.Left - next.Right) && (Top - Bottom) <= TooWide * (next.Top - next.Bottom)
            ? this
            : next;

    private static (double Low, double High) Widened(double low, double high, double least)
    {
        double middle = 0.5 * (low + high);
        double half = 0.5 * Math.Max(high - low, least) * (1.0 + (2.0 * Margin));
        return (middle - half, middle + half);
    }
}
