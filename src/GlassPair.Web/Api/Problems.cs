using GlassPair.Catalogue;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;
using Microsoft.AspNetCore.Http.HttpResults;

namespace GlassPair.Web.Api;

/// <summary>The answers of the API where it cannot do what was asked, in the form of RFC 9457.</summary>
public static class Problems
{
    private const int MostUnknown = 10;

    /// <summary>400: fields are wrong; <c>errors</c> names each with what is allowed.</summary>
    public static ProblemHttpResult Faulty(FieldFaults faults) => TypedResults.Problem(
        title: "Some fields are wrong.",
        detail: "errors names each field, what is wrong with it, and what is allowed.",
        statusCode: StatusCodes.Status400BadRequest,
        extensions: [new("errors", faults.ToErrors())]);

    /// <summary>404: the stock is not served.</summary>
    public static ProblemHttpResult UnknownStock(string id, IEnumerable<string> served) => TypedResults.Problem(
        title: "Unknown stock.",
        detail: $"No stock has the id {id}. Served: {string.Join(", ", served)}.",
        statusCode: StatusCodes.Status404NotFound,
        extensions: [new("stocks", served.ToArray())]);

    /// <summary>404: the stock has no such glasses; the closest names are listed, for the first few.</summary>
    public static ProblemHttpResult UnknownGlasses(Stock stock, IReadOnlyList<string> ids)
    {
        UnknownGlass[] unknown = [.. ids.Take(MostUnknown).Select(id => new UnknownGlass(StrictJson.Shown(id), ClosestGlasses.To(stock, id)))];
        string more = ids.Count > unknown.Length ? FormattableString.Invariant($" {ids.Count - unknown.Length} more names are unknown.") : "";
        return TypedResults.Problem(
            title: "Unknown glass.",
            detail: string.Join(" ", unknown.Select(u => $"The stock {stock.Id} has no glass {u.Glass}; the closest names are {string.Join(", ", u.Closest)}.")) + more,
            statusCode: StatusCodes.Status404NotFound,
            extensions: [new("unknownGlasses", unknown)]);
    }

    /// <summary>422: glasses have no index at wavelengths that are needed.</summary>
    public static ProblemHttpResult OutOfRange(IReadOnlyList<(Glass Glass, Wavelength Wavelength)> misses) => TypedResults.Problem(
        title: "A glass has no index at a wavelength that is needed.",
        detail: string.Join(" ", misses.Select(m => new WavelengthOutOfRangeException(m.Glass.Id, m.Wavelength, m.Glass.Range).Message)),
        statusCode: StatusCodes.Status422UnprocessableEntity,
        extensions: [new("outOfRange", misses.Select(m => new IndexMiss(m.Glass.Id, m.Wavelength.Nanometers, RangeNm(m.Glass.Range))).ToArray())]);

    /// <summary>422: the maker says too little of a glass to take its index to another temperature.</summary>
    public static ProblemHttpResult NoTemperature(Glass glass, IReadOnlyList<Wavelength> wavelengths) => TypedResults.Problem(
        title: "The index cannot be taken to another temperature.",
        detail: glass is { Thermal: null } or { ReferenceCelsius: null }
            ? $"The catalogue states no temperature coefficients of {glass.Id}: leave temperatureC out for the index at the reference temperature."
            : $"The temperature coefficients of {glass.Id} say nothing at {string.Join(", ", wavelengths)}, too close to their resonance.",
        statusCode: StatusCodes.Status422UnprocessableEntity);

    /// <summary>422: the glasses make no lens of the required kind.</summary>
    public static ProblemHttpResult NoSolution(NoThinSolution outcome) => TypedResults.Problem(
        title: "These glasses make no lens of the required kind.",
        detail: outcome.Sentence,
        statusCode: StatusCodes.Status422UnprocessableEntity,
        extensions: [new("reason", outcome.Reason), new("largestAirSpaceMm", outcome.LargestAirSpace)]);

    /// <summary>422: no sound formula fits the measured indices.</summary>
    public static ProblemHttpResult NoFit(string sentence) => TypedResults.Problem(
        title: "No sound formula fits these indices.",
        detail: sentence,
        statusCode: StatusCodes.Status422UnprocessableEntity);

    /// <summary>422: the surfaces make no lens that can be traced.</summary>
    public static ProblemHttpResult NoLens(string sentence) => TypedResults.Problem(
        title: "These surfaces make no lens that can be traced.",
        detail: sentence,
        statusCode: StatusCodes.Status422UnprocessableEntity);

    /// <summary>Gets the ends of a range, nm.</summary>
    internal static double[] RangeNm(WavelengthRange range) => [range.Shortest.Nanometers, range.Longest.Nanometers];

    private sealed record UnknownGlass(string Glass, string[] Closest);

    private sealed record IndexMiss(string Glass, double Nm, double[] RangeNm);
}
