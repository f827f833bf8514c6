using Bunit;
using Bunit.TestDoubles;
using GlassPair.Web.Addresses;
using GlassPair.Web.Components.Charts;
using GlassPair.Web.Components.Pages;
using GlassPair.Web.Hosting;
using GlassPair.Web.Tests.Glasses;
using GlassPair.Web.Work;
using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Web;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Tests.Pages;

public sealed class WorkbenchTests : BunitContext
{
    private const string Small = "?v=1&f=240&n=6&makers=hoya";

    public WorkbenchTests()
    {
        Services.AddSingleton(ServedStock.Library);
        Services.AddSingleton(Options.Create(new WorkOptions { AtOnce = 2 }));
        Services.AddSingleton<WorkGate>().AddSingleton<ShortlistService>().AddSingleton<WorkbenchAnswers>().AddScoped<LastRequirement>();
        Services.AddSingleton(TimeProvider.System).AddScoped<CircuitPresence>();
        Services.AddSingleton(new DemoRequirement("A test objective", WorkbenchAddress.Read("?f=240&n=6&makers=hoya").State));
        ComponentFactories.AddStub<GlassMap>();
        ComponentFactories.AddStub<FocalShiftChart>();
        ComponentFactories.AddStub<PowersFigure>();
        SetRendererInfo(new RendererInfo("Server", isInteractive: true));
    }

    private BunitNavigationManager Navigation => (BunitNavigationManager)Services.GetRequiredService<NavigationManager>();

    private string Query => new Uri(Navigation.Uri).Query;

    [Fact]
    public void FirstVisit_ShowsTheExampleAndSaysSo()
    {
        var page = Open("");

        Assert.Contains("This is an example: A test objective", page.Find(".notice.info").TextContent, StringComparison.Ordinal);
        Assert.Equal("?v=1", page.Find(".notice.info a").GetAttribute("href"));
        Assert.Equal("240", page.Find("#field-f").GetAttribute("value"));
        Assert.NotEmpty(page.FindAll(".rank tbody tr"));
    }

    [Fact]
    public void EmptyRequirement_AsksForWhatIsMissing()
    {
        var page = Render("?v=1");

        Assert.Contains("Give a focal length and an f-number", page.Find(".rank").TextContent, StringComparison.Ordinal);
        Assert.Empty(page.FindAll("[aria-invalid]"));
    }

