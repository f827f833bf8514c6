using Bunit;
using GlassPair.Web.Addresses;
using GlassPair.Web.Components.Pages;
using Microsoft.Extensions.DependencyInjection;

namespace GlassPair.Web.Tests.Glasses;

public sealed class GlassPageTests : GlassPagesTestBase
{
    // nd and the partial dispersions: data sheet of N-BK7 by its maker, from memory; vd and ve: M. N. Polyanskiy, refractiveindex.info, page of the glass.
    [Theory]
    [InlineData("nd", "1.51680")]
    [InlineData("vd", "64.17")]
    [InlineData("ve", "63.96")]
    [InlineData("Pg,F", "0.5349")]
    [InlineData("ΔPg,F", "−0.0009")]
    public void KeyFigures_AreThoseOfTheDataSheet(string name, string value) =>
        Assert.Equal(value, Open("schott", "N-BK7").FindAll(".key-figures div").Single(d => d.QuerySelector("dt")!.TextContent == name).QuerySelector("dd")!.TextContent.Trim());

    [Theory]
    [InlineData("C,s", "0.5612")]    // data sheet of N-BK7 by its maker, from memory
    [InlineData("d,C", "0.3076")]    // opticsrealm.com, optics tutorial 11, homework solutions, quoting the data sheet
    [InlineData("e,d", "0.2386")]    // data sheet of N-BK7 by its maker, from memory
    public void PartialDispersions_AreThoseOfTheDataSheet(string lines, string value) =>
        Assert.Equal(value, Row(Open("schott", "N-BK7"), "P" + lines).Last());

    [Fact]
    public void Lines_ShowIndexAndItsChangeWithTemperature()
    {
        string[] cells = Row(Open("schott", "N-BK7"), "e mercury");
        Assert.Equal("546.0740", cells[0]);
        Assert.Equal("1.518722", cells[1]);    // 1.51872: data sheet of N-BK7 by its maker, from memory
        Assert.Equal(3.0, double.Parse(cells[3].TrimStart('+'), System.Globalization.CultureInfo.InvariantCulture), 0.15);    // +20 to +40 °C: data sheet as printed at pmoptics.com/Glass_Temperature_Coefficient.html
        Assert.Equal(1.6, double.Parse(cells[4].TrimStart('+'), System.Globalization.CultureInfo.InvariantCulture), 0.15);    // the same; at 20 °C both are a little lower
    }

    [Fact]
    public void Address_IsReadWithoutRegardToCase() =>
        Assert.StartsWith("N-BK7", Open("SCHOTT", "n-bk7").Find("h1").TextContent, StringComparison.Ordinal);

    [Fact]
    public void UnknownGlass_ListsTheClosestNames()
    {
        IRenderedComponent<GlassPage> page = Open("schott", "NBK77");
        Assert.Equal("No glass of that name", page.Find("h1").TextContent);
        Assert.Equal("glasses/schott/N-BK7", page.FindAll("li a")[0].GetAttribute("href"));
    }

