using System.Text;
using AngleSharp.Dom;
using Bunit;
using GlassPair.Web.Components.Glasses;
using GlassPair.Web.Components.Pages;
using Microsoft.AspNetCore.Components.Forms;

namespace GlassPair.Web.Tests.Glasses;

public sealed class FitPageTests : GlassPagesTestBase
{
    [Fact]
    public void FirstVisit_SaysWhatToDo() => Assert.Contains("Paste at least 3 lines", Open("").Find(".reading").TextContent, StringComparison.Ordinal);

    [Fact]
    public void Example_IsCalledInventedAndFitsAtOnce()
    {
        IRenderedComponent<FitPage> page = Open("");
        Button(page, "Example (invented)").Click();
        Settled(page);
        Assert.Contains("invented", page.Find("textarea").GetAttribute("value"), StringComparison.Ordinal);
        Assert.Equal("worst line", page.FindAll(".lines tbody tr").Single(r => r.TextContent.Contains("852.11", StringComparison.Ordinal)).QuerySelector(".said")!.TextContent);
        Assert.StartsWith("fit?v=1&rows=", Address, StringComparison.Ordinal);
    }

    [Fact]
    public void LineLeftOut_ChangesTheFitAtOnceAndTheAddress()
    {
        IRenderedComponent<FitPage> page = Open(FitAddress.Write(FitExample.State));
        string before = page.Find(".reading b").TextContent;
        page.Find("input[aria-label='Use the index at 852.11 nm']").Change(false);
        Settled(page);
        Assert.NotEqual(before, page.Find(".reading b").TextContent);
        Assert.Contains("1 line left out by you; with all of them the RMS is " + before, page.Find(".reading").TextContent, StringComparison.Ordinal);
        Assert.Contains("&out=852.11", Address, StringComparison.Ordinal);
        Button(page, "Use all lines").Click();
        Settled(page);
        Assert.Equal(before, page.Find(".reading b").TextContent);
    }

    [Fact]
    public void Typing_FitsSoon()
    {
        IRenderedComponent<FitPage> page = Open("");
        page.Find("textarea").Input("486.13 1.52238\n587.56 1.5168\n656.27 1.51432\n435.83 1.52668\n");
        page.WaitForAssertion(() => Assert.Contains("4 lines fitted", page.Find(".reading").TextContent, StringComparison.Ordinal));
        page.WaitForAssertion(() => Assert.StartsWith("fit?v=1&rows=486.13+1.52238%0A", Address, StringComparison.Ordinal));
    }

    [Fact]
    public void FaultyRow_StandsBesideItsReason()
    {
        IRenderedComponent<FitPage> page = Open(FitAddress.Write(FitState.Empty with { Text = "486.13 1.52238\n587.56 abc\n656.27 1.51432\n435.83 1.52668" }));
        Assert.Contains("1 row of 4 cannot be used", page.Find("#rows-said").TextContent, StringComparison.Ordinal);
        Assert.Equal("587.56 abc ✕ “abc” is not a number that can be used.", page.Find(".faulty .fault").TextContent);
    }

    [Fact]
    public void FormAndTerms_AreFollowed()
    {
        IRenderedComponent<FitPage> page = Open(FitAddress.Write(FitExample.State));
        page.Find("#fit-form").Change("Sellmeier");
        Settled(page).Find("#fit-terms").Change("2");
        Settled(page);
        Assert.Contains("Sellmeier formula of 2 terms", page.Find(".reading").TextContent, StringComparison.Ordinal);
        Assert.EndsWith("&form=sellmeier&terms=2&name=invented/example", Address, StringComparison.Ordinal);
        page.Find("#fit-form").Change("");
        page.WaitForAssertion(() => Assert.DoesNotContain("terms", Address, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("#fit-form", "Cubic")]
    [InlineData("#fit-terms", "99")]
    [InlineData("#fit-unit", "feet")]
    public void ChoiceThatWasNotOffered_IsIgnored(string field, string value)
    {
        IRenderedComponent<FitPage> page = Open(FitAddress.Write(FitExample.State));
        string before = page.Find(".reading").TextContent;
        page.Find(field).Change(value);
        Settled(page);
        Assert.Equal(before, page.Find(".reading").TextContent);
    }

    [Fact]
    public void CatalogueRow_CanBeCopiedWithAndWithoutHeading()
    {
        IRenderedComponent<FitPage> page = Open(FitAddress.Write(FitExample.State));
        Assert.StartsWith("invented,example,", Button(page, "Copy catalogue row").GetAttribute("data-copy"), StringComparison.Ordinal);
        Assert.StartsWith("maker,name,form,", Button(page, "With heading").GetAttribute("data-copy"), StringComparison.Ordinal);
    }

    [Fact]
    public void TableTooLongForTheAddress_IsSaid()
    {
        IRenderedComponent<FitPage> page = Open("");
        page.Find("textarea").Input(string.Join('\n', Enumerable.Range(0, 300).Select(i => FormattableString.Invariant($"{400 + i}.123 1.{530000 - (i * 40)}"))));
        page.WaitForAssertion(() => Assert.Contains("too long for the address", page.Find(".notice").TextContent, StringComparison.Ordinal));
        page.WaitForAssertion(() => Assert.Contains("300 lines fitted", page.Find(".reading").TextContent, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("wavelength;n\r\n486,13;1,52238\r\n587,56;1,5168\r\n656,27;1,51432\r\n", "3 lines fitted")]
    [InlineData("<html></html>", "web page")]
    [InlineData("PK\u0003\u0004", "Excel workbook")]
    [InlineData("", "empty")]
    public void File_IsReadOrRefusedWithTheReason(string content, string said)
    {
        IRenderedComponent<FitPage> page = Open("");
        page.FindComponent<InputFile>().UploadFiles(InputFileContent.CreateFromText(content, "table.csv"));
        page.WaitForAssertion(() => Assert.Contains(said, page.Markup, StringComparison.Ordinal));
    }

    [Fact]
    public void FileNotInUtf8_IsRefused()
    {
        IRenderedComponent<FitPage> page = Open("");
        page.FindComponent<InputFile>().UploadFiles(InputFileContent.CreateFromBinary(Encoding.Latin1.GetBytes("Länge n\n486.13 1.52238\n"), "table.csv"));
        page.WaitForAssertion(() => Assert.Contains("Not UTF-8", page.Find(".problem").TextContent, StringComparison.Ordinal));
    }

    [Fact]
    public void FileTooLarge_IsRefusedWithTheLimit()
    {
        IRenderedComponent<FitPage> page = Open("");
        page.FindComponent<InputFile>().UploadFiles(InputFileContent.CreateFromText(new string('1', MeasuredTable.MaxLength + 1), "table.csv"));
        page.WaitForAssertion(() => Assert.Contains("up to 10,000", page.Find(".problem").TextContent, StringComparison.Ordinal));
    }

    private static IElement Button(IRenderedComponent<FitPage> page, string text) => page.FindAll("button").Single(b => b.TextContent == text);

    private IRenderedComponent<FitPage> Open(string query)
    {
        Navigation.NavigateTo("fit" + query);
        return Settled(Render<FitPage>());
    }

    private static IRenderedComponent<FitPage> Settled(IRenderedComponent<FitPage> page)
    {
        page.WaitForState(() => !page.Find(".fit").HasAttribute("aria-busy"));
        return page;
    }
}
