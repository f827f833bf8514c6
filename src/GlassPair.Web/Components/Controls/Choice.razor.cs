using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>One of a few, side by side.</summary>
/// <typeparam name="TValue">What is chosen.</typeparam>
public sealed partial class Choice<TValue> : ComponentBase
{
    /// <summary>Gets or sets what is chosen here.</summary>
    [Parameter, EditorRequired] public required string Label { get; set; }

    /// <summary>Gets or sets the name of the group, unique on the page.</summary>
    [Parameter, EditorRequired] public required string Name { get; set; }

    /// <summary>Gets or sets what can be chosen, with its words.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<(TValue Value, string Text)> Options { get; set; }

    /// <summary>Gets or sets what is chosen.</summary>
    [Parameter] public TValue? Value { get; set; }

    /// <summary>Called with the new choice.</summary>
    [Parameter] public EventCallback<TValue> Changed { get; set; }
}
