using System.Collections.Immutable;
using Bunit;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Components.Charts;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Tests.Charts;

public sealed class GlassMapTests : ChartTestBase
{
    private const int All = 0;
    private const int Usable = 1;
    private const int Partnered = 2;
    private const string Positive = "ohara/S-FPL53";
    private const string Negative = "schott/N-LAK10";

    [Fact]
    public void Figure_AnyTable_HasEveryGlassAndThoseThatMayBeUsed()
    {
        RenderMap(p => p.Add(m => m.Limits, GlassLimits.None with { Makers = ["schott"] }));
        Assert.Equal(Table.Rows.Length, Sent[^1].Traces[All]!.X.Length);
        Assert.Equal(Table.Rows.Count(r => r.Glass.Maker == "schott"), Sent[^1].Traces[Usable]!.X.Length);
        Assert.True(Sent[^1].Traces[All]!.IsPickable);
    }

    [Fact]
    public void Figure_AbbeNumbers_FallToTheRight()
    {
        RenderMap();
        Assert.True(Sent[^1].Figure.X.From > Sent[^1].Figure.X.To);
        Assert.True(Sent[^1].Figure.Y.From < Sent[^1].Figure.Y.To);
    }

    [Fact]
    public void Figure_ChosenPair_IsInView()
    {
        RenderMap();
        PlotFigure figure = Sent[^1].Figure;
        foreach (GlassIndices glass in new[] { Glass(Positive), Glass(Negative) })
        {
            Assert.InRange(glass.AbbeNumber, figure.X.To, figure.X.From);
            Assert.InRange(glass.PartialDispersion, figure.Y.From, figure.Y.To);
        }
    }

    [Fact]
    public void Figure_ChosenPair_HasADiskForThePositiveAndARingForTheNegativeGlass()
    {
        RenderMap();
        PlotDisk[] disks = [.. Sent[^1].Figure.Disks];
        Assert.Equal(Glass(Positive).AbbeNumber, disks[0].X, 1e-3);
        Assert.Equal("--positive", disks[0].Fill);
        Assert.Equal(Glass(Negative).AbbeNumber, disks[1].X, 1e-3);
        Assert.Equal(("--pane", "--negative"), (disks[1].Fill, disks[1].Color));
    }

    [Fact]
    public void Figure_ChosenPair_IsLabelledWithNamesSlopeAndSecondarySpectrum()
    {
        RenderMap();
        string[] labels = [.. Sent[^1].Figure.Labels.SelectMany(l => l.Notes.Prepend(l.Title))];
        GlassIndices positive = Glass(Positive);
        GlassIndices negative = Glass(Negative);
        double slope = (positive.PartialDispersion - negative.PartialDispersion) / (positive.AbbeNumber - negative.AbbeNumber);
        Assert.Contains("S-FPL53", labels);
        Assert.Contains("N-LAK10", labels);
        Assert.Contains(FormattableString.Invariant($"slope −{Math.Abs(slope) * 1e4:0.00}·10⁻⁴"), labels);
        double spectrum = Solve(Asked(), Positive, Negative).SecondarySpectrum;
        Assert.Equal(slope, spectrum / 240.0, 0.05 * Math.Abs(slope)); // the balance differs from united ends by a few percent
        Assert.Contains(FormattableString.Invariant($"secondary spectrum −{Math.Abs(spectrum) * 1e3:0}\u00A0µm"), labels);
    }

    [Fact]
    public void Figure_MoreThanSixtyCandidates_DrawsSixtyChordsInTwoStrengths()
    {
        ImmutableArray<Candidate> candidates = Candidates(Asked(fNumber: 3.0), 200);
        RenderMap(p => p.Add(m => m.Candidates, candidates));
        PlotPath[] chords = [.. Sent[^1].Figure.Paths.Where(p => p.Picks.Length > 0)];
        Assert.Equal(GlassMap.MostChords, chords.Sum(c => c.Lines.Length));
        int holding = candidates.Take(GlassMap.MostChords).Count(c => c.Solution.Holds);
        Assert.Equal(holding, chords.Where(c => c.Dash.Length == 0).Sum(c => c.Lines.Length));
        Assert.Equal(Enumerable.Range(0, GlassMap.MostChords), chords.SelectMany(c => c.Picks).Order());
    }

    [Fact]
    public void Figure_Pinned_IsDashedAndLabelled()
    {
        RenderMap(p => p.Add(m => m.Pinned, Solve(Asked(), "schott/N-BK7", "schott/F2")));
        Assert.Contains(Sent[^1].Figure.Paths, p => p is { Dash: "6px,3px", Color: "--ink-2", Lines.Length: 1 });
        Assert.Contains(Sent[^1].Figure.Labels, l => l.Title == "F2, pinned");
    }

