using Bunit;
using GlassPair.Optics.Rankings;
using GlassPair.Web.Addresses;
using GlassPair.Web.Components.Controls;
using GlassPair.Web.Components.Pages;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Tests.Controls;

public sealed class RankingTableTests : BunitContext
{
    private WorkbenchState? _picked;
    private WorkbenchState? _filtered;
    private RankedPair? _chosen;
    private RankedPair? _pinned;

    [Fact]
    public void Rows_StandInOrderOfRank() =>
        Assert.Equal(Ranked.Pairs.Select(p => p.Positive.Glass.Name), Table("?f=240&n=6").FindAll("tbody tr:not(.group) th .g:first-child").Where(g => g.ParentElement!.ClassName != "with").Select(g => g.TextContent));

    [Fact]
    public void Tie_StandsUnderOneHeading() =>
        Assert.Contains("tie", Table("?f=240&n=6").Find("tbody tr").TextContent, StringComparison.Ordinal);

    [Theory]
    [InlineData("&sort=holds")]
    [InlineData("&filter=hoya")]
    public void Tie_OutOfTheOrderOfRank_HasNoHeading(string more) => Assert.Empty(Table("?f=240&n=6" + more).FindAll("tr.group"));

    [Fact]
    public void Row_Chosen_IsReported()
    {
        Table("?f=240&n=6").FindAll("tbody button")[3].Click();

        Assert.Same(Ranked.Pairs[3], _chosen);
    }

    [Fact]
    public void Row_KeyP_IsPinned()
    {
        Table("?f=240&n=6").FindAll("tbody button")[2].KeyDown("p");

        Assert.Same(Ranked.Pairs[2], _pinned);
    }

    [Fact]
    public void Verdict_IsASignAndAWordNotColorAlone()
    {
        string text = Table("?f=240&n=6").Find(".v").TextContent;

        Assert.Contains(Ranked.Pairs[0].Verdict.Sign(), text);
        Assert.Contains(Ranked.Pairs[0].Verdict.Word(), text, StringComparison.Ordinal);
    }

    [Fact]
    public void Column_Added_IsReported()
    {
        Table("?f=240&n=6").FindAll(".menu .chip input").First(i => i.ParentElement!.TextContent.Trim() == "n₁").Change(true);

        Assert.Contains("n1", _picked!.Columns!.Value);
        Assert.Contains("expected", _picked.Columns.Value);
    }

    [Fact]
    public void Columns_OfTheAddress_AreShown() =>
        Assert.Equal(["#", "Positive", "Negative", "V₁of band"], Table("?f=240&n=6&columns=v1").FindAll("thead th").Select(h => h.TextContent.Replace("↑", "", StringComparison.Ordinal).Trim()).Select(t => t.Replace("\n", "", StringComparison.Ordinal).Replace(" ", "", StringComparison.Ordinal).Replace("ofband", "of band", StringComparison.Ordinal)));

    [Fact]
    public void Filter_Typed_IsCutAndReported()
    {
        Table("?f=240&n=6").Find("input[type=search]").Input(new string('x', 60_000));

        Assert.Equal(WorkbenchState.MaxFilterLength, _filtered!.Filter.Length);
    }

    [Fact]
    public void Filter_NothingMatches_SaysSo() =>
        Assert.Contains("No ranked pair matches the filter.", Table("?f=240&n=6&filter=nosuch").Markup, StringComparison.Ordinal);

    [Theory]
    [InlineData("any", null)]
    [InlineData("5", 5)]
    public void PairsPerGlass_Picked_IsReported(string value, int? each)
    {
        Table("?f=240&n=6").Find(".bar > label select").Change(value);

        Assert.Equal(each, _picked!.PairsPerGlass);
    }

    [Theory]
    [InlineData("0")]
    [InlineData("-3")]
    [InlineData("1e9")]
    [InlineData("nonsense")]
    public void PairsPerGlass_NotOffered_IsIgnored(string value)
    {
        Table("?f=240&n=6").Find(".bar > label select").Change(value);

        Assert.Null(_picked);
    }

    [Fact]
    public void Rank_SortedAgain_TurnsTheOrderRound()
    {
        Table("?f=240&n=6").FindAll("thead button")[0].Click();

        Assert.Equal(("rank", true), (_picked!.SortBy, _picked.SortDescending));
    }

    [Fact]
    public void Export_HasTheAddressOfThePage()
    {
        var table = Table("?f=240&n=6&filter=FCD1");

        Assert.Equal("export/shortlist.csv?v=1&f=240&n=6&filter=FCD1", table.Find("a[download]").GetAttribute("href"));
        Assert.Equal("export/shortlist.tsv?v=1&f=240&n=6&filter=FCD1", table.Find("[data-copy-from]").GetAttribute("data-copy-from"));
    }

    [Fact]
    public void Twins_AreSaidAtThePair()
    {
        WorkbenchAnswer twins = Ranked.Answer("?f=240&n=6&take=200");
        RankedPair pair = twins.Pairs.First(p => p.Candidate!.SameAs.Length > 0);

        var table = Render<RankingTable>(p => p.Add(t => t.State, WorkbenchState.Empty).Add(t => t.Pairs, [pair]));

        Assert.Contains(pair.Candidate!.SameAs[0], table.Find("abbr").GetAttribute("title"), StringComparison.Ordinal);
    }

    private IRenderedComponent<RankingTable> Table(string query) => Render<RankingTable>(p => p
        .Add(t => t.State, Ranked.StateOf(query)).Add(t => t.Pairs, Ranked.Pairs).Add(t => t.Ties, [new Tie(1, 4)]).Add(t => t.Feasible, Ranked.Few.Shortlist.CombinationsFeasible)
        .Add(t => t.Picked, s => _picked = s).Add(t => t.FilterTyped, s => _filtered = s).Add(t => t.PairChosen, c => _chosen = c).Add(t => t.PinToggled, c => _pinned = c));
}
