using System.Collections.Immutable;
using GlassPair.Optics.Glasses;

namespace GlassPair.Catalogue;

/// <summary>Reads a catalogue of CSV files in the format of <see cref="CatalogueFormat"/>. What is in the files never makes it throw.</summary>
public static class StockReader
{
    /// <summary>Reads every CSV file of a folder as one stock. A folder or file that cannot be read is an issue.</summary>
    public static StockReading ReadFolder(string folder, string title)
    {
        var issues = new IssueList();
        List<CatalogueFile> files = [];
        try
        {
            foreach (string path in CatalogueFolder.Paths(folder).Take(CatalogueFolder.MostFiles + 1))
            {
                try
                {
                    using FileStream content = File.OpenRead(path);
                    files.Add(CatalogueFile.FromStream(Path.GetFileName(path), content));
                }
                catch (Exception e) when (e is IOException or UnauthorizedAccessException)
                {
                    issues.Error(Path.GetFileName(path), 0, "The file cannot be read; is it open in another program, and may the server read it?");
                }
            }
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            issues.Error("", 0, "The catalogue's folder does not exist or cannot be read.");
        }

        return Read(files, title, issues);
    }

    /// <summary>Reads one file as a stock.</summary>
    /// <exception cref="IOException">The stream cannot be read.</exception>
    public static StockReading ReadFile(string name, Stream content, string title) => Read([CatalogueFile.FromStream(name, content)], title);

    /// <summary>Reads files as one stock.</summary>
    public static StockReading Read(IEnumerable<CatalogueFile> files, string title) => Read([.. files], title, new IssueList());

    private static StockReading Read(List<CatalogueFile> files, string title, IssueList issues)
    {
        if (files.Count == 0 && issues.Errors == 0)
        {
            issues.Error("", 0, "The catalogue has no CSV file.");
        }

        if (files.Count > CatalogueFolder.MostFiles)
        {
            issues.Error("", 0, $"More than {CatalogueFolder.MostFiles} files, the limit.");
            return ReadingOf(null, issues);
        }

        files.Sort((a, b) => string.CompareOrdinal(a.Name, b.Name));
        foreach ((CatalogueFile _, CatalogueFile next) in files.Zip(files.Skip(1)).Where(pair => pair.First.Name == pair.Second.Name))
        {
            issues.Error(next.Name, 0, "Two files have this name.");
        }

        List<GlassRow> rows = [];
        var firstOf = new Dictionary<string, CsvRow>(StringComparer.Ordinal);
        foreach (CatalogueFile file in files)
        {
            if (CsvText.TryOpen(file, issues) is not { } text
                || CsvTable.TryRead(text, CatalogueFormat.Names, CatalogueFormat.Required, issues) is not { } table)
            {
                continue;
            }

            foreach (CsvRow row in table.Rows)
            {
                if (GlassRow.TryRead(row) is not { } read)
                {
                    continue;
                }

                if (firstOf.TryGetValue(GlassKey.Of(read.Glass.Id), out CsvRow? first))
                {
                    row.Error(
                        FormattableString.Invariant($"The glass stands in {first.File}, line {first.Line}, too: upper and lower case, spaces and the kind of dash do not count. Take one row away."),
                        CatalogueFormat.Name);
                }
                else
                {
                    firstOf.Add(GlassKey.Of(read.Glass.Id), row);
                    rows.Add(read);
                }
            }
        }

        if (rows.Count > CsvTable.MostRows)
        {
            issues.Error("", 0, $"More than {CsvTable.MostRows:N0} glasses, the limit.");
        }

        return ReadingOf(issues.Errors == 0 ? StockOf(rows, files, title) : null, issues);
    }

    private static Stock StockOf(List<GlassRow> rows, IReadOnlyList<CatalogueFile> files, string title)
    {
        IEnumerable<Glass> glasses = rows.Select(r => r.Glass);
        ImmutableArray<GlassRemark> remarks =
        [
            .. rows.SelectMany(r => GlassRemarks.On(r).Select(message => new GlassRemark(r.Glass.Id, message))),
            .. MakerNormalLine.RemarksOn(glasses),
        ];
        return new Stock(StockId.Of(files), title, glasses, remarks, [.. files]);
    }

    private static StockReading ReadingOf(Stock? stock, IssueList issues) => new(stock, issues.Listed) { FurtherIssues = issues.Further };
}
