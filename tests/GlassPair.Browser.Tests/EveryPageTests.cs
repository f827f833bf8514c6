using Deque.AxeCore.Commons;
using Deque.AxeCore.Playwright;
using Microsoft.Playwright;

namespace GlassPair.Browser.Tests;

/// <summary>Every page and state, in both schemes and three widths: accessible, complete, silent.</summary>
[Collection(SharedApp.Name)]
public sealed class EveryPageTests(AppFixture app)
{
    private static readonly string[] s_levels = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"];

    public static TheoryData<string> Addresses =>
    [
        "/",
        "/?v=1",
        "/?v=1&f=250&n=6",
        "/?v=1&f=250&n=0.3",
        "/?v=1&f=2000&n=1",
        "/?v=1&f=250&n=6&stock=000000000000",
        "/glasses",
        "/glasses/schott/N-BK7",
        "/glasses/lzos/TK9",
        "/glasses/schott/N-BK77",
        "/fit",
        "/nowhere",
    ];

    [Theory]
    [MemberData(nameof(Addresses))]
    public async Task Page_HasNoAccessibilityFinding_AndNoScriptError(string address)
    {
        foreach ((int width, ColorScheme scheme) in new[] { (1440, ColorScheme.Light), (1024, ColorScheme.Dark), (390, ColorScheme.Light) })
        {
            IPage page = await app.OpenAsync(address, width, scheme: scheme);
            AxeResult result = await page.RunAxe(new AxeRunOptions { RunOnly = new RunOnlyOptions { Type = "tag", Values = [.. s_levels] } });
            Assert.True(
                result.Violations.Length == 0,
                $"{address} at {width} px, {scheme}: {string.Join("; ", result.Violations.Select(v => $"{v.Id} at {string.Join(", ", v.Nodes.Select(n => n.Target))}"))}");
            Assert.True(await page.EvaluateAsync<bool>("document.documentElement.scrollWidth <= innerWidth"), $"{address} scrolls sideways at {width} px.");
            Assert.Empty(app.ErrorsOf(page));
            await page.Context.CloseAsync();
        }
    }
}
