using System.IO.Compression;
using System.Text;

namespace GlassPair.Catalogue.Tests;

public class StockArchiveTests
{
    private const string Text = "maker,name,form,range_from_nm,range_to_nm,b1,c1_um2,supply\nschott,A,sellmeier,400,700,1.25,0.01,listed\n";

    [Fact]
    public void Load_SavedStock_GivesTheSameStock()
    {
        using var folder = new TemporaryFolder();
        var archive = new StockArchive(Path.Combine(folder.Path, "new", "stocks"));
        archive.Save(Shipped.Stock);
        Stock back = archive.Load(Shipped.Stock.Id)!;
        Assert.Equal((Shipped.Stock.Id, Shipped.Stock.Title), (back.Id, back.Title));
        Assert.Equal(Shipped.Stock.Glasses.Select(g => (g.Id, g.Formula)), back.Glasses.Select(g => (g.Id, g.Formula)));
        Assert.Equal(Shipped.Stock.Remarks.AsEnumerable(), back.Remarks.AsEnumerable());
        Assert.Equal([$"{Shipped.Stock.Id}.zip"], Directory.GetFiles(archive.Folder).Select(Path.GetFileName));
    }

    [Theory]
    [InlineData("0123456789ab")]
    [InlineData("../secret")]
    [InlineData("")]
    [InlineData("0123456789AB")]
    public void Load_UnknownOrMalformedId_GivesNull(string id)
    {
        using var folder = new TemporaryFolder();
        Assert.Null(new StockArchive(folder.Path).Load(id));
    }

    [Fact]
    public void Load_ContentChanged_IsRefused()
    {
        using var folder = new TemporaryFolder();
        var archive = new StockArchive(folder.Path);
        Stock stock = Of("a.csv", Text);
        archive.Save(stock);
        string path = Path.Combine(folder.Path, stock.Id + ".zip");
        File.Delete(path);
        using (ZipArchive zip = ZipFile.Open(path, ZipArchiveMode.Create))
        {
            using Stream entry = zip.CreateEntry("a.csv").Open();
            entry.Write(Encoding.UTF8.GetBytes(Text.Replace("1.25", "1.26", StringComparison.Ordinal)));
        }

        Assert.Contains("does not have the content", Assert.Throws<InvalidDataException>(() => archive.Load(stock.Id)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Load_AnyByteOfTheZipChanged_GivesTheSameStockOrIsRefused()
    {
        using var folder = new TemporaryFolder();
        var archive = new StockArchive(folder.Path);
        Stock stock = Of("a.csv", Text);
        archive.Save(stock);
        string path = Path.Combine(folder.Path, stock.Id + ".zip");
        byte[] whole = File.ReadAllBytes(path);
        int refused = 0;
        for (int i = 0; i < whole.Length; i++)
        {
            byte[] damaged = [.. whole];
            damaged[i] ^= 0xFF;
            File.WriteAllBytes(path, damaged);
            try
            {
                Assert.Equal(stock.Glasses[0].Formula, archive.Load(stock.Id)!.Glasses[0].Formula);
            }
            catch (InvalidDataException)
            {
                refused++;
            }
        }

        Assert.InRange(refused, 50, whole.Length);
    }

    [Fact]
    public void Id_LineEndsChanged_StaysTheSame() => Assert.Equal(Of("a.csv", Text).Id, Of("a.csv", Text.Replace("\n", "\r\n", StringComparison.Ordinal)).Id);

    [Fact]
    public void Id_NameOrContentChanged_Changes()
    {
        string id = Of("a.csv", Text).Id;
        Assert.Matches("^[0-9a-f]{12}$", id);
        Assert.NotEqual(id, Of("b.csv", Text).Id);
        Assert.NotEqual(id, Of("a.csv", Text + "\n").Id);
    }

    private static Stock Of(string name, string text) => StockReader.Read([CatalogueFile.FromBytes(name, Encoding.UTF8.GetBytes(text))], "Small").Stock!;
}
