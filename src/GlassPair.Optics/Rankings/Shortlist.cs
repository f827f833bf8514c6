using System.Collections.Immutable;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Rankings;

/// <summary>The figure that candidates are ranked by, smallest first.</summary>
public enum RankBy
{
    /// <summary>The RMS focal shift over the band.</summary>
    ColorResidual,

    /// <summary>The RMS focal shift to be expected with the data floor.</summary>
    ExpectedResidual,

    /// <summary>The size of the secondary spectrum.</summary>
    SecondarySpectrum,
}

/// <summary>What to rank.</summary>
/// <param name="Requirement">What the lens must do.</param>
/// <param name="Limits">Which glasses may be used.</param>
/// <param name="Quality">How well the glasses are known.</param>
/// <param name="RankBy">The figure to rank by.</param>
/// <param name="Take">How many candidates to keep, 1 to 5,000.</param>
/// <param name="PairsPerGlass">In how many candidates one glass may stand, 1 or more; null allows any number.</param>
public sealed record ShortlistRequest(
    Requirement Requirement, GlassLimits Limits, DataQuality Quality, RankBy RankBy, int Take, int? PairsPerGlass = null)
{
    /// <summary>The most candidates that can be asked for.</summary>
    public const int MaxTake = 5_000;

    /// <summary>Gets how many elements a candidate has: 2, see <see cref="PairRanking"/>, or 3, see <see cref="TripletRanking"/>.</summary>
    public int Elements { get; init => field = value is 2 or 3 ? value : throw new ArgumentOutOfRangeException(nameof(Elements), value, "Must be 2 or 3."); } = 2;
}

/// <summary>One choice of glasses: the glass of positive power first, the rest in falling power.</summary>
/// <param name="Rank">Its place in the ranking, from 1.</param>
/// <param name="Solution">Its powers and figures.</param>
/// <param name="SameAs">Other glasses with coefficients identical to one of its own, by <see cref="Glass.Id"/>.</param>
public sealed record Candidate(int Rank, ThinSolution Solution, ImmutableArray<string> SameAs)
{
    /// <summary>Gets the glasses' ids joined by <c> + </c>.</summary>
    public string Name => string.Join(" + ", Solution.Elements.Select(e => e.Glass.Id));
}

/// <summary>Candidates ranked for one requirement on one stock, and what became of everything else.</summary>
/// <param name="Request">What was asked.</param>
/// <param name="GlassesConsidered">Glasses that cover the band and pass the limits, twins included.</param>
/// <param name="DistinctGlasses">The same, twins counted once.</param>
/// <param name="CombinationsExamined">Every combination of distinct glasses.</param>
/// <param name="CombinationsFeasible">Combinations with a solution within all limits.</param>
/// <param name="CombinationsHolding">Feasible combinations whose color stays inside the quarter wave at the required f-number.</param>
/// <param name="Candidates">The best, ranked.</param>
/// <param name="DroppedGlasses">Glasses not considered, with the reason.</param>
/// <param name="DroppedCombinations">How many combinations fell to each reason.</param>
public sealed record Shortlist(
    ShortlistRequest Request,
    int GlassesConsidered,
    int DistinctGlasses,
    long CombinationsExamined,
    long CombinationsFeasible,
    long CombinationsHolding,
    ImmutableArray<Candidate> Candidates,
    ImmutableArray<DroppedGlass> DroppedGlasses,
    ImmutableSortedDictionary<PairDropReason, long> DroppedCombinations);

/// <summary>A glass that was not considered.</summary>
/// <param name="Glass">The glass.</param>
/// <param name="Reason">Why.</param>
public readonly record struct DroppedGlass(Glass Glass, GlassDropReason Reason);
