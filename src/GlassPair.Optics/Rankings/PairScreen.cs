using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Rankings;

/// <summary>Solves every pair of <see cref="PairColumns"/>, counts what becomes of it, and offers the feasible ones to a pool.</summary>
internal sealed class PairScreen
{
    private readonly PairColumns _glasses;
    private readonly ShortlistRequest _request;
    private readonly PairFigures _row;
    private readonly double[] _includedFront;
    private readonly double[] _includedRear;
    private readonly double[] _keys;
    private readonly double _airSpace;
    private readonly double _depth;
    private readonly long[] _dropped = new long[Enum.GetValues<PairDropReason>().Length];

    /// <summary>Prepares the screen.</summary>
    /// <param name="glasses">The glasses.</param>
    /// <param name="included">Those of which every pair must hold one; null asks for none.</param>
    /// <param name="request">The limits, and the figure to rank by.</param>
    public PairScreen(PairColumns glasses, IReadOnlySet<GlassIndices>? included, ShortlistRequest request)
    {
        (_glasses, _request, _row) = (glasses, request, new PairFigures(glasses));
        _keys = new double[Lanes512.Count];
        (_includedFront, _includedRear) = (new double[_row.Rms.Length], new double[_row.Rms.Length]);
        for (int j = 0; j < glasses.Count; j++)
        {
            // The front glass, of larger Abbe number, is the positive one.
            bool isNamed = included is null || included.Contains(glasses.Glasses[j]);
            _includedFront[j] = isNamed && (included is null || request.Limits.IncludeAs is not PowerSign.Negative) ? 1.0 : 0.0;
            _includedRear[j] = isNamed && (included is null || request.Limits.IncludeAs is not PowerSign.Positive) ? 1.0 : 0.0;
        }

        Requirement requirement = request.Requirement;
        _airSpace = requirement.AirSpace.GetValueOrDefault();
        _depth = 2.0 * requirement.Band.Design.Millimeters;
    }

    /// <summary>Gets the glasses, in the order of the pool's combinations.</summary>
    public IReadOnlyList<GlassIndices> Glasses => _glasses.Glasses;

    /// <summary>Gets how many pairs have powers within all limits.</summary>
    public long Feasible { get; private set; }

    /// <summary>Gets how many feasible pairs keep their color inside the quarter wave.</summary>
    public long Holding { get; private set; }

    /// <summary>Gets how many pairs fell to each reason.</summary>
    public IEnumerable<KeyValuePair<PairDropReason, long>> Dropped =>
        Enum.GetValues<PairDropReason>().Select(r => KeyValuePair.Create(r, _dropped[(int)r])).Where(r => r.Value > 0);

    /// <summary>Screens all pairs.</summary>
    public void Run(CandidatePool pool, CancellationToken cancellation)
    {
        for (int front = 0; front < _glasses.Count; front++)
        {
            cancellation.ThrowIfCancellationRequested();
            PairKernel.Fill(_glasses, front, _row);
            if (Vector512.IsHardwareAccelerated)
            {
                ScreenVector<Lanes512>(front, pool);
            }
            else if (Vector256.IsHardwareAccelerated)
            {
                ScreenVector<Lanes256>(front, pool);
            }
            else
            {
                ScreenScalar(front, pool);
            }
        }
    }

    /// <summary>Screens a row, a pair at a time.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void ScreenScalar(int front, CandidatePool pool)
    {
        for (int rear = front + 1; rear < _glasses.Count; rear++)
        {
            if (ReasonAgainst(front, rear) is { } reason)
            {
                _dropped[(int)reason]++;
                continue;
            }

            Feasible++;
            Holding += Math.Sqrt(0.5 * _row.PeakToValley[rear] / _depth) <= _request.Requirement.FNumber ? 1 : 0;
            pool.Offer(
                _request.RankBy switch
                {
                    RankBy.ColorResidual => _row.Rms[rear],
                    RankBy.ExpectedResidual => _row.ExpectedRms[rear],
                    _ => Math.Abs(_row.SecondarySpectrum[rear]),
                },
                new Combination(front, rear));
        }
    }

