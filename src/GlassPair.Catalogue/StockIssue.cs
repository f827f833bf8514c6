namespace GlassPair.Catalogue;

/// <summary>How much an issue matters.</summary>
public enum IssueSeverity
{
    /// <summary>Read all the same; the user should know.</summary>
    Note,

    /// <summary>The catalogue cannot be used.</summary>
    Error,
}

/// <summary>Something wrong in a catalogue file, and where.</summary>
/// <param name="File">The file's name, without its folder; empty where the whole catalogue is meant.</param>
/// <param name="Line">The line, from 1; 0 where the whole file is meant.</param>
/// <param name="Column">The column's name; empty where the whole line is meant.</param>
/// <param name="Value">The value as read, invisible characters written out, cut to 40 characters.</param>
/// <param name="Message">What is wrong and what is allowed, as sentences.</param>
/// <param name="Severity">How much it matters.</param>
public sealed record StockIssue(string File, int Line, string Column, string Value, string Message, IssueSeverity Severity)
{
    /// <summary>The issue as one line of text: where, what was read, what is wrong.</summary>
    public override string ToString()
    {
        string[] where = [File, Line > 0 ? FormattableString.Invariant($"line {Line}") : "", Column, Value.Length > 0 ? $"\"{Value}\"" : ""];
        string place = string.Join(", ", where.Where(part => part.Length > 0));
        return place.Length > 0 ? $"{place}: {Message}" : Message;
    }
}