    [Fact]
    public void FittedGlass_ShowsTheFitAndWhyALineWasLeftOut()
    {
        IRenderedComponent<GlassPage> page = Open("lzos", "TK9");
        Assert.Contains("fit to 30 of them", page.Markup, StringComparison.Ordinal);
        Assert.Contains("852.1 nm", page.Find(".sentences").TextContent, StringComparison.Ordinal);
        string link = page.FindAll("a").Single(a => a.TextContent == "Open the table in the fit").GetAttribute("href")!;
        Navigation.NavigateTo(link);
        IRenderedComponent<FitPage> fit = Render<FitPage>();
        fit.WaitForAssertion(() => Assert.Equal(31, fit.FindAll(".lines tbody tr").Count));
        Assert.Contains("1 line left out by you", fit.Find(".reading").TextContent, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("schott", "N-BK7", "N-BK7HT")]
    [InlineData("schott", "N-BK7HT", "N-BK7")]
    public void Twins_AreNamed(string maker, string name, string twin) =>
        Assert.Contains(Open(maker, name).FindAll("a.twin"), a => a.TextContent == twin);

    [Fact]
    public void GlassesThatComeNear_AreOtherDispersionsNearestFirst()
    {
        string[][] rows = [.. Open("schott", "N-BK7").FindAll("[aria-label='Glasses that come near'] tbody tr").Skip(1).Select(r => r.QuerySelectorAll("td").Select(c => c.TextContent).ToArray())];
        double[] distances = [.. rows.Select(r => double.Parse(r[5], System.Globalization.CultureInfo.InvariantCulture))];
        Assert.Equal(Components.Glasses.GlassNeighbors.Count, distances.Length);
        Assert.Equal(distances.Order(), distances);
        Assert.True(distances[0] > 0.0);
    }

    [Fact]
    public void Band_CanBeTypedAndStandsInTheAddress()
    {
        IRenderedComponent<GlassPage> page = Open("schott", "N-BK7");
        page.Find("#field-short").Input("g");
        page.WaitForAssertion(() => Assert.Equal("glasses/schott/N-BK7?v=1&short=g", Address));
        Assert.Contains("435.83", page.Markup, StringComparison.Ordinal);
        page.Find("#field-short").Input("700");
        page.WaitForAssertion(() => Assert.Contains("must lie below", page.Find("#field-short-problem").TextContent, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("25", true)]
    [InlineData("1,5", false)]
    [InlineData("-1", false)]
    [InlineData("NaN", false)]
    [InlineData("", false)]
    public void Thickness_ThatCannotBeRead_KeepsTheLastPictureAndSaysWhy(string typed, bool isRead)
    {
        IRenderedComponent<GlassPage> page = Open("schott", "N-BK7");
        page.Find("#field-thickness").Input(typed);
        Assert.Equal(isRead, page.FindAll("#field-thickness-problem").Count == 0);
        Assert.Contains(isRead ? "Through 25 mm" : "Through 10 mm", page.Markup, StringComparison.Ordinal);
    }

    [Fact]
    public void EveryGlassOfTheStock_HasAPage()
    {
        // Every 40th, and those with a fit, without thermal data, without transmittance.
        foreach (var glass in ServedStock.Stock.Glasses.Where((g, i) => i % 40 == 0 || g.Fit is not null))
        {
            Navigation.NavigateTo("glasses");
            IRenderedComponent<GlassPage> page = Open(glass.Maker, glass.Name);
            Assert.StartsWith(glass.Name, page.Find("h1").TextContent, StringComparison.Ordinal);
            Assert.DoesNotContain("NaN", page.Markup, StringComparison.Ordinal);
        }
    }

    [Theory]
    [InlineData("Use as positive element", "&as=positive")]
    [InlineData("Use as negative element", "&as=negative")]
    public void WayToTheWorkbench_KeepsTheRequirementAndDemandsTheGlass(string words, string sign)
    {
        WorkbenchState last = WorkbenchState.Empty.With(NumberField.FocalLength, "240").With(NumberField.FNumber, "6");
        Services.GetRequiredService<LastRequirement>().State = last with { Exclude = last.Exclude.Add("schott/N-BK7") };
        string link = Open("schott", "N-BK7").FindAll("a.button").Single(a => a.TextContent.Trim() == words).GetAttribute("href")!;
        Assert.Equal($"?v=1&f=240&n=6&include=schott/N-BK7{sign}&glass=schott/N-BK7", link);
        Assert.Equal(link, WorkbenchAddress.Write(WorkbenchAddress.Read(link).State));
    }

    [Fact]
    public void LeadAndSuccessor_AreSaid()
    {
        var lead = ServedStock.Stock.Glasses.First(g => g.ContainsLead);
        Assert.Contains("contains lead", Open(lead.Maker, lead.Name).Find(".verdicts").TextContent, StringComparison.Ordinal);
        var replaced = ServedStock.Stock.Glasses.First(g => g.ReplacedBy is not null);
        Assert.Contains(replaced.ReplacedBy!, Open(replaced.Maker, replaced.Name).Find(".verdicts").TextContent, StringComparison.Ordinal);
    }

    private static string[] Row(IRenderedComponent<GlassPage> page, string heading) =>
        [.. page.FindAll("tbody tr").First(r => r.QuerySelector("th")?.TextContent.Trim() == heading).QuerySelectorAll("td").Select(c => c.TextContent)];

    private IRenderedComponent<GlassPage> Open(string maker, string name)
    {
        Navigation.NavigateTo($"glasses/{maker}/{Uri.EscapeDataString(name)}");
        return Render<GlassPage>(p => p.Add(g => g.Maker, maker).Add(g => g.Name, name));
    }
}
