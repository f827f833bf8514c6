using Bunit;
using GlassPair.Optics.Rankings;
using GlassPair.Web.Components.Controls;
using GlassPair.Web.Components.Pages;
using GlassPair.Web.Tests.Glasses;

namespace GlassPair.Web.Tests.Controls;

public sealed class FunnelTests : BunitContext
{
    [Fact]
    public void Reasons_AccountForEveryGlassAndPair()
    {
        WorkbenchAnswer answer = Ranked.Answer("?f=240&n=6&short=g&long=C&makers=schott,hoya&power=2&expansion=3&lead=no&exclude=hoya/FCD1");
        Shortlist shortlist = answer.Shortlist;

        var funnel = Render<Funnel>(p => p.Add(f => f.Shortlist, shortlist).Add(f => f.GlassesInStock, ServedStock.Stock.Glasses.Length));

        (string Reason, long Count, string Unit)[] rows = [.. funnel.FindAll("tr").Select(r => (
            r.QuerySelector("th")!.TextContent,
            long.Parse(r.QuerySelector("td")!.FirstChild!.TextContent.Trim().Replace(",", "", StringComparison.Ordinal), System.Globalization.CultureInfo.InvariantCulture),
            r.QuerySelector(".unit")!.TextContent))];
        Assert.Equal(ServedStock.Stock.Glasses.Length - shortlist.DistinctGlasses, rows.Where(r => r.Unit == "glasses").Sum(r => r.Count));
        Assert.Equal(shortlist.CombinationsExamined - shortlist.CombinationsHolding, rows.Where(r => r.Unit == "pairs").Sum(r => r.Count));
    }

    [Fact]
    public void Steps_SayHowManyAreLeft()
    {
        var funnel = Render<Funnel>(p => p.Add(f => f.Shortlist, Ranked.Few.Shortlist).Add(f => f.GlassesInStock, ServedStock.Stock.Glasses.Length));

        Assert.Contains("hold the depth of focus at f/6", funnel.Find("dl").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void EveryReason_HasItsOwnWords()
    {
        Shortlist with = Ranked.Few.Shortlist with
        {
            DroppedGlasses = [.. Enum.GetValues<GlassDropReason>().Select(r => new DroppedGlass(ServedStock.Stock.Glasses[0], r))],
            DroppedCombinations = System.Collections.Immutable.ImmutableSortedDictionary.CreateRange(Enum.GetValues<PairDropReason>().Select(r => KeyValuePair.Create(r, 1L))),
        };

        string[] words = [.. Render<Funnel>(p => p.Add(f => f.Shortlist, with).Add(f => f.GlassesInStock, 9)).FindAll("th").Select(h => h.TextContent)];

        Assert.Equal(words.Length, words.Distinct().Count());
        Assert.DoesNotContain(words, w => Enum.GetNames<GlassDropReason>().Contains(w) || Enum.GetNames<PairDropReason>().Contains(w));
    }

    [Fact]
    public void NoPairHolds_SaysTheNearestAndOffersWhatHelps()
    {
        WorkbenchAnswer answer = Ranked.Answer("?f=240&n=1&makers=hoya&take=20");
        string? applied = null;

        var none = Render<NoPairHolds>(p => p.Add(n => n.Shortlist, answer.Shortlist).Add(n => n.Pairs, answer.Pairs)
            .Add(n => n.Costs, [("Stop down to f/4", 12), ("Glasses with lead too", 0), ("Any difference in expansion", null)]).Add(n => n.Applied, s => applied = s));

        Assert.Contains("At f/1 no pair of", none.Find("[role=status]").TextContent, StringComparison.Ordinal);
        Assert.Equal([false, true, true], none.FindAll("button").Select(b => b.HasAttribute("disabled")));
        none.Find("button").Click();
        Assert.Equal("Stop down to f/4", applied);
    }

    [Fact]
    public void NoPairHolds_NothingWithinTheLimits_SaysThat()
    {
        WorkbenchAnswer answer = Ranked.Answer("?f=240&n=6&makers=hoya&power=1");

        Assert.Contains("No pair is within the limits.", Render<NoPairHolds>(p => p.Add(n => n.Shortlist, answer.Shortlist).Add(n => n.Pairs, answer.Pairs).Add(n => n.Costs, [])).Markup, StringComparison.Ordinal);
    }
}
