using System.Numerics;
using System.Runtime.CompilerServices;
using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Rankings;

/// <summary>Solves one glass with every glass that follows it: the scalar form, and its vector twin for many partners at once.</summary>
/// <remarks>
/// Both do the arithmetic of <see cref="ThinPair"/> and <see cref="ThinSolution"/> operation by operation, without fused
/// multiply-adds, so that all three round alike: every processor gets the same bits, and no figure has to be computed again to rank.
/// </remarks>
internal static class PairKernel
{
    // Newton's method of ThinPair gives up after as many.
    private const int MostSteps = 60;

    /// <summary>Solves row <paramref name="front"/> by the fastest form that this processor has.</summary>
    public static void Fill(PairColumns glasses, int front, PairFigures row)
    {
        if (Vector.IsHardwareAccelerated)
        {
            FillVector(glasses, front, row);
        }
        else
        {
            FillScalar(glasses, front, row);
        }
    }

    /// <summary>Solves row <paramref name="front"/>, a pair at a time.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static void FillScalar(PairColumns glasses, int front, PairFigures row)
    {
        double focal = glasses.Requirement.FocalLength;
        double space = glasses.Space;
        double[] weights = glasses.Weights;
        Span<double> shifts = stackalloc double[weights.Length];
        for (int rear = front + 1; rear < glasses.Count; rear++)
        {
            (double p1, double p2) = Powers(glasses, front, rear);
            (row.FrontPower[rear], row.RearPower[rear]) = (p1, p2);

            double mean = 0.0;
            double least = double.PositiveInfinity;
            double most = double.NegativeInfinity;
            for (int k = 0; k < weights.Length; k++)
            {
                double shift = focal * Shift(p1, p2, glasses.Changes[k][front], glasses.Changes[k][rear], space);
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

            double rms = Math.Sqrt(variance);
            double shortShift = focal * Shift(p1, p2, glasses.ShortChange[front], glasses.ShortChange[rear], space);
            double longShift = focal * Shift(p1, p2, glasses.LongChange[front], glasses.LongChange[rear], space);
            double height = 1.0 - (space * p1);
            double rearWeight = height * height * p2;
            double floor = focal * Math.Sqrt((p1 * p1 * glasses.Floor[front]) + (rearWeight * rearWeight * glasses.Floor[rear]));
            row.Rms[rear] = rms;
            row.PeakToValley[rear] = most - least;
            row.SecondarySpectrum[rear] = -0.5 * (shortShift + longShift);
            row.ExpectedRms[rear] = Math.Sqrt((rms * rms) + (floor * floor));
        }
    }

    /// <summary>Vector twin of <see cref="FillScalar"/>: lane l holds partner rear + l.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static void FillVector(PairColumns glasses, int front, PairFigures row)
    {
        var focal = new Vector<double>(glasses.Requirement.FocalLength);
        double space = glasses.Space;
        double[] weights = glasses.Weights;
        Span<Vector<double>> shifts = stackalloc Vector<double>[weights.Length];
        for (int rear = front + 1; rear < glasses.Count; rear += Vector<double>.Count)
        {
            (Vector<double> p1, Vector<double> p2) = PowersVector(glasses, front, rear);
            p1.CopyTo(row.FrontPower, rear);
            p2.CopyTo(row.RearPower, rear);

            Vector<double> mean = Vector<double>.Zero;
            var least = new Vector<double>(double.PositiveInfinity);
            var most = new Vector<double>(double.NegativeInfinity);
            for (int k = 0; k < shifts.Length; k++)
            {
                double[] changes = glasses.Changes[k];
                Vector<double> shift = focal * ShiftVector(p1, p2, changes[front], new Vector<double>(changes, rear), space);
                shifts[k] = shift;
                mean += weights[k] * shift;
                least = Vector.MinNative(least, shift);
                most = Vector.MaxNative(most, shift);
            }

            Vector<double> variance = Vector<double>.Zero;
            for (int k = 0; k < shifts.Length; k++)
            {
                Vector<double> off = shifts[k] - mean;
                variance += weights[k] * off * off;
            }

            Vector<double> rms = Vector.SquareRoot(variance);
            Vector<double> shortShift = focal * ShiftVector(p1, p2, glasses.ShortChange[front], new Vector<double>(glasses.ShortChange, rear), space);
            Vector<double> longShift = focal * ShiftVector(p1, p2, glasses.LongChange[front], new Vector<double>(glasses.LongChange, rear), space);
            Vector<double> height = Vector<double>.One - (space * p1);
            Vector<double> rearWeight = height * height * p2;
            Vector<double> floor = focal * Vector.SquareRoot((p1 * p1 * glasses.Floor[front]) + (rearWeight * rearWeight * new Vector<double>(glasses.Floor, rear)));
            rms.CopyTo(row.Rms, rear);
            (most - least).CopyTo(row.PeakToValley, rear);
            (-0.5 * (shortShift + longShift)).CopyTo(row.SecondarySpectrum, rear);
            Vector.SquareRoot((rms * rms) + (floor * floor)).CopyTo(row.ExpectedRms, rear);
        }
    }

    /// <summary>Both powers as <see cref="ThinPair.Solve"/> finds them; NaN where it finds none.</summary>
    /// <remarks>In contact the glass of more power counts as the front one, as in a shortlist; that changes the rounding only.</remarks>
    private static (double Front, double Rear) Powers(PairColumns glasses, int front, int rear)
    {
        double space = glasses.Space;
        bool endsUnited = glasses.Requirement.Balance == ColorBalance.EndsUnited;
        double v1 = glasses.Abbe[front];
        double v2 = glasses.Abbe[rear];
        if (space != 0.0)
        {
            double start = EndsUnited(v1, v2, space);
            double spaced = Checked(endsUnited ? start : AirSpacedBalance(glasses, front, rear, start));
            return (spaced, (1.0 - spaced) / (1.0 - (space * spaced)));
        }

        double p1 = Checked(endsUnited ? v1 / (v1 - v2) : ContactBalance(glasses, front, rear));
        double p2 = 1.0 - p1;
        if (p2 > p1)
        {
            p2 = Checked(endsUnited ? v2 / (v2 - v1) : ContactBalance(glasses, rear, front));
            p1 = 1.0 - p2;
        }

        return (p1, p2);

        static double Checked(double power) => Math.Abs(power) <= ThinSolution.LargestPower ? power : double.NaN;
    }

    private static (Vector<double> Front, Vector<double> Rear) PowersVector(PairColumns glasses, int front, int rear)
    {
        double space = glasses.Space;
        bool endsUnited = glasses.Requirement.Balance == ColorBalance.EndsUnited;
        var v1 = new Vector<double>(glasses.Abbe[front]);
        var v2 = new Vector<double>(glasses.Abbe, rear);
        if (space != 0.0)
        {
            Vector<double> start = EndsUnitedVector(v1, v2, space);
            Vector<double> spaced = Checked(endsUnited ? start : AirSpacedBalanceVector(glasses, front, rear, start));
            return (spaced, (Vector<double>.One - spaced) / (Vector<double>.One - (space * spaced)));
        }

        (Vector<double> alongRear, Vector<double> alongFront, Vector<double> gap) = endsUnited
            ? (v1, -v2, v1 - v2)
            : ContactBalanceVector(glasses, front, rear);
        Vector<double> p1 = Checked(alongRear / gap);
        Vector<double> p2 = Vector<double>.One - p1;
        Vector<long> turned = Vector.GreaterThan(p2, p1);
        if (turned != Vector<long>.Zero)
        {
            Vector<double> turnedPower = Checked(alongFront / gap);
            p2 = Vector.ConditionalSelect(turned, turnedPower, p2);
            p1 = Vector.ConditionalSelect(turned, Vector<double>.One - turnedPower, p1);
        }

        return (p1, p2);

        static Vector<double> Checked(Vector<double> power) =>
            Vector.ConditionalSelect(Vector.LessThanOrEqual(Vector.Abs(power), new Vector<double>(ThinSolution.LargestPower)), power, NotANumber);
    }

    private static Vector<double> NotANumber => new(double.NaN);

    /// <summary>−s/(1 + s), see <see cref="FocalShift"/>.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
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
    private static Vector<double> ShiftVector(Vector<double> p1, Vector<double> p2, double t1, Vector<double> t2, double space)
    {
        Vector<double> front = p1 * t1;
        if (space == 0.0)
        {
            Vector<double> sum = front + (p2 * t2);
            return -sum / (Vector<double>.One + sum);
        }

        Vector<double> height = Vector<double>.One - (space * p1);
        Vector<double> s = front + (height * p2 * t2) - (space * front * p2 * (Vector<double>.One + t2));
        return -((space * front) + (height * s)) / (Vector<double>.One + s);
    }

    /// <summary>p₁ of least variance in contact, c₂·(c₂ − c₁)/|c₂ − c₁|².</summary>
    private static double ContactBalance(PairColumns glasses, int first, int second)
    {
        double along = 0.0;
        double gap = 0.0;
        for (int k = 0; k < glasses.Weights.Length; k++)
        {
            double weight = glasses.Weights[k];
            double c2 = glasses.Changes[k][second] - glasses.Mean[second];
            double difference = c2 - (glasses.Changes[k][first] - glasses.Mean[first]);
            along += weight * c2 * difference;
            gap += weight * difference * difference;
        }

        return along / gap;
    }

    /// <summary>The parts of <see cref="ContactBalance"/>, with the glass of the row first and with it second.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static (Vector<double> AlongRear, Vector<double> AlongFront, Vector<double> Gap) ContactBalanceVector(PairColumns glasses, int front, int rear)
    {
        double[] weights = glasses.Weights;
        double mean1 = glasses.Mean[front];
        var mean2 = new Vector<double>(glasses.Mean, rear);
        Vector<double> alongRear = Vector<double>.Zero;
        Vector<double> alongFront = Vector<double>.Zero;
        Vector<double> gap = Vector<double>.Zero;
        for (int k = 0; k < weights.Length; k++)
        {
            double[] changes = glasses.Changes[k];
            double c1 = changes[front] - mean1;
            Vector<double> c2 = new Vector<double>(changes, rear) - mean2;
            Vector<double> difference = c2 - new Vector<double>(c1);
            alongRear += weights[k] * c2 * difference;
            alongFront -= weights[k] * c1 * difference;
            gap += weights[k] * difference * difference;
        }

        return (alongRear, alongFront, gap);
    }

    /// <summary>See <see cref="ThinPair.EndsUnited"/>; NaN where it is null.</summary>
    private static double EndsUnited(double v1, double v2, double space)
    {
        double b = 1.0 - (v2 / v1) + space;
        return b == 0.0 ? double.NaN : 2.0 / (b + Math.CopySign(Math.Sqrt((b * b) - (4.0 * space)), b));
    }

    private static Vector<double> EndsUnitedVector(Vector<double> v1, Vector<double> v2, double space)
    {
        Vector<double> b = Vector<double>.One - (v2 / v1) + new Vector<double>(space);
        Vector<double> root = Vector.SquareRoot((b * b) - new Vector<double>(4.0 * space));
        return Vector.ConditionalSelect(Vector.Equals(b, Vector<double>.Zero), NotANumber, new Vector<double>(2.0) / (b + Vector.CopySign(root, b)));
    }

    /// <summary>Newton's method of <see cref="ThinPair"/> from the ends united; NaN where it is null.</summary>
    private static double AirSpacedBalance(PairColumns glasses, int front, int rear, double start)
    {
        double space = glasses.Space;
        double g11 = glasses.Variance[front];
        double g22 = glasses.Variance[rear];
        double g12 = 0.0;
        for (int k = 0; k < glasses.Weights.Length; k++)
        {
            g12 += glasses.Weights[k] * (glasses.Changes[k][front] - glasses.Mean[front]) * (glasses.Changes[k][rear] - glasses.Mean[rear]);
        }

        double p = start;
        for (int step = 0; step < MostSteps; step++)
        {
            double h = (1.0 - (space * p)) * (1.0 - p);
            double slope = (2.0 * space * p) - 1.0 - space;
            double gradient = (p * g11) + ((h + (p * slope)) * g12) + (h * slope * g22);
            double curvature = g11 + (((2.0 * slope) + (2.0 * space * p)) * g12) + (((slope * slope) + (2.0 * space * h)) * g22);
            double next = p - (gradient / curvature);
            if (!(curvature > 0.0 && Math.Abs(next) <= ThinSolution.LargestPower))
            {
                return double.NaN;
            }

            bool done = Math.Abs(next - p) <= 1e-15 * Math.Abs(p);
            p = next;
            if (done)
            {
                break;
            }
        }

        return p;
    }

    private static Vector<double> AirSpacedBalanceVector(PairColumns glasses, int front, int rear, Vector<double> start)
    {
        var space = new Vector<double>(glasses.Space);
        var g11 = new Vector<double>(glasses.Variance[front]);
        var g22 = new Vector<double>(glasses.Variance, rear);
        var mean2 = new Vector<double>(glasses.Mean, rear);
        Vector<double> g12 = Vector<double>.Zero;
        for (int k = 0; k < glasses.Weights.Length; k++)
        {
            double[] changes = glasses.Changes[k];
            g12 += glasses.Weights[k] * (changes[front] - glasses.Mean[front]) * (new Vector<double>(changes, rear) - mean2);
        }

        Vector<double> p = start;
        Vector<long> active = Vector.Equals(p, p);
        for (int step = 0; step < MostSteps && active != Vector<long>.Zero; step++)
        {
            Vector<double> h = (Vector<double>.One - (space * p)) * (Vector<double>.One - p);
            Vector<double> slope = (2.0 * space * p) - Vector<double>.One - space;
            Vector<double> gradient = (p * g11) + ((h + (p * slope)) * g12) + (h * slope * g22);
            Vector<double> curvature = g11 + (((2.0 * slope) + (2.0 * space * p)) * g12) + (((slope * slope) + (2.0 * space * h)) * g22);
            Vector<double> next = p - (gradient / curvature);
            Vector<long> sound = Vector.GreaterThan(curvature, Vector<double>.Zero)
                & Vector.LessThanOrEqual(Vector.Abs(next), new Vector<double>(ThinSolution.LargestPower));
            Vector<long> done = Vector.LessThanOrEqual(Vector.Abs(next - p), 1e-15 * Vector.Abs(p));
            p = Vector.ConditionalSelect(active, Vector.ConditionalSelect(sound, next, NotANumber), p);
            active &= Vector.AndNot(sound, done);
        }

        return p;
    }
}
