using System.Collections.Immutable;

namespace GlassPair.Optics.Glasses;

/// <summary>Fits the Sellmeier formula by variable projection: B by linear least squares inside, C by Levenberg-Marquardt outside. Source: [variable-projection].</summary>
/// <remarks>
/// Terms enter one by one, each starting from the best of those before it, so that a further term never makes the fit worse. With x = λ² and σ the logistic
/// function of a free variable, C = x_min σ below the table and 1/C = 1/x_far + σ (1/x_max − 1/x_far) above it, so no pole comes between the points.
/// An infrared term is written b x/(1 − x/C), with b = −B/C, which has a limit where C is far away.
/// </remarks>
internal sealed class SellmeierFitter
{
    /// <summary>C of an infrared resonance as far as glass has one, μm²; for tables past it, 100 times the square of their longest wavelength.</summary>
    private const double FarResonance = 1e4;

    /// <summary>A share this small is at its bound, and its variable no longer free.</summary>
    private const double BoundShare = 1e-4;

    /// <summary>The free variables stay within ±this: shares within 1e-5 of their ends.</summary>
    private const double MostFree = 11.5;

    /// <summary>Where each further term enters: below the table with a resonance at a share of x_min, or above it.</summary>
    private static readonly ImmutableArray<(bool IsInfrared, double Share)> s_entries =
        [(false, 0.1), (true, 0.05), (false, 0.3), (false, 0.5), (true, 0.2), (false, 0.7)];

    private readonly double[] _squares;
    private readonly double[] _weights;
    private readonly double[] _target;
    private readonly double _far;
    private readonly double _span;

    private SellmeierFitter(MeasuredIndex[] points)
    {
        _squares = [.. points.Select(p => p.Wavelength.Micrometers * p.Wavelength.Micrometers)];
        _weights = [.. points.Select(p => 1.0 / (2.0 * p.Index))];
        _target = [.. points.Select((p, i) => ((p.Index * p.Index) - 1.0) * _weights[i])];
        _far = 1.0 / Math.Max(FarResonance, 100.0 * _squares[^1]);
        _span = (1.0 / _squares[^1]) - _far;
    }

    public static LeastSquaresFit Fit(MeasuredIndex[] points, int terms)
    {
        var fitter = new SellmeierFitter(points);
        State best = fitter.Minimize([Logit(s_entries[0].Share)]);
        for (int j = 1; j < terms; j++)
        {
            best = fitter.Minimize([.. best.Free, Logit(s_entries[j].Share)]);
        }

        var formula = new SellmeierFormula(Enumerable.Range(0, terms).Select(j => fitter.Term(j, best.Free[j], best.Strengths[j])).OrderBy(t => t.ResonanceSquared));
        IEnumerable<double[]> free = best.Slopes.Where((_, j) => Logistic(best.Free[j]) > BoundShare);
        return new LeastSquaresFit(formula, points, 2 * terms, new OrthogonalColumns([.. best.Columns, .. free]));
    }

    private static double Logistic(double free) => 1.0 / (1.0 + Math.Exp(-free));

    private static double Logit(double share) => Math.Log(share / (1.0 - share));

    private SellmeierTerm Term(int j, double free, double strength)
    {
        double share = Logistic(free);
        double resonance = s_entries[j].IsInfrared ? 1.0 / (_far + (share * _span)) : _squares[0] * share;
        return new SellmeierTerm(s_entries[j].IsInfrared ? -strength * resonance : strength, resonance);
    }

    /// <summary>Levenberg-Marquardt with Nielsen's damping. Source: [damping].</summary>
    private State Minimize(double[] start)
    {
        const int mostSteps = 300;
        const double flat = 1e-8;
        const double still = 1e-10;
        State state = At(start);
        double damping = 1e-3;
        double growth = 2.0;
        for (int i = 0; i < mostSteps && state.Slope > flat; i++)
        {
            double[] step = StepFrom(state, damping);
            State next = At([.. state.Free.Zip(step, (u, s) => Math.Clamp(u + s, -MostFree, MostFree))]);
            double gain = state.Sum - next.Sum;
            if (gain > 0.0)
            {
                double promised = state.Sum - PromisedSum(state, step);
                damping *= Math.Max(1.0 / 3.0, 1.0 - Math.Pow((2.0 * gain / promised) - 1.0, 3.0));
                growth = 2.0;
                state = next;
            }
            else if (step.All(s => Math.Abs(s) < still))
            {
                break;
            }
            else
            {
                damping *= growth;
                growth *= 2.0;
            }
        }

        return state;
    }

    /// <summary>The step of least |r − J s|² + damping Σ (‖Jⱼ‖ sⱼ)²: least squares with a row more for each variable.</summary>
    private static double[] StepFrom(State state, double damping)
    {
        int points = state.Rest.Length;
        int terms = state.Free.Length;
        double[][] columns = new double[terms][];
        for (int j = 0; j < terms; j++)
        {
            columns[j] = new double[points + terms];
            state.Jacobian[j].CopyTo(columns[j], 0);
            columns[j][points + j] = Math.Sqrt(damping * state.Jacobian[j].Sum(v => v * v));
        }

        double[] target = new double[points + terms];
        state.Rest.CopyTo(target, 0);
        return new OrthogonalColumns(columns).Solve(target);
    }

    private static double PromisedSum(State state, double[] step) =>
        state.Rest.Select((rest, i) => rest - step.Select((s, j) => s * state.Jacobian[j][i]).Sum()).Sum(r => r * r);

    /// <summary>Finds the best B for the C of the free variables, what is left, and (1 − Q Qᵀ) ∂Φ b: the part of each slope that no change of B takes up.</summary>
    private State At(double[] free)
    {
        double[][] columns = new double[free.Length][];
        double[][] slopes = new double[free.Length][];
        for (int j = 0; j < free.Length; j++)
        {
            (columns[j], slopes[j]) = (new double[_squares.Length], new double[_squares.Length]);
            double share = Logistic(free[j]);
            double resonance = _squares[0] * share;
            double rate = _span * share * (1.0 - share);
            for (int i = 0; i < _squares.Length; i++)
            {
                double x = _squares[i];
                double room = s_entries[j].IsInfrared ? 1.0 - (x * (_far + (share * _span))) : x - resonance;
                columns[j][i] = _weights[i] * x / room;
                slopes[j][i] = columns[j][i] / room * (s_entries[j].IsInfrared ? x * rate : resonance * (1.0 - share));
            }
        }

        var basis = new OrthogonalColumns(columns);
        double[] strengths = basis.Solve(_target);
        double[] rest = [.. _target];
        basis.RemoveFrom(rest);
        double[][] jacobian = [.. slopes.Select((slope, j) => slope.Select(s => s * strengths[j]).ToArray())];
        foreach (double[] column in jacobian)
        {
            basis.RemoveFrom(column);
        }

        return new State(free, columns, slopes, strengths, rest, jacobian);
    }

    private sealed record State(double[] Free, double[][] Columns, double[][] Slopes, double[] Strengths, double[] Rest, double[][] Jacobian)
    {
        public double Sum { get; } = Rest.Sum(r => r * r);

        /// <summary>Gets the largest cosine between what is left and a change of it: zero at the minimum.</summary>
        public double Slope { get; } = Jacobian.Max(column =>
            Math.Abs(column.Zip(Rest, (c, r) => c * r).Sum()) / Math.Sqrt(column.Sum(c => c * c) * Rest.Sum(r => r * r)));
    }
}
