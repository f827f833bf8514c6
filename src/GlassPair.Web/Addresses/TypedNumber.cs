using System.Globalization;

namespace GlassPair.Web.Addresses;

/// <summary>Reads numbers as people type them, and says what is wrong with those that are none.</summary>
public static class TypedNumber
{
    private const NumberStyles Allowed = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;
    private const int LongestShown = 40;

    /// <summary>Reads a finite number with a decimal point; the typographic minus sign counts as a minus.</summary>
    /// <param name="text">The text as typed.</param>
    /// <param name="value">The number; 0 where there is none.</param>
    /// <param name="problem">What is wrong, as a sentence; null where the number was read.</param>
    public static bool TryRead(string text, out double value, out string? problem)
    {
        string trimmed = text.Trim().Replace('\u2212', '-');
        problem = null;
        if (TryParse(trimmed, out value))
        {
            return true;
        }

        string shown = Shorten(text);
        problem = trimmed.Length == 0 ? "A number is needed."
            : trimmed.Contains(',', StringComparison.Ordinal) && TryParse(trimmed.Replace(',', '.'), out _)
                ? $"“{shown}” has a decimal comma; write {trimmed.Replace(',', '.')}."
                : $"“{shown}” is not a number that can be used; write it like 12.5.";
        value = 0.0;
        return false;
    }

    /// <summary>Writes a number in the fewest digits that read back alike.</summary>
    public static string Write(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    /// <summary>Cuts a text to what fits into a sentence, without control characters.</summary>
    public static string Shorten(string text)
    {
        string clean = new([.. text.Select(c => char.IsControl(c) ? '\u25a1' : c)]);
        return clean.Length <= LongestShown ? clean : clean[..(LongestShown - 1)] + "…";
    }

    // A text such as 1e-400 rounds to zero without being it.
    private static bool TryParse(string text, out double value) =>
        double.TryParse(text, Allowed, CultureInfo.InvariantCulture, out value) && double.IsFinite(value)
        && (value != 0.0 || !Mantissa(text).ContainsAnyInRange('1', '9'));

    private static ReadOnlySpan<char> Mantissa(string text) =>
        text.AsSpan(0, text.IndexOfAny(['e', 'E']) is >= 0 and var end ? end : text.Length);
}
