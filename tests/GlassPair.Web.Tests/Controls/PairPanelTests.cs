using Bunit;
using GlassPair.Web.Components.Charts;
using GlassPair.Web.Components.Controls;
using GlassPair.Web.Components.Pages;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Tests.Controls;

public sealed class PairPanelTests : BunitContext
{
    public PairPanelTests()
    {
        ComponentFactories.AddStub<FocalShiftChart>();
        ComponentFactories.AddStub<PowersFigure>();
    }

    [Fact]
    public void Pair_IsNamedWithLinksToItsGlasses()
    {
        var panel = Panel(Ranked.Few, 0);

        Assert.Equal(
            [$"glasses/hoya/{Ranked.Pairs[0].Positive.Glass.Name}", $"glasses/hoya/{Ranked.Pairs[0].Negative.Glass.Name}"],
            panel.FindAll("h2 a").Select(a => a.GetAttribute("href")));
    }

    [Fact]
    public void Findings_StartWithColorByWordAndSign()
    {
        var first = Panel(Ranked.Few, 0).Find(".verdicts li");

        Assert.Contains("✓ Color holds", first.TextContent.Replace("\n", " ", StringComparison.Ordinal), StringComparison.Ordinal);
    }

    [Fact]
    public void EveryFigure_OpensFormulaInputsAndSource() => Assert.All(
        Panel(Ranked.Few, 0).FindAll("details.figure"),
        figure =>
        {
            Assert.NotEmpty(figure.QuerySelector(".formula")!.TextContent);
            Assert.Contains("Source: ", figure.TextContent, StringComparison.Ordinal);
            Assert.NotEmpty(figure.QuerySelector(".value")!.TextContent.Trim());
        });

    [Fact]
    public void Pin_Pressed_ReportsThePair()
    {
        RankedPair? pinned = null;
        var panel = Render<PairPanel>(p => p.Add(c => c.Pair, Ranked.Pairs[1]).Add(c => c.Quality, Ranked.Few.Shortlist.Request.Quality).Add(c => c.PinToggled, c => pinned = c));

        panel.Find("button").Click();

        Assert.Same(Ranked.Pairs[1], pinned);
        Assert.Equal("false", panel.Find("button").GetAttribute("aria-pressed"));
    }

    [Fact]
    public void Pin_OfThePinnedPair_IsPressed() => Assert.Equal(
        "true",
        Render<PairPanel>(p => p.Add(c => c.Pair, Ranked.Pairs[1]).Add(c => c.Quality, Ranked.Few.Shortlist.Request.Quality).Add(c => c.Pinned, Ranked.Pairs[1])).Find("button").GetAttribute("aria-pressed"));

    private IRenderedComponent<PairPanel> Panel(WorkbenchAnswer answer, int index) =>
        Render<PairPanel>(p => p.Add(c => c.Pair, answer.Pairs[index]).Add(c => c.Quality, answer.Shortlist.Request.Quality));
}
