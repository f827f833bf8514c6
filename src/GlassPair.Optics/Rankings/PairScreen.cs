using System.Numerics;
using System.Runtime.CompilerServices;
using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Rankings;

/// <summary>Solves every pair of <see cref="PairColumns"/>, counts what becomes of it, and offers the feasible ones to a pool.</summary>
internal sealed class PairScreen
{
    private readonly PairColumns _glasses;
    private readonly ShortlistRequest _request;
    private readonly PairFigures _row;
    private readonly double[] _included;
    private readonly double[] _keys;
    private readonly double _airSpace;
    private readonly double _powerLimit;
    private readonly double _depth;
    private readonly long[] _dropped = new long[Enum.GetValues<PairDropReason>().Length];

    /// <summary>Prepares the screen.</summary>
    /// <param name="glasses">The glasses.</param>
    /// <param name="included">Those of which every pair must hold one; null asks for none.</param>
    /// <param name="request">The limits, and the figure to rank by.</param>
    public PairScreen(PairColumns glasses, IReadOnlySet<GlassIndices>? included, ShortlistRequest request)
    {
        (_glasses, _request, _row) = (glasses, request, new PairFigures(glasses));
        _keys = new double[_row.Rms.Length];
        _included = new double[_row.Rms.Length];
        for (int j = 0; j < glasses.Count; j++)
        {
            _included[j] = included is null || included.Contains(glasses.Glasses[j]) ? 1.0 : 0.0;
        }

        Requirement requirement = request.Requirement;
        _airSpace = requirement.AirSpace.GetValueOrDefault();
        _powerLimit = requirement.ElementPowerLimit ?? double.PositiveInfinity;
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
            if (Vector.IsHardwareAccelerated)
            {
                ScreenVector(front, pool);
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

    /// <summary>Vector twin of <see cref="ScreenScalar"/>: lane l holds partner rear + l.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void ScreenVector(int front, CandidatePool pool)
    {
        bool someIncluded = _included[front] == 0.0;
        double expansion = _glasses.Expansion[front];
        double? expansionLimit = _request.Limits.ExpansionDifference;
        var powerLimit = new Vector<double>(_powerLimit);
        var fNumber = new Vector<double>(_request.Requirement.FNumber);
        Counts counts = default;
        for (int rear = front + 1; rear < _glasses.Count; rear += Vector<double>.Count)
        {
            Vector<long> open = Vector.LessThan(Vector<long>.Indices, new Vector<long>(_glasses.Count - rear));
            if (someIncluded)
            {
                Drop(ref open, ref counts.NotIncluded, Vector.Equals(new Vector<double>(_included, rear), Vector<double>.Zero));
            }

            if (expansionLimit is { } most)
            {
                Vector<double> difference = Vector.Abs(new Vector<double>(expansion) - new Vector<double>(_glasses.Expansion, rear));
                Drop(ref open, ref counts.ExpansionUnknown, ~Vector.Equals(difference, difference));
                Drop(ref open, ref counts.ExpansionDifference, Vector.GreaterThan(difference, new Vector<double>(most)));
            }

            var p1 = new Vector<double>(_row.FrontPower, rear);
            Vector<long> unsolved = ~Vector.Equals(p1, p1);
            if (_airSpace > 0.0 && (open & unsolved) != Vector<long>.Zero)
            {
                // ThinPair.LargestAirSpace and IsTooLarge
                Vector<double> root = Vector<double>.One - Vector.SquareRoot(new Vector<double>(_glasses.Abbe, rear) / new Vector<double>(_glasses.Abbe[front]));
                Vector<double> largest = _request.Requirement.FocalLength * Vector.Min(Vector<double>.One, root * root);
                Drop(ref open, ref counts.AirSpace, unsolved & Vector.GreaterThan(largest, Vector<double>.Zero) & Vector.GreaterThan(new Vector<double>(_airSpace), ThinPair.SureAirSpace * largest));
            }

            Drop(ref open, ref counts.DispersionsAlike, unsolved);
            Vector<double> largestPower = Vector.Max(Vector.Abs(p1), Vector.Abs(new Vector<double>(_row.RearPower, rear)));
            Drop(ref open, ref counts.ElementPower, Vector.GreaterThan(largestPower, powerLimit));
            if (open == Vector<long>.Zero)
            {
                continue;
            }

            counts.Feasible -= open;
            Vector<double> limitedTo = Vector.SquareRoot(0.5 * new Vector<double>(_row.PeakToValley, rear) / new Vector<double>(_depth));
            counts.Holding -= open & Vector.LessThanOrEqual(limitedTo, fNumber);
            Vector<double> key = _request.RankBy switch
            {
                RankBy.ColorResidual => new Vector<double>(_row.Rms, rear),
                RankBy.ExpectedResidual => new Vector<double>(_row.ExpectedRms, rear),
                _ => Vector.Abs(new Vector<double>(_row.SecondarySpectrum, rear)),
            };
            open &= Vector.LessThanOrEqual(key, new Vector<double>(pool.Bound));
            if (open != Vector<long>.Zero)
            {
                for (int lane = 0; lane < Vector<double>.Count; lane++)
                {
                    if (open[lane] != 0)
                    {
                        pool.Offer(key[lane], new Combination(front, rear + lane));
                    }
                }
            }
        }

        Take(counts);
    }

    private static void Drop(ref Vector<long> open, ref Vector<long> count, Vector<long> which)
    {
        // a lane that is set holds −1
        count -= open & which;
        open = Vector.AndNot(open, which);
    }

    private void Take(in Counts counts)
    {
        Feasible += Vector.Sum(counts.Feasible);
        Holding += Vector.Sum(counts.Holding);
        _dropped[(int)PairDropReason.NotIncluded] += Vector.Sum(counts.NotIncluded);
        _dropped[(int)PairDropReason.ExpansionUnknown] += Vector.Sum(counts.ExpansionUnknown);
        _dropped[(int)PairDropReason.ExpansionDifference] += Vector.Sum(counts.ExpansionDifference);
        _dropped[(int)PairDropReason.AirSpace] += Vector.Sum(counts.AirSpace);
        _dropped[(int)PairDropReason.DispersionsAlike] += Vector.Sum(counts.DispersionsAlike);
        _dropped[(int)PairDropReason.ElementPower] += Vector.Sum(counts.ElementPower);
    }

    private PairDropReason? ReasonAgainst(int front, int rear)
    {
        if (_included[front] == 0.0 && _included[rear] == 0.0)
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

        return Math.Max(Math.Abs(p1), Math.Abs(_row.RearPower[rear])) > _powerLimit ? PairDropReason.ElementPower : null;
    }

    private struct Counts
    {
        public Vector<long> Feasible;
        public Vector<long> Holding;
        public Vector<long> NotIncluded;
        public Vector<long> ExpansionUnknown;
        public Vector<long> ExpansionDifference;
        public Vector<long> AirSpace;
        public Vector<long> DispersionsAlike;
        public Vector<long> ElementPower;
    }
}
