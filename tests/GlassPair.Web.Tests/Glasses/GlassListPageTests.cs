using AngleSharp.Dom;
using Bunit;
using GlassPair.Web.Components.Glasses;
using GlassPair.Web.Components.Pages;

namespace GlassPair.Web.Tests.Glasses;

public sealed class GlassListPageTests : GlassPagesTestBase
{
    [Fact]
    public void FirstVisit_ListsEveryGlassOfTheStock()
    {
        IRenderedComponent<GlassListPage> page = Open("");
        Assert.Equal($"{ServedStock.Stock.Glasses.Length:#,0} glasses", page.Find("[role=status]").TextContent);
        Assert.Equal((ServedStock.Stock.Glasses.Length + 1).ToString(System.Globalization.CultureInfo.InvariantCulture), page.Find("table").GetAttribute("aria-rowcount"));
    }

    [Fact]
    public void Row_LeadsToThePageOfItsGlass()
    {
        IElement link = Open("?find=n-bk7ht&makers=schott").FindAll("tbody th a")[0];
        Assert.Equal(("glasses/schott/N-BK7HT", "N-BK7HT schott"), (link.GetAttribute("href"), link.TextContent));
    }

    [Fact]
    public void Typing_NarrowsTheListAtOnceAndTheAddressSoon()
    {
        IRenderedComponent<GlassListPage> page = Open("");
        page.Find("input[type=search]").Input("n-bk7");
        Assert.All(page.FindAll("tbody th a"), a => Assert.Contains("BK7", a.TextContent, StringComparison.Ordinal));
        page.WaitForAssertion(() => Assert.Equal("glasses?v=1&find=n-bk7", Address));
    }

    [Fact]
    public void Chips_KeepTheOthersOnly()
    {
        IRenderedComponent<GlassListPage> page = Open("?makers=hoya,schott");
        page.FindAll("label.chip").Single(c => c.TextContent.Contains("hoya", StringComparison.Ordinal)).QuerySelector("input")!.Change(false);
        Assert.Equal("glasses?v=1&makers=schott", Address);
        Assert.All(page.FindAll("tbody td.c1:first-of-type"), c => Assert.Equal("schott", c.TextContent));
    }

    [Fact]
    public void Heading_SortsAndSaysSo()
    {
        IRenderedComponent<GlassListPage> page = Open("?makers=schott");
        IElement Heading() => page.FindAll("thead th").Single(h => h.TextContent.StartsWith("vd", StringComparison.Ordinal));
        Heading().QuerySelector("button")!.Click();
        Assert.Equal("ascending", Heading().GetAttribute("aria-sort"));
        Heading().QuerySelector("button")!.Click();
        Assert.Equal("descending", Heading().GetAttribute("aria-sort"));
        Assert.Equal("glasses?v=1&makers=schott&sort=-vd", Address);
    }

    [Fact]
    public void ClickOnARow_ChoosesItsGlass()
    {
        IRenderedComponent<GlassListPage> page = Open("?find=n-bk7&makers=schott");
        page.FindAll("tbody tr").Single(r => r.QuerySelector("th a .g")?.TextContent == "N-BK7").Click();
        Assert.Contains("glass=schott/N-BK7", Address, StringComparison.Ordinal);
        Assert.Equal("N-BK7 schott", page.Find("h2.title").TextContent);
        Assert.Contains(Sent, figure => figure.Figure.Labels.Any(l => l.Title == "N-BK7"));
    }

    [Fact]
    public void Back_ShowsTheListOfThatAddress()
    {
        IRenderedComponent<GlassListPage> page = Open("?makers=schott");
        Navigation.NavigateTo("glasses?v=1&find=lzos");
        page.WaitForAssertion(() => Assert.Equal("26 of 1,636 glasses", page.Find("[role=status]").TextContent));
    }

    [Theory]
    [InlineData("?stock=0123456789ab", "no longer served")]
    [InlineData("?glass=schott/NBK77", "not in this stock")]
    [InlineData("?sort=price", "no column to sort by")]
    public void AddressThatCannotBeFollowed_SaysSo(string query, string sentence) =>
        Assert.Contains(sentence, Open(query).Find(".notice").TextContent, StringComparison.Ordinal);

    [Fact]
    public void NoMatch_SaysWhatToDo() =>
        Assert.Contains("widen the filter", Open("?find=zzzz").Find(".empty").TextContent, StringComparison.Ordinal);

    [Theory]
    [InlineData(GlassMapHeight.Index, 0)]
    [InlineData(GlassMapHeight.Partial, 1)]
    [InlineData(GlassMapHeight.Delta, 1)]
    public void Map_DrawsAsManyDotsAsTheListAndTheNormalLineWhereItBelongs(GlassMapHeight height, int lines)
    {
        IReadOnlyList<GlassFigures> all = GlassFigures.Of(ServedStock.Stock);
        GlassFigures[] shown = [.. all.Where(g => g.Glass.Maker == "schott" && g.PartialGF is not null)];
        Render<GlassDotMap>(p => p.Add(m => m.All, all).Add(m => m.Shown, shown).Add(m => m.Height, height));
        var figure = Sent[^1].Figure;
        Assert.Equal(shown.Length, Sent[^1].Traces[1]!.X.Length);
        Assert.Equal(lines, figure.Paths.Length);
        Assert.True(figure.X.From > figure.X.To);
    }

    private IRenderedComponent<GlassListPage> Open(string query)
    {
        Navigation.NavigateTo("glasses" + query);
        return Render<GlassListPage>();
    }
}
