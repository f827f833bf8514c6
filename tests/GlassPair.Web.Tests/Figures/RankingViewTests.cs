using GlassPair.Web.Figures;
using GlassPair.Web.Tests.Controls;

namespace GlassPair.Web.Tests.Figures;

public sealed class RankingViewTests
{
    [Fact]
    public void Of_NothingAsked_IsTheRanking() => Assert.Equal(Ranked.Pairs, RankingView.Of(Ranked.Pairs, Ranked.StateOf("?f=1")));

    [Theory]
    [InlineData("fcd1 lac14")]
    [InlineData("HOYA/FCD1")]
    [InlineData("nothing at all")]
    public void Of_Filter_KeepsPairsThatHoldEveryWord(string filter)
    {
        string[] words = filter.Split(' ');

        IEnumerable<RankedPair> expected = Ranked.Pairs.Where(p => words.All(w =>
            $"{p.Positive.Glass.Id} {p.Negative.Glass.Id} {string.Join(' ', p.Candidate!.SameAs)}".Contains(w, StringComparison.OrdinalIgnoreCase)));
        Assert.Equal(expected, RankingView.Of(Ranked.Pairs, Ranked.StateOf("?filter=" + Uri.EscapeDataString(filter))));
    }

    [Theory]
    [InlineData("holds", false)]
    [InlineData("expansion", true)]
    [InlineData("rank", true)]
    public void Of_Sort_OrdersByTheColumn(string key, bool descending)
    {
        Func<RankedPair, double> value = key == "rank" ? p => p.Candidate!.Rank : p => RankingColumn.Find(key)!.Value!(p) ?? double.NaN;

        double[] shown = [.. RankingView.Of(Ranked.Pairs, Ranked.StateOf($"?sort={(descending ? "-" : "")}{key}")).Select(value).Where(v => !double.IsNaN(v))];

        Assert.Equal(descending ? shown.OrderDescending() : shown.Order(), shown);
        Assert.True(shown.Length > 10);
    }

    [Fact]
    public void Of_UnknownValues_StandLastBothWays()
    {
        var pairs = Ranked.Answer("?f=240&n=6&take=300").Pairs;
        Assert.Contains(pairs, p => p.ExpansionDifference is null);

        foreach (string sort in new[] { "expansion", "-expansion" })
        {
            bool[] unknown = [.. RankingView.Of(pairs, Ranked.StateOf("?sort=" + sort)).Select(p => p.ExpansionDifference is null)];
            Assert.Equal(unknown.Order(), unknown);
        }
    }

    [Fact]
    public void EveryColumn_WritesEveryPair() => Assert.All(RankingColumn.All, column => Assert.All(Ranked.Pairs, pair =>
    {
        Assert.NotNull(column.Text(pair));
        Assert.DoesNotContain("NaN", column.Text(pair), StringComparison.Ordinal);
    }));

    [Fact]
    public void EveryColumn_HasAKeyOfItsOwn() => Assert.Equal(RankingColumn.All.Length, RankingColumn.All.Select(c => c.Key).Distinct(StringComparer.OrdinalIgnoreCase).Count());
}
