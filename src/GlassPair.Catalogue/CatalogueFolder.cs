using System.Globalization;
using System.Text;

namespace GlassPair.Catalogue;

/// <summary>A folder whose CSV files are one catalogue.</summary>
public static class CatalogueFolder
{
    /// <summary>The most files of a folder that are read.</summary>
    internal const int MostFiles = 100;

    private static readonly EnumerationOptions Options = new() { MatchCasing = MatchCasing.CaseInsensitive };

    /// <summary>Gets what tells whether a file was changed, added or taken away: names, lengths and times of writing. Empty where the folder cannot be read.</summary>
    public static string StampOf(string folder)
    {
        var stamp = new StringBuilder();
        try
        {
            foreach (string path in Paths(folder))
            {
                var file = new FileInfo(path);
                stamp.Append(CultureInfo.InvariantCulture, $"{file.Name}\n{file.Length}\n{file.LastWriteTimeUtc.Ticks}\n");
            }
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return "";
        }

        return stamp.ToString();
    }

    /// <summary>Gets the CSV files in ordinal order of their names, without those that a spreadsheet hides beside an open file.</summary>
    internal static IReadOnlyList<string> Paths(string folder) =>
        [.. Directory.EnumerateFiles(folder, "*.csv", Options)
            .Where(path => Path.GetFileName(path) is { } name && !name.StartsWith('.') && !name.StartsWith("~$", StringComparison.Ordinal))
            .OrderBy(Path.GetFileName, StringComparer.Ordinal)];
}