    /// <summary>Vector twin of <see cref="ScreenScalar"/>: lane l, and bit l of a mask, hold partner rear + l.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void ScreenVector<T>(int front, CandidatePool pool)
        where T : unmanaged, ILanes<T>
    {
        T zero = T.All(0.0);
        T powerLimit = T.All(_glasses.PowerLimit);
        T fNumber = T.All(_request.Requirement.FNumber);
        double focal = _request.Requirement.FocalLength;
        double? expansionLimit = _request.Limits.ExpansionDifference;
        bool isIncluded = _includedFront[front] > 0.0;
        for (int rear = front + 1; rear < _glasses.Count; rear += T.Count)
        {
            uint open = uint.MaxValue >> (32 - Math.Min(T.Count, _glasses.Count - rear));
            if (!isIncluded)
            {
                Drop(PairDropReason.NotIncluded, T.Bits(T.AreEqual(T.Load(_includedRear, rear), zero)), ref open);
            }

            if (expansionLimit is { } most)
            {
                T difference = T.Abs(T.All(_glasses.Expansion[front]) - T.Load(_glasses.Expansion, rear));
                Drop(PairDropReason.ExpansionUnknown, ~T.Bits(T.AreEqual(difference, difference)), ref open);
                Drop(PairDropReason.ExpansionDifference, T.Bits(T.Exceeds(difference, T.All(most))), ref open);
            }

            T p1 = T.Load(_row.FrontPower, rear);
            uint unsolved = ~T.Bits(T.AreEqual(p1, p1));
            if (_airSpace > 0.0 && (open & unsolved) != 0)
            {
                // ThinPair.LargestAirSpace and IsTooLarge
                T root = T.All(1.0) - T.SquareRoot(T.Load(_glasses.Abbe, rear) / T.All(_glasses.Abbe[front]));
                T largest = focal * T.Min(T.All(1.0), root * root);
                T tooLarge = T.Exceeds(largest, zero) & T.Exceeds(T.All(_airSpace), ThinPair.SureAirSpace * largest);
                Drop(PairDropReason.AirSpace, unsolved & T.Bits(tooLarge), ref open);
            }

            Drop(PairDropReason.DispersionsAlike, unsolved, ref open);
            T largestPower = T.Max(T.Abs(p1), T.Abs(T.Load(_row.RearPower, rear)));
            Drop(PairDropReason.ElementPower, T.Bits(T.Exceeds(largestPower, powerLimit)), ref open);
            if (open == 0)
            {
                continue;
            }

            Feasible += BitOperations.PopCount(open);
            T limitedTo = T.SquareRoot(0.5 * T.Load(_row.PeakToValley, rear) / T.All(_depth));
            Holding += BitOperations.PopCount(open & T.Bits(T.AtMost(limitedTo, fNumber)));
            T key = _request.RankBy switch
            {
                RankBy.ColorResidual => T.Load(_row.Rms, rear),
                RankBy.ExpectedResidual => T.Load(_row.ExpectedRms, rear),
                _ => T.Abs(T.Load(_row.SecondarySpectrum, rear)),
            };
            open &= T.Bits(T.AtMost(key, T.All(pool.Bound)));
            if (open != 0)
            {
                key.Store(_keys, 0);
                for (; open != 0; open &= open - 1)
                {
                    int lane = BitOperations.TrailingZeroCount(open);
                    pool.Offer(_keys[lane], new Combination(front, rear + lane));
                }
            }
        }
    }

    private void Drop(PairDropReason reason, uint which, ref uint open)
    {
        _dropped[(int)reason] += BitOperations.PopCount(open & which);
        open &= ~which;
    }

    private PairDropReason? ReasonAgainst(int front, int rear)
    {
        if (_includedFront[front] == 0.0 && _includedRear[rear] == 0.0)
        {
            return PairDropReason.NotIncluded;
        }

        if (_request.Limits.ReasonAgainst(_glasses.Glasses[front].Glass, _glasses.Glasses[rear].Glass) is { } reason)
        {
            return reason;
        }

        double p1 = _row.FrontPower[rear];
        if (double.IsNaN(p1))
        {
            double largest = ThinPair.LargestAirSpace(_request.Requirement.FocalLength, _glasses.Abbe[front], _glasses.Abbe[rear]);
            return ThinPair.IsTooLarge(_airSpace, largest) ? PairDropReason.AirSpace : PairDropReason.DispersionsAlike;
        }

        return Math.Max(Math.Abs(p1), Math.Abs(_row.RearPower[rear])) > _glasses.PowerLimit ? PairDropReason.ElementPower : null;
    }
}
