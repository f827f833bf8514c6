using Bunit;
using GlassPair.Optics.Color;
using GlassPair.Web.Components.Charts;

namespace GlassPair.Web.Tests.Charts;

public sealed class FocalShiftChartTests : ChartTestBase
{
    [Fact]
    public void Figure_ChosenAlone_HasCurveAndSamples()
    {
        ThinSolution chosen = Solve(Asked(), "ohara/S-FPL53", "schott/N-LAK10");
        Draw(chosen);
        PlotTrace samples = Sent[^1].Traces[^1]!;
        Assert.Equal(2, Sent[^1].Traces.Length);
        Assert.Equal(PlotMark.Ring, samples.Mark);
        Assert.Equal(chosen.FocalShifts[3] - chosen.FocalShifts[0], (samples.Y[3] - samples.Y[0]) / 1e3, 2e-6);
        Assert.Equal("focal shift, µm", Sent[^1].Figure.Y.Title);
    }

    [Fact]
    public void Figure_Zone_IsTheDepthOfFocusAtEachWavelength()
    {
        Draw(Solve(Asked(), "schott/N-BK7", "schott/F2"));
        double[] zone = [.. Sent[^1].Figure.Paths.Single(p => p.Fill == "--depth").Lines[0]];
        for (int i = 0; i < zone.Length; i += 2)
        {
            Assert.Equal(2.0 * zone[i] * 1e-3 * 36.0, Math.Abs(zone[i + 1]), 0.01); // 2 λ N², nm to µm
        }
    }

    [Fact]
    public void Figure_PinnedFarOff_DoesNotSetTheScale()
    {
        ThinSolution chosen = Solve(Asked(), "ohara/S-FPL53", "schott/N-LAK10");
        Draw(chosen);
        PlotAxis alone = Sent[^1].Figure.Y;
        Draw(chosen, Solve(Asked(), "schott/N-BK7", "schott/F2"));
        Assert.Equal(alone, Sent[^1].Figure.Y);
        Assert.Equal("6px,3px", Sent[^1].Traces[0]!.Dash);
        Assert.Contains(Sent[^1].Figure.Labels, l => l.Title == "N-BK7 + F2, pinned");
    }

    [Fact]
    public void Figure_SlowLens_StillShowsTheBendOfTheCurveAndSaysSo()
    {
        ThinSolution chosen = Solve(Asked(fNumber: 60.0), "ohara/S-FPL53", "schott/N-LAK10");
        Draw(chosen);
        double largest = Sent[^1].Traces[^1]!.Y.Max(Math.Abs);
        Assert.True(Sent[^1].Figure.Y.To < 6.0 * largest);
        Assert.StartsWith("all inside the depth of focus", Sent[^1].Figure.Note[0], StringComparison.Ordinal);
    }

    [Fact]
    public void Figure_LongLens_IsInMillimeters()
    {
        Draw(Solve(Asked(10_000.0, 60.0), "schott/N-BK7", "schott/F2"));
        Assert.Equal("focal shift, mm", Sent[^1].Figure.Y.Title);
        Assert.True(Sent[^1].Figure.Y.To > 1.0);
    }

    [Fact]
    public void Figure_Band_HasItsEndsAndDesignWavelengthMarkedByName()
    {
        Draw(Solve(Asked(), "schott/N-BK7", "schott/F2"));
        Assert.Equal(["g", "e", "C"], Sent[^1].Figure.Guides.Select(g => g.Text));
        Assert.Equal([435.8343, 546.074, 656.2725], Sent[^1].Figure.Guides.Select(g => g.X));
    }

    [Fact]
    public void Render_ShiftALittleSmaller_KeepsTheScale()
    {
        IRenderedComponent<FocalShiftChart> chart = Draw(Solve(Asked(250.0), "schott/N-BK7", "schott/F2"));
        chart.Render(p => p.Add(c => c.Chosen, Solve(Asked(240.0), "schott/N-BK7", "schott/F2")));
        Assert.Equal(Sent[0].Figure.Y, Sent[1].Figure.Y);
        chart.Render(p => p.Add(c => c.Chosen, Solve(Asked(100.0, 4.0), "schott/N-BK7", "schott/F2")));
        Assert.NotEqual(Sent[0].Figure.Y, Sent[2].Figure.Y);
        chart.Render(p => p.Add(c => c.Chosen, Solve(Asked(260.0), "schott/N-BK7", "schott/F2")));
        Assert.NotEqual(Sent[2].Figure.Y, Sent[3].Figure.Y);
    }

    [Fact]
    public void Render_SameSolutions_SendsNothing()
    {
        ThinSolution chosen = Solve(Asked(), "schott/N-BK7", "schott/F2");
        IRenderedComponent<FocalShiftChart> chart = Draw(chosen);
        chart.Render(p => p.Add(c => c.Chosen, chosen).Add(c => c.Stale, true));
        Assert.Single(Sent);
    }

    [Fact]
    public void ListAsText_Pinned_HasAColumnOfItsOwn()
    {
        IRenderedComponent<FocalShiftChart> chart = Draw(Solve(Asked(), "ohara/S-FPL53", "schott/N-LAK10"), Solve(Asked(), "schott/N-BK7", "schott/F2"));
        chart.FindAll("button").Single(b => b.TextContent == "List as text").Click();
        Assert.Equal(9, chart.FindAll("tbody tr").Count);
        Assert.Equal("N-BK7 + F2", chart.FindAll("thead th")[2].TextContent);
        Assert.Contains("−", chart.Find("tbody").TextContent, StringComparison.Ordinal);
        Assert.DoesNotContain("-", chart.Find("tbody").TextContent, StringComparison.Ordinal);
    }

    private IRenderedComponent<FocalShiftChart> Draw(ThinSolution chosen, ThinSolution? pinned = null) =>
        Render<FocalShiftChart>(p => p.Add(c => c.Chosen, chosen).Add(c => c.Pinned, pinned));
}
