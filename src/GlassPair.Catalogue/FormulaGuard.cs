namespace GlassPair.Catalogue;

/// <summary>
/// The apostrophe that keeps a spreadsheet from running a cell's text as a formula. Unlike a one-way escape it can be taken
/// off again exactly: a text that already looks guarded gets one apostrophe more.
/// </summary>
internal static class FormulaGuard
{
    /// <summary>Puts the guard before a text that a spreadsheet could run.</summary>
    public static string Add(string text) => LooksLikeFormula(text.AsSpan().TrimStart('\'')) ? "'" + text : text;

    /// <summary>Takes the guard off again.</summary>
    public static string Remove(string text) =>
        text.StartsWith('\'') && LooksLikeFormula(text.AsSpan().TrimStart('\'')) ? text[1..] : text;

    private static bool LooksLikeFormula(ReadOnlySpan<char> text) => text.Length > 0 && text[0] is '=' or '+' or '-' or '@' or '\t' or '\r';
}
