using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Rankings;

/// <summary>Solves two glasses with every glass that follows them: the scalar form, and its vector twin for many third glasses at once.</summary>
/// <remarks>
/// Like <see cref="PairKernel"/> both round as the solver does, here <see cref="ThinTriplet"/> and the <see cref="ThinSolution"/> of the glasses in the
/// order of falling power, and past the limit on power only the powers are sure.
/// </remarks>
internal sealed class TripletKernel
{
    private readonly GlassColumns _glasses;

    // By sample, then glass: its deviation, and that less the first glass's of the row.
    private readonly double[] _deviations;
    private readonly double[] _differences;
    private readonly int _stride;

    // Of a difference with itself, and with the deviation of the first glass.
    private readonly double[] _squares;
    private readonly double[] _products;
    private int _first = -1;

    public TripletKernel(GlassColumns glasses)
    {
        _glasses = glasses;
        _stride = glasses.Abbe.Length;
        _deviations = [.. glasses.Deviations.SelectMany(d => d)];
        _differences = new double[_deviations.Length];
        _squares = new double[glasses.Abbe.Length];
        _products = new double[glasses.Abbe.Length];
    }

    /// <summary>Solves a row by the fastest form that this processor has.</summary>
    public void Fill(Row row, RowFigures figures)
    {
        if (Vector512.IsHardwareAccelerated)
        {
            FillVector<Lanes512>(row, figures);
        }
        else if (Vector256.IsHardwareAccelerated)
        {
            FillVector<Lanes256>(row, figures);
        }
        else
        {
            FillScalar(row, figures);
        }
    }

    /// <summary>Solves a row, a triplet at a time.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void FillScalar(Row row, RowFigures figures)
    {
        MoveTo(row.First);
        double focal = _glasses.Requirement.FocalLength;
        double[] weights = _glasses.Weights;
        Span<double> shifts = stackalloc double[weights.Length];
        Span<int> order = stackalloc int[3];
        Span<double> powers = stackalloc double[3];
        for (int third = row.Start; third < _glasses.Count; third++)
        {
            (double p2, double p3) = _glasses.Requirement.Balance == ColorBalance.EndsUnited ? ThreeUnited(row, third) : BandBalanced(row, third);
            double p1 = 1.0 - p2 - p3;
            bool isSolved = Math.Abs(p1) <= ThinSolution.LargestPower && Math.Abs(p2) <= ThinSolution.LargestPower && Math.Abs(p3) <= ThinSolution.LargestPower;
            (figures.Powers[0][third], figures.Powers[1][third], figures.Powers[2][third]) = isSolved ? (p1, p2, p3) : (double.NaN, double.NaN, double.NaN);
            if (!(isSolved && Math.Max(Math.Abs(p1), Math.Max(Math.Abs(p2), Math.Abs(p3))) <= _glasses.PowerLimit))
            {
                continue;
            }

            (powers[0], powers[1], powers[2]) = (p1, p2, p3);
            (order[0], order[1], order[2]) = (row.First, row.Second, third);
            Exchange(powers, order, 0);
            Exchange(powers, order, 1);
            Exchange(powers, order, 0);

            double mean = 0.0;
            double least = double.PositiveInfinity;
            double most = double.NegativeInfinity;
            for (int k = 0; k < weights.Length; k++)
            {
                double shift = Shift(powers, order, _glasses.Changes[k]);
                shifts[k] = shift;
                mean += weights[k] * shift;
                least = Math.Min(least, shift);
                most = Math.Max(most, shift);
            }

            double variance = 0.0;
            for (int k = 0; k < weights.Length; k++)
            {
                double off = shifts[k] - mean;
                variance += weights[k] * off * off;
            }

            double unknown = 0.0;
            for (int i = 0; i < powers.Length; i++)
            {
                unknown += powers[i] * powers[i] * _glasses.Floor[order[i]];
            }

            figures.Rms[third] = focal * Math.Sqrt(variance);
            figures.PeakToValley[third] = (focal * most) - (focal * least);
            figures.SecondarySpectrum[third] =
                -0.5 * ((focal * Shift(powers, order, _glasses.ShortChange)) + (focal * Shift(powers, order, _glasses.LongChange)));
            figures.ExpectedRms[third] = focal * Math.Sqrt(variance + unknown);
        }

        static void Exchange(Span<double> powers, Span<int> order, int i)
        {
            if (powers[i + 1] > powers[i])
            {
                (powers[i], powers[i + 1]) = (powers[i + 1], powers[i]);
                (order[i], order[i + 1]) = (order[i + 1], order[i]);
            }
        }

        static double Shift(ReadOnlySpan<double> powers, ReadOnlySpan<int> order, double[] changes)
        {
            double sum = 0.0;
            for (int i = 0; i < powers.Length; i++)
            {
                sum += powers[i] * changes[order[i]];
            }

            return -sum / (1.0 + sum);
        }
    }

