using Microsoft.Playwright;

namespace GlassPair.Browser.Tests;

[Collection(SharedApp.Name)]
public sealed class ApiReferenceTests(AppFixture app)
{
    [Fact]
    public async Task ReferencePage_Opened_ShowsTheCallsWithoutAnotherHostOrABrokenRule()
    {
        IPage page = await app.Browser.NewPageAsync();
        List<string> asked = [];
        List<string> errors = [];
        page.Request += (_, request) => asked.Add(request.Url);
        page.Console += (_, message) =>
        {
            if (message.Type == "error")
            {
                errors.Add(message.Text);
            }
        };
        await page.GotoAsync(app.BaseUrl + "/api-docs/");
        await Assertions.Expect(page.GetByText("/api/v1/stocks").First).ToBeAttachedAsync(new() { Timeout = 60_000 });
        await page.WaitForLoadStateAsync(LoadState.NetworkIdle);
        Assert.All(asked.Where(url => !url.StartsWith("data:", StringComparison.Ordinal) && !url.StartsWith("blob:", StringComparison.Ordinal)), url => Assert.StartsWith(app.BaseUrl, url, StringComparison.Ordinal));
        Assert.Empty(errors);
        await page.CloseAsync();
    }
}
