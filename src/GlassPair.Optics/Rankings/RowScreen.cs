using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;

namespace GlassPair.Optics.Rankings;

/// <summary>Counts what becomes of combinations, a row at a time, and offers the feasible ones to a pool.</summary>
internal sealed class RowScreen
{
    private readonly GlassColumns _glasses;
    private readonly ShortlistRequest _request;
    private readonly RowFigures _figures;
    private readonly double[] _includedAhead;
    private readonly double[] _includedLast;
    private readonly double[] _keys = new double[Lanes512.Count];
    private readonly double _airSpace;
    private readonly double _depth;
    private readonly long[] _dropped = new long[Enum.GetValues<PairDropReason>().Length];

    /// <summary>Prepares the screen.</summary>
    /// <param name="glasses">The glasses.</param>
    /// <param name="figures">Where each row's figures stand when it is screened.</param>
    /// <param name="mustInclude">Glasses of which every combination must hold one; null asks for none.</param>
    /// <param name="request">The limits, and the figure to rank by.</param>
    public RowScreen(GlassColumns glasses, RowFigures figures, IReadOnlySet<GlassIndices>? mustInclude, ShortlistRequest request)
    {
        (_glasses, _request, _figures) = (glasses, request, figures);
        (_includedAhead, _includedLast) = (new double[glasses.Abbe.Length], new double[glasses.Abbe.Length]);

        // The first glass of a pair, of larger Abbe number, is the positive one.
        PowerSign? sign = mustInclude is not null && figures.Powers.Length == 2 ? request.Limits.IncludeAs : null;
        for (int j = 0; j < glasses.Count; j++)
        {
            bool isNamed = mustInclude is null || mustInclude.Contains(glasses.Glasses[j]);
            _includedAhead[j] = isNamed && sign is not PowerSign.Negative ? 1.0 : 0.0;
            _includedLast[j] = isNamed && sign is not PowerSign.Positive ? 1.0 : 0.0;
        }

        _airSpace = request.Requirement.AirSpace.GetValueOrDefault();
        _depth = 2.0 * request.Requirement.Band.Design.Millimeters;
    }

    /// <summary>Gets how many combinations have powers within all limits.</summary>
    public long Feasible { get; private set; }

    /// <summary>Gets how many feasible combinations keep their color inside the quarter wave.</summary>
    public long Holding { get; private set; }

    /// <summary>Gets how many combinations fell to each reason.</summary>
    public IEnumerable<KeyValuePair<PairDropReason, long>> Dropped =>
        Enum.GetValues<PairDropReason>().Select(r => KeyValuePair.Create(r, _dropped[(int)r])).Where(r => r.Value > 0);

    /// <summary>Screens a row by the fastest form that this processor has.</summary>
    public void Screen(Row row, CandidatePool pool)
    {
        if (Vector512.IsHardwareAccelerated)
        {
            ScreenVector<Lanes512>(row, pool);
        }
        else if (Vector256.IsHardwareAccelerated)
        {
            ScreenVector<Lanes256>(row, pool);
        }
        else
        {
            ScreenScalar(row, pool);
        }
    }

    /// <summary>Screens a row, a combination at a time.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void ScreenScalar(Row row, CandidatePool pool)
    {
        for (int last = row.Start; last < _glasses.Count; last++)
        {
            if (ReasonAgainst(row.With(last), last) is { } reason)
            {
                _dropped[(int)reason]++;
                continue;
            }

            Feasible++;
            Holding += Math.Sqrt(0.5 * _figures.PeakToValley[last] / _depth) <= _request.Requirement.FNumber ? 1 : 0;
            double key = _request.RankBy switch
            {
                RankBy.ColorResidual => _figures.Rms[last],
                RankBy.ExpectedResidual => _figures.ExpectedRms[last],
                _ => Math.Abs(_figures.SecondarySpectrum[last]),
            };
            pool.Offer(key, row.With(last));
        }
    }