    [Fact]
    public void Figure_Wedge_OpensAsTheDepthOfFocusAllows()
    {
        RenderMap();
        ImmutableArray<double> area = Sent[^1].Figure.Paths.Single(p => p.IsBehind).Lines[0];
        GlassIndices glass = Glass(Positive);
        double slope = 4.0 * 546.074e-6 * 36.0 / 240.0; // 4 λ N²/f
        for (int i = 0; i < area.Length; i += 2)
        {
            Assert.Equal(slope * (glass.AbbeNumber - area[i]), Math.Abs(area[i + 1] - glass.PartialDispersion), 2e-6);
        }

        Assert.Equal(glass.AbbeNumber * (1.0 - (1.0 / 2.6)), Enumerable.Range(0, area.Length / 2).Max(i => area[2 * i]), 1e-3);
    }

    [Fact]
    public void Figure_ChosenGlass_ShowsItsPartnersInsteadOfThoseOfThePair()
    {
        RenderMap(p => p.Add(m => m.ChosenGlass, Glass("schott/N-FK58").Glass));
        Assert.Equal(Partners.HoldingWith(Table, Asked(), GlassLimits.None, Glass("schott/N-FK58")).Length, Sent[^1].Traces[Partnered]!.X.Length);
        Assert.Contains(Sent[^1].Figure.Labels, l => l.Title == "N-FK58");
    }

    [Fact]
    public void Figure_IndexAxes_HasIndicesAndNoWedge()
    {
        RenderMap(p => p.Add(m => m.Axes, MapAxes.Index));
        Assert.Equal(Table.Rows[0].DesignIndex, Sent[^1].Traces[All]!.Y[0], 1e-6);
        Assert.DoesNotContain(Sent[^1].Figure.Paths, p => p.IsBehind);
    }

    [Fact]
    public void Render_OtherFocalLength_SendsNoDotsAgainAndStaysInPlace()
    {
        IRenderedComponent<GlassMap> map = RenderMap();
        Requirement longer = Asked(241.0);
        map.Render(p => p.Add(m => m.Requirement, longer).Add(m => m.Chosen, Solve(longer, Positive, Negative)));
        Assert.Equal(2, Sent.Count);
        Assert.Null(Sent[1].Traces[All]);
        Assert.Null(Sent[1].Traces[Usable]);
        Assert.Equal(Sent[0].Figure.X, Sent[1].Figure.X);
    }

    [Fact]
    public void Render_NothingOfItsOwnChanged_SendsNothing()
    {
        ImmutableArray<Candidate> candidates = Candidates(Asked(), 10);
        IRenderedComponent<GlassMap> map = RenderMap(p => p.Add(m => m.Candidates, candidates));
        map.Render(p => p.Add(m => m.Candidates, candidates).Add(m => m.Stale, true));
        Assert.Single(Sent);
        Assert.Contains("stale", map.Find("figure").ClassList);
    }

    [Fact]
    public async Task OnPick_Dot_ReportsThatGlass()
    {
        Glass? picked = null;
        IRenderedComponent<GlassMap> map = RenderMap(p => p.Add(m => m.GlassPicked, g => picked = g));
        await PickAsync(map, PlotPickKind.Point, 5);
        Assert.Same(Table.Rows[5].Glass, picked);
    }

    [Fact]
    public async Task OnPick_Chord_ReportsThatCandidate()
    {
        ImmutableArray<Candidate> candidates = Candidates(Asked(), 10);
        Candidate? picked = null;
        IRenderedComponent<GlassMap> map = RenderMap(p => p.Add(m => m.Candidates, candidates).Add(m => m.CandidatePicked, c => picked = c));
        await PickAsync(map, PlotPickKind.Line, 7);
        Assert.Same(candidates[7], picked);
    }

    [Theory, InlineData(PlotPickKind.Point, 100_000), InlineData(PlotPickKind.Line, 3)]
    public async Task OnPick_NumberOfNothing_IsIgnored(PlotPickKind kind, int index)
    {
        int picks = 0;
        IRenderedComponent<GlassMap> map = RenderMap(p => p.Add(m => m.GlassPicked, _ => picks++).Add(m => m.CandidatePicked, _ => picks++));
        await PickAsync(map, kind, index);
        Assert.Equal(0, picks);
    }

    [Fact]
    public async Task OnHover_Dot_SaysGlassMakerFiguresSupplyAndSpectrumWithTheChosen()
    {
        IRenderedComponent<GlassMap> map = RenderMap();
        int index = Table.Rows.IndexOf(Glass("schott/N-BK7"));
        await HoverAsync(map, PlotPickKind.Point, index);
        double spectrum = Chord.SecondarySpectrum(Asked(), Glass(Positive), Glass("schott/N-BK7"))!.Value;
        string tip = map.Find(".plot-tip").TextContent;
        foreach (string part in new[] { "N-BK7", "schott", "1.51872", FigureText.Of(Glass("schott/N-BK7").Glass.Supply), "maker’s list of", "with S-FPL53: secondary spectrum " + FigureText.ShortLength(spectrum) })
        {
            Assert.Contains(part, tip, StringComparison.Ordinal);
        }
    }

