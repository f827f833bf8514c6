namespace GlassPair.Optics.Rankings;

/// <summary>Two glasses, or three, by their places in a table; <see cref="Third"/> is −1 for two.</summary>
internal readonly record struct Combination(int First, int Second, int Third = -1)
{
    /// <summary>Gets the places of the glasses.</summary>
    public int[] Places => Third < 0 ? [First, Second] : [First, Second, Third];
}

/// <summary>Keeps the combinations with the smallest keys of very many, in little room.</summary>
/// <param name="wanted">How many to keep at least, 1 or more.</param>
/// <param name="above">Only larger keys are taken.</param>
internal sealed class CandidatePool(int wanted, double above)
{
    private double[] _keys = new double[Math.Max(4 * wanted, 1024)];
    private Combination[] _combinations = new Combination[Math.Max(4 * wanted, 1024)];
    private int _count;

    /// <summary>Gets the largest key that is still taken: every smaller one that was offered is in the pool.</summary>
    public double Bound { get; private set; } = double.PositiveInfinity;

    /// <summary>Gets whether combinations were left out because their keys are too large.</summary>
    public bool IsCut => Bound < double.PositiveInfinity;

    /// <summary>Gets the largest key that <see cref="Groups"/> handed out.</summary>
    public double LastKey { get; private set; }

    /// <summary>Takes a combination if its key may be among the smallest.</summary>
    public void Offer(double key, Combination combination)
    {
        if (!(key > above && key <= Bound))
        {
            return;
        }

        if (_count == _keys.Length)
        {
            Cut();
        }

        (_keys[_count], _combinations[_count]) = (key, combination);
        _count++;
    }

    /// <summary>Hands out the pool by rising key, in groups of keys equal to 12 digits; a group that may lack a member is left out.</summary>
    public IEnumerable<ArraySegment<Combination>> Groups()
    {
        Array.Sort(_keys, _combinations, 0, _count);
        double end = RankingOrder.TwelveDigits(Bound);
        int start = 0;
        for (int i = 1; i <= _count; i++)
        {
            double last = _keys[i - 1];
            if (i < _count && RankingOrder.AreTied(last, _keys[i]))
            {
                continue;
            }

            if (IsCut && RankingOrder.TwelveDigits(last) >= end)
            {
                yield break;
            }

            LastKey = last;
            yield return new ArraySegment<Combination>(_combinations, start, i - start);
            start = i;
        }
    }

    /// <summary>Makes room: keeps the wanted ones and all that tie with the last of them.</summary>
    private void Cut()
    {
        Array.Sort(_keys, _combinations, 0, _count);
        Bound = RankingOrder.LargestTieOf(_keys[wanted - 1]);
        _count = Array.FindLastIndex(_keys, _count - 1, _count, key => key <= Bound) + 1;
        if (2 * _count > _keys.Length)
        {
            Array.Resize(ref _keys, 2 * _keys.Length);
            Array.Resize(ref _combinations, _keys.Length);
        }
    }
}
