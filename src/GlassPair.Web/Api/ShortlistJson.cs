using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Work;

namespace GlassPair.Web.Api;

/// <summary>Candidates ranked for one requirement on one stock, and what became of everything else.</summary>
public sealed record ShortlistJson
{
    /// <summary>Writes a shortlist.</summary>
    public ShortlistJson(ShortlistAnswer answer)
    {
        Shortlist shortlist = answer.Shortlist;
        Stock = answer.Stock.Id;
        GlassesConsidered = shortlist.GlassesConsidered;
        DistinctGlasses = shortlist.DistinctGlasses;
        CombinationsExamined = shortlist.CombinationsExamined;
        CombinationsFeasible = shortlist.CombinationsFeasible;
        CombinationsHolding = shortlist.CombinationsHolding;
        MaxElementPower = shortlist.Request.Requirement.ElementPowerLimit;
        DroppedGlasses = shortlist.DroppedGlasses.GroupBy(d => d.Reason).OrderBy(g => g.Key).ToDictionary(g => g.Key, g => g.Count());
        DroppedCombinations = new(shortlist.DroppedCombinations);
        ElapsedMs = answer.Elapsed.TotalMilliseconds;
        Candidates = [.. shortlist.Candidates.Select(c => new CandidateJson(c, shortlist.Request.Quality))];
    }

    /// <summary>Gets the stock's id.</summary>
    public string Stock { get; }

    /// <summary>Gets how many glasses cover the band and pass the limits, twins included.</summary>
    public int GlassesConsidered { get; }

    /// <summary>Gets the same with glasses of identical coefficients counted once.</summary>
    public int DistinctGlasses { get; }

    /// <summary>Gets how many combinations of distinct glasses there are.</summary>
    public long CombinationsExamined { get; }

    /// <summary>Gets how many combinations have a solution within all limits.</summary>
    public long CombinationsFeasible { get; }

    /// <summary>Gets how many feasible combinations stay inside the quarter wave at the required f-number.</summary>
    public long CombinationsHolding { get; }

    /// <summary>Gets the limit on |φᵢ|/Φ that was applied: the requirement's, or 4 for three elements without one; null where none was.</summary>
    public double? MaxElementPower { get; }

    /// <summary>Gets how many glasses were not considered, by reason.</summary>
    public Dictionary<GlassDropReason, int> DroppedGlasses { get; }

    /// <summary>Gets how many combinations were not ranked, by reason.</summary>
    public Dictionary<PairDropReason, long> DroppedCombinations { get; }

    /// <summary>Gets how long the ranking took, ms.</summary>
    public double ElapsedMs { get; }

    /// <summary>Gets the best candidates.</summary>
    public CandidateJson[] Candidates { get; }
}

/// <summary>A thin solution and its place in the ranking: the glass of positive power first, the rest in falling power.</summary>
public sealed record CandidateJson : ThinSolutionJson
{
    /// <summary>Writes a candidate.</summary>
    public CandidateJson(Candidate candidate, DataQuality quality)
        : base(candidate.Solution, quality) =>
        (Rank, SameAs) = (candidate.Rank, [.. candidate.SameAs]);

    /// <summary>Gets the place in the ranking, from 1.</summary>
    public int Rank { get; }

    /// <summary>Gets other glasses with coefficients identical to one of the candidate's.</summary>
    public string[] SameAs { get; }
}
