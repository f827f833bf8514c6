using GlassPair.Optics.Color;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Charts;

/// <summary>The powers of the elements to scale, adding up to the power of the lens.</summary>
public sealed partial class PowersFigure : ComponentBase
{
    /// <summary>Gets or sets the combination shown.</summary>
    [Parameter, EditorRequired] public required ThinSolution Solution { get; set; }
}
