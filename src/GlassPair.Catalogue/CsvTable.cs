using System.Collections.Frozen;
using System.Collections.Immutable;
using CsvHelper;

namespace GlassPair.Catalogue;

/// <summary>The header and rows of a CSV file, read strictly: every row has the header's fields, quotes close in their line.</summary>
internal sealed class CsvTable
{
    public const int MostColumns = 64;
    public const int MostRows = 20_000;

    private static readonly char[] Separators = [',', ';', '\t', '|'];

    private CsvTable(ImmutableArray<CsvRow> rows) => Rows = rows;

    public ImmutableArray<CsvRow> Rows { get; }

    /// <summary>Reads a table; null where an error was found before the cells themselves.</summary>
    /// <param name="text">The file.</param>
    /// <param name="known">The columns that mean something; others are noted and ignored.</param>
    /// <param name="required">The columns that must be there.</param>
    /// <param name="issues">Takes what is found.</param>
    public static CsvTable? TryRead(CsvText text, FrozenSet<string> known, IReadOnlyList<string> required, IssueList issues)
    {
        int errorsBefore = issues.Errors;
        (int headerLine, string header) = FindHeader(text);
        char separator = text.StatedSeparator
            ?? Separators.MaxBy(candidate => header.Split(candidate).Count(name => known.Contains(NormalName(name))));
        var options = new CsvReaderOptions
        {
            Separator = separator,
            CommentPrefix = '#',
            TrimWhitespace = true,
            WhitespaceCharacters = separator == '\t' ? " " : " \t",
            AllowLineBreaksInQuotes = false,
            MalformedData = CsvMalformedDataHandling.Skip,
            OnMalformedRecord = record => issues.Error(text.File, text.LinesBefore + (int)record.LineNumber, ReasonOf(record.Reason), value: record.RawRecord),
            MissingField = CsvMissingFieldHandling.Throw,
            TrackLineNumbers = true,
        };
        using CsvReader reader = CsvReader.Create(text.Bytes, options);
        reader.ReadHeader();
        if (issues.Errors > errorsBefore || ReadHeader(text.File, headerLine, [.. reader.Headers], known, required, issues) is not { } columns)
        {
            return null;
        }

        var numbers = new NumberFormat(separator);
        ImmutableArray<CsvRow>.Builder rows = ImmutableArray.CreateBuilder<CsvRow>();
        int blank = 0;
        while (reader.Read())
        {
            int line = text.LinesBefore + (int)reader.LineNumber;
            string[] cells = new string[reader.FieldCount];
            bool isBlank = true;
            for (int i = 0; i < cells.Length; i++)
            {
                cells[i] = reader.GetString(i);
                isBlank &= cells[i].Length == 0;
            }

            if (isBlank)
            {
                blank++;
            }
            else if (rows.Count == MostRows)
            {
                issues.Error(text.File, line, $"More than {MostRows:N0} rows, the limit.");
                return null;
            }
            else if (FieldCountFault(cells, reader.Headers.Count, separator, isCutOff: line == text.LastLine && !text.EndsWithLineBreak) is { } fault)
            {
                issues.Error(text.File, line, fault);
            }
            else
            {
                rows.Add(new CsvRow(text.File, line, cells, columns, numbers, issues));
            }
        }

        if (blank + text.Comments > 0)
        {
            issues.Note(text.File, 0, $"Skipped rows without a value: {blank}; comment lines: {text.Comments}.");
        }

        if (rows.Count == 0 && issues.Errors == errorsBefore)
        {
            issues.Error(text.File, 0, "No rows found below the header.");
        }

        if (separator != ',')
        {
            issues.Note(text.File, 0, $"Columns are separated by {NameOf(separator)}.");
        }

        return issues.Errors > errorsBefore ? null : new CsvTable(rows.ToImmutable());
    }

    private static (int Line, string Header) FindHeader(CsvText text)
    {
        using var lines = new StreamReader(new MemoryStream(text.Bytes));
        int line = text.LinesBefore;
        while (lines.ReadLine() is { } header)
        {
            line++;
            if (header.AsSpan().Trim() is { Length: > 0 } trimmed && trimmed[0] != '#')
            {
                return (line, header);
            }
        }

        return (0, "");
    }

    private static FrozenDictionary<string, int>? ReadHeader(
        string file, int line, ImmutableArray<string> headers, FrozenSet<string> known, IReadOnlyList<string> required, IssueList issues)
    {
        if (headers.Length > MostColumns)
        {
            issues.Error(file, line, $"{headers.Length} columns; the limit is {MostColumns}.");
            return null;
        }

        int errorsBefore = issues.Errors;
        var columns = new Dictionary<string, int>(StringComparer.Ordinal);
        for (int i = 0; i < headers.Length; i++)
        {
            string name = NormalName(headers[i]);
            if (!columns.TryAdd(name, i) && name.Length > 0)
            {
                issues.Error(file, line, $"The column stands twice, as columns {columns[name] + 1} and {i + 1}.", name);
            }
        }

        if (!columns.Keys.Any(known.Contains))
        {
            issues.Error(file, line, $"The first line must be the header with the columns' names, such as {string.Join(", ", required)}.", value: string.Join(", ", headers));
            return null;
        }

        string[] missing = [.. required.Where(name => !columns.ContainsKey(name))];
        if (missing.Length > 0)
        {
            issues.Error(file, line, $"Columns are missing: {string.Join(", ", missing)}. Found: {string.Join(", ", headers.Take(12))}{(headers.Length > 12 ? ", …" : "")}.");
        }

        string[] unknown = [.. headers.Where(name => !known.Contains(NormalName(name))).Select(name => name.Length > 0 ? CellText.Shown(name) : "a column without a name")];
        if (unknown.Length > 0)
        {
            issues.Note(file, line, $"Ignored: {string.Join(", ", unknown)}.");
        }

        return issues.Errors > errorsBefore ? null : columns.ToFrozenDictionary(StringComparer.Ordinal);
    }

    private static string? FieldCountFault(string[] cells, int expected, char separator, bool isCutOff)
    {
        if (cells.Length == expected || (cells.Length > expected && cells.AsSpan(expected).IndexOfAnyExcept("") < 0))
        {
            return null;
        }

        string hint = isCutOff && cells.Length < expected ? " The file may be cut off."
            : cells.Length > expected && separator == ',' ? " A decimal comma? Write a point, or separate the columns with semicolons."
            : "";
        return $"The row has {cells.Length} fields, {expected} expected.{hint}";
    }

    /// <summary>Upper and lower case, spaces around a name and spaces for underscores do not count.</summary>
    private static string NormalName(string name) => name.Trim().Trim('"').Trim().ToLowerInvariant().Replace(' ', '_');

    private static string ReasonOf(CsvMalformedReason reason) => reason switch
    {
        CsvMalformedReason.LineBreakInQuotes => "A quote opens here and is not closed in its line.",
        CsvMalformedReason.UnterminatedQuote => "A quote opens here and is never closed.",
        CsvMalformedReason.StrayQuote => "A quote stands inside a field that does not begin with one: double it, and put the field in quotes.",
        CsvMalformedReason.TextAfterClosingQuote => "Text follows a closing quote: double a quote that belongs to the text.",
        _ => "The row is not CSV.",
    };

    private static string NameOf(char separator) => separator switch { ';' => "semicolons", '\t' => "tabs", '|' => "upright bars", _ => "commas" };
}
