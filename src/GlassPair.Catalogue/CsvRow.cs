using System.Collections.Frozen;
using System.Collections.Immutable;

namespace GlassPair.Catalogue;

/// <summary>One row of a table. Each cell is read as what its column holds; a fault is listed with line, column and value.</summary>
internal sealed class CsvRow(
    string file, int line, string[] cells, FrozenDictionary<string, int> columns, NumberFormat numbers, IssueList issues)
{
    private static readonly char[] UsualSpaces = [' ', '\t'];

    public string File => file;

    public int Line => line;

    /// <summary>Gets the number of errors in the list, of this row and of those before it.</summary>
    public int Errors => issues.Errors;

    public bool Has(CatalogueColumn column) => Raw(column).Length > 0;

    /// <summary>Lists an error of this row.</summary>
    public void Error(string message, CatalogueColumn? column = null) =>
        issues.Error(file, line, message, column?.Name ?? "", column is null ? "" : Raw(column));

    /// <summary>Lists a note on this row.</summary>
    public void Note(string message, CatalogueColumn? column = null) =>
        issues.Note(file, line, message, column?.Name ?? "", column is null ? "" : Raw(column));

    /// <summary>Reads a text of one line; null where the cell is empty or faulty.</summary>
    public string? Text(CatalogueColumn column)
    {
        string raw = Raw(column);
        string text = FormulaGuard.Remove(raw);
        if (text.Length == 0)
        {
            return null;
        }

        if (CellText.FindInvisible(text) is { } invisible)
        {
            Error($"Holds an invisible character, {invisible}: type the text again.", column);
            return null;
        }

        if (text.Length > column.MaxLength)
        {
            Error(FormattableString.Invariant($"Longer than {column.MaxLength} characters."), column);
            return null;
        }

        return text;
    }

    /// <summary>Reads a text of which names are made: accents must be one character with their letter, slashes would break links.</summary>
    public string? Name(CatalogueColumn column)
    {
        if (Text(column) is not { } text)
        {
            return null;
        }

        if (CellText.FindCombiningMark(text) is { } mark)
        {
            Error($"Holds an accent apart from its letter, {mark}: type the accented letter as one character.", column);
            return null;
        }

        if (text.AsSpan().ContainsAny('/', '\\') || text.AsSpan().Trim('.').Length == 0)
        {
            Error("A name holds no / or \\ and is more than dots: it is part of a link.", column);
            return null;
        }

        return text;
    }

    /// <summary>Reads one of a few words; null where the cell is empty or holds another word.</summary>
    public string? Choice(CatalogueColumn column)
    {
        string raw = Raw(column);
        if (raw.Length == 0)
        {
            return null;
        }

        foreach (string choice in column.Choices)
        {
            if (string.Equals(raw, choice, StringComparison.OrdinalIgnoreCase))
            {
                return choice;
            }
        }

        Error($"Must be one of: {string.Join(", ", column.Choices)}.", column);
        return null;
    }

    /// <summary>Reads a number in the column's range; null where the cell is empty or faulty.</summary>
    public double? Number(CatalogueColumn column) =>
        Raw(column) is { Length: > 0 } raw && TryNumber(column, raw, column.Quantity!, out double value) ? value : null;

    /// <summary>Reads a list such as <c>350 1.2e-8; 400 3e-9</c>; empty where the cell is empty or faulty.</summary>
    public ImmutableArray<(double At, double Value)> Samples(CatalogueColumn column)
    {
        string raw = Raw(column);
        if (raw.Length == 0)
        {
            return [];
        }

        ImmutableArray<(double, double)>.Builder samples = ImmutableArray.CreateBuilder<(double, double)>();
        foreach (string entry in raw.Split(';', StringSplitOptions.TrimEntries))
        {
            string[] parts = entry.Split(UsualSpaces, StringSplitOptions.RemoveEmptyEntries);
            if (parts.Length != 2)
            {
                issues.Error(file, line, "Entries are \"nm value\", separated by semicolons, such as 350 1.2e-8; 400 3e-9.", column.Name, entry);
                return [];
            }

            if (!TryNumber(column, parts[0], CatalogueFormat.Nanometers, out double at) || !TryNumber(column, parts[1], column.Quantity!, out double value))
            {
                return [];
            }

            samples.Add((at, value));
        }

        return samples.ToImmutable();
    }

    /// <summary>Gets the number of decimals that a number is written with, such as 4 for 1.5168.</summary>
    public int DecimalsOf(CatalogueColumn column)
    {
        ReadOnlySpan<char> raw = Raw(column);
        int mark = raw.IndexOfAny('.', ',');
        int end = mark < 0 ? -1 : raw[(mark + 1)..].IndexOfAnyExceptInRange('0', '9');
        return mark < 0 ? 0 : end < 0 ? raw.Length - mark - 1 : end;
    }

    private bool TryNumber(CatalogueColumn column, string text, Quantity quantity, out double value)
    {
        string? fault = numbers.FindFault(text, out value) ?? quantity.FindFault(value);
        if (fault is not null)
        {
            issues.Error(file, line, fault, column.Name, text);
        }

        return fault is null;
    }

    private string Raw(CatalogueColumn column)
    {
        if (!columns.TryGetValue(column.Name, out int index))
        {
            return "";
        }

        string cell = cells[index];
        string trimmed = cell.Trim();
        if (trimmed.Length < cell.Length)
        {
            cells[index] = trimmed;
            if (trimmed.Length < cell.Trim(UsualSpaces).Length)
            {
                issues.Note(file, line, "Unusual spaces before or after the value were left out.", column.Name, trimmed);
            }
        }

        return trimmed;
    }
}
