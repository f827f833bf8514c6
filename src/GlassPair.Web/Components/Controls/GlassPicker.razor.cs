using GlassPair.Optics.Glasses;
using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Web;

namespace GlassPair.Web.Components.Controls;

/// <summary>Picks glasses by name, after the editable combo box with list autocomplete of the ARIA Authoring Practices.</summary>
public sealed partial class GlassPicker : ComponentBase
{
    private const int MostHits = 8;
    private string _text = "";
    private IReadOnlyList<Glass> _hits = [];
    private int _active = -1;

    /// <summary>Gets or sets the id of the input, unique on the page.</summary>
    [Parameter, EditorRequired] public required string Id { get; set; }

    /// <summary>Gets or sets what the glasses are picked for.</summary>
    [Parameter, EditorRequired] public required string Label { get; set; }

    /// <summary>Gets or sets the glasses that can be picked.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<Glass> Glasses { get; set; }

    /// <summary>Gets or sets the ids of those picked.</summary>
    [Parameter, EditorRequired] public required IReadOnlyCollection<string> Picked { get; set; }

    /// <summary>Called with the id of a glass to put on the list.</summary>
    [Parameter] public EventCallback<string> Added { get; set; }

    /// <summary>Called with the id of a glass to take off the list.</summary>
    [Parameter] public EventCallback<string> Removed { get; set; }

    private bool IsOpen => _hits.Count > 0;

    private void Type(string? text)
    {
        _text = text ?? "";
        string[] words = _text.Split([' ', '/'], StringSplitOptions.RemoveEmptyEntries);
        _hits = words.Length == 0 ? [] :
        [
            .. Glasses.Where(g => words.All(w => g.Id.Contains(w, StringComparison.OrdinalIgnoreCase)) && !Picked.Contains(g.Id))
                .OrderBy(g => !g.Name.Equals(words[^1], StringComparison.OrdinalIgnoreCase))
                .ThenBy(g => !g.Name.StartsWith(words[^1], StringComparison.OrdinalIgnoreCase))
                .ThenBy(g => g.Name.Length)
                .Take(MostHits),
        ];
        _active = _hits.Count > 0 ? 0 : -1;
    }

    private async Task KeyAsync(KeyboardEventArgs e)
    {
        switch (e.Key)
        {
            case "ArrowDown" when IsOpen:
                _active = (_active + 1) % _hits.Count;
                break;
            case "ArrowUp" when IsOpen:
                _active = (_active + _hits.Count - 1) % _hits.Count;
                break;
            case "Enter" when IsOpen:
                await PickAsync(_hits[Math.Max(_active, 0)]);
                break;
            case "Escape":
                Close();
                break;
        }
    }

    private async Task PickAsync(Glass glass)
    {
        (_text, _hits, _active) = ("", [], -1);
        await Added.InvokeAsync(glass.Id);
    }

    private void Close() => (_hits, _active) = ([], -1);
}
