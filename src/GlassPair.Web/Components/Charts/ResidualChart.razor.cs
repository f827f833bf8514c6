using GlassPair.Optics.Glasses;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Charts;

/// <summary>Measured minus fitted index at each line of a fit; lines left out are crossed.</summary>
public sealed partial class ResidualChart : ComponentBase
{
    /// <summary>Gets or sets the fit.</summary>
    [Parameter, EditorRequired] public required DispersionFit Fit { get; set; }
}
