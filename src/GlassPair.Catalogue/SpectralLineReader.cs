using System.Collections.Frozen;
using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Catalogue;

/// <summary>Reads a table of named spectral lines: columns <c>symbol</c>, <c>wavelength_nm</c>, <c>emitted_by</c> and <c>source</c>.</summary>
public static class SpectralLineReader
{
    private static readonly CatalogueColumn Symbol = CatalogueColumn.OfText("symbol", 12, "The trade's letter or number of the line.");
    private static readonly CatalogueColumn WavelengthColumn = CatalogueColumn.OfNumber("wavelength_nm", CatalogueFormat.Nanometers, "Wavelength in standard air.");
    private static readonly CatalogueColumn EmittedBy = CatalogueColumn.OfText("emitted_by", 40, "The element or laser that emits it.");
    private static readonly FrozenSet<string> Known = FrozenSet.Create(StringComparer.Ordinal, Symbol.Name, WavelengthColumn.Name, EmittedBy.Name, "source");

    /// <summary>Reads the lines of a file in rising wavelength.</summary>
    /// <exception cref="InvalidDataException">The file is not such a table; the message names the first fault, its line and column.</exception>
    /// <exception cref="IOException">The file cannot be read.</exception>
    /// <exception cref="UnauthorizedAccessException">The file cannot be read.</exception>
    public static ImmutableArray<SpectralLine> ReadFile(string path)
    {
        using FileStream content = File.OpenRead(path);
        var issues = new IssueList();
        List<SpectralLine> lines = [];
        if (CsvText.TryOpen(CatalogueFile.FromStream(Path.GetFileName(path), content), issues) is { } text
            && CsvTable.TryRead(text, Known, [Symbol.Name, WavelengthColumn.Name, EmittedBy.Name], issues) is { } table)
        {
            foreach (CsvRow row in table.Rows)
            {
                if (row.Text(Symbol) is not { } symbol || row.Number(WavelengthColumn) is not { } nanometers || row.Text(EmittedBy) is not { } emitter)
                {
                    row.Error("A line needs its symbol, its wavelength and what emits it.");
                }
                else if (lines.Any(l => l.Symbol == symbol))
                {
                    row.Error("The symbol stands twice.", Symbol);
                }
                else
                {
                    lines.Add(new SpectralLine(symbol, emitter, Wavelength.FromNanometers(nanometers)));
                }
            }
        }

        return issues.Errors == 0
            ? [.. lines.OrderBy(l => l.Wavelength)]
            : throw new InvalidDataException(issues.Listed[0].ToString());
    }
}
