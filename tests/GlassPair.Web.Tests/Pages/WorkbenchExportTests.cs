using System.Globalization;
using System.Text;
using GlassPair.Web.Components.Pages;
using GlassPair.Web.Figures;
using GlassPair.Web.Tests.Controls;

namespace GlassPair.Web.Tests.Pages;

public sealed class WorkbenchExportTests
{
    private const string Query = "?f=240&n=6&makers=hoya&take=20";

    [Fact]
    public void File_HasRequirementStockAndCautionsInItsHead()
    {
        string[] head = [.. File(Query).TakeWhile(l => l[0] == '#')];

        Assert.Contains(head, l => l.Contains("240 mm f/6, 480–644 nm, cemented", StringComparison.Ordinal));
        Assert.Contains(head, l => l.Contains(Ranked.Few.Stock.Id, StringComparison.Ordinal));
        Assert.Contains(head, l => l.Contains("https://example.org/?v=1", StringComparison.Ordinal));
        Assert.Contains(head, l => l.Contains("melt certificate decide", StringComparison.Ordinal));
    }

    [Fact]
    public void File_HasEveryPairInFullPrecision()
    {
        string[][] rows = [.. File(Query).SkipWhile(l => l[0] == '#').Select(l => l.Split(','))];

        int at = Array.IndexOf(rows[0], "Expected (µm RMS)");
        Assert.Equal(Ranked.Pairs.Select(p => p.Expected * 1e3), rows[1..].Select(r => double.Parse(r[at], CultureInfo.InvariantCulture)));
        Assert.Equal(Ranked.Pairs.Select(p => p.Negative.Glass.Name), rows[1..].Select(r => r[3]));
    }

    [Fact]
    public void File_NamesTheUnitOfEachNumber() => Assert.All(
        RankingColumn.All.Where(c => c.Unit.Length > 0 && c.Key != RankingColumn.BarKey),
        c => Assert.Contains($"{c.Title} ({c.Unit})", File(Query).First(l => l[0] != '#'), StringComparison.Ordinal));

    [Fact]
    public void File_FilteredAndSorted_IsWhatThePageShows()
    {
        string[][] rows = [.. File(Query + "&filter=FCD1&sort=-rank").SkipWhile(l => l[0] == '#').Skip(1).Select(l => l.Split(','))];

        int[] ranks = [.. rows.Select(r => int.Parse(r[0], CultureInfo.InvariantCulture))];
        Assert.NotEmpty(ranks);
        Assert.Equal(ranks.OrderDescending(), ranks);
        Assert.All(rows, r => Assert.Contains("FCD1", r[1] + r[3], StringComparison.Ordinal));
    }

    [Fact]
    public void Table_HasTheColumnsShownAsNumbers()
    {
        using var bytes = new MemoryStream();
        WorkbenchExport.WriteTable(Ranked.Few, Ranked.StateOf(Query + "&columns=power2,secondary"), "", bytes);
        string[][] rows = [.. Lines(bytes).Select(l => l.Split('\t'))];

        Assert.Equal(["rank", "positive glass", "positive maker", "negative glass", "negative maker", "Secondary (µm)", "φ₂ (of Φ)", "also sold as"], rows[0]);
        Assert.Equal(Ranked.Pairs[0].Solution.RelativePowers[1], double.Parse(rows[1][6], CultureInfo.InvariantCulture), 0.005);
    }

    private static string[] File(string query)
    {
        using var bytes = new MemoryStream();
        WorkbenchExport.WriteFile(Ranked.Few, Ranked.StateOf(query), "https://example.org/?v=1", bytes);
        return Lines(bytes);
    }

    private static string[] Lines(MemoryStream bytes) =>
        Encoding.UTF8.GetString(bytes.ToArray()).TrimStart('\uFEFF').Split('\n').Select(l => l.TrimEnd('\r')).Where(l => l.Length > 0).ToArray();
}
