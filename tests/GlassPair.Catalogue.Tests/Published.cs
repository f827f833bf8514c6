namespace GlassPair.Catalogue.Tests;

/// <summary>A reference table of <c>tests/published</c>: lines that begin with # say where the rows come from.</summary>
internal static class Published
{
    public static IEnumerable<string[]> Rows(string file) =>
        File.ReadLines(Path.Combine(AppContext.BaseDirectory, "published", file)).Where(line => !line.StartsWith('#')).Skip(1).Select(line => line.Split(','));
}