    [Fact]
    public async Task OnHover_ChordAndAway_ReportsCandidateThenNone()
    {
        ImmutableArray<Candidate> candidates = Candidates(Asked(), 10);
        List<Candidate?> pointed = [];
        IRenderedComponent<GlassMap> map = RenderMap(p => p.Add(m => m.Candidates, candidates).Add(m => m.CandidateHovered, pointed.Add));
        await HoverAsync(map, PlotPickKind.Line, 2);
        Assert.Contains("rank 3", map.Find(".plot-tip").TextContent, StringComparison.Ordinal);
        await HoverAsync(map, PlotPickKind.Line, -1);
        Assert.Equal([candidates[2], null], pointed);
    }

    [Fact]
    public void ListAsText_Candidates_CanBeChosenThere()
    {
        ImmutableArray<Candidate> candidates = Candidates(Asked(), 10);
        Candidate? picked = null;
        IRenderedComponent<GlassMap> map = RenderMap(p => p.Add(m => m.Candidates, candidates).Add(m => m.CandidatePicked, c => picked = c));
        map.FindAll("button").Single(b => b.TextContent == "List as text").Click();
        map.FindAll(".plot-text table")[0].QuerySelectorAll("tbody tr button")[4].Click();
        Assert.Same(candidates[4], picked);
    }

    [Fact]
    public void ListAsText_Partners_AreListedByTheirSecondarySpectrum()
    {
        Glass? picked = null;
        IRenderedComponent<GlassMap> map = RenderMap(p => p.Add(m => m.GlassPicked, g => picked = g));
        map.FindAll("button").Single(b => b.TextContent == "List as text").Click();
        map.FindAll(".plot-text table")[1].QuerySelector("tbody tr button")!.Click();
        GlassIndices best = Partners.HoldingWith(Table, Asked(), GlassLimits.None, Glass(Positive))
            .MinBy(p => Math.Abs(Chord.SecondarySpectrum(Asked(), Glass(Positive), p)!.Value))!;
        Assert.Same(best.Glass, picked);
    }

    [Fact]
    public void AxesButton_Pressed_AsksForThem()
    {
        MapAxes? asked = null;
        IRenderedComponent<GlassMap> map = RenderMap(p => p.Add(m => m.AxesChanged, a => asked = a));
        map.FindAll("[aria-label='Vertical axis'] button").Single(b => b.GetAttribute("aria-pressed") == "false").Click();
        Assert.Equal(MapAxes.Index, asked);
    }

    [Fact]
    public void Label_ChosenAndPinned_SaysBothInWords()
    {
        IRenderedComponent<GlassMap> map = RenderMap(p => p.Add(m => m.Pinned, Solve(Asked(), "schott/N-BK7", "schott/F2")));
        string label = map.Find("[role=img]").GetAttribute("aria-label")!;
        Assert.Contains("Chosen: S-FPL53 + N-LAK10, secondary spectrum −", label, StringComparison.Ordinal);
        Assert.Contains("Pinned: N-BK7 + F2", label, StringComparison.Ordinal);
    }

    [Fact]
    public void Render_NothingChosen_DrawsTheGlassesAlone()
    {
        Render<GlassMap>(p => p.Add(m => m.Table, Table).Add(m => m.Requirement, Asked()));
        PlotFigure figure = Sent[^1].Figure;
        Assert.Empty(figure.Disks);
        Assert.Empty(figure.Labels);
        Assert.True(figure.X.From >= Table.Rows.Max(r => r.AbbeNumber) && figure.X.To <= Table.Rows.Min(r => r.AbbeNumber));
    }

    private IRenderedComponent<GlassMap> RenderMap(Action<ComponentParameterCollectionBuilder<GlassMap>>? more = null) => Render<GlassMap>(p =>
    {
        p.Add(m => m.Table, Table).Add(m => m.Requirement, Asked()).Add(m => m.Chosen, Solve(Asked(), Positive, Negative));
        more?.Invoke(p);
    });

    private Task PickAsync(IRenderedComponent<GlassMap> map, PlotPickKind kind, int index) =>
        map.InvokeAsync(() => map.FindComponent<PlotChart>().Instance.OnPick(Sent[^1].Serial, kind, index));

    private Task HoverAsync(IRenderedComponent<GlassMap> map, PlotPickKind kind, int index) =>
        map.InvokeAsync(() => map.FindComponent<PlotChart>().Instance.OnHover(Sent[^1].Serial, kind, index));
}
