using System.Globalization;
using CsvHelper;
using GlassPair.Optics.Glasses;

namespace GlassPair.Catalogue;

/// <summary>Writes glasses in the catalogue's format: what the reader reads back is the same glasses.</summary>
public static class StockWriter
{
    private static readonly CsvWriterOptions Options = new() { NewLine = "\n", CommentPrefix = '#' };

    /// <summary>Writes a header and one row for each glass, as UTF-8.</summary>
    /// <remarks>A glass with a fit is written as its measured indices, those left out included. Text that a spreadsheet could run is guarded.</remarks>
    public static void Write(IEnumerable<Glass> glasses, Stream stream)
    {
        using CsvWriter writer = CsvWriter.Create(stream, Options, leaveOpen: true);
        foreach (CatalogueColumn column in CatalogueFormat.Columns)
        {
            writer.WriteField(column.Name);
        }

        writer.EndRecord();
        foreach (Glass glass in glasses)
        {
            Dictionary<CatalogueColumn, string> cells = CellsOf(glass);
            foreach (CatalogueColumn column in CatalogueFormat.Columns)
            {
                writer.WriteField(cells.GetValueOrDefault(column, ""));
            }

            writer.EndRecord();
        }
    }

    /// <summary>Gets a header and one row for each glass as text, to be copied into a catalogue.</summary>
    public static string ToText(params IEnumerable<Glass> glasses)
    {
        using var stream = new MemoryStream();
        Write(glasses, stream);
        return System.Text.Encoding.UTF8.GetString(stream.GetBuffer(), 0, (int)stream.Length);
    }

    private static Dictionary<CatalogueColumn, string> CellsOf(Glass glass)
    {
        var cells = new Dictionary<CatalogueColumn, string>
        {
            [CatalogueFormat.Maker] = FormulaGuard.Add(glass.Maker),
            [CatalogueFormat.Name] = FormulaGuard.Add(glass.Name),
            [CatalogueFormat.SupplyColumn] = SupplyNames.Of(glass.Supply),
        };
        void Number(CatalogueColumn column, double? value)
        {
            if (value is { } number)
            {
                cells[column] = Digits(number);
            }
        }

        void Text(CatalogueColumn column, string? value)
        {
            if (value is not null)
            {
                cells[column] = FormulaGuard.Add(value);
            }
        }

        if (glass.Fit is { } fit)
        {
            cells[CatalogueFormat.Form] = CatalogueFormat.Measured;
            cells[CatalogueFormat.MeasuredIndices] = Samples(fit.Measured.Concat(fit.LeftOut.Select(l => l.Measured)).Select(m => (m.Wavelength.Nanometers, m.Index)));
        }
        else
        {
            Number(CatalogueFormat.RangeFrom, glass.Range.Shortest.Nanometers);
            Number(CatalogueFormat.RangeTo, glass.Range.Longest.Nanometers);
            WriteFormula(glass.Formula, cells, Number);
        }

        Number(CatalogueFormat.Nd, glass.Stated.Nd);
        Number(CatalogueFormat.Vd, glass.Stated.Vd);
        Number(CatalogueFormat.DeltaPgF, glass.Stated.DeltaPgF);
        Text(CatalogueFormat.Code, glass.Stated.Code);
        Number(CatalogueFormat.ReferenceTemperature, glass.ReferenceCelsius);
        Number(CatalogueFormat.D0, glass.Thermal?.D0);
        Number(CatalogueFormat.D1, glass.Thermal?.D1);
        Number(CatalogueFormat.D2, glass.Thermal?.D2);
        Number(CatalogueFormat.E0, glass.Thermal?.E0);
        Number(CatalogueFormat.E1, glass.Thermal?.E1);
        Number(CatalogueFormat.LambdaTk, glass.Thermal?.ResonanceMicrometers);
        Number(CatalogueFormat.ExpansionLow, glass.ExpansionPerKelvin);
        Number(CatalogueFormat.ExpansionHigh, glass.HighExpansionPerKelvin);
        Number(CatalogueFormat.Density, glass.DensityGramsPerCm3);
        Number(CatalogueFormat.Climatic, glass.Resistance.Climatic);
        Number(CatalogueFormat.Stain, glass.Resistance.Stain);
        Number(CatalogueFormat.Acid, glass.Resistance.Acid);
        Number(CatalogueFormat.Alkali, glass.Resistance.Alkali);
        Number(CatalogueFormat.Phosphate, glass.Resistance.Phosphate);
        if (!glass.Extinction.IsEmpty)
        {
            cells[CatalogueFormat.Extinction] = Samples(glass.Extinction.Select(e => (e.Wavelength.Nanometers, e.Coefficient)));
        }

        Text(CatalogueFormat.Process, glass.Process);
        Number(CatalogueFormat.AnnealRate, glass.AnnealRateKelvinPerHour);
        Text(CatalogueFormat.Lead, glass.ContainsLead ? "yes" : null);
        Text(CatalogueFormat.ReplacedBy, glass.ReplacedBy);
        Text(CatalogueFormat.Edition, glass.Edition);
        return cells;
    }

    private static void WriteFormula(DispersionFormula formula, Dictionary<CatalogueColumn, string> cells, Action<CatalogueColumn, double?> number)
    {
        switch (formula)
        {
            case SellmeierFormula sellmeier:
                cells[CatalogueFormat.Form] = CatalogueFormat.Sellmeier;
                foreach ((SellmeierTerm term, (CatalogueColumn b, CatalogueColumn c)) in sellmeier.Terms.Zip(CatalogueFormat.SellmeierTerms))
                {
                    number(b, term.Strength);
                    number(c, term.ResonanceSquared);
                }

                break;
            case PowerSeriesFormula series:
                cells[CatalogueFormat.Form] = CatalogueFormat.PowerSeries;
                number(CatalogueFormat.Constant, series.Constant);
                foreach (PowerTerm term in series.Terms)
                {
                    number(CatalogueFormat.PowerTerms.Single(t => t.Exponent == term.Exponent).Column, term.Coefficient);
                }

                break;
            default:
                throw new NotSupportedException($"The catalogue's format has no form for {formula.GetType().Name}.");
        }
    }

    private static string Samples(IEnumerable<(double At, double Value)> samples) =>
        string.Join("; ", samples.OrderBy(s => s.At).Select(s => $"{Digits(s.At)} {Digits(s.Value)}"));

    private static string Digits(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
