using System.Globalization;
using GlassPair.Optics.Glasses;

namespace GlassPair.Catalogue;

/// <summary>
/// The line P = a + b v_d from which a maker counts its stated ΔP_g,F. Makers do not state their lines, but each value
/// gives a point of it, so that the line is found from all of them and a misprint stands out.
/// </summary>
internal static class MakerNormalLine
{
    private const int FewestGlasses = 10;
    private const double GrossDifference = 0.003;
    private const int MostRounds = 20;

    /// <summary>Gets a remark on each glass whose stated ΔP_g,F is grossly off its maker's line.</summary>
    public static IEnumerable<GlassRemark> RemarksOn(IEnumerable<Glass> glasses) => glasses.GroupBy(g => g.Maker).SelectMany(RemarksOnMaker);

    private static IEnumerable<GlassRemark> RemarksOnMaker(IEnumerable<Glass> glasses)
    {
        List<(Glass Glass, double Abbe, double Partial, double Stated)> points = [];
        foreach (Glass glass in glasses)
        {
            if (glass.Stated.DeltaPgF is { } stated && AbbeNumber.TryD(glass) is { } abbe && PartialDispersion.TryGF(glass) is { } partial)
            {
                points.Add((glass, abbe, partial, stated));
            }
        }

        if (points.Count < FewestGlasses)
        {
            yield break;
        }

        (double constant, double slope) = LineThrough([.. points.Select(p => (p.Abbe, p.Partial - p.Stated))]);
        foreach ((Glass glass, double abbe, double partial, double stated) in points)
        {
            double computed = partial - constant - (slope * abbe);
            if (Math.Abs(stated - computed) > GrossDifference)
            {
                yield return new GlassRemark(glass.Id, string.Create(
                    CultureInfo.InvariantCulture, $"The maker states ΔP_g,F {stated}; from the normal line of its other glasses the formula gives {computed:0.0000}."));
            }
        }
    }

    /// <summary>The least-squares line through the points that lie within five median distances of it.</summary>
    private static (double Constant, double Slope) LineThrough((double X, double Y)[] points)
    {
        // The median of the points is a line that no few misprints can move.
        (double constant, double slope) = (Median(points.Select(p => p.Y)), 0.0);
        for (int i = 0; i < MostRounds; i++)
        {
            double[] distances = [.. points.Select(p => Math.Abs(p.Y - constant - (slope * p.X)))];
            double limit = Math.Max(5.0 * Median(distances), 1e-6);
            (double X, double Y)[] near = [.. points.Where((_, at) => distances[at] <= limit)];
            (double meanX, double meanY) = (near.Average(p => p.X), near.Average(p => p.Y));
            double spread = near.Sum(p => (p.X - meanX) * (p.X - meanX));
            slope = spread > 0.0 ? near.Sum(p => (p.X - meanX) * (p.Y - meanY)) / spread : 0.0;
            constant = meanY - (slope * meanX);
        }

        return (constant, slope);
    }

    private static double Median(IEnumerable<double> values)
    {
        double[] sorted = [.. values.Order()];
        return sorted[sorted.Length / 2];
    }
}
