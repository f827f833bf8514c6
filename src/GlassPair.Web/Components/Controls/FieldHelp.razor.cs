using GlassPair.Web.Addresses;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>The explanation of a group of fields, opened on demand.</summary>
public sealed partial class FieldHelp : ComponentBase
{
    /// <summary>Gets or sets the fields explained.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<NumberField> Fields { get; set; }

    /// <summary>Gets or sets further explanations, as terms and definitions.</summary>
    [Parameter] public RenderFragment? ChildContent { get; set; }
}
