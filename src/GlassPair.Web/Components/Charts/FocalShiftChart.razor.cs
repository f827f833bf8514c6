using GlassPair.Optics.Color;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Charts;

/// <summary>The focal shift of a combination against wavelength, over the depth of focus.</summary>
public sealed partial class FocalShiftChart : ComponentBase
{
    /// <summary>Gets or sets the combination shown.</summary>
    [Parameter, EditorRequired] public required ThinSolution Chosen { get; set; }

    /// <summary>Gets or sets the combination pinned for comparison, drawn dashed.</summary>
    [Parameter] public ThinSolution? Pinned { get; set; }

    /// <summary>Gets or sets whether a newer answer is being computed: the picture is dimmed.</summary>
    [Parameter] public bool Stale { get; set; }
}
