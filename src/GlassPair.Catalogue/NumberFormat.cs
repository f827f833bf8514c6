using System.Buffers;
using System.Globalization;

namespace GlassPair.Catalogue;

/// <summary>How the numbers of one file are written: with a decimal point, or with a decimal comma throughout. The first fraction decides.</summary>
internal sealed class NumberFormat(char separator)
{
    private static readonly SearchValues<char> Marks = SearchValues.Create(",.' \u00A0\u202F\u2009");
    private static readonly SearchValues<char> DigitsAndMarks = SearchValues.Create("+-0123456789,.' \u00A0\u202F\u2009");

    /// <summary>Gets the decimal mark; null until a fraction has been read.</summary>
    public char? Mark { get; private set; }

    /// <summary>Reads a number such as <c>-1.34e-6</c>. Gives what is wrong with it, as a sentence, or null.</summary>
    public string? FindFault(string text, out double value)
    {
        value = 0.0;
        if (FindShape(text) is not { } mark)
        {
            return LooksGrouped(text) ? "Not a number: thousands are written without a separator, as in 1234.5."
                : "Not a number, such as 1.5168 or 1.34e-6; leave the cell empty where the value is not known.";
        }

        if (mark == ',' && separator == ',')
        {
            return $"A decimal comma cannot be told from a separator: write {text.Replace(',', '.')}, or separate the columns with semicolons.";
        }

        if (mark != '\0')
        {
            if (Mark is { } before && before != mark)
            {
                return $"Written with a decimal {NameOf(mark)}, but numbers before it with a decimal {NameOf(before)}: use one of them throughout.";
            }

            Mark = mark;
        }

        value = double.Parse(mark == ',' ? text.Replace(',', '.') : text, NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent, CultureInfo.InvariantCulture);
        return !double.IsFinite(value) ? "Too large for a number."
            : value == 0.0 && HasOtherDigitThanZero(text) ? "Too small for a number: write 0."
            : null;
    }

    // [sign] digits [mark digits] [e [sign] digits]: gives the mark, '\0' where there is none, or null where the text has another shape.
    private static char? FindShape(ReadOnlySpan<char> text)
    {
        char mark = '\0';
        ReadOnlySpan<char> rest = text.Length > 0 && text[0] is '+' or '-' ? text[1..] : text;
        int digits = SkipDigits(ref rest);
        if (rest.Length > 0 && rest[0] is '.' or ',')
        {
            mark = rest[0];
            rest = rest[1..];
            digits += SkipDigits(ref rest);
        }

        if (digits == 0)
        {
            return null;
        }

        if (rest.Length > 1 && rest[0] is 'e' or 'E')
        {
            rest = rest[1] is '+' or '-' ? rest[2..] : rest[1..];
            if (SkipDigits(ref rest) == 0)
            {
                return null;
            }
        }

        return rest.Length == 0 ? mark : null;
    }

    private static int SkipDigits(ref ReadOnlySpan<char> text)
    {
        int count = text.IndexOfAnyExceptInRange('0', '9');
        count = count < 0 ? text.Length : count;
        text = text[count..];
        return count;
    }

    private static bool LooksGrouped(ReadOnlySpan<char> text) =>
        !text.ContainsAnyExcept(DigitsAndMarks) && text.ContainsAnyInRange('0', '9') && text.ContainsAny(Marks);

    private static bool HasOtherDigitThanZero(ReadOnlySpan<char> text)
    {
        int exponent = text.IndexOfAny('e', 'E');
        return (exponent < 0 ? text : text[..exponent]).ContainsAnyInRange('1', '9');
    }

    private static string NameOf(char mark) => mark == ',' ? "comma" : "point";
}
