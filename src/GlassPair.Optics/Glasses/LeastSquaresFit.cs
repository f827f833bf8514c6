using MathNet.Numerics.Distributions;

namespace GlassPair.Optics.Glasses;

/// <summary>A formula of least squares, before anyone has judged it.</summary>
/// <remarks>
/// Least squares run on n² with the weight 1/(2 n) of each point, which to first order makes their residuals those of n.
/// </remarks>
internal sealed class LeastSquaresFit
{
    /// <summary>No index is measured better than this: smaller errors count as this.</summary>
    private const double FinestIndex = 1e-6;

    /// <summary>The share of sound tables in which chance alone may make a value stand out.</summary>
    private const double FalseAlarms = 1e-4;

    private readonly OrthogonalColumns _tangents;

    /// <param name="formula">The formula.</param>
    /// <param name="points">What it was fitted to.</param>
    /// <param name="parameters">The number of its coefficients.</param>
    /// <param name="tangents">The change of each index with each coefficient that was free at the end, a column each.</param>
    public LeastSquaresFit(DispersionFormula formula, MeasuredIndex[] points, int parameters, OrthogonalColumns tangents)
    {
        (Formula, Parameters, _tangents) = (formula, parameters, tangents);
        Residuals = [.. points.Select(p => p.Index - Math.Sqrt(formula.IndexSquaredAt(p.Wavelength.Micrometers)))];
    }

    public DispersionFormula Formula { get; }

    public int Parameters { get; }

    public double[] Residuals { get; }

    /// <summary>Schwarz's information criterion with the unbiased variance: the smaller of two is to be preferred. Source: [schwarz].</summary>
    public double Criterion
    {
        get
        {
            int points = Residuals.Length;
            double variance = (SumOfSquares / (points - Parameters)) + (FinestIndex * FinestIndex);
            return (points * Math.Log(variance)) + (Parameters * Math.Log(points));
        }
    }

    private int Freedom => Residuals.Length - Parameters - 1;

    private double SumOfSquares => Residuals.Sum(r => r * r);

    /// <summary>Finds the value that stands out most from what the others let expect; null where none does. Source: [studentized].</summary>
    public (int Position, double Ratio)? FindOutlier()
    {
        double[] ratios = [.. Enumerable.Range(0, Residuals.Length).Select(i => Ratio(SumWithout(i)))];
        int worst = Array.IndexOf(ratios, ratios.Max());
        return StandsOut(ratios[worst]) ? (worst, ratios[worst]) : null;
    }

    /// <summary>Finds the few values of which one must be the outlier if there is any: those of largest ratio and of largest residual.</summary>
    public IEnumerable<int> FindSuspects()
    {
        const int each = 2;
        int[] positions = [.. Enumerable.Range(0, Residuals.Length)];
        return positions.OrderBy(SumWithout).Take(each).Union(positions.OrderByDescending(i => Math.Abs(Residuals[i])).Take(each));
    }

    /// <summary>How many times the error to be expected a value is off, whose leaving out brought the squares down to those of another fit.</summary>
    public double RatioTo(LeastSquaresFit without) => Ratio(without.SumOfSquares);

    /// <summary>Tells whether chance makes a ratio like this less than once in 10,000 tables: Student's t, for the worst of all values.</summary>
    public bool StandsOut(double ratio) =>
        Freedom > 0 && 2.0 * Residuals.Length * StudentT.CDF(0.0, 1.0, Freedom, -ratio) < FalseAlarms;

    /// <summary>t² = (S − S₍ᵢ₎)(N − p − 1)/S₍ᵢ₎, S the sum of squares and S₍ᵢ₎ that without the value.</summary>
    private double Ratio(double sumWithout) =>
        Math.Sqrt(Math.Max(SumOfSquares - sumWithout, 0.0) / Math.Max(sumWithout / Math.Max(Freedom, 1), FinestIndex * FinestIndex));

    /// <summary>S₍ᵢ₎ = S − e²/(1 − h), with h the leverage of the point, as if the formula were linear in its coefficients.</summary>
    private double SumWithout(int i) => Math.Max(SumOfSquares - (Residuals[i] * Residuals[i] / Math.Max(1.0 - _tangents.LeverageOf(i), 1e-6)), 0.0);
}
