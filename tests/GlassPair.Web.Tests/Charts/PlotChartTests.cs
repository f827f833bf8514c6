using Bunit;
using GlassPair.Web.Components.Charts;
using Microsoft.AspNetCore.Components;
using Microsoft.JSInterop;

namespace GlassPair.Web.Tests.Charts;

public sealed class PlotChartTests : ChartTestBase
{
    private static readonly PlotTrace s_dots = new([1.0, 2.0], [3.0, 4.0]) { Mark = PlotMark.Disk };
    private static readonly PlotTrace s_line = new([1.0, 2.0], [3.0, 4.0]) { Width = 1.0 };
    private static readonly PlotFigure s_figure = new() { X = new PlotAxis("x", 0.0, 3.0), Y = new PlotAxis("y", 0.0, 5.0), Traces = [s_dots, s_line] };

    [Fact]
    public void Render_ChartMade_SendsTheWholeFigure()
    {
        IRenderedComponent<PlotChart> chart = RenderChart();
        AssertSame([s_dots, s_line], Assert.Single(Sent));
        Assert.Empty(chart.FindAll(".plot-message"));
    }

    [Fact]
    public void Render_NextFigure_SendsOnlyTracesThatAreOtherObjects()
    {
        IRenderedComponent<PlotChart> chart = RenderChart();
        PlotTrace other = s_line with { X = [1.5, 2.0] };
        chart.Render(p => p.Add(c => c.Figure, s_figure with { Traces = [s_dots, other] }));
        Assert.Equal(2, Sent.Count);
        AssertSame([null, other], Sent[1]);
        Assert.Empty(Sent[1].Figure.Traces);
    }

    [Fact]
    public void Render_SameFigure_SendsNothing()
    {
        IRenderedComponent<PlotChart> chart = RenderChart();
        chart.Render(p => p.Add(c => c.Label, "another label"));
        Assert.Single(Sent);
    }

    [Fact]
    public void Render_OtherCountOfTraces_SendsAllOfThem()
    {
        IRenderedComponent<PlotChart> chart = RenderChart();
        chart.Render(p => p.Add(c => c.Figure, s_figure with { Traces = [s_dots] }));
        AssertSame([s_dots], Sent[1]);
    }

    [Fact]
    public void Render_ScriptStillLoading_SaysSoAndHidesTheButtonsThatNeedIt()
    {
        JSRuntimeInvocationHandler slow = Script.SetupVoid("open", _ => true);
        IRenderedComponent<PlotChart> chart = RenderChart();
        Assert.Contains("Drawing", chart.Find(".plot-message").TextContent, StringComparison.Ordinal);
        Assert.Empty(chart.FindAll("button[aria-label='Save as PNG']"));
        Assert.Equal("true", chart.Find("figure").GetAttribute("aria-busy"));

        slow.SetVoidResult();
        chart.WaitForAssertion(() => Assert.Empty(chart.FindAll(".plot-message")));
        Assert.Single(Sent);
    }

    [Fact]
    public void Render_ScriptFails_SaysWhatToDoAndKeepsTheText()
    {
        Script.SetupVoid("open", _ => true).SetException(new JSException("The chart library could not be loaded."));
        IRenderedComponent<PlotChart> chart = RenderChart();
        chart.WaitForAssertion(() => Assert.Contains("cannot be drawn", chart.Find(".plot-message").TextContent, StringComparison.Ordinal));
        chart.Find("button[aria-pressed]").Click();
        Assert.Equal("the data", chart.Find(".plot-text").TextContent);
    }

    [Fact]
    public void Render_LibraryCannotBeLoaded_OnlyThePictureIsMissing()
    {
        JSInterop.SetupModule(i => i.Identifier == "import" && i.Arguments[0]!.ToString()!.Contains("plotly-interop", StringComparison.Ordinal))
            .SetupVoid("importScript", _ => true).SetException(new JSException("Failed to load script"));
        IRenderedComponent<PlotChart> chart = RenderChart();
        chart.WaitForAssertion(() => Assert.Contains("cannot be drawn", Assert.Single(chart.FindAll(".plot-message")).TextContent, StringComparison.Ordinal));
    }

