using System.Collections.Immutable;

namespace GlassPair.Optics.Glasses;

/// <summary>Fits the power series by linear least squares.</summary>
internal static class PowerSeriesFitter
{
    /// <summary>The exponents in the order in which terms are added: 2 to −8 first, the Schott form, then the further ones of today's data sheets.</summary>
    private static readonly ImmutableArray<int> s_order = [-2, 2, -4, -6, -8, 4, -10, -12];

    public static int MaxTerms => s_order.Length;

    public static LeastSquaresFit Fit(MeasuredIndex[] points, int terms)
    {
        int[] exponents = [0, .. s_order.Take(terms)];
        double[] weights = [.. points.Select(p => 1.0 / (2.0 * p.Index))];
        double[] target = [.. points.Select((p, i) => p.Index * p.Index * weights[i])];
        var columns = new OrthogonalColumns(
            [.. exponents.Select(exponent => points.Select((p, i) => Math.Pow(p.Wavelength.Micrometers, exponent) * weights[i]).ToArray())]);
        double[] coefficients = columns.Solve(target);
        var formula = new PowerSeriesFormula(coefficients[0], exponents.Zip(coefficients).Skip(1).Select(t => new PowerTerm(t.First, t.Second)));
        return new LeastSquaresFit(formula, points, exponents.Length, columns);
    }
}
