using GlassPair.Optics.Glasses;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Charts;

/// <summary>The index of one glass against wavelength, with the named lines.</summary>
public sealed partial class DispersionChart : ComponentBase
{
    /// <summary>Gets or sets the glass.</summary>
    [Parameter, EditorRequired] public required Glass Glass { get; set; }
}
