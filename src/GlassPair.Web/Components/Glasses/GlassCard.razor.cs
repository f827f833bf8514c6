using GlassPair.Web.Addresses;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Glasses;

/// <summary>The glass that is chosen in the list: what it is, what was noticed about it, and where one can go with it.</summary>
public sealed partial class GlassCard : ComponentBase
{
    /// <summary>Gets or sets the glass; null where none is chosen.</summary>
    [Parameter] public GlassFigures? Figures { get; set; }

    /// <summary>Gets or sets the id of the stock that is asked for; null stands for today's.</summary>
    [Parameter] public string? StockId { get; set; }

    /// <summary>Gets or sets the requirement that the ways lead back to.</summary>
    [Parameter, EditorRequired] public required LastRequirement Last { get; set; }
}