    [Fact]
    public void Link_ShowsWhatItSays()
    {
        var page = Open(Small);

        Assert.Equal(Ranked("").Pairs[0].Positive.Glass.Name, Title(page).Split(": ")[1].Split(" + ")[0]);
        Assert.StartsWith("240 mm f/6, 480–644 nm", Title(page), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Typing_ShowsTheNewAnswerAndReplacesTheAddress()
    {
        var page = Open(Small);
        int before = Navigation.History.Count;

        await page.InvokeAsync(() => page.Find("#field-f").Input("500"));

        page.WaitForAssertion(() => Assert.StartsWith("500 mm f/6", Title(page), StringComparison.Ordinal));
        await AddressAsync(q => q.Contains("f=500", StringComparison.Ordinal));
        Assert.Equal(before, Navigation.History.Count);
        Assert.True(Navigation.History.First().Options.ReplaceHistoryEntry);
    }

    [Fact]
    public async Task Typing_Nonsense_KeepsTheLastAnswerAndTheText()
    {
        var page = Open(Small);
        string first = page.Find(".rank tbody button").TextContent;

        await page.InvokeAsync(() => page.Find("#field-f").Input("24o"));

        await AddressAsync(q => q.Contains("f=24o", StringComparison.Ordinal));
        Assert.Equal("24o", page.Find("#field-f").GetAttribute("value"));
        Assert.Contains("“24o” is not a number", page.Find("#field-f-problem").TextContent, StringComparison.Ordinal);
        Assert.Equal(first, page.Find(".rank tbody button").TextContent);
        Assert.NotEmpty(page.FindAll(".bench.stale"));
    }

    [Fact]
    public async Task Choosing_PushesTheAddressSoThatBackWorks()
    {
        var page = Open(Small);
        string first = page.Find("[aria-current=true] button").TextContent;
        string before = Navigation.Uri;

        await page.InvokeAsync(() => page.FindAll(".rank tbody button")[2].Click());

        page.WaitForAssertion(() => Assert.NotEqual(first, page.Find("[aria-current=true] button").TextContent));
        Assert.Contains("pair=hoya/", Query, StringComparison.Ordinal);
        Assert.False(Navigation.History.First().Options.ReplaceHistoryEntry);

        Navigation.NavigateTo(before);
        page.WaitForAssertion(() => Assert.Equal(first, page.Find("[aria-current=true] button").TextContent));
    }

    [Fact]
    public async Task Address_OpenedAnew_ShowsTheSame()
    {
        var page = Open(Small);
        await page.InvokeAsync(() => page.FindAll(".rank tbody button")[2].Click());
        await AddressAsync(q => q.Contains("pair=", StringComparison.Ordinal));
        await page.InvokeAsync(() => page.FindAll(".rank tbody button")[1].KeyDown("p"));
        await AddressAsync(q => q.Contains("pin=", StringComparison.Ordinal));
        await page.InvokeAsync(() => page.FindAll(".rank thead button").Single(b => b.TextContent.Contains("Holds", StringComparison.Ordinal)).Click());
        await AddressAsync(q => q.Contains("sort=holds", StringComparison.Ordinal));

        var again = Open(Query);

        Assert.Equal(page.Find(".rank table").TextContent, again.Find(".rank table").TextContent);
        Assert.Equal(page.Find(".pair h2").TextContent, again.Find(".pair h2").TextContent);
        Assert.Equal(Title(page), Title(again));
    }

    [Fact]
    public async Task Pin_StaysOnTopUntilUnpinned()
    {
        var page = Open(Small);
        string name = page.FindAll(".rank tbody button")[1].TextContent;

        await page.InvokeAsync(() => page.FindAll(".rank tbody button")[1].KeyDown("p"));
        page.WaitForAssertion(() => Assert.Equal(name, page.Find(".rank tr.pinned button").TextContent));

        await page.InvokeAsync(() => page.Find(".rank tr.pinned button").KeyDown("p"));
        page.WaitForAssertion(() => Assert.Empty(page.FindAll(".rank tr.pinned")));
        Assert.DoesNotContain("pin=", Query, StringComparison.Ordinal);
    }

    [Fact]
    public void ChosenPair_NotAmongTheRanked_IsShownAllTheSame()
    {
        var page = Open(Small + "&pair=schott/N-BK7,schott/F2");

        Assert.Contains("N-BK7 + F2", page.Find(".pair h2").TextContent, StringComparison.Ordinal);
        Assert.Contains("not among the ranked", page.Find(".pair").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void ChosenPair_WrongWayRound_IsTheSamePair() =>
        Assert.Equal(Open(Small + "&pair=schott/N-BK7,schott/F2").Find(".pair h2").TextContent, Open(Small + "&pair=schott/F2,schott/N-BK7").Find(".pair h2").TextContent);

    [Theory]
    [InlineData("&pair=schott/NOPE,schott/F2", "schott/NOPE is not in this stock")]
    [InlineData("&short=g&long=C&pair=schott/N-BK7,schott/SF6G05", "schott/SF6G05 has no index over the whole band")]
    [InlineData("&pair=schott/N-BK7,schott/N-BK7", "disperse too much alike")]
    [InlineData("&pin=schott/N-BK7,schott/NOPE", "The pinned pair cannot be shown")]
    [InlineData("&stock=0123456789ab", "0123456789ab that this link was made on is not kept here")]
    [InlineData("&price=3", "means nothing here")]
    public void Link_WithWhatCannotBe_SaysSoAndShowsTheRest(string more, string words)
    {
        var page = Open(Small + more);

        Assert.Contains(page.FindAll(".notice"), n => n.TextContent.Contains(words, StringComparison.Ordinal));
        Assert.NotEmpty(page.FindAll(".pair h2"));
    }

    [Theory]
    [InlineData("?f=abc&n=6")]
    [InlineData("?f=1,5&n=6")]
    [InlineData("?f=NaN&n=6")]
    [InlineData("?f=%00&n=6")]
    [InlineData("?f=240&n=6&short=700")]
    [InlineData("?f=240&n=6&include=schott/NOPE")]
    public void Link_WithWrongValue_ShowsItBesideTheFieldAndNoAnswer(string query)
    {
        var page = Render(query);

        Assert.NotEmpty(page.FindAll(".problem"));
        Assert.Contains("Correct what is marked", page.Find(".rank").TextContent, StringComparison.Ordinal);
        Assert.Empty(page.FindAll(".rank table"));
    }

    [Fact]
    public async Task NoPairHolds_TellsWhatHelpsAndApplies()
    {
        var page = Open("?v=1&f=240&n=1&makers=hoya&take=50");
        page.WaitForAssertion(() => Assert.Contains(page.FindAll(".no-pair tr button"), b => !b.HasAttribute("disabled")), TimeSpan.FromSeconds(20));

        await page.InvokeAsync(() => page.FindAll(".no-pair tbody tr").First(r => r.TextContent.Contains("Stop down to", StringComparison.Ordinal)).QuerySelector("button")!.Click());

        await AddressAsync(q => !q.Contains("n=1&", StringComparison.Ordinal));
        page.WaitForAssertion(() => Assert.Empty(page.FindAll(".no-pair")));
    }

    [Fact]
    public async Task ManyClicks_BeforeARender_LeaveThePageWhole()
    {
        var page = Open(Small);

        for (int i = 0; i < 100; i++)
        {
            await page.InvokeAsync(() => page.FindAll(".rank tbody button")[i % 5].Click());
        }

        page.WaitForAssertion(() => Assert.Single(page.FindAll("tr[aria-current=true]")));
    }

    [Fact]
    public void BandThatNoGlassCovers_SaysThatNoneIsLeft()
    {
        var page = Open("?f=240&n=6&short=150&design=160&long=170");

        Assert.Contains("No pair is within the limits.", page.Find(".rank").TextContent, StringComparison.Ordinal);
        Assert.Contains("no index over the whole band", page.Find(".reasons").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void FaultyPanel_LeavesTheOthersWorking()
    {
        ComponentFactories.AddStub<GlassMap>((CapturedParameterView<GlassMap> _) => (RenderFragment)(_ => throw new InvalidOperationException("A fault of ours.")));

        var page = Open(Small);

        Assert.Contains("The map met an error that is ours", page.Find(".map").TextContent, StringComparison.Ordinal);
        Assert.NotEmpty(page.FindAll(".rank tbody button"));
        Assert.NotEmpty(page.FindAll(".pair h2"));
    }

    [Fact]
    public async Task Typing_BackToWhatWasShown_IsNotOvertakenByWhatWasTypedBetween()
    {
        var page = Open(Small);

        await page.InvokeAsync(() => page.Find("#field-f").Input("24"));
        await page.InvokeAsync(() => page.Find("#field-f").Input("240"));
        await Task.Delay(1_500);

        Assert.StartsWith("240 mm f/6", Title(page), StringComparison.Ordinal);
        Assert.Equal("240", page.Find("#field-f").GetAttribute("value"));
        Assert.Empty(page.FindAll(".bench.stale"));
    }

    private static WorkbenchAnswer Ranked(string more) => Controls.Ranked.Answer(Small + more);

    private static string Title(IRenderedComponent<Workbench> page)
    {
        var title = page.FindComponent<PageTitle>();
        return new BunitContext().Render(title.Instance.ChildContent!).Markup;
    }

    /// <summary>Waits until the address says something; a change of it alone draws nothing.</summary>
    private async Task AddressAsync(Predicate<string> says)
    {
        for (int i = 0; i < 400 && !says(Query); i++)
        {
            await Task.Delay(50);
        }

        Assert.True(says(Query), Query);
    }

    /// <summary>Opens the page at an address and waits for its answer.</summary>
    private IRenderedComponent<Workbench> Open(string query)
    {
        IRenderedComponent<Workbench> page = Render(query);
        page.WaitForState(() => page.FindAll(".rank .bar").Count > 0, TimeSpan.FromSeconds(20));
        return page;
    }

    private IRenderedComponent<Workbench> Render(string query)
    {
        Navigation.NavigateTo("/" + query);
        return Render<Workbench>();
    }
}
