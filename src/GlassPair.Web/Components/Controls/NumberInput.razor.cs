using GlassPair.Web.Addresses;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>A field for a number or a wavelength: keeps what was typed and shows what is wrong with it beside it.</summary>
public sealed partial class NumberInput : ComponentBase
{
    private readonly DraftText _draft = new();

    /// <summary>Gets or sets what is asked for.</summary>
    [Parameter, EditorRequired] public required NumberField Field { get; set; }

    /// <summary>Gets or sets the text as typed.</summary>
    [Parameter, EditorRequired] public required string Value { get; set; }

    /// <summary>Gets or sets what is wrong with it; null where nothing is.</summary>
    [Parameter] public string? Problem { get; set; }

    /// <summary>Gets or sets the unit, where it says more than the field's own.</summary>
    [Parameter] public string? Unit { get; set; }

    /// <summary>Gets or sets whether it stands in a line with others that name it and its unit for the eye.</summary>
    [Parameter] public bool Inline { get; set; }

    /// <summary>Gets or sets the id of a list of suggestions.</summary>
    [Parameter] public string? List { get; set; }

    /// <summary>Called with the text at each change.</summary>
    [Parameter] public EventCallback<string> Typed { get; set; }

    private string Id => "field-" + Field.Key;

    /// <inheritdoc/>
    protected override void OnParametersSet() => _draft.Receive(Value);

    private Task TypeAsync(string? text) => Typed.InvokeAsync(_draft.Text = text ?? "");
}
