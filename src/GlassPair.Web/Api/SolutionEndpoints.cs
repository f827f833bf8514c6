using GlassPair.Catalogue;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Stocks;
using Microsoft.AspNetCore.Http.HttpResults;

namespace GlassPair.Web.Api;

/// <summary>Solves glasses that are already chosen.</summary>
internal static class SolutionEndpoints
{
    /// <summary>Solves a thin pair, in contact or air-spaced.</summary>
    /// <remarks>422 where a glass does not cover the band, or where no powers balance the pair; the problem then tells the largest air space if that is the reason.</remarks>
    public static Results<Ok<ThinSolutionJson>, ProblemHttpResult> SolvePair(JsonBody<PairJson> body, StockLibrary library)
    {
        Requirement? requirement = RequirementReading.Read(body.Value.Requirement, "requirement", body.Faults);
        return Solve(
            body.Value, body.Value.Glasses, requirement, body.Faults, library, g => ThinPair.Solve(requirement!, g[0], g[1]));
    }

    /// <summary>Solves a thin triplet in contact.</summary>
    /// <remarks><c>endsUnited</c> unites the short end, the design wavelength, and the long end. 422 where a glass does not cover the band, or where no powers balance the triplet.</remarks>
    public static Results<Ok<ThinSolutionJson>, ProblemHttpResult> SolveTriplet(JsonBody<TripletJson> body, StockLibrary library)
    {
        Requirement? requirement = RequirementReading.Read(body.Value.Requirement, "requirement", body.Faults);
        CheckInContact(body.Value.Requirement, body.Faults);
        return Solve(
            body.Value, body.Value.Glasses, requirement, body.Faults, library, g => ThinTriplet.Solve(requirement!, g[0], g[1], g[2]));
    }

    /// <summary>Notes an air space in a requirement for three elements.</summary>
    internal static void CheckInContact(RequirementJson? requirement, FieldFaults faults)
    {
        if (requirement?.Construction == Construction.AirSpaced)
        {
            faults.Add("requirement.construction", "Must be \"cemented\" for three elements: thin triplets are solved in contact.");
        }
    }

    private static Results<Ok<ThinSolutionJson>, ProblemHttpResult> Solve(
        ChosenGlassesJson question,
        string[] ids,
        Requirement? requirement,
        FieldFaults faults,
        StockLibrary library,
        Func<GlassIndices[], ThinOutcome> solve)
    {
        if (requirement is null || faults.Any)
        {
            return Problems.Faulty(faults);
        }

        if (!library.TryFindStock(question.Stock, out Stock? stock, out ProblemHttpResult? problem)
            || !stock.TryFindAll(ids, out Glass[] glasses, out problem))
        {
            return problem;
        }

        (Glass, Wavelength)[] misses = [.. glasses.SelectMany(g => Misses(g, requirement.Band))];
        if (misses.Length > 0)
        {
            return Problems.OutOfRange(misses);
        }

        return solve([.. glasses.Select(g => GlassIndices.Of(g, requirement.Band))]) switch
        {
            ThinSolution solution => TypedResults.Ok(new ThinSolutionJson(solution, question.Quality())),
            NoThinSolution none => Problems.NoSolution(none),
            _ => throw new InvalidOperationException("An outcome is a solution or none."),
        };
    }

    private static IEnumerable<(Glass Glass, Wavelength Wavelength)> Misses(Glass glass, Band band) =>
        new[] { band.ShortEnd, band.LongEnd }.Where(w => !glass.Range.Contains(w)).Select(w => (glass, w));
}
