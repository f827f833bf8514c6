using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>A choice that is either taken or not.</summary>
public sealed partial class Chip : ComponentBase
{
    /// <summary>Gets or sets whether it is taken.</summary>
    [Parameter] public bool On { get; set; }

    /// <summary>Gets or sets its name.</summary>
    [Parameter] public RenderFragment? ChildContent { get; set; }

    /// <summary>Called with the new choice.</summary>
    [Parameter] public EventCallback<bool> Changed { get; set; }
}
