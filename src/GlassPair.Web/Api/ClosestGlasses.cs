using GlassPair.Catalogue;

namespace GlassPair.Web.Api;

/// <summary>Finds the glasses that a mistyped name may have meant.</summary>
public static class ClosestGlasses
{
    private const int Longest = 64;

    /// <summary>Gets the ids closest to a name: fewest characters to insert, drop, or replace; case, dashes, and spaces do not count.</summary>
    /// <param name="stock">The glasses.</param>
    /// <param name="id">What was typed, <c>maker/name</c>.</param>
    /// <param name="count">How many to name.</param>
    public static string[] To(Stock stock, string id, int count = 5)
    {
        string wanted = Bare(id.Length <= Longest ? id : id[..Longest]);
        return [.. stock.Glasses
            .OrderBy(g => Distance(wanted, Bare(g.Id)))
            .ThenBy(g => g.Id, StringComparer.Ordinal)
            .Take(count)
            .Select(g => g.Id)];
    }

    private static string Bare(string id) => id.Replace("-", "", StringComparison.Ordinal).Replace(" ", "", StringComparison.Ordinal).ToUpperInvariant();

    /// <summary>The edit distance of Levenshtein (1966), row by row.</summary>
    private static int Distance(string a, string b)
    {
        Span<int> row = stackalloc int[b.Length + 1];
        for (int j = 0; j <= b.Length; j++)
        {
            row[j] = j;
        }

        for (int i = 1; i <= a.Length; i++)
        {
            int diagonal = row[0];
            row[0] = i;
            for (int j = 1; j <= b.Length; j++)
            {
                int replaced = diagonal + (a[i - 1] == b[j - 1] ? 0 : 1);
                diagonal = row[j];
                row[j] = Math.Min(replaced, 1 + Math.Min(row[j], row[j - 1]));
            }
        }

        return row[b.Length];
    }
}
