using System.Collections.Immutable;
using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Rankings;

/// <summary>The glasses that go well with one glass.</summary>
public static class Partners
{
    /// <summary>Finds the glasses that may be used and that hold the requirement together with the given one, by the rules of the ranking.</summary>
    /// <param name="table">The glasses over the requirement's band.</param>
    /// <param name="requirement">What the lens must do.</param>
    /// <param name="limits">Which glasses may be used; the given glass need not be among them.</param>
    /// <param name="glass">The glass whose partners are sought.</param>
    /// <returns>Rows of the table, in its order.</returns>
    public static ImmutableArray<GlassIndices> HoldingWith(IndexTable table, Requirement requirement, GlassLimits limits, GlassIndices glass) =>
    [
        .. table.Rows.Where(row =>
            limits.ReasonAgainst(row.Glass) is null
            && limits.ReasonAgainst(row.Glass, glass.Glass) is null
            && SolvePositiveFirst(requirement, row, glass) is ThinSolution { Holds: true } solution
            && solution.LargestElementPower <= (requirement.ElementPowerLimit ?? ThinSolution.LargestPower)),
    ];

    private static ThinOutcome SolvePositiveFirst(Requirement requirement, GlassIndices a, GlassIndices b) =>
        a.AbbeNumber >= b.AbbeNumber ? ThinPair.Solve(requirement, a, b) : ThinPair.Solve(requirement, b, a);
}
