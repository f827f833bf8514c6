using GlassPair.Optics.Rankings;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>What is left of glasses and pairs, and why the others dropped out, counted by reason.</summary>
public sealed partial class Funnel : ComponentBase
{
    /// <summary>Gets or sets the answer.</summary>
    [Parameter, EditorRequired] public required Shortlist Shortlist { get; set; }

    /// <summary>Gets or sets how many glasses the stock holds.</summary>
    [Parameter, EditorRequired] public required int GlassesInStock { get; set; }

    private IEnumerable<(string Reason, long Count, string Unit)> Reasons =>
    [
        .. Shortlist.DroppedGlasses.CountBy(g => g.Reason).OrderBy(c => c.Key).Select(c => (WordsFor(c.Key), (long)c.Value, "glasses")),
        ("sold under another name too, ranked once", Shortlist.GlassesConsidered - Shortlist.DistinctGlasses, "glasses"),
        .. Shortlist.DroppedCombinations.Select(c => (WordsFor(c.Key), c.Value, "pairs")),
        ("past the depth of focus", Shortlist.CombinationsFeasible - Shortlist.CombinationsHolding, "pairs"),
    ];

    private static string WordsFor(GlassDropReason reason) => reason switch
    {
        GlassDropReason.Band => "no index over the whole band",
        GlassDropReason.Maker => "maker not kept",
        GlassDropReason.Supply => "supply state not kept",
        GlassDropReason.Lead => "contain lead",
        GlassDropReason.Molding => "made for molding",
        GlassDropReason.Excluded => "excluded by name",
        _ => reason.ToString(),
    };

    private static string WordsFor(PairDropReason reason) => reason switch
    {
        PairDropReason.NotIncluded => "hold no demanded glass",
        PairDropReason.DispersionsAlike => "disperse too much alike",
        PairDropReason.AirSpace => "air space too large",
        PairDropReason.ElementPower => "element power past the limit",
        PairDropReason.ExpansionDifference => "expand too differently",
        PairDropReason.ExpansionUnknown => "expansion not known",
        _ => reason.ToString(),
    };
}
