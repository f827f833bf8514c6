namespace GlassPair.Web.Components.Controls;

/// <summary>The text of a field while it is typed: what the owner says counts only when it says something new, so that a drawing that is late overwrites no keystroke.</summary>
internal sealed class DraftText
{
    private string? _received;

    /// <summary>Gets or sets the text as it stands in the field.</summary>
    public string Text { get; set; } = "";

    /// <summary>Takes what the owner says: at each setting of parameters.</summary>
    public void Receive(string text)
    {
        if (text != _received)
        {
            Text = _received = text;
        }
    }
}
