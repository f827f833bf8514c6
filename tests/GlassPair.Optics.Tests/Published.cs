using System.Globalization;
using CsvHelper;

namespace GlassPair.Optics.Tests;

/// <summary>Reference tables of tests/published: one file a subject, one value a row, each with its source.</summary>
internal static class Published
{
    public static IReadOnlyList<PublishedRow> Rows(string file)
    {
        List<PublishedRow> rows = [];
        using CsvReader reader = CsvReader.FromFile(TestFiles.Path($"tests/published/{file}"));
        reader.ReadHeader();
        string[] columns = [.. reader.Headers.Select(h => h.ToString())];
        while (reader.Read())
        {
            rows.Add(new PublishedRow(columns.ToDictionary(c => c, c => reader.GetString(c))));
        }

        return rows;
    }

    /// <summary>Every row of a file as the data of a theory.</summary>
    public static TheoryData<PublishedRow> Theory(string file) => [.. Rows(file)];
}

/// <summary>A row of a reference table.</summary>
public sealed class PublishedRow(IReadOnlyDictionary<string, string> values)
{
    public string this[string column] => values[column];

    public double Number(string column) => double.Parse(values[column], CultureInfo.InvariantCulture);

    /// <summary>The value as printed: any number that rounds to it agrees.</summary>
    public void AssertPrints(string column, double actual, double unit = 1.0)
    {
        string printed = values[column];
        int digits = printed.Contains('.', StringComparison.Ordinal) ? printed.Length - printed.IndexOf('.', StringComparison.Ordinal) - 1 : 0;
        double halfLastPrintedDigit = 0.5 * Math.Pow(10.0, -digits);
        double expected = Number(column);
        Assert.True(
            Math.Abs((actual / unit) - expected) <= halfLastPrintedDigit * (1.0 + 1e-9),
            string.Create(CultureInfo.InvariantCulture, $"{printed} is printed, {actual / unit:R} computed: {this}"));
    }

    public override string ToString() => string.Join(", ", values.Where(v => v.Key != "source").Select(v => v.Value));
}