    /// <summary>Vector twin of <see cref="ScreenScalar"/>: lane l, and bit l of a mask, hold last glass last + l.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void ScreenVector<T>(Row row, CandidatePool pool)
        where T : unmanaged, ILanes<T>
    {
        T zero = T.All(0.0);
        T powerLimit = T.All(_glasses.PowerLimit);
        T fNumber = T.All(_request.Requirement.FNumber);
        double[][] powers = _figures.Powers;
        bool hasExpansionLimit = _request.Limits.ExpansionDifference is not null;
        T expansionLimit = T.All(_request.Limits.ExpansionDifference.GetValueOrDefault());
        (T firstExpansion, T secondExpansion) = (T.All(_glasses.Expansion[row.First]), T.All(_glasses.Expansion[Math.Max(row.First, row.Second)]));
        bool isIncluded = _includedAhead[row.First] > 0.0 || (row.Second >= 0 && _includedAhead[row.Second] > 0.0);
        for (int last = row.Start; last < _glasses.Count; last += T.Count)
        {
            uint open = uint.MaxValue >> (32 - Math.Min(T.Count, _glasses.Count - last));
            if (!isIncluded)
            {
                Drop(PairDropReason.NotIncluded, T.Bits(T.AreEqual(T.Load(_includedLast, last), zero)), ref open);
            }

            if (hasExpansionLimit)
            {
                T expansion = T.Load(_glasses.Expansion, last);
                (T a, T b, T c) = (T.Abs(firstExpansion - expansion), T.Abs(secondExpansion - expansion), T.Abs(firstExpansion - secondExpansion));
                Drop(PairDropReason.ExpansionUnknown, ~T.Bits(T.AreEqual(a + b, a + b)), ref open);
                Drop(PairDropReason.ExpansionDifference, T.Bits(T.Exceeds(T.Max(a, T.Max(b, c)), expansionLimit)), ref open);
            }

            T largestPower = T.Abs(T.Load(powers[0], last));
            for (int element = 1; element < powers.Length; element++)
            {
                largestPower = T.Max(largestPower, T.Abs(T.Load(powers[element], last)));
            }

            uint unsolved = ~T.Bits(T.AreEqual(largestPower, largestPower));
            if (_airSpace > 0.0 && (open & unsolved) != 0)
            {
                // ThinPair.LargestAirSpace and IsTooLarge
                T root = T.All(1.0) - T.SquareRoot(T.Load(_glasses.Abbe, last) / T.All(_glasses.Abbe[row.First]));
                T largest = _request.Requirement.FocalLength * T.Min(T.All(1.0), root * root);
                T tooLarge = T.Exceeds(largest, zero) & T.Exceeds(T.All(_airSpace), ThinPair.SureAirSpace * largest);
                Drop(PairDropReason.AirSpace, unsolved & T.Bits(tooLarge), ref open);
            }

            Drop(PairDropReason.DispersionsAlike, unsolved, ref open);
            Drop(PairDropReason.ElementPower, T.Bits(T.Exceeds(largestPower, powerLimit)), ref open);
            if (open == 0)
            {
                continue;
            }

            Feasible += BitOperations.PopCount(open);
            T limitedTo = T.SquareRoot(0.5 * T.Load(_figures.PeakToValley, last) / T.All(_depth));
            Holding += BitOperations.PopCount(open & T.Bits(T.AtMost(limitedTo, fNumber)));
            T key = _request.RankBy switch
            {
                RankBy.ColorResidual => T.Load(_figures.Rms, last),
                RankBy.ExpectedResidual => T.Load(_figures.ExpectedRms, last),
                _ => T.Abs(T.Load(_figures.SecondarySpectrum, last)),
            };
            open &= T.Bits(T.AtMost(key, T.All(pool.Bound)));
            if (open != 0)
            {
                key.Store(_keys, 0);
                for (; open != 0; open &= open - 1)
                {
                    int lane = BitOperations.TrailingZeroCount(open);
                    pool.Offer(_keys[lane], row.With(last + lane));
                }
            }
        }
    }

    private void Drop(PairDropReason reason, uint which, ref uint open)
    {
        _dropped[(int)reason] += BitOperations.PopCount(open & which);
        open &= ~which;
    }

    private PairDropReason? ReasonAgainst(Combination combination, int last)
    {
        if (!combination.Places.Any(place => (place == last ? _includedLast : _includedAhead)[place] > 0.0))
        {
            return PairDropReason.NotIncluded;
        }

        // Of three glasses two may expand too differently and another be unknown: the unknown comes first.
        Glass[] glasses = [.. combination.Places.Select(place => _glasses.Glasses[place].Glass)];
        PairDropReason?[] reasons = [.. glasses.SelectMany((a, i) => glasses.Skip(i + 1).Select(b => _request.Limits.ReasonAgainst(a, b)))];
        PairDropReason? reason = reasons.Contains(PairDropReason.ExpansionUnknown) ? PairDropReason.ExpansionUnknown : reasons.FirstOrDefault(r => r is not null);
        if (reason is not null)
        {
            return reason;
        }

        double largestPower = _figures.Powers.Max(p => Math.Abs(p[last]));
        if (double.IsNaN(_figures.Powers[0][last]))
        {
            double largest = ThinPair.LargestAirSpace(_request.Requirement.FocalLength, _glasses.Abbe[combination.First], _glasses.Abbe[last]);
            return ThinPair.IsTooLarge(_airSpace, largest) ? PairDropReason.AirSpace : PairDropReason.DispersionsAlike;
        }

        return largestPower > _glasses.PowerLimit ? PairDropReason.ElementPower : null;
    }
}