    [Fact]
    public void ListAsText_Pressed_TakesThePlaceOfThePicture()
    {
        IRenderedComponent<PlotChart> chart = RenderChart();
        Assert.Empty(chart.FindAll(".plot-text"));
        chart.Find("button[aria-pressed=false]").Click();
        Assert.Equal("the data", chart.Find(".plot-text").TextContent);
        Assert.True(chart.Find(".plot-picture").HasAttribute("inert"));
        chart.Find("button[aria-pressed=true]").Click();
        Assert.Empty(chart.FindAll(".plot-text"));
    }

    [Fact]
    public async Task OnPick_FigureOnTheScreenIsTheLatest_IsReported()
    {
        PlotPick? picked = null;
        IRenderedComponent<PlotChart> chart = RenderChart(p => p.Add(c => c.Picked, pick => picked = pick));
        await chart.InvokeAsync(() => chart.Instance.OnPick(Sent[^1].Serial, PlotPickKind.Line, 3));
        Assert.Equal(new PlotPick(PlotPickKind.Line, 3), picked);
    }

    [Fact]
    public async Task OnPick_FigureHasChangedMeanwhile_IsNotReported()
    {
        PlotPick? picked = null;
        IRenderedComponent<PlotChart> chart = RenderChart(p => p.Add(c => c.Picked, pick => picked = pick));
        int old = Sent[^1].Serial;
        chart.Render(p => p.Add(c => c.Figure, s_figure with { View = "other" }));
        await chart.InvokeAsync(() => chart.Instance.OnPick(old, PlotPickKind.Point, 0));
        Assert.Null(picked);
    }

    [Fact]
    public async Task OnHover_NothingAnyMore_ReportsNull()
    {
        List<PlotPick?> pointed = [];
        IRenderedComponent<PlotChart> chart = RenderChart(p => p.Add(c => c.Hovered, pointed.Add));
        await chart.InvokeAsync(() => chart.Instance.OnHover(Sent[^1].Serial, PlotPickKind.Point, 1));
        await chart.InvokeAsync(() => chart.Instance.OnHover(Sent[^1].Serial, PlotPickKind.Point, -1));
        Assert.Equal([new PlotPick(PlotPickKind.Point, 1), null], pointed);
    }

    [Theory, InlineData("PNG", "png"), InlineData("SVG", "svg")]
    public void Save_Pressed_NamesFormatAndFile(string button, string format)
    {
        IRenderedComponent<PlotChart> chart = RenderChart(p => p.Add(c => c.FileName, "glass-map"));
        chart.Find($"button[aria-label='Save as {button}']").Click();
        Assert.Equal([format, "glass-map"], Assert.Single(Script.Invocations["download"]).Arguments.Skip(1));
    }

    [Fact]
    public void Zoom_ButtonsPressed_ZoomInOutAndBack()
    {
        IRenderedComponent<PlotChart> chart = RenderChart(p => p.Add(c => c.ShowZoom, true));
        foreach (string name in new[] { "Zoom in", "Zoom out" })
        {
            chart.Find($"button[aria-label='{name}']").Click();
        }

        chart.FindAll("[aria-label=Zoom] button")[2].Click();
        Assert.Equal([0.6, 1.0 / 0.6, 0.0], Script.Invocations["zoom"].Select(i => (double)i.Arguments[1]!));
    }

    [Fact]
    public void Picture_Always_IsAnImageWithALabel()
    {
        IRenderedComponent<PlotChart> chart = RenderChart();
        Assert.Equal("a label", chart.Find("[role=img]").GetAttribute("aria-label"));
    }

    private static void AssertSame(PlotTrace?[] expected, PlotChart.FigureChange sent) =>
        Assert.True(expected.SequenceEqual(sent.Traces, ReferenceEqualityComparer.Instance), "Other traces than expected were sent.");

    private IRenderedComponent<PlotChart> RenderChart(Action<ComponentParameterCollectionBuilder<PlotChart>>? more = null) => Render<PlotChart>(p =>
    {
        p.Add(c => c.Figure, s_figure).Add(c => c.Label, "a label").Add(c => c.AsText, (RenderFragment)(b => b.AddContent(0, "the data")));
        more?.Invoke(p);
    });
}
