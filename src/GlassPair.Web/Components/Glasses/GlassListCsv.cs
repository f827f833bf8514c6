using System.Collections.Immutable;
using CsvHelper;
using GlassPair.Catalogue;
using GlassPair.Web.Figures;
using GlassPair.Web.Stocks;

namespace GlassPair.Web.Components.Glasses;

/// <summary>The list of glasses as CSV: every column, full precision, units in the heading; the stock and what was asked for in comments before it.</summary>
public static class GlassListCsv
{
    private static readonly CsvWriterOptions _options = CsvWriterOptions.Default with
    {
        CommentPrefix = '#',
        Injection = CsvInjection.Escape,
        WriteByteOrderMark = true,
    };

    private static readonly ImmutableArray<(string Heading, Func<GlassFigures, object?> Value)> _columns =
    [
        ("maker", g => g.Glass.Maker),
        ("name", g => g.Glass.Name),
        ("nd", g => g.Nd),
        ("vd", g => g.AbbeD),
        ("ne", g => g.Ne),
        ("ve", g => g.AbbeE),
        ("p_gf", g => g.PartialGF),
        ("delta_p_gf", g => g.DeltaGF),
        ("range_from_nm", g => g.Glass.Range.Shortest.Nanometers),
        ("range_to_nm", g => g.Glass.Range.Longest.Nanometers),
        ("density_g_per_cm3", g => g.Glass.DensityGramsPerCm3),
        ("expansion_minus30_to_70_per_k", g => g.Glass.ExpansionPerKelvin),
        ("contains_lead", g => g.Glass.ContainsLead ? "yes" : ""),
        ("supply", g => FigureText.Of(g.Glass.Supply)),
        ("edition", g => g.Glass.Edition),
        ("remarks", g => string.Join(" ", g.Remarks)),
    ];

    /// <summary>Maps <c>/export/glasses.csv</c>; its query is that of the list.</summary>
    public static void Map(IEndpointRouteBuilder routes) => routes.MapGet("/export/glasses.csv", Answer).ExcludeFromDescription();

    /// <summary>Writes the glasses that a state shows, in its order.</summary>
    public static void Write(Stream stream, Stock stock, GlassListState state)
    {
        using CsvWriter writer = CsvWriter.Create(stream, _options, leaveOpen: true);
        writer.WriteComment($" Stock: {stock.Title}, {FigureText.Count(stock.Glasses.Length)} glasses, {stock.Id}");
        writer.WriteComment($" Asked for: {GlassListAddress.Write(state with { StockId = stock.Id, Chosen = null })}");
        writer.WriteComment(" Indices, Abbe numbers and partial dispersions are computed from the coefficients. Supply is as the makers' lists said: confirm with the maker.");
        writer.WriteHeader([.. _columns.Select(c => c.Heading)]);
        foreach (GlassFigures figures in GlassListView.Of(GlassFigures.Of(stock), state))
        {
            foreach ((_, Func<GlassFigures, object?> value) in _columns)
            {
                writer.WriteField(value(figures));
            }

            writer.EndRecord();
        }
    }

    private static IResult Answer(HttpRequest request, StockLibrary library)
    {
        GlassListState state = GlassListAddress.Read(request.QueryString.ToString()).State;
        Stock stock = state.StockId is { } id && library.TryFind(id, out Stock? found) ? found : library.Current;
        var content = new MemoryStream();
        Write(content, stock, state);
        content.Position = 0;
        return Results.File(content, "text/csv; charset=utf-8", $"glasses-{stock.Id}.csv");
    }
}
