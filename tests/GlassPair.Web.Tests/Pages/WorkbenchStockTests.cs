using Bunit;
using GlassPair.Web.Addresses;
using GlassPair.Web.Components.Charts;
using GlassPair.Web.Components.Pages;
using GlassPair.Web.Hosting;
using GlassPair.Web.Stocks;
using GlassPair.Web.Work;
using Microsoft.AspNetCore.Components;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Logging.Abstractions;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Tests.Pages;

/// <summary>What the page says when the catalogue changes under it.</summary>
public sealed class WorkbenchStockTests : BunitContext
{
    private readonly string _folder = Directory.CreateTempSubdirectory("glasspair-page-").FullName;
    private readonly StockLibrary _library;

    public WorkbenchStockTests()
    {
        string catalogue = Directory.CreateDirectory(Path.Combine(_folder, "catalogue")).FullName;
        File.Copy(Path.Combine(AppContext.BaseDirectory, "data", "catalogue", "schott.csv"), Path.Combine(catalogue, "schott.csv"));
        _library = new StockLibrary(
            Options.Create(new StockOptions { Folder = catalogue, ArchiveFolder = Path.Combine(_folder, "archive") }), TimeProvider.System, NullLogger<StockLibrary>.Instance);
        Services.AddSingleton(_library);
        Services.AddSingleton(Options.Create(new WorkOptions { AtOnce = 2 }));
        Services.AddSingleton<WorkGate>().AddSingleton<ShortlistService>().AddSingleton<WorkbenchAnswers>().AddScoped<LastRequirement>();
        Services.AddSingleton(TimeProvider.System).AddScoped<CircuitPresence>();
        Services.AddSingleton(new DemoRequirement("A test objective", WorkbenchAddress.Read("?f=240&n=6").State));
        ComponentFactories.AddStub<GlassMap>();
        ComponentFactories.AddStub<FocalShiftChart>();
        ComponentFactories.AddStub<PowersFigure>();
        SetRendererInfo(new RendererInfo("Server", isInteractive: true));
    }

    private string CsvFile => Path.Combine(_library.Folder, "schott.csv");

    [Fact]
    public void OlderStock_IsShownAsItWasAndOffersTodays()
    {
        string then = _library.Current.Id;
        ChangeCatalogue(lines => lines[..^1]);
        Assert.NotEqual(then, _library.Current.Id);

        var page = Open($"?v=1&f=240&n=6&stock={then}");

        var notice = page.FindAll(".notice").Single(n => n.TextContent.Contains("older stock", StringComparison.Ordinal));
        Assert.Contains(then, notice.TextContent, StringComparison.Ordinal);
        Assert.Equal($"?v=1&f=240&n=6&stock={_library.Current.Id}", notice.QuerySelector("a")!.GetAttribute("href"));
        Assert.True(_library.TryFind(then, out Catalogue.Stock? old));
        Assert.Contains($"of {old.Glasses.Length} glasses", page.Find(".funnel").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void CatalogueChanges_WhileThePageIsOpen_SaysSoAndKeepsTheAnswer()
    {
        var page = Open("?v=1&f=240&n=6");
        string first = page.Find(".rank tbody button").TextContent;

        ChangeCatalogue(lines => lines[..^1]);

        page.WaitForAssertion(() => Assert.Contains(page.FindAll(".notice"), n => n.TextContent.Contains("Rank again on today’s stock", StringComparison.Ordinal)));
        Assert.Equal(first, page.Find(".rank tbody button").TextContent);
    }

    [Fact]
    public void FaultyCatalogue_IsSaidWithItsPlaceWhileTheOldOneServes()
    {
        var page = Open("?v=1&f=240&n=6");

        ChangeCatalogue(lines => [.. lines, "schott,BROKEN,sellmeier,oops"]);

        page.WaitForAssertion(() => Assert.Contains(page.FindAll(".notice"), n => n.TextContent.Contains("cannot be used", StringComparison.Ordinal) && n.TextContent.Contains("schott.csv", StringComparison.Ordinal)));
        Assert.NotEmpty(page.FindAll(".rank tbody button"));
    }

    protected override void Dispose(bool disposing)
    {
        base.Dispose(disposing);
        Directory.Delete(_folder, recursive: true);
    }

    private void ChangeCatalogue(Func<string[], string[]> change)
    {
        File.WriteAllText(CsvFile, string.Join('\n', change(File.ReadAllLines(CsvFile))) + "\n");
        _library.Reload();
    }

    private IRenderedComponent<Workbench> Open(string query)
    {
        Services.GetRequiredService<NavigationManager>().NavigateTo("/" + query);
        IRenderedComponent<Workbench> page = Render<Workbench>();
        page.WaitForState(() => page.FindAll(".rank .bar").Count > 0);
        return page;
    }
}
