using System.Globalization;
using System.Text;

namespace GlassPair.Catalogue;

/// <summary>What text a cell may hold, and how a cell's text is shown in a message.</summary>
internal static class CellText
{
    private const int LongestShown = 40;

    /// <summary>Finds the first character that cannot be seen or that changes how its neighbors are shown; null where there is none.</summary>
    public static string? FindInvisible(string text)
    {
        foreach (Rune rune in text.EnumerateRunes())
        {
            if (IsInvisible(rune))
            {
                return CodePoint(rune);
            }
        }

        return null;
    }

    /// <summary>Finds the first accent written apart from its letter: two names that look alike could differ by it.</summary>
    public static string? FindCombiningMark(string text)
    {
        foreach (Rune rune in text.EnumerateRunes())
        {
            if (Rune.GetUnicodeCategory(rune) is UnicodeCategory.NonSpacingMark or UnicodeCategory.EnclosingMark or UnicodeCategory.SpacingCombiningMark)
            {
                return CodePoint(rune);
            }
        }

        return null;
    }

    /// <summary>The text for a message: invisible characters written out, cut to 40 characters.</summary>
    public static string Shown(string text)
    {
        var shown = new StringBuilder();
        foreach (Rune rune in text.EnumerateRunes())
        {
            shown.Append(IsInvisible(rune) ? $"[{CodePoint(rune)}]" : rune.ToString());
            if (shown.Length > LongestShown)
            {
                return string.Concat(shown.ToString().AsSpan(0, LongestShown - 1), "…");
            }
        }

        return shown.ToString();
    }

    private static bool IsInvisible(Rune rune) => rune.IsAscii
        ? rune.Value is < 0x20 or 0x7F
        : Rune.IsWhiteSpace(rune) || Rune.GetUnicodeCategory(rune) is UnicodeCategory.Control
            or UnicodeCategory.Format or UnicodeCategory.PrivateUse or UnicodeCategory.OtherNotAssigned;

    private static string CodePoint(Rune rune) => "U+" + rune.Value.ToString("X4", CultureInfo.InvariantCulture);
}
