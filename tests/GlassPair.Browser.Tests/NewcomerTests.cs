using Microsoft.Playwright;

namespace GlassPair.Browser.Tests;

[Collection(SharedApp.Name)]
public sealed class NewcomerTests(AppFixture app)
{
    [Fact]
    public async Task FirstVisit_ShowsAHeading()
    {
        IPage page = await app.Browser.NewPageAsync();
        await page.GotoAsync(app.BaseUrl);
        await Assertions.Expect(page.Locator("h1")).ToHaveCountAsync(1);
    }
}
