using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Rankings;

/// <summary>Solves one glass with every glass that follows it: the scalar form, and its vector twin for many partners at once.</summary>
/// <remarks>
/// Both do the arithmetic of <see cref="ThinPair"/> and <see cref="ThinSolution"/> operation by operation, without fused
/// multiply-adds, so that all three round alike: every processor gets the same bits, and no figure has to be computed again to rank.
/// Partners with which an element's power exceeds the requirement's limit get their powers; the other figures may be left as they are.
/// </remarks>
internal static class PairKernel
{
    /// <summary>Solves row <paramref name="front"/> by the fastest form that this processor has.</summary>
    public static void Fill(GlassColumns glasses, int front, RowFigures row)
    {
        if (Vector512.IsHardwareAccelerated)
        {
            FillVector<Lanes512>(glasses, front, row);
        }
        else if (Vector256.IsHardwareAccelerated)
        {
            FillVector<Lanes256>(glasses, front, row);
        }
        else
        {
            FillScalar(glasses, front, row);
        }
    }

    /// <summary>Solves a row, a pair at a time.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static void FillScalar(GlassColumns glasses, int front, RowFigures row)
    {
        double focal = glasses.Requirement.FocalLength;
        double space = glasses.Space;
        double[] weights = glasses.Weights;
        Span<double> shifts = stackalloc double[weights.Length];
        for (int rear = front + 1; rear < glasses.Count; rear++)
        {
            (double p1, double p2) = Powers(glasses, front, rear);
            (row.Powers[0][rear], row.Powers[1][rear]) = (p1, p2);
            if (Math.Max(Math.Abs(p1), Math.Abs(p2)) > glasses.PowerLimit)
            {
                continue;
            }

            double mean = 0.0;
            double least = double.PositiveInfinity;
            double most = double.NegativeInfinity;
            for (int k = 0; k < weights.Length; k++)
            {
                double shift = Shift(p1, p2, glasses.Changes[k][front], glasses.Changes[k][rear], space);
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

            double shortShift = focal * Shift(p1, p2, glasses.ShortChange[front], glasses.ShortChange[rear], space);
            double longShift = focal * Shift(p1, p2, glasses.LongChange[front], glasses.LongChange[rear], space);
            double height = 1.0 - (space * p1);
            double rearWeight = height * height * p2;
            double unknown = (p1 * p1 * glasses.Floor[front]) + (rearWeight * rearWeight * glasses.Floor[rear]);
            row.Rms[rear] = focal * Math.Sqrt(variance);
            row.PeakToValley[rear] = (focal * most) - (focal * least);
            row.SecondarySpectrum[rear] = -0.5 * (shortShift + longShift);
            row.ExpectedRms[rear] = focal * Math.Sqrt(variance + unknown);
        }
    }

    /// <summary>Vector twin of <see cref="FillScalar"/>: lane l holds partner rear + l.</summary>
    /// <remarks>Powers of the whole row first, then the rest: the processor overlaps more of the shorter loops.</remarks>
    public static void FillVector<T>(GlassColumns glasses, int front, RowFigures row)
        where T : unmanaged, ILanes<T>
    {
        FillPowers<T>(glasses, front, row);
        FillFigures<T>(glasses, front, row);
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void FillPowers<T>(GlassColumns glasses, int front, RowFigures row)
        where T : unmanaged, ILanes<T>
    {
        Span<double> deviations = stackalloc double[glasses.Weights.Length];
        for (int k = 0; k < deviations.Length; k++)
        {
            deviations[k] = glasses.Deviations[k][front];
        }

        (double[] frontPower, double[] rearPower) = (row.Powers[0], row.Powers[1]);
        for (int rear = front + 1; rear < glasses.Count; rear += T.Count)
        {
            (T p1, T p2) = Powers<T>(glasses, front, deviations, rear);
            p1.Store(frontPower, rear);
            p2.Store(rearPower, rear);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void FillFigures<T>(GlassColumns glasses, int front, RowFigures row)
        where T : unmanaged, ILanes<T>
    {
        T one = T.All(1.0);
        double focal = glasses.Requirement.FocalLength;
        double space = glasses.Space;
        T powerLimit = T.All(glasses.PowerLimit);
        double[] weights = glasses.Weights;
        double[][] columns = glasses.Changes;
        (double[] frontPower, double[] rearPower) = (row.Powers[0], row.Powers[1]);
        Span<T> shifts = stackalloc T[weights.Length];
        Span<double> frontChanges = stackalloc double[weights.Length];
        for (int k = 0; k < frontChanges.Length; k++)
        {
            frontChanges[k] = columns[k][front];
        }

        for (int rear = front + 1; rear < glasses.Count; rear += T.Count)
        {
            (T p1, T p2) = (T.Load(frontPower, rear), T.Load(rearPower, rear));
            if (T.Bits(T.AtMost(T.Max(T.Abs(p1), T.Abs(p2)), powerLimit)) == 0)
            {
                continue;
            }

            T mean = T.All(0.0);
            T least = T.All(double.PositiveInfinity);
            T most = T.All(double.NegativeInfinity);
            for (int k = 0; k < weights.Length; k++)
            {
                T shift = Shift(p1, p2, T.All(frontChanges[k]), T.Load(columns[k], rear), space);
                shifts[k] = shift;
                mean += weights[k] * shift;
                least = T.Min(least, shift);
                most = T.Max(most, shift);
            }

            T variance = T.All(0.0);
            for (int k = 0; k < weights.Length; k++)
            {
                T off = shifts[k] - mean;
                variance += weights[k] * off * off;
            }

            (T shortShift, T longShift) = glasses.EndsAreSamples
                ? (shifts[0], shifts[^1])
                : (Shift(p1, p2, T.All(glasses.ShortChange[front]), T.Load(glasses.ShortChange, rear), space),
                    Shift(p1, p2, T.All(glasses.LongChange[front]), T.Load(glasses.LongChange, rear), space));
            T height = one - (space * p1);
            T rearWeight = height * height * p2;
            T unknown = (p1 * p1 * T.All(glasses.Floor[front])) + (rearWeight * rearWeight * T.Load(glasses.Floor, rear));
            (focal * T.SquareRoot(variance)).Store(row.Rms, rear);
            ((focal * most) - (focal * least)).Store(row.PeakToValley, rear);
            (-0.5 * ((focal * shortShift) + (focal * longShift))).Store(row.SecondarySpectrum, rear);
            (focal * T.SquareRoot(variance + unknown)).Store(row.ExpectedRms, rear);
        }
    }

    /// <summary>Both powers as <see cref="PairRanking.Solve"/> finds them; NaN where it finds none.</summary>
    private static (double Front, double Rear) Powers(GlassColumns glasses, int front, int rear)
    {
        double space = glasses.Space;
        bool endsUnited = glasses.Requirement.Balance == ColorBalance.EndsUnited;
        double v1 = glasses.Abbe[front];
        double v2 = glasses.Abbe[rear];
        (double along, double gap) = endsUnited ? (v1, v1 - v2) : Balance(glasses, front, rear);
        if (space != 0.0)
        {
            double start = EndsUnited(v1, v2, space);
            double spaced = Checked(endsUnited ? start : AirSpacedBalance(along, gap, glasses.Variance[rear], space, start));
            return (spaced, (1.0 - spaced) / (1.0 - (space * spaced)));
        }

        double p1 = Checked(along / gap);
        double p2 = 1.0 - p1;
        if (p2 > p1)
        {
            p2 = Checked((endsUnited ? -v2 : Balance(glasses, rear, front).Along) / gap);
            p1 = 1.0 - p2;
        }

        return (p1, p2);

        static double Checked(double power) => Math.Abs(power) <= ThinSolution.LargestPower ? power : double.NaN;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static (T Front, T Rear) Powers<T>(GlassColumns glasses, int front, ReadOnlySpan<double> deviations, int rear)
        where T : unmanaged, ILanes<T>
    {
        T one = T.All(1.0);
        double space = glasses.Space;
        bool endsUnited = glasses.Requirement.Balance == ColorBalance.EndsUnited;
        T v1 = T.All(glasses.Abbe[front]);
        T v2 = T.Load(glasses.Abbe, rear);
        (T along, T gap) = endsUnited ? (v1, v1 - v2) : Balance<T>(glasses, deviations, rear);
        if (space != 0.0)
        {
            T start = EndsUnited(v1, v2, space);
            T spaced = Checked(endsUnited ? start : AirSpacedBalance(along, gap, T.Load(glasses.Variance, rear), space, start));
            return (spaced, (one - spaced) / (one - (space * spaced)));
        }

        T p1 = Checked(along / gap);
        T p2 = one - p1;
        T turned = T.Exceeds(p2, p1);
        if (T.Bits(turned) != 0)
        {
            T rearPower = Checked((endsUnited ? -v2 : AlongFront<T>(glasses, deviations, rear)) / gap);
            p2 = T.Select(turned, rearPower, p2);
            p1 = T.Select(turned, one - rearPower, p1);
        }

        return (p1, p2);

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        static T Checked(T power) => T.Select(T.AtMost(T.Abs(power), T.All(ThinSolution.LargestPower)), power, T.All(double.NaN));
    }

    /// <summary>See <see cref="FocalShift.Of"/>.</summary>
    private static double Shift(double p1, double p2, double t1, double t2, double space)
    {
        double front = p1 * t1;
        if (space == 0.0)
        {
            double sum = front + (p2 * t2);
            return -sum / (1.0 + sum);
        }

        double height = 1.0 - (space * p1);
        double s = front + (height * p2 * t2) - (space * front * p2 * (1.0 + t2));
        return -((space * front) + (height * s)) / (1.0 + s);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static T Shift<T>(T p1, T p2, T t1, T t2, double space)
        where T : unmanaged, ILanes<T>
    {
        T one = T.All(1.0);
        T front = p1 * t1;
        if (space == 0.0)
        {
            T sum = front + (p2 * t2);
            return -sum / (one + sum);
        }

        T height = one - (space * p1);
        T s = front + (height * p2 * t2) - (space * front * p2 * (one + t2));
        return -((space * front) + (height * s)) / (one + s);
    }

    /// <summary>c₂·(c₂ − c₁) and |c₂ − c₁|² of <see cref="ThinPair.BandBalanced"/>.</summary>
    private static (double Along, double Gap) Balance(GlassColumns glasses, int first, int second)
    {
        double along = 0.0;
        double gap = 0.0;
        foreach (double[] deviations in glasses.Deviations)
        {
            double difference = deviations[second] - deviations[first];
            along += deviations[second] * difference;
            gap += difference * difference;
        }

        return (along, gap);
    }

    /// <summary>The same, with the deviations c₁ of the first glass by sample.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static (T Along, T Gap) Balance<T>(GlassColumns glasses, ReadOnlySpan<double> first, int rear)
        where T : unmanaged, ILanes<T>
    {
        double[][] deviations = glasses.Deviations;
        T along = T.All(0.0);
        T gap = T.All(0.0);
        for (int k = 0; k < deviations.Length; k++)
        {
            T second = T.Load(deviations[k], rear);
            T difference = second - T.All(first[k]);
            along += second * difference;
            gap += difference * difference;
        }

        return (along, gap);
    }

    /// <summary>c₁·(c₁ − c₂): what <see cref="Balance{T}"/> gives first with the glasses the other way round.</summary>
    private static T AlongFront<T>(GlassColumns glasses, ReadOnlySpan<double> first, int rear)
        where T : unmanaged, ILanes<T>
    {
        T along = T.All(0.0);
        for (int k = 0; k < first.Length; k++)
        {
            along += first[k] * (T.All(first[k]) - T.Load(glasses.Deviations[k], rear));
        }

        return along;
    }

    /// <summary>See <see cref="ThinPair.EndsUnited"/>; NaN where it is null.</summary>
    private static double EndsUnited(double v1, double v2, double space) => ThinPair.EndsUnited(v1, v2, space) ?? double.NaN;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static T EndsUnited<T>(T v1, T v2, double space)
        where T : unmanaged, ILanes<T>
    {
        T b = T.All(1.0) - (v2 / v1) + T.All(space);
        T root = T.SquareRoot((b * b) - T.All(4.0 * space));
        return T.Select(T.AreEqual(b, T.All(0.0)), T.All(double.NaN), T.All(2.0) / (b + T.CopySign(root, b)));
    }

    /// <summary>See <see cref="ThinPair.AirSpacedBalance"/>; NaN where it is null.</summary>
    private static double AirSpacedBalance(double along, double gap, double rearVariance, double space, double start) =>
        ThinPair.AirSpacedBalance(along, gap, rearVariance, space, start) ?? double.NaN;

    private static T AirSpacedBalance<T>(T along, T gap, T rearVariance, double space, T start)
        where T : unmanaged, ILanes<T>
    {
        T p = start;
        T active = T.AreEqual(p, p);
        for (int step = 0; step < ThinPair.MostSteps && T.Bits(active) != 0; step++)
        {
            T a = T.All(1.0) - (space * p) + (space * p * p);
            T slope = (2.0 * space * p) - T.All(space);
            T gradient = (a * slope * rearVariance) - ((a + (p * slope)) * along) + (p * gap);
            T curvature = (((slope * slope) + (2.0 * space * a)) * rearVariance) - (((2.0 * slope) + (2.0 * space * p)) * along) + gap;
            T change = gradient / curvature;
            T next = p - change;
            T sound = T.Exceeds(curvature, T.All(0.0)) & T.AtMost(T.Abs(next), T.All(ThinSolution.LargestPower));
            p = T.Select(active, T.Select(sound, next, T.All(double.NaN)), p);
            active &= sound & T.Exceeds(T.Abs(change), ThinPair.SmallStep * T.Abs(p));
        }

        return p;
    }
}
