using Microsoft.Playwright;
using static Microsoft.Playwright.Assertions;

namespace GlassPair.Browser.Tests;

/// <summary>What somebody does who has only read the README.</summary>
[Collection(SharedApp.Name)]
public sealed class NewcomerTests(AppFixture app)
{
    [Fact]
    public async Task FirstVisit_ShowsTheInventedExample_AndSaysSo()
    {
        IPage page = await app.OpenAsync("/");
        await Expect(page.GetByText("invented scenario").First).ToBeVisibleAsync();
        await Expect(Rows(page).First).ToBeVisibleAsync();
        await Expect(page.Locator(".map .js-plotly-plot").First).ToBeVisibleAsync();
    }

    [Fact]
    public async Task TypingARequirement_GivesALink_ThatShowsAColleagueTheSame()
    {
        IPage page = await app.OpenAsync("/");
        await page.GetByLabel("Focal length", new() { Exact = true }).FillAsync("250");
        await page.GetByLabel("f-number", new() { Exact = true }).FillAsync("6");
        await Expect(page).ToHaveURLAsync(new System.Text.RegularExpressions.Regex("f=250&n=6"));
        await Expect(page.Locator(".head")).ToContainTextAsync("250 mm f/6");
        await Rows(page).Nth(3).GetByRole(AriaRole.Rowheader).GetByRole(AriaRole.Button).ClickAsync();
        await Expect(Rows(page).Nth(3)).ToHaveAttributeAsync("aria-current", "true");
        string pair = await page.Locator(".pair h2").InnerTextAsync();
        string[] said = await Said(page);
        string title = await page.TitleAsync();

        IPage colleague = await app.OpenAsync(new Uri(page.Url).PathAndQuery);
        await Expect(colleague.Locator(".pair h2")).ToHaveTextAsync(pair, new() { UseInnerText = true });
        await Expect(colleague.Locator(".js-plotly-plot")).ToHaveCountAsync(await page.Locator(".js-plotly-plot").CountAsync());
        Assert.Equal(title, await colleague.TitleAsync());
        Assert.Contains("250 mm f/6", title, StringComparison.Ordinal);
        Assert.NotEmpty(said);
        Assert.Equal(said, await Said(colleague));
    }

    [Fact]
    public async Task Back_ReturnsToThePairBefore()
    {
        IPage page = await app.OpenAsync("/?v=1&f=250&n=6");
        string first = await page.Locator(".pair h2").InnerTextAsync();
        await Rows(page).Nth(4).GetByRole(AriaRole.Rowheader).GetByRole(AriaRole.Button).ClickAsync();
        await Expect(page.Locator(".pair h2")).Not.ToHaveTextAsync(first, new() { UseInnerText = true });
        await page.GoBackAsync();
        await Expect(page.Locator(".pair h2")).ToHaveTextAsync(first, new() { UseInnerText = true });
    }

    [Fact]
    public async Task Keyboard_ChoosesAndPins()
    {
        IPage page = await app.OpenAsync("/?v=1&f=250&n=6");
        await Rows(page).First.GetByRole(AriaRole.Rowheader).GetByRole(AriaRole.Button).FocusAsync();
        await page.Keyboard.PressAsync("ArrowDown");
        await page.Keyboard.PressAsync("ArrowDown");
        await page.Keyboard.PressAsync("Enter");
        await Expect(Rows(page).Nth(2)).ToHaveAttributeAsync("aria-current", "true");
        await page.Keyboard.PressAsync("p");
        await Expect(page.Locator("tr.pinned")).ToHaveCountAsync(1);
    }

    [Fact]
    public async Task Phone_ShowsVerdictThenMapThenRanking_WithoutScrollingSideways()
    {
        IPage page = await app.OpenAsync("/?v=1&f=250&n=6", 390, 844);
        await Expect(Rows(page).First).ToBeVisibleAsync();
        double[] tops = await page.EvaluateAsync<double[]>("['.pair', '.map', '.rank', '.req'].map(s => document.querySelector(s).getBoundingClientRect().top)");
        Assert.Equal(tops.Order(), tops);
        Assert.True(await page.EvaluateAsync<bool>("document.documentElement.scrollWidth <= innerWidth"));
    }

    [Theory]
    [InlineData("/?f=abc&n=6", "abc")]
    [InlineData("/?f=1,5&n=6", "1,5")]
    [InlineData("/?f=NaN&n=6", "NaN")]
    [InlineData("/?f=250&n=0", "0")]
    public async Task BadNumberInTheAddress_StaysAsTyped_WithTheReason(string address, string typed)
    {
        IPage page = await app.OpenAsync(address);
        ILocator field = page.Locator("input[aria-invalid=true]").First;
        await Expect(field).ToHaveValueAsync(typed);
        await Expect(page.Locator(".problem").First).ToBeVisibleAsync();
    }

    [Fact]
    public async Task TypingFasterThanTheServerAnswers_LosesNoCharacter()
    {
        IPage page = await app.OpenAsync("/?v=1&f=250&n=6");
        ILocator field = page.GetByLabel("Focal length", new() { Exact = true });
        await field.FillAsync("");
        foreach (int pause in new[] { 0, 5, 12, 25, 40, 60 })
        {
            await field.PressSequentiallyAsync("1234.5678", new() { Delay = pause });
            await page.WaitForTimeoutAsync(400);
            await Expect(field).ToHaveValueAsync("1234.5678");
            await field.FillAsync("");
        }
    }

    [Fact]
    public async Task ImpossibleValue_KeepsTheLastAnswer()
    {
        IPage page = await app.OpenAsync("/?v=1&f=250&n=6");
        await page.GetByLabel("f-number", new() { Exact = true }).FillAsync("0.3");
        await Expect(page.Locator(".problem").First).ToBeVisibleAsync();
        await Expect(Rows(page).First).ToBeVisibleAsync();
        await page.GetByLabel("f-number", new() { Exact = true }).FillAsync("8");
        await Expect(page.Locator(".problem")).ToHaveCountAsync(0);
        await Expect(page.Locator(".head")).ToContainTextAsync("f/8");
    }

    /// <summary>The verdicts and the figures of the chosen pair.</summary>
    private static async Task<string[]> Said(IPage page) =>
        [.. await page.Locator(".pair .verdicts li").AllInnerTextsAsync(), .. await page.Locator(".pair dl.facts dd").AllInnerTextsAsync()];

    internal static ILocator Rows(IPage page) => page.Locator(".rank tbody tr:not(.group):not(.pinned):has(th)");
}
