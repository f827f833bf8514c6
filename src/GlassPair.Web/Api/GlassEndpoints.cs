using System.Diagnostics.CodeAnalysis;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Stocks;
using Microsoft.AspNetCore.Http.HttpResults;

namespace GlassPair.Web.Api;

/// <summary>Tells what glasses there are, and their values.</summary>
internal static class GlassEndpoints
{
    private static readonly QueryParameter StockId = new("stock", QueryKind.Text, "The stock's id; left out, the default stock.");
    private static readonly QueryParameter Maker = new("maker", QueryKind.Words, "Makers to keep, separated by commas; left out, all.");
    private static readonly QueryParameter SupplyStates = new("supply", QueryKind.Words, "Supply states to keep, separated by commas: recommended, listed, onRequest, unconfirmed, discontinued; left out, all.");
    private static readonly QueryParameter Search = new("search", QueryKind.Text, "Text that maker/name holds.");
    private static readonly QueryParameter Take = new("take", QueryKind.Whole, "How many glasses to answer with.", 1, 2_000, Usual: 100);
    private static readonly QueryParameter Skip = new("skip", QueryKind.Whole, "How many matching glasses to leave out first.", 0, 1_000_000);
    private static readonly QueryParameter Nm = new(
        "nm", QueryKind.Numbers, "Wavelengths, nm, separated by commas, 1 to 1,000 of them.", Wavelength.MinNanometers, Wavelength.MaxNanometers, 1_000, IsRequired: true);

    private static readonly QueryParameter Temperature = new(
        "temperatureC",
        QueryKind.Number,
        "Temperature of glass and air, degrees Celsius; left out, the reference temperature of the glass. Makers state their coefficients for 365 nm to 1014 nm; past that they are extrapolated.",
        AirIndex.MinCelsius,
        AirIndex.MaxCelsius);

    /// <summary>Gets the parameters of <see cref="ListGlasses"/>.</summary>
    public static QueryParameter[] ListParameters { get; } = [StockId, Maker, SupplyStates, Search, Take, Skip];

    /// <summary>Gets the parameters of <see cref="ShowGlass"/>.</summary>
    public static QueryParameter[] GlassParameters { get; } = [StockId];

    /// <summary>Gets the parameters of <see cref="ShowIndex"/>.</summary>
    public static QueryParameter[] IndexParameters { get; } = [Nm, Temperature, StockId];

    /// <summary>Lists the stocks served: the default one, and those it has replaced that are at hand.</summary>
    public static Results<Ok<StockJson[]>, ProblemHttpResult> ListStocks(HttpRequest request, StockLibrary library)
    {
        var query = new QueryReading(request.Query);
        Stock current = library.Current;
        return query.Faults.Any
            ? Problems.Faulty(query.Faults)
            : TypedResults.Ok<StockJson[]>([.. library.All.Select(s => new StockJson(s.Id, s.Title, s.Glasses.Length, IsDefault: s == current))]);
    }

    /// <summary>Lists glasses with values computed from their coefficients, a part at a time.</summary>
    /// <remarks>Text parameters compare without regard to case.</remarks>
    public static Results<Ok<GlassPageJson>, ProblemHttpResult> ListGlasses(HttpRequest request, StockLibrary library)
    {
        var query = new QueryReading(request.Query, ListParameters);
        if (!library.TryFindStock(query.Text(StockId), out Stock? stock, out ProblemHttpResult? problem) && !query.Faults.Any)
        {
            return problem;
        }

        string[]? makers = query.Words(Maker, (stock ?? library.Current).Glasses.Select(g => g.Maker).Distinct());
        Supply[]? supply = query.Words<Supply>(SupplyStates);
        string search = query.Text(Search) ?? "";
        int take = query.Whole(Take);
        int skip = query.Whole(Skip);
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
        ILookup<DispersionFormula, string> ids = IdsByFormula(stock);
        return TypedResults.Ok(new GlassPageJson(stock.Id, matches.Length, skip, [.. matches.Skip(skip).Take(take).Select(g => new GlassJson(g, stock, ids))]));
    }

    /// <summary>Shows one glass with values computed from its coefficients.</summary>
    /// <remarks>404 lists the closest names where the stock has no such glass.</remarks>
    /// <param name="maker">The maker.</param>
    /// <param name="name">The maker's name of the glass.</param>
    /// <param name="request">The call.</param>
    /// <param name="library">The stocks served.</param>
    public static Results<Ok<GlassJson>, ProblemHttpResult> ShowGlass(string maker, string name, HttpRequest request, StockLibrary library)
    {
        var query = new QueryReading(request.Query, GlassParameters);
        return TryFind(maker, name, query, library, out (Stock Stock, Glass Glass) found, out ProblemHttpResult? problem)
            ? TypedResults.Ok(new GlassJson(found.Glass, found.Stock, IdsByFormula(found.Stock)))
            : problem;
    }

    /// <summary>Evaluates the index of one glass.</summary>
    /// <remarks>The index is relative to air of the same temperature and 101,325 Pa. 422 names glass, wavelength, and range where the glass has no index, or says that its temperature coefficients are not known.</remarks>
    /// <param name="maker">The maker.</param>
    /// <param name="name">The maker's name of the glass.</param>
    /// <param name="request">The call.</param>
    /// <param name="library">The stocks served.</param>
    public static Results<Ok<IndexJson>, ProblemHttpResult> ShowIndex(string maker, string name, HttpRequest request, StockLibrary library)
    {
        var query = new QueryReading(request.Query, IndexParameters);
        double[] nm = query.Numbers(Nm);
        double? celsius = query.Number(Temperature);
        if (!TryFind(maker, name, query, library, out (Stock Stock, Glass Glass) found, out ProblemHttpResult? problem))
        {
            return problem;
        }

        Glass glass = found.Glass;
        Wavelength[] wavelengths = [.. nm.Select(Wavelength.FromNanometers)];
        Wavelength[] misses = [.. wavelengths.Where(w => !glass.Range.Contains(w))];
        if (misses.Length > 0)
        {
            return Problems.OutOfRange([.. misses.Select(w => (glass, w))]);
        }

        IndexAtTemperature?[] heated = [.. wavelengths.Select(w => (celsius ?? glass.ReferenceCelsius) is { } c ? IndexAtTemperature.TryOf(glass, w, c) : null)];
        return celsius is not null && heated.Contains(null)
            ? Problems.NoTemperature(glass, [.. wavelengths.Where((_, i) => heated[i] is null)])
            : TypedResults.Ok(new IndexJson(
                nm,
                [.. wavelengths.Select((w, i) => celsius is null ? glass.IndexAt(w) : heated[i]!.Relative)],
                [.. heated.Select(h => h?.AbsoluteRatePerKelvin)],
                [.. heated.Select(h => h?.RelativeRatePerKelvin)],
                celsius ?? glass.ReferenceCelsius));
    }

    private static ILookup<DispersionFormula, string> IdsByFormula(Stock stock) => stock.Glasses.ToLookup(g => g.Formula, g => g.Id);

    private static bool TryFind(
        string maker,
        string name,
        QueryReading query,
        StockLibrary library,
        out (Stock Stock, Glass Glass) found,
        [NotNullWhen(false)] out ProblemHttpResult? problem)
    {
        found = default;
        string? id = query.Text(StockId);
        if (query.Faults.Any)
        {
            problem = Problems.Faulty(query.Faults);
        }
        else if (library.TryFindStock(id, out Stock? stock, out problem) && stock.TryFindAll([$"{maker}/{name}"], out Glass[] glasses, out problem))
        {
            found = (stock, glasses[0]);
        }

        return problem is null;
    }
}
