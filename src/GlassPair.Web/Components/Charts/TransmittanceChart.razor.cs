using GlassPair.Optics.Glasses;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Charts;

/// <summary>The internal transmittance of one glass against wavelength.</summary>
public sealed partial class TransmittanceChart : ComponentBase
{
    /// <summary>Gets or sets the glass.</summary>
    [Parameter, EditorRequired] public required Glass Glass { get; set; }
}
