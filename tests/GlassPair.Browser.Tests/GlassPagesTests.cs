using System.Text.RegularExpressions;
using Deque.AxeCore.Commons;
using Deque.AxeCore.Playwright;
using Microsoft.Playwright;

namespace GlassPair.Browser.Tests;

/// <summary>What people do on the pages of glasses and of fits.</summary>
[Collection(SharedApp.Name)]
public sealed partial class GlassPagesTests(AppFixture app)
{
    private const string Measured =
        "/fit?v=1&rows=nm;n%0A404,66;1,54111%0A435,83;1,536704%0A0,479;1,531%0Aabc;1,5%0A546,07;1,527063%0A587,56;1,524786%0A632,8;1,52279%0A656,27;1,521897%0A852,1;1,51681&out=852.1&form=cubic";

    public static TheoryData<string, int, ColorScheme> Views
    {
        get
        {
            TheoryData<string, int, ColorScheme> views = [];
            foreach (string address in new[]
            {
                "/glasses", "/glasses?v=1&find=zzz&stock=0123456789ab", "/glasses?v=1&glass=schott/N-BK7&map=partial", "/glasses/schott/N-BK7", "/glasses/lzos/TK9",
                "/glasses/hikari/LAK09?v=1&thickness=abc&short=900", "/glasses/schott/NBK77", "/fit", Measured,
            })
            {
                views.Add(address, 1440, ColorScheme.Light);
                views.Add(address, 390, ColorScheme.Dark);
            }

            return views;
        }
    }

    [Theory]
    [MemberData(nameof(Views))]
    public async Task Page_HasNoAccessibilityFindingAndFitsItsWidth(string address, int width, ColorScheme scheme)
    {
        IPage page = await app.OpenAsync(address, width, 900, scheme);
        await Assertions.Expect(page.Locator(".plot[aria-busy]")).ToHaveCountAsync(0, new() { Timeout = 30_000 });
        AxeResult found = await page.RunAxe(new AxeRunOptions { RunOnly = new RunOnlyOptions { Type = "tag", Values = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"] } });
        Assert.Empty(found.Violations.Select(v => $"{v.Id}: {v.Nodes[0].Html}"));
        Assert.True(await page.EvaluateAsync<int>("document.documentElement.scrollWidth - innerWidth") <= 0);
    }

    [Fact]
    public async Task List_ByKeyboardAlone_LeadsToAGlassAndOnToTheWorkbench()
    {
        IPage page = await app.OpenAsync("/glasses");
        await page.GetByRole(AriaRole.Searchbox).FocusAsync();
        await page.Keyboard.TypeAsync("n-bk7");
        await Assertions.Expect(page).ToHaveURLAsync(WithSearch());
        await page.GetByRole(AriaRole.Region, new() { Name = "Glasses", Exact = true }).FocusAsync();
        await page.Keyboard.PressAsync("ArrowDown");
        await Assertions.Expect(page.GetByRole(AriaRole.Link, new() { Name = "N-BK7", Exact = true })).ToBeFocusedAsync();
        await page.Keyboard.PressAsync("Enter");
        await Assertions.Expect(page.GetByRole(AriaRole.Heading, new() { Level = 1 })).ToHaveTextAsync("N-BK7 schott");
        await page.GetByRole(AriaRole.Link, new() { Name = "Use as positive element" }).PressAsync("Enter");
        await Assertions.Expect(page).ToHaveURLAsync(WithDemandedGlass());
    }

    [Fact]
    public async Task Link_ShowsTheSameInAnotherBrowser()
    {
        IPage first = await app.OpenAsync("/glasses");
        await first.GetByRole(AriaRole.Searchbox).FillAsync("schott lak");
        await first.GetByRole(AriaRole.Button, new() { Name = "vd" }).ClickAsync();
        await Assertions.Expect(first).ToHaveURLAsync(new Regex("sort=vd"));
        IPage second = await app.OpenAsync(new Uri(first.Url).PathAndQuery);
        Assert.Equal(await first.Locator("tbody").InnerTextAsync(), await second.Locator("tbody").InnerTextAsync());
    }

    [Fact]
    public async Task Fit_TypedThenLineLeftOut_StandsInTheAddress()
    {
        IPage page = await app.OpenAsync("/fit");
        await page.GetByRole(AriaRole.Button, new() { Name = "Example (invented)" }).ClickAsync();
        await Assertions.Expect(page.GetByText("worst line")).ToBeVisibleAsync();
        await page.GetByRole(AriaRole.Checkbox, new() { Name = "Use the index at 852.11 nm" }).UncheckAsync();
        await Assertions.Expect(page.GetByText("1 line left out by you;")).ToBeVisibleAsync();
        IPage again = await app.OpenAsync(new Uri(page.Url).PathAndQuery);
        Assert.Equal(await page.Locator(".answer .reading").InnerTextAsync(), await again.Locator(".answer .reading").InnerTextAsync());
        await page.GoBackAsync();
        await Assertions.Expect(page.GetByRole(AriaRole.Checkbox, new() { Name = "Use the index at 852.11 nm" })).ToBeCheckedAsync();
    }

    [Fact]
    public async Task UnknownGlass_IsNotFoundAndNamesTheClosest()
    {
        IPage page = await app.Browser.NewPageAsync();
        IResponse answer = (await page.GotoAsync(app.BaseUrl + "/glasses/schott/NBK77"))!;
        Assert.Equal(404, answer.Status);
        await page.GetByRole(AriaRole.Link, new() { Name = "schott/N-BK7", Exact = true }).ClickAsync();
        await Assertions.Expect(page.GetByRole(AriaRole.Heading, new() { Level = 1 })).ToHaveTextAsync("N-BK7 schott");
    }

    [Fact]
    public async Task Csv_IsSavedUnderTheNameOfTheStock()
    {
        IPage page = await app.OpenAsync("/glasses?v=1&find=lak");
        IDownload file = await page.RunAndWaitForDownloadAsync(() => page.GetByRole(AriaRole.Link, new() { Name = "Download CSV" }).ClickAsync());
        Assert.Matches("^glasses-[0-9a-f]{12}\\.csv$", file.SuggestedFilename);
    }

    [GeneratedRegex("find=n-bk7")]
    private static partial Regex WithSearch();

    [GeneratedRegex("include=schott/N-BK7&as=positive&glass=schott/N-BK7")]
    private static partial Regex WithDemandedGlass();
}
