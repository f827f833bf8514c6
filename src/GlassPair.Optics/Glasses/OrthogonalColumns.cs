namespace GlassPair.Optics.Glasses;

/// <summary>The columns of a least-squares problem made orthonormal by modified Gram-Schmidt, each twice over. Source: [gram-schmidt].</summary>
/// <remarks>A column that depends on those before it, to rounding, takes no part: its coefficient is zero.</remarks>
internal sealed class OrthogonalColumns
{
    private const double Dependent = 1e-14;

    private readonly double[][] _basis;
    private readonly double[][] _triangle;

    /// <param name="columns">Columns of one length, each at least as long as there are columns.</param>
    public OrthogonalColumns(ReadOnlySpan<double[]> columns)
    {
        _basis = new double[columns.Length][];
        _triangle = new double[columns.Length][];
        for (int j = 0; j < columns.Length; j++)
        {
            double[] rest = [.. columns[j]];
            double[] shares = new double[j + 1];
            for (int pass = 0; pass < 2; pass++)
            {
                for (int k = 0; k < j; k++)
                {
                    shares[k] += Take(rest, _basis[k]);
                }
            }

            double length = Math.Sqrt(Dot(rest, rest));
            bool isNew = length > Dependent * Math.Sqrt(Dot(columns[j], columns[j]));
            shares[j] = isNew ? length : 0.0;
            for (int i = 0; i < rest.Length; i++)
            {
                rest[i] = isNew ? rest[i] / length : 0.0;
            }

            (_basis[j], _triangle[j]) = (rest, shares);
        }
    }

    /// <summary>Gets the coefficients of the columns whose sum comes nearest to a target.</summary>
    public double[] Solve(double[] target)
    {
        double[] rest = [.. target];
        double[] coefficients = [.. _basis.Select(column => Take(rest, column))];
        for (int j = coefficients.Length - 1; j >= 0; j--)
        {
            coefficients[j] = _triangle[j][j] == 0.0 ? 0.0 : coefficients[j] / _triangle[j][j];
            for (int k = 0; k < j; k++)
            {
                coefficients[k] -= coefficients[j] * _triangle[j][k];
            }
        }

        return coefficients;
    }

    /// <summary>Takes from a vector what the columns can make of it.</summary>
    public void RemoveFrom(double[] vector)
    {
        foreach (double[] column in _basis)
        {
            Take(vector, column);
        }
    }

    /// <summary>Gets the leverage of a row: how much of its own value the fit returns, from 0 to 1.</summary>
    public double LeverageOf(int row) => _basis.Sum(column => column[row] * column[row]);

    private static double Take(double[] vector, double[] column)
    {
        double share = Dot(vector, column);
        for (int i = 0; i < vector.Length; i++)
        {
            vector[i] -= share * column[i];
        }

        return share;
    }

    private static double Dot(double[] left, double[] right)
    {
        double sum = 0.0;
        for (int i = 0; i < left.Length; i++)
        {
            sum += left[i] * right[i];
        }

        return sum;
    }
}
