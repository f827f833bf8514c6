using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Figures;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>The chosen pair in words, pictures and numbers.</summary>
public sealed partial class PairPanel : ComponentBase
{
    private const int Foremost = 5;
    private ImmutableArray<Figure> _figures = [];

    /// <summary>Gets or sets the pair.</summary>
    [Parameter, EditorRequired] public required RankedPair Pair { get; set; }

    /// <summary>Gets or sets how well its glasses are known.</summary>
    [Parameter, EditorRequired] public required DataQuality Quality { get; set; }

    /// <summary>Gets or sets the pair kept for comparison.</summary>
    [Parameter] public RankedPair? Pinned { get; set; }

    /// <summary>Gets or sets whether a newer answer is being computed.</summary>
    [Parameter] public bool Stale { get; set; }

    /// <summary>Called with the pair to pin, or no longer to pin.</summary>
    [Parameter] public EventCallback<RankedPair> PinToggled { get; set; }

    /// <inheritdoc/>
    protected override void OnParametersSet() => _figures = PairFigures.Of(Pair, Quality);

    private bool IsPinned => Pinned is not null && Addresses.PairName.Of(Pinned.Solution) == Addresses.PairName.Of(Pair.Solution);

    private string Makers => Pair.Positive.Glass.Maker == Pair.Negative.Glass.Maker
        ? Pair.Positive.Glass.Maker
        : $"{Pair.Positive.Glass.Maker} and {Pair.Negative.Glass.Maker}";

    private static string GlassAddress(Glass glass) => $"glasses/{Uri.EscapeDataString(glass.Maker)}/{Uri.EscapeDataString(glass.Name)}";
}
