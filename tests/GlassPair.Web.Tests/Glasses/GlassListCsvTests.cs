using System.Globalization;
using System.Text;
using CsvHelper;
using GlassPair.Catalogue;
using GlassPair.Web.Components.Glasses;

namespace GlassPair.Web.Tests.Glasses;

public sealed class GlassListCsvTests
{
    [Fact]
    public void Write_EveryGlass_ReadsBackAtFullPrecision()
    {
        IReadOnlyList<GlassFigures> all = GlassListView.Of(GlassFigures.Of(ServedStock.Stock), GlassListState.Empty);
        using CsvReader reader = CsvReader.Create(new MemoryStream(Encoding.UTF8.GetBytes(Written(ServedStock.Stock, GlassListState.Empty))), CsvReaderOptions.Default with { CommentPrefix = '#' });
        reader.ReadHeader();
        foreach (GlassFigures figures in all)
        {
            Assert.True(reader.Read());
            Assert.Equal(figures.Glass.Maker, reader.GetString("maker"));
            Assert.Equal(figures.Glass.Name, reader.GetString("name"));
            Assert.Equal(figures.Nd, reader.GetString("nd") is { Length: > 0 } nd ? double.Parse(nd, CultureInfo.InvariantCulture) : null);
            Assert.Equal(figures.DeltaGF, reader.GetString("delta_p_gf") is { Length: > 0 } delta ? double.Parse(delta, CultureInfo.InvariantCulture) : null);
        }

        Assert.False(reader.Read());
    }

    [Fact]
    public void Write_NamesStockAndQuestionInTheHead()
    {
        string[] lines = Written(ServedStock.Stock, new GlassListState { Search = "lak" }).Split("\r\n");
        Assert.Contains(ServedStock.Stock.Id, lines[0], StringComparison.Ordinal);
        Assert.Contains("find=lak", lines[1], StringComparison.Ordinal);
    }

    [Fact]
    public void Write_NameThatASpreadsheetWouldRun_IsGuarded()
    {
        const string catalogue = "maker,name,form,range_from_nm,range_to_nm,b1,c1_um2,supply\nlab,'=1+1,sellmeier,400,700,1.2,0.01,listed\nlab,B,sellmeier,400,700,1.2,0.01,listed\n";
        StockReading reading = StockReader.Read([CatalogueFile.FromBytes("lab.csv", Encoding.UTF8.GetBytes(catalogue))], "Test");
        Assert.Contains("lab,\"'=1+1\",", Written(Assert.IsType<Stock>(reading.Stock), GlassListState.Empty).Split("\r\n")[4], StringComparison.Ordinal);
    }

    private static string Written(Stock stock, GlassListState state)
    {
        using var stream = new MemoryStream();
        GlassListCsv.Write(stream, stock, state);
        return Encoding.UTF8.GetString(stream.ToArray());
    }
}
