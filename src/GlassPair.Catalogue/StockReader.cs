using System.Collections.Immutable;
using System.Globalization;
using System.Security.Cryptography;
using CsvHelper;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Catalogue;

/// <summary>Reads a catalogue of CSV files.</summary>
public static class StockReader
{
    /// <summary>Reads every CSV file of a folder as one stock.</summary>
    public static StockReading ReadFolder(string folder, string title)
    {
        List<Glass> glasses = [];
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        foreach (string file in Directory.GetFiles(folder, "*.csv").Order(StringComparer.Ordinal))
        {
            hash.AppendData(File.ReadAllBytes(file));
            using CsvReader reader = CsvReader.FromFile(file);
            reader.ReadHeader();
            while (reader.Read())
            {
                if (reader.GetString("form") == "measured") continue;
                double Number(string column) => double.Parse(reader.GetString(column), CultureInfo.InvariantCulture);
                bool Has(string column) => reader.TryGetFieldIndex(column, out int index) && reader.GetString(index).Length > 0;
                DispersionFormula formula = reader.GetString("form") == "sellmeier"
                    ? new SellmeierFormula(Enumerable.Range(1, 6).Where(i => Has($"b{i}")).Select(i => new SellmeierTerm(Number($"b{i}"), Number($"c{i}_um2"))))
                    : new PowerSeriesFormula(Number("a_0"), PowerSeriesFormula.Exponents.Select(e => (e, Name: e < 0 ? $"a_minus_{-e}" : $"a_{e}")).Where(t => Has(t.Name)).Select(t => new PowerTerm(t.e, Number(t.Name))));
                glasses.Add(new Glass(reader.GetString("maker"), reader.GetString("name"), formula, WavelengthRange.FromNanometers(Number("range_from_nm"), Number("range_to_nm")))
                {
                    ContainsLead = Has("contains_lead"),
                    Supply = Enum.Parse<Supply>(reader.GetString("supply").Replace(" ", "", StringComparison.Ordinal), ignoreCase: true),
                    ExpansionPerKelvin = Has("expansion_minus30_to_70_per_k") ? Number("expansion_minus30_to_70_per_k") : null,
                    Process = reader.GetString("process") is { Length: > 0 } p ? p : null,
                    Edition = reader.GetString("edition"),
                });
            }
        }

        return new StockReading(new Stock(Convert.ToHexStringLower(hash.GetHashAndReset())[..12], title, glasses, []), ImmutableArray<StockIssue>.Empty);
    }
}
