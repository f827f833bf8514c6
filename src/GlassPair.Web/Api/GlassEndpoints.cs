using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Stocks;
using Microsoft.AspNetCore.Http.HttpResults;

namespace GlassPair.Web.Api;

/// <summary>Tells what glasses there are, and their values.</summary>
internal static class GlassEndpoints
{
    /// <summary>The most glasses in one answer.</summary>
    internal const int MostGlasses = 2_000;

    /// <summary>How many glasses an answer holds where the client does not say.</summary>
    internal const int UsualGlasses = 100;

    /// <summary>The most wavelengths in one question.</summary>
    internal const int MostWavelengths = 1_000;

    /// <summary>Lists the stocks served.</summary>
    public static Results<Ok<StockJson[]>, ProblemHttpResult> ListStocks(HttpRequest request, StockLibrary library)
    {
        var query = new QueryReading(request.Query);
        Stock stock = library.Current;
        return query.Faults.Any
            ? Problems.Faulty(query.Faults)
            : TypedResults.Ok(new StockJson[] { new(stock.Id, stock.Title, stock.Glasses.Length, IsDefault: true) });
    }

    /// <summary>Lists glasses with values computed from their coefficients, a part at a time.</summary>
    /// <remarks>Text parameters compare without regard to case.</remarks>
    public static Results<Ok<GlassPageJson>, ProblemHttpResult> ListGlasses(HttpRequest request, StockLibrary library)
    {
        var query = new QueryReading(request.Query, "stock", "maker", "supply", "search", "take", "skip");
        if (!library.TryFindStock(query.Text("stock"), out Stock? stock, out ProblemHttpResult? problem) && !query.Faults.Any)
        {
            return problem;
        }

        string[]? makers = query.Words("maker", (stock ?? library.Current).Glasses.Select(g => g.Maker).Distinct());
        Supply[]? supply = query.Words<Supply>("supply");
        string search = query.Text("search") ?? "";
        int take = query.Whole("take", 1, MostGlasses, UsualGlasses);
        int skip = query.Whole("skip", 0, int.MaxValue, 0);
        if (query.Faults.Any || stock is null)
        {
            return Problems.Faulty(query.Faults);
        }

        Glass[] matches =
        [
            .. stock.Glasses.Where(g => (makers is null || makers.Contains(g.Maker, StringComparer.OrdinalIgnoreCase))
                && (supply is null || supply.Contains(g.Supply))
                && g.Id.Contains(search, StringComparison.OrdinalIgnoreCase)),
        ];
        return TypedResults.Ok(new GlassPageJson(stock.Id, matches.Length, skip, [.. matches.Skip(skip).Take(take).Select(g => new GlassJson(g))]));
    }

    /// <summary>Shows one glass with values computed from its coefficients.</summary>
    /// <remarks>404 lists the closest names where the stock has no such glass.</remarks>
    public static Results<Ok<GlassJson>, ProblemHttpResult> ShowGlass(string maker, string name, HttpRequest request, StockLibrary library)
    {
        var query = new QueryReading(request.Query, "stock");
        return TryFind(maker, name, query, library, out Glass? glass, out ProblemHttpResult? problem) ? TypedResults.Ok(new GlassJson(glass!)) : problem!;
    }

    /// <summary>Evaluates the index of one glass.</summary>
    /// <remarks>422 names glass, wavelength, and range where the glass has no index.</remarks>
    public static Results<Ok<IndexJson>, ProblemHttpResult> ShowIndex(string maker, string name, HttpRequest request, StockLibrary library)
    {
        var query = new QueryReading(request.Query, "stock", "nm");
        double[] nm = query.Numbers("nm", Wavelength.MinNanometers, Wavelength.MaxNanometers, MostWavelengths);
        if (!TryFind(maker, name, query, library, out Glass? glass, out ProblemHttpResult? problem))
        {
            return problem!;
        }

        Wavelength[] wavelengths = [.. nm.Select(Wavelength.FromNanometers)];
        (Glass, Wavelength)[] misses = [.. wavelengths.Where(w => !glass!.Range.Contains(w)).Select(w => (glass!, w))];
        return misses.Length > 0
            ? Problems.OutOfRange(misses)
            : TypedResults.Ok(new IndexJson(nm, [.. wavelengths.Select(w => glass!.IndexAt(w))]));
    }

    private static bool TryFind(
        string maker, string name, QueryReading query, StockLibrary library, out Glass? glass, out ProblemHttpResult? problem)
    {
        glass = null;
        string? id = query.Text("stock");
        if (query.Faults.Any)
        {
            problem = Problems.Faulty(query.Faults);
        }
        else if (library.TryFindStock(id, out Stock? stock, out problem) && stock.TryFindAll([$"{maker}/{name}"], out Glass[] found, out problem))
        {
            glass = found[0];
        }

        return problem is null;
    }
}
