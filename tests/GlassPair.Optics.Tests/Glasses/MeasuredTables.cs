using System.Globalization;
using CsvHelper;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Glasses;

/// <summary>The tables of the maker who publishes measured indices only, as shipped in data/catalogue.</summary>
internal static class MeasuredTables
{
    public static IReadOnlyList<(string Name, MeasuredIndex[] Measured)> All { get; } = Read();

    public static MeasuredIndex[] Named(string name) => All.Single(t => t.Name == name).Measured;

    private static List<(string, MeasuredIndex[])> Read()
    {
        List<(string, MeasuredIndex[])> tables = [];
        using CsvReader reader = CsvReader.FromFile(TestFiles.Path("data/catalogue/lzos.csv"));
        reader.ReadHeader();
        while (reader.Read())
        {
            IEnumerable<double[]> pairs = reader.GetString("index_at_nm").Split("; ")
                .Select(pair => pair.Split(' ').Select(v => double.Parse(v, CultureInfo.InvariantCulture)).ToArray());
            tables.Add((reader.GetString("name"), [.. pairs.Select(p => new MeasuredIndex(Wavelength.FromNanometers(p[0]), p[1]))]));
        }

        return tables;
    }
}
