using System.Collections.Immutable;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Stocks;
using GlassPair.Web.Work;
using Microsoft.AspNetCore.Http.HttpResults;

namespace GlassPair.Web.Api;

/// <summary>Ranks combinations of glasses.</summary>
internal static class ShortlistEndpoint
{
    private const int UsualTake = 50;

    /// <summary>Ranks every combination of a stock's glasses for a requirement.</summary>
    /// <remarks>A combination stands once, the glass of positive power first. Of glasses with identical coefficients one is ranked and <c>sameAs</c> lists the others.</remarks>
    public static async Task<Results<Ok<ShortlistJson>, ProblemHttpResult>> Rank(
        JsonBody<ShortlistRequestJson> body, StockLibrary library, ShortlistService shortlists, CancellationToken cancellation)
    {
        (ShortlistRequestJson json, FieldFaults faults) = (body.Value, body.Faults);
        Requirement? requirement = RequirementReading.Read(json.Requirement, "requirement", faults);
        Stock? stock = null;
        ProblemHttpResult? problem = null;
        if (!faults.Concern("stock") && library.TryFindStock(json.Stock, out stock, out problem))
        {
            CheckMakers(json.Makers, stock, faults);
        }

        CheckIds(json.Exclude, "exclude", faults);
        CheckIds(json.Include, "include", faults);
        if (json.Elements == 3)
        {
            SolutionEndpoints.CheckInContact(json.Requirement, faults);
        }

        if (requirement is null || faults.Any)
        {
            return Problems.Faulty(faults);
        }

        if (stock is null || !stock.TryFindAll([.. json.Exclude ?? [], .. json.Include ?? []], out Glass[] named, out problem))
        {
            return problem!;
        }

        int excluded = json.Exclude?.Length ?? 0;

        var request = new ShortlistRequest(
            requirement,
            LimitsOf(json, named[..excluded], named[excluded..]),
            ChosenGlassesJson.QualityOf(json.AbbeTolerancePercent, json.IndexPrecision),
            json.RankBy ?? RankBy.ColorResidual,
            json.Take ?? UsualTake,
            json.PairsPerGlass) { Elements = json.Elements ?? 2 };
        if (request.Elements == 3 && TripletRanking.FindFault(request) is { } fault)
        {
            faults.Add("elements", fault);
            return Problems.Faulty(faults);
        }

        return TypedResults.Ok(new ShortlistJson(await shortlists.RankAsync(stock, request, cancellation)));
    }

    private static GlassLimits LimitsOf(ShortlistRequestJson json, Glass[] exclude, Glass[] include) => new()
    {
        Makers = json.Makers?.ToImmutableSortedSet(StringComparer.OrdinalIgnoreCase),
        Supply = json.Supply?.ToImmutableSortedSet(),
        Exclude = exclude.Select(g => g.Id).ToImmutableSortedSet(StringComparer.OrdinalIgnoreCase),
        Include = include.Select(g => g.Id).ToImmutableSortedSet(StringComparer.OrdinalIgnoreCase),
        ExpansionDifference = json.MaxExpansionDifferencePerK,
        AllowLead = json.AllowLead ?? true,
        AllowMolding = json.AllowMolding ?? true,
    };

    private static void CheckMakers(string[]? makers, Stock stock, FieldFaults faults)
    {
        string[] known = [.. stock.Glasses.Select(g => g.Maker).Distinct()];
        for (int i = 0; i < makers?.Length; i++)
        {
            if (makers[i] is { } maker && !known.Contains(maker, StringComparer.OrdinalIgnoreCase))
            {
                faults.Add(FormattableString.Invariant($"makers[{i}]"), $"The stock has no maker of this name. Makers: {string.Join(", ", known)}.");
            }
        }
    }

    private static void CheckIds(string[]? ids, string path, FieldFaults faults)
    {
        for (int i = 0; i < ids?.Length; i++)
        {
            if (ids[i] is { } id && !id.Contains('/', StringComparison.Ordinal))
            {
                faults.Add(FormattableString.Invariant($"{path}[{i}]"), "Must name a glass as maker/name, such as schott/N-BK7.");
            }
        }
    }
}
