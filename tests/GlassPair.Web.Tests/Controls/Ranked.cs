using System.Collections.Immutable;
using GlassPair.Optics.Rankings;
using GlassPair.Web.Addresses;
using GlassPair.Web.Components.Pages;
using GlassPair.Web.Figures;
using GlassPair.Web.Tests.Glasses;
using GlassPair.Web.Work;

namespace GlassPair.Web.Tests.Controls;

/// <summary>Rankings of the shipped catalogue for the tests of what shows them.</summary>
internal static class Ranked
{
    public static WorkbenchState StateOf(string query) => WorkbenchAddress.Read(query).State;

    public static WorkbenchAnswer Answer(string query)
    {
        ShortlistRequest request = FormReading.Of(StateOf(query), ServedStock.Stock).Request!;
        var table = IndexTable.Of(ServedStock.Stock.Glasses, request.Requirement.Band);
        return new WorkbenchAnswer(new ShortlistAnswer(ServedStock.Stock, PairRanking.Rank(table, request), TimeSpan.Zero), table);
    }

    /// <summary>A few pairs of one maker, quick to rank.</summary>
    public static WorkbenchAnswer Few { get; } = Answer("?f=240&n=6&makers=hoya&take=20");

    public static ImmutableArray<RankedPair> Pairs => Few.Pairs;
}
