using System.Collections.Immutable;
using System.Globalization;
using Bunit;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Practice;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Components.Charts;
using GlassPair.Web.Tests.Glasses;

namespace GlassPair.Web.Tests.Charts;

public sealed class SmallFigureTests : ChartTestBase
{
    [Fact]
    public void Powers_OfAPair_AddUpToThatOfTheLens()
    {
        IRenderedComponent<PowersFigure> figure = Render<PowersFigure>(p => p.Add(f => f.Solution, Solve(Asked(), "schott/N-BK7", "schott/F2")));
        (double From, double To)[] bars = [.. figure.FindAll("rect").Select(r => (Number(r, "x"), Number(r, "x") + Number(r, "width")))];
        Assert.Equal(0.0, bars[0].From, 0.01);
        Assert.Equal(bars[0].To, bars[1].To, 0.02);      // the negative element goes back from where the positive one ended
        Assert.Equal(bars[1].From, bars[2].To, 0.02);    // and ends at the power of the lens
        Assert.Equal(Solve(Asked(), "schott/N-BK7", "schott/F2").RelativePowers[0], bars[0].To / bars[2].To, 0.01);
    }

    [Fact]
    public void Powers_OfAPair_AreWrittenWithSignAndUnit()
    {
        IRenderedComponent<PowersFigure> figure = Render<PowersFigure>(p => p.Add(f => f.Solution, Solve(Asked(), "schott/N-BK7", "schott/F2")));
        string[] texts = [.. figure.FindAll(".num").Select(n => n.TextContent)];
        Assert.Matches("^\\+[12]\\.\\d\\d\u00A0Φ$", texts[0]);
        Assert.Matches("^−[01]\\.\\d\\d\u00A0Φ$", texts[1]);
        Assert.Equal("1/(240.0\u00A0mm)", texts[2]);
        Assert.Equal(["positive", "negative", "lens"], figure.FindAll("tr").Select(r => r.ClassName));
    }

    [Fact]
    public void Powers_NegativeElementFirst_StayInsideTheFigure()
    {
        IRenderedComponent<PowersFigure> figure = Render<PowersFigure>(p => p.Add(f => f.Solution, Solve(Asked(), "schott/F2", "schott/N-BK7")));
        Assert.All(figure.FindAll("rect"), r => Assert.True(Number(r, "x") >= 0.0 && Number(r, "x") + Number(r, "width") <= 100.0 && Number(r, "width") > 0.0));
    }

    [Fact]
    public void Dispersion_OfAGlass_GoesThroughItsWholeRangeAndTheNamedLines()
    {
        Glass glass = Glass("schott/N-BK7").Glass;
        Render<DispersionChart>(p => p.Add(c => c.Glass, glass));
        PlotFigure figure = Sent[^1].Figure;
        Assert.Equal((glass.Range.Shortest.Nanometers, glass.Range.Longest.Nanometers), (figure.X.From, figure.X.To));
        Assert.Contains(Sent[^1].Traces[1]!.Tips, t => t.StartsWith("d, helium, 587.56 nm: n = 1.5168", StringComparison.Ordinal));
    }

    [Fact]
    public void Transmittance_OfAGlass_IsThatOfTheStatedThickness()
    {
        Glass glass = ServedStock.Stock.Glasses.First(g => g.Id == "schott/N-BK7");
        Render<TransmittanceChart>(p => p.Add(c => c.Glass, glass).Add(c => c.Thickness, 25.0));
        PlotTrace stated = Sent[^1].Traces[1]!;
        for (int i = 0; i < stated.X.Length; i++)
        {
            Assert.Equal(InternalTransmittance.TryOf(glass, Wavelength.FromNanometers(stated.X[i]), 25.0)!.Value, stated.Y[i], 1e-5);
        }
    }

    [Fact]
    public void Transmittance_NotStated_IsSaidInWords()
    {
        Glass whole = Glass("schott/N-BK7").Glass;
        IRenderedComponent<TransmittanceChart> chart = Render<TransmittanceChart>(p => p.Add(c => c.Glass, new Glass("test", "dark", whole.Formula, whole.Range)));
        Assert.Contains("states no transmittance of dark", chart.Find("p").TextContent, StringComparison.Ordinal);
        Assert.Empty(Sent);
    }

    [Fact]
    public void Residuals_LineLeftOut_IsCrossedAndDoesNotFlattenTheRest()
    {
        DispersionFit fit = Fit(residuals: [1e-6, -2e-6, 1.5e-6], leftOut: 4e-3);
        Render<ResidualChart>(p => p.Add(c => c.Fit, fit));
        Assert.Equal(PlotMark.Cross, Sent[^1].Traces[1]!.Mark);
        Assert.Equal("measured − fitted index, 10⁻⁶", Sent[^1].Figure.Y.Title);
        Assert.Equal([1.0, -2.0, 1.5], Sent[^1].Traces[0]!.Y.ToArray());
        Assert.Contains(Sent[^1].Figure.Labels, l => l.Title == "left out" && l.Notes[0] == "4.0·10⁻³");
    }

    [Fact]
    public void Residuals_AsText_SayWhyALineWasLeftOut()
    {
        IRenderedComponent<ResidualChart> chart = Render<ResidualChart>(p => p.Add(c => c.Fit, Fit(residuals: [1e-6, -2e-6, 1.5e-6], leftOut: 4e-3)));
        chart.FindAll("button").Single(b => b.TextContent == "List as text").Click();
        Assert.Equal(4, chart.FindAll("tbody tr").Count);
        Assert.Contains("a misprint", chart.Find("tbody").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void Residuals_ExactFit_StillHasAnAxis()
    {
        Render<ResidualChart>(p => p.Add(c => c.Fit, Fit(residuals: [0.0, 0.0, 0.0], leftOut: null)));
        Assert.True(Sent[^1].Figure.Y.To > Sent[^1].Figure.Y.From);
    }

    private static DispersionFit Fit(double[] residuals, double? leftOut)
    {
        Glass glass = Glass("schott/N-BK7").Glass;
        MeasuredIndex At(int i) => new(Wavelength.FromNanometers(450.0 + (50.0 * i)), 1.52);
        return new DispersionFit(
            glass.Formula,
            [.. residuals.Select((_, i) => At(i))],
            [.. residuals],
            leftOut is { } residual ? [new LeftOutIndex(At(residuals.Length), residual, "a misprint")] : ImmutableArray<LeftOutIndex>.Empty,
            []);
    }

    private static double Number(AngleSharp.Dom.IElement element, string attribute) => double.Parse(element.GetAttribute(attribute)!, CultureInfo.InvariantCulture);
}
