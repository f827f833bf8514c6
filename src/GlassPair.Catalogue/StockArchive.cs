using System.IO.Compression;

namespace GlassPair.Catalogue;

/// <summary>A folder that keeps stocks as the files they were read from, one zip for each id, so that a link to an old stock still opens.</summary>
/// <param name="folder">The folder; made when the first stock is saved.</param>
public sealed class StockArchive(string folder)
{
    /// <summary>Gets the folder.</summary>
    public string Folder => folder;

    /// <summary>Keeps a stock. A stock of the same id, which has the same content, is replaced in one step.</summary>
    /// <exception cref="IOException">The folder cannot be written to.</exception>
    /// <exception cref="UnauthorizedAccessException">The folder cannot be written to.</exception>
    public void Save(Stock stock)
    {
        Directory.CreateDirectory(folder);
        string unfinished = Path.Combine(folder, $"{stock.Id}.{Guid.NewGuid():N}.tmp");
        try
        {
            using (FileStream stream = File.Create(unfinished))
            {
                using (var zip = new ZipArchive(stream, ZipArchiveMode.Create, leaveOpen: true))
                {
                    zip.Comment = stock.Title;
                    foreach (CatalogueFile file in stock.Files)
                    {
                        using Stream entry = zip.CreateEntry(file.Name, CompressionLevel.Fastest).Open();
                        entry.Write(file.Content.AsSpan());
                    }
                }

                stream.Flush(flushToDisk: true);
            }

            File.Move(unfinished, PathOf(stock.Id), overwrite: true);
        }
        finally
        {
            File.Delete(unfinished);
        }
    }

    /// <summary>Reads a stock back; null where none of that id is kept.</summary>
    /// <exception cref="InvalidDataException">What is kept under the id does not have that content any more, or can no longer be read.</exception>
    /// <exception cref="IOException">The folder cannot be read.</exception>
    /// <exception cref="UnauthorizedAccessException">The folder cannot be read.</exception>
    public Stock? Load(string id)
    {
        if (!StockId.IsWellFormed(id) || !File.Exists(PathOf(id)))
        {
            return null;
        }

        List<CatalogueFile> files = [];
        using FileStream stream = File.OpenRead(PathOf(id));
        using var zip = new ZipArchive(stream, ZipArchiveMode.Read);
        foreach (ZipArchiveEntry kept in zip.Entries.Take(CatalogueFolder.MostFiles + 1))
        {
            using Stream content = kept.Open();
            files.Add(CatalogueFile.FromStream(kept.Name, content));
        }

        if (StockId.Of(files.OrderBy(f => f.Name, StringComparer.Ordinal)) != id)
        {
            throw new InvalidDataException($"The archived stock {id} does not have the content that its name is made from.");
        }

        StockReading reading = StockReader.Read(files, zip.Comment.Length > 0 ? zip.Comment : id);
        return reading.Stock ?? throw new InvalidDataException($"The archived stock {id} can no longer be read: {reading.Issues[0]}");
    }

    private string PathOf(string id) => Path.Combine(folder, id + ".zip");
}