    /// <summary>Vector twin of <see cref="FillScalar"/>: lane l holds third glass third + l.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void FillVector<T>(Row row, RowFigures figures)
        where T : unmanaged, ILanes<T>
    {
        MoveTo(row.First);
        double focal = _glasses.Requirement.FocalLength;
        bool threeUnited = _glasses.Requirement.Balance == ColorBalance.EndsUnited;
        T largest = T.All(ThinSolution.LargestPower);
        T powerLimit = T.All(_glasses.PowerLimit);
        T nan = T.All(double.NaN);
        double[] weights = _glasses.Weights;
        Span<T> shifts = stackalloc T[weights.Length];
        for (int third = row.Start; third < _glasses.Count; third += T.Count)
        {
            (T p2, T p3) = threeUnited ? ThreeUnited<T>(row, third) : BandBalanced<T>(row, third);
            T p1 = T.All(1.0) - p2 - p3;
            T solved = T.AtMost(T.Abs(p1), largest) & T.AtMost(T.Abs(p2), largest) & T.AtMost(T.Abs(p3), largest);
            (p1, p2, p3) = (T.Select(solved, p1, nan), T.Select(solved, p2, nan), T.Select(solved, p3, nan));
            p1.Store(figures.Powers[0], third);
            p2.Store(figures.Powers[1], third);
            p3.Store(figures.Powers[2], third);
            if (T.Bits(T.AtMost(T.Max(T.Abs(p1), T.Max(T.Abs(p2), T.Abs(p3))), powerLimit)) == 0)
            {
                continue;
            }

            Order<T> order = Order<T>.Falling(ref p1, ref p2, ref p3);
            T mean = T.All(0.0);
            T least = T.All(double.PositiveInfinity);
            T most = T.All(double.NegativeInfinity);
            for (int k = 0; k < shifts.Length; k++)
            {
                T shift = Shift(p1, p2, p3, order, row, third, _glasses.Changes[k]);
                shifts[k] = shift;
                mean += weights[k] * shift;
                least = T.Min(least, shift);
                most = T.Max(most, shift);
            }

            T variance = T.All(0.0);
            for (int k = 0; k < shifts.Length; k++)
            {
                T off = shifts[k] - mean;
                variance += weights[k] * off * off;
            }

            (T f1, T f2, T f3) = (T.All(_glasses.Floor[row.First]), T.All(_glasses.Floor[row.Second]), T.Load(_glasses.Floor, third));
            order.Apply(ref f1, ref f2, ref f3);
            T unknown = (p1 * p1 * f1) + (p2 * p2 * f2) + (p3 * p3 * f3);
            (focal * T.SquareRoot(variance)).Store(figures.Rms, third);
            ((focal * most) - (focal * least)).Store(figures.PeakToValley, third);
            (T shortShift, T longShift) = _glasses.EndsAreSamples
                ? (shifts[0], shifts[^1])
                : (Shift(p1, p2, p3, order, row, third, _glasses.ShortChange), Shift(p1, p2, p3, order, row, third, _glasses.LongChange));
            (-0.5 * ((focal * shortShift) + (focal * longShift))).Store(figures.SecondarySpectrum, third);
            (focal * T.SquareRoot(variance + unknown)).Store(figures.ExpectedRms, third);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        static T Shift(T p1, T p2, T p3, Order<T> order, Row row, int third, double[] changes)
        {
            (T t1, T t2, T t3) = (T.All(changes[row.First]), T.All(changes[row.Second]), T.Load(changes, third));
            order.Apply(ref t1, ref t2, ref t3);
            T sum = (p1 * t1) + (p2 * t2) + (p3 * t3);
            return -sum / (T.All(1.0) + sum);
        }
    }

    /// <summary>Takes the differences from another first glass.</summary>
    private void MoveTo(int first)
    {
        if (first == _first)
        {
            return;
        }

        _first = first;
        Array.Clear(_squares);
        Array.Clear(_products);
        for (int sample = 0; sample < _deviations.Length; sample += _stride)
        {
            double target = _deviations[sample + first];
            for (int j = first; j < _stride; j++)
            {
                double difference = _deviations[sample + j] - target;
                _differences[sample + j] = difference;
                _squares[j] += difference * difference;
                _products[j] += difference * target;
            }
        }
    }

    /// <summary>See <see cref="ThinTriplet"/>: least squares by orthogonalization.</summary>
    private (double Second, double Third) BandBalanced(Row row, int third)
    {
        double square = _squares[row.Second];
        double product = 0.0;
        for (int sample = 0; sample < _differences.Length; sample += _stride)
        {
            product += _differences[sample + row.Second] * _differences[sample + third];
        }

        double projection = product / square;
        double along = 0.0;
        double gap = 0.0;
        for (int sample = 0; sample < _differences.Length; sample += _stride)
        {
            double w = _differences[sample + third] - (projection * _differences[sample + row.Second]);
            along += w * _deviations[sample + row.First];
            gap += w * w;
        }

        double p3 = -along / gap;
        return (-(_products[row.Second] / square) - (p3 * projection), p3);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private (T Second, T Third) BandBalanced<T>(Row row, int third)
        where T : unmanaged, ILanes<T>
    {
        double[] differences = _differences;
        double[] deviations = _deviations;
        int stride = _stride;
        double square = _squares[row.Second];
        T product = T.All(0.0);
        for (int sample = 0; sample < differences.Length; sample += stride)
        {
            product += differences[sample + row.Second] * T.Load(differences, sample + third);
        }

        T projection = product / T.All(square);
        T along = T.All(0.0);
        T gap = T.All(0.0);
        for (int sample = 0; sample < differences.Length; sample += stride)
        {
            T w = T.Load(differences, sample + third) - (differences[sample + row.Second] * projection);
            along += deviations[sample + row.First] * w;
            gap += w * w;
        }

        T p3 = -along / gap;
        return (T.All(-(_products[row.Second] / square)) - (p3 * projection), p3);
    }

    /// <summary>See <see cref="ThinTriplet"/>: Cramer's rule on differences from the first glass.</summary>
    private (double Second, double Third) ThreeUnited(Row row, int third)
    {
        (double s1, double l1) = (_glasses.ShortChange[row.First], _glasses.LongChange[row.First]);
        (double s2, double l2) = (_glasses.ShortChange[row.Second] - s1, _glasses.LongChange[row.Second] - l1);
        (double s3, double l3) = (_glasses.ShortChange[third] - s1, _glasses.LongChange[third] - l1);
        double determinant = (s2 * l3) - (s3 * l2);
        return (((s3 * l1) - (l3 * s1)) / determinant, ((l2 * s1) - (s2 * l1)) / determinant);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private (T Second, T Third) ThreeUnited<T>(Row row, int third)
        where T : unmanaged, ILanes<T>
    {
        (double s1, double l1) = (_glasses.ShortChange[row.First], _glasses.LongChange[row.First]);
        (double s2, double l2) = (_glasses.ShortChange[row.Second] - s1, _glasses.LongChange[row.Second] - l1);
        (T s3, T l3) = (T.Load(_glasses.ShortChange, third) - T.All(s1), T.Load(_glasses.LongChange, third) - T.All(l1));
        T determinant = (s2 * l3) - (l2 * s3);
        return (((l1 * s3) - (s1 * l3)) / determinant, T.All((l2 * s1) - (s2 * l1)) / determinant);
    }

    /// <summary>Which of three were exchanged, lane by lane, to bring their powers into falling order.</summary>
    private readonly struct Order<T>(T firstTwo, T lastTwo, T firstTwoAgain)
        where T : unmanaged, ILanes<T>
    {
        /// <summary>Brings powers into falling order; equal ones stay as they are.</summary>
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public static Order<T> Falling(ref T p1, ref T p2, ref T p3)
        {
            T firstTwo = T.Exceeds(p2, p1);
            Exchange(firstTwo, ref p1, ref p2);
            T lastTwo = T.Exceeds(p3, p2);
            Exchange(lastTwo, ref p2, ref p3);
            T firstTwoAgain = T.Exceeds(p2, p1);
            Exchange(firstTwoAgain, ref p1, ref p2);
            return new Order<T>(firstTwo, lastTwo, firstTwoAgain);
        }

        /// <summary>Does to other values of the three what was done to their powers.</summary>
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public void Apply(ref T first, ref T second, ref T third)
        {
            Exchange(firstTwo, ref first, ref second);
            Exchange(lastTwo, ref second, ref third);
            Exchange(firstTwoAgain, ref first, ref second);
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        private static void Exchange(T mask, ref T left, ref T right) =>
            (left, right) = (T.Select(mask, right, left), T.Select(mask, left, right));
    }
}
