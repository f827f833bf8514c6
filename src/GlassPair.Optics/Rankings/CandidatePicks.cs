using GlassPair.Optics.Color;

namespace GlassPair.Optics.Rankings;

/// <summary>Picks the candidates of a request in the order of the ranking, none of its glasses more often than it allows.</summary>
/// <param name="request">The request.</param>
/// <param name="poolPerPick">How many candidates to have at hand for each pick where glasses may not stand in any number of them: many of the best share a glass.</param>
internal sealed class CandidatePicks(ShortlistRequest request, int poolPerPick)
{
    private const int LargestPool = 100_000;
    private readonly Dictionary<GlassIndices, int> _uses = [];

    /// <summary>Gets the picks, best first.</summary>
    public List<ThinSolution> Solutions { get; } = [];

    /// <summary>Gets how many candidates to have at hand.</summary>
    public int PoolSize => request.PairsPerGlass is null ? request.Take : Math.Max(request.Take, Math.Min(poolPerPick * request.Take, LargestPool));

    /// <summary>Tells whether a glass may stand in a further candidate.</summary>
    public bool MayUse(GlassIndices glass) => request.PairsPerGlass is not { } most || _uses.GetValueOrDefault(glass) < most;

    /// <summary>Picks from a pool.</summary>
    /// <param name="pool">The pool.</param>
    /// <param name="glassesOf">The glasses of a combination.</param>
    /// <param name="solve">Solves them, in the order in which a shortlist shows them.</param>
    /// <returns>Whether all that were asked for are picked.</returns>
    public bool TakeFrom(CandidatePool pool, Func<Combination, GlassIndices[]> glassesOf, Func<GlassIndices[], ThinOutcome> solve)
    {
        foreach (ArraySegment<Combination> group in pool.Groups())
        {
            ThinSolution[] tied = [.. group.Select(glassesOf).Where(g => g.All(MayUse)).Select(solve).Cast<ThinSolution>()];
            foreach (ThinSolution solution in RankingOrder.OfTied(tied))
            {
                if (Solutions.Count == request.Take)
                {
                    return true;
                }

                if (solution.Elements.All(MayUse))
                {
                    foreach (GlassIndices element in solution.Elements)
                    {
                        _uses[element] = _uses.GetValueOrDefault(element) + 1;
                    }

                    Solutions.Add(solution);
                }
            }
        }

        return Solutions.Count == request.Take;
    }
}
