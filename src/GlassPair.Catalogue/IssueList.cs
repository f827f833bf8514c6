using System.Collections.Immutable;

namespace GlassPair.Catalogue;

/// <summary>The issues found so far: the first of each severity, and a count of all.</summary>
internal sealed class IssueList
{
    public const int MostListed = 100;

    private readonly List<StockIssue> _errors = [];
    private readonly List<StockIssue> _notes = [];

    /// <summary>Gets the number of errors found, listed or not.</summary>
    public int Errors { get; private set; }

    public int Notes { get; private set; }

    /// <summary>Gets the issues to show, errors first.</summary>
    public ImmutableArray<StockIssue> Listed => [.. _errors.Concat(_notes).Take(MostListed)];

    public int Further => Errors + Notes - Listed.Length;

    public void Error(string file, int line, string message, string column = "", string value = "")
    {
        Errors++;
        if (_errors.Count < MostListed)
        {
            _errors.Add(new StockIssue(file, line, column, CellText.Shown(value), message, IssueSeverity.Error));
        }
    }

    public void Note(string file, int line, string message, string column = "", string value = "")
    {
        Notes++;
        if (_notes.Count < MostListed)
        {
            _notes.Add(new StockIssue(file, line, column, CellText.Shown(value), message, IssueSeverity.Note));
        }
    }
}
