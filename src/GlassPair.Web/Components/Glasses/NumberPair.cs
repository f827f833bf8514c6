using System.Globalization;
using GlassPair.Web.Addresses;

namespace GlassPair.Web.Components.Glasses;

/// <summary>The two numbers of a line, or what is wrong with it.</summary>
/// <param name="First">The first number.</param>
/// <param name="Second">The second number.</param>
/// <param name="Problem">What is wrong, as a sentence; null where both numbers were read.</param>
internal readonly record struct NumberPair(double First, double Second, string? Problem)
{
    private const char Quote = '"';

    /// <summary>Reads a line whose form is known.</summary>
    public static NumberPair Read(string line, TableForm form)
    {
        if (line.Any(c => char.IsControl(c) && c != '\t'))
        {
            return Faulty("The line holds a character that cannot be seen: type it anew.");
        }

        if (TrySplit(line, form.Separator) is not { } fields)
        {
            return Faulty("A quotation mark is opened and not closed.");
        }

        if (fields.Count != 2)
        {
            string hint = form.Separator == FieldSeparator.Comma && fields.Count is 3 or 4
                ? " Are these decimal commas? Part the numbers by semicolons or blanks, or choose how the table is written."
                : fields.Count > 2 ? " Leave out names and units." : "";
            return Faulty(string.Create(CultureInfo.InvariantCulture, $"{fields.Count} {(fields.Count == 1 ? "field" : "fields")}, where 2 are expected: wavelength and index.{hint}"));
        }

        return TryNumber(fields[0], form, out double first) is { } problem ? Faulty(problem)
            : TryNumber(fields[1], form, out double second) is { } other ? Faulty(other)
            : new NumberPair(first, second, null);
    }

    /// <summary>Tells whether a line is a pair of numbers if its fields are parted so, with either decimal mark.</summary>
    public static bool Fits(string line, FieldSeparator separator) =>
        TrySplit(line, separator) is [var first, var second] && LooksLikeNumber(first.Text) && LooksLikeNumber(second.Text);

    /// <summary>Splits a line into its fields, passing over empty ones at the end; null where a quotation mark is not closed.</summary>
    public static List<Field>? TrySplit(string line, FieldSeparator? separator)
    {
        List<Field> fields = [];
        for (int at = 0; at <= line.Length;)
        {
            while (at < line.Length && IsBlank(line[at]) && (separator == FieldSeparator.Space || !Separates(line[at], separator)))
            {
                at++;
            }

            bool isQuoted = at < line.Length && line[at] == Quote;
            int close = isQuoted ? line.IndexOf(Quote, at + 1) : at - 1;
            if (isQuoted && close < 0)
            {
                return null;
            }

            int end = close + 1;
            while (end < line.Length && !Separates(line[end], separator))
            {
                end++;
            }

            // What stands behind a closing quotation mark makes the whole no number.
            bool isClean = isQuoted && line.AsSpan(close + 1, end - close - 1).IsWhiteSpace();
            fields.Add(new Field((isClean ? line[(at + 1)..close] : line[at..end]).Trim(), isClean));
            at = end + 1;
        }

        while (fields is [.., { Text.Length: 0, IsQuoted: false }])
        {
            fields.RemoveAt(fields.Count - 1);
        }

        return fields;
    }

    /// <summary>Tells whether a text is a number with a decimal point or a decimal comma.</summary>
    public static bool LooksLikeNumber(string text) =>
        TypedNumber.TryRead(text, out _, out _) || (IsOneComma(text) && TypedNumber.TryRead(text.Replace(',', '.'), out _, out _));

    private static bool IsOneComma(string text) => text.Count(c => c == ',') == 1 && !text.Contains('.', StringComparison.Ordinal);

    private static bool IsBlank(char c) => c is ' ' or '\t' or '\u00A0';

    private static bool Separates(char c, FieldSeparator? separator) => separator switch
    {
        FieldSeparator.Tab => c == '\t',
        FieldSeparator.Semicolon => c == ';',
        FieldSeparator.Bar => c == '|',
        FieldSeparator.Comma => c == ',',
        _ => IsBlank(c),
    };

    /// <summary>Reads a number; the problem as a sentence where there is none.</summary>
    private static string? TryNumber(Field field, TableForm form, out double value)
    {
        string text = field.Text;
        string shown = TypedNumber.Shorten(text);
        value = 0.0;
        if (text.Length == 0)
        {
            return "A number is missing.";
        }

        bool hasComma = text.Contains(',', StringComparison.Ordinal), hasPoint = text.Contains('.', StringComparison.Ordinal);
        if (hasComma && hasPoint)
        {
            return $"“{shown}” holds both a comma and a point. Leave out marks between thousands.";
        }

        if (text.Any(char.IsWhiteSpace))
        {
            return $"“{shown}” holds a blank. Leave out marks between thousands, and units.";
        }

        if (form.Mark == DecimalMark.Comma)
        {
            return hasPoint ? $"“{shown}” has a decimal point, the table has decimal commas."
                : TypedNumber.TryRead(text.Replace(',', '.'), out value, out _) && IsOneCommaOrNone(text) ? null
                : NotANumber(shown);
        }

        return !hasComma ? TypedNumber.TryRead(text, out value, out _) ? null : NotANumber(shown)
            : field.IsQuoted && IsOneComma(text) ? $"“{shown}” has a comma inside quotation marks. If it stands before the decimals, choose “decimal comma”."
            : IsOneComma(text) ? $"“{shown}” has a decimal comma, the table has decimal points."
            : NotANumber(shown);
    }

    private static bool IsOneCommaOrNone(string text) => text.Count(c => c == ',') <= 1;

    private static string NotANumber(string shown) => $"“{shown}” is not a number that can be used.";

    private static NumberPair Faulty(string problem) => new(0.0, 0.0, problem);

    /// <summary>A field of a line.</summary>
    internal readonly record struct Field(string Text, bool IsQuoted);
}
