using System.Collections.Immutable;

namespace GlassPair.Catalogue;

/// <summary>What reading a catalogue came to: a stock, or null with the issues that stopped it. All or nothing.</summary>
/// <param name="Stock">The stock; null where an issue of severity <see cref="IssueSeverity.Error"/> was found.</param>
/// <param name="Issues">Every issue found, the first 100.</param>
public sealed record StockReading(Stock? Stock, ImmutableArray<StockIssue> Issues);

/// <summary>How much an issue matters.</summary>
public enum IssueSeverity
{
    /// <summary>Read all the same; the user should know.</summary>
    Note,

    /// <summary>The catalogue cannot be used.</summary>
    Error,
}

/// <summary>Something wrong in a catalogue file, and where.</summary>
/// <param name="File">The file's name, without its folder.</param>
/// <param name="Line">The line, from 1; 0 where the whole file is meant.</param>
/// <param name="Column">The column's name; empty where the whole line is meant.</param>
/// <param name="Value">The value as read, cut to 40 characters.</param>
/// <param name="Message">What is wrong and what is allowed.</param>
/// <param name="Severity">How much it matters.</param>
public sealed record StockIssue(string File, int Line, string Column, string Value, string Message, IssueSeverity Severity);
