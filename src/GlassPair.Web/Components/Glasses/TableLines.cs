using System.Collections.Immutable;

namespace GlassPair.Web.Components.Glasses;

/// <summary>The lines of a pasted table: which hold data, and how their fields are parted.</summary>
internal sealed class TableLines
{
    private const string SeparatorLine = "sep=";

    /// <summary>Sorts the lines of a text.</summary>
    public TableLines(string text, TableForm asked)
    {
        List<(int Number, string Text)> data = [];
        FieldSeparator? declared = null;
        string[] lines = text.ReplaceLineEndings("\n").Split('\n');
        for (int i = 0; i < lines.Length; i++)
        {
            string line = lines[i];
            if (i == 0 && line.StartsWith(SeparatorLine, StringComparison.OrdinalIgnoreCase) && DeclaredBy(line) is { } separator)
            {
                declared = separator;
            }
            else if (line.AsSpan().Trim().Trim(";,|\"").IsWhiteSpace() || line.AsSpan().TrimStart().StartsWith('#'))
            {
                // The text's last line end leaves an empty line behind that nobody wrote.
                Skipped += i == lines.Length - 1 && line.Length == 0 ? 0 : 1;
            }
            else
            {
                data.Add((i + 1, line));
            }
        }

        if (data.Count > 0 && IsHeading(data[0].Text))
        {
            Header = data[0];
            data.RemoveAt(0);
        }

        Data = [.. data];
        FieldSeparator parts = asked.Separator ?? declared ?? SeparatorOf(data.Select(l => l.Text));
        Form = asked with { Separator = parts, Mark = asked.Mark ?? MarkOf(data.Select(l => l.Text), parts) };
    }

    /// <summary>Gets the lines that should hold a pair of numbers, with their numbers from 1.</summary>
    public ImmutableArray<(int Number, string Text)> Data { get; }

    /// <summary>Gets the heading; null where there is none.</summary>
    public (int Number, string Text)? Header { get; }

    /// <summary>Gets how many blank and comment lines were passed over.</summary>
    public int Skipped { get; }

    /// <summary>Gets what parts the fields and stands before the decimals; the unit as asked.</summary>
    public TableForm Form { get; }

    private static FieldSeparator? DeclaredBy(string line) => line[SeparatorLine.Length..].TrimEnd('\r') switch
    {
        ";" => FieldSeparator.Semicolon,
        "," => FieldSeparator.Comma,
        "|" => FieldSeparator.Bar,
        "\t" => FieldSeparator.Tab,
        _ => null,
    };

    /// <summary>A heading holds letters and, however its fields are parted, no number.</summary>
    private static bool IsHeading(string line) =>
        line.Any(char.IsLetter) && !line.Split([' ', '\t', ';', ',', '|', '\u00A0']).Any(field => NumberPair.LooksLikeNumber(field.Trim('"')));

    /// <summary>The separator with which most lines are pairs of numbers; where none is, the first one that occurs.</summary>
    private static FieldSeparator SeparatorOf(IEnumerable<string> lines)
    {
        string[] all = [.. lines];
        FieldSeparator best = Enum.GetValues<FieldSeparator>().MaxBy(s => all.Count(l => NumberPair.Fits(l, s)));
        return all.Any(l => NumberPair.Fits(l, best)) ? best
            : Enum.GetValues<FieldSeparator>().FirstOrDefault(s => all.Any(l => NumberPair.TrySplit(l, s) is { Count: > 1 }), FieldSeparator.Space);
    }

    /// <summary>The mark that more numbers have; a comma in a table parted by commas decides nothing.</summary>
    private static DecimalMark MarkOf(IEnumerable<string> lines, FieldSeparator separator)
    {
        int points = 0, commas = 0;
        foreach (NumberPair.Field field in lines.SelectMany(l => NumberPair.TrySplit(l, separator) ?? []).Where(f => NumberPair.LooksLikeNumber(f.Text)))
        {
            points += field.Text.Contains('.', StringComparison.Ordinal) ? 1 : 0;
            commas += field.Text.Contains(',', StringComparison.Ordinal) ? 1 : 0;
        }

        return separator != FieldSeparator.Comma && commas > points ? DecimalMark.Comma : DecimalMark.Point;
    }
}
