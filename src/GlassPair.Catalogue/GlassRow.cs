using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Catalogue;

/// <summary>A glass and the row that it was read from.</summary>
/// <param name="Glass">The glass.</param>
/// <param name="Row">The row.</param>
/// <param name="Remarks">What the row's values made the reader notice, as sentences.</param>
internal sealed record GlassRow(Glass Glass, CsvRow Row, ImmutableArray<string> Remarks)
{
    /// <summary>Reads a row; null where it has an error, which is in the row's list of issues.</summary>
    public static GlassRow? TryRead(CsvRow row)
    {
        int errorsBefore = row.Errors;
        List<string> remarks = [];
        string? maker = Required(row, CatalogueFormat.Maker, row.Name(CatalogueFormat.Maker))?.ToLowerInvariant();
        string? name = Required(row, CatalogueFormat.Name, row.Name(CatalogueFormat.Name));
        (DispersionFormula Formula, WavelengthRange Range, DispersionFit? Fit)? dispersion =
            Required(row, CatalogueFormat.Form, row.Choice(CatalogueFormat.Form)) switch
            {
                CatalogueFormat.Sellmeier => Stated(row, SellmeierOf(row)),
                CatalogueFormat.PowerSeries => Stated(row, PowerSeriesOf(row)),
                CatalogueFormat.Measured => Fitted(row, remarks),
                _ => null,
            };
        StatedValues stated = new(row.Number(CatalogueFormat.Nd), row.Number(CatalogueFormat.Vd), row.Number(CatalogueFormat.DeltaPgF), Code(row));
        ThermalIndex? thermal = ThermalOf(row);
        double? reference = row.Number(CatalogueFormat.ReferenceTemperature);
        ImmutableArray<ExtinctionSample> extinction = ExtinctionOf(row, remarks);
        double? expansionLow = row.Number(CatalogueFormat.ExpansionLow);
        double? expansionHigh = row.Number(CatalogueFormat.ExpansionHigh);
        double? density = DensityOf(row, remarks);
        ResistanceClasses resistance = new(
            row.Number(CatalogueFormat.Climatic), row.Number(CatalogueFormat.Stain), row.Number(CatalogueFormat.Acid), row.Number(CatalogueFormat.Alkali), row.Number(CatalogueFormat.Phosphate));
        Supply supply = SupplyNames.Read(row.Choice(CatalogueFormat.SupplyColumn));
        string? replacedBy = row.Name(CatalogueFormat.ReplacedBy);
        bool containsLead = row.Choice(CatalogueFormat.Lead) == "yes";
        string? process = row.Text(CatalogueFormat.Process);
        double? annealRate = row.Number(CatalogueFormat.AnnealRate);
        string? edition = row.Text(CatalogueFormat.Edition);
        if (row.Errors > errorsBefore || maker is null || name is null || dispersion is not { } found)
        {
            return null;
        }

        var glass = new Glass(maker, name, found.Formula, found.Range)
        {
            Stated = stated,
            Thermal = thermal,
            ReferenceCelsius = reference,
            Extinction = extinction,
            ExpansionPerKelvin = expansionLow,
            HighExpansionPerKelvin = expansionHigh,
            DensityGramsPerCm3 = density,
            Resistance = resistance,
            Supply = supply,
            ReplacedBy = replacedBy,
            ContainsLead = containsLead,
            Process = process,
            AnnealRateKelvinPerHour = annealRate,
            Edition = edition,
            Fit = found.Fit,
        };
        return new GlassRow(glass, row, [.. remarks]);
    }

    private static string? Required(CsvRow row, CatalogueColumn column, string? value)
    {
        if (!row.Has(column))
        {
            row.Error(column.Choices.IsEmpty ? "Is empty; every row needs it." : $"Is empty; must be one of: {string.Join(", ", column.Choices)}.", column);
        }

        return value;
    }

    private static SellmeierFormula? SellmeierOf(CsvRow row)
    {
        List<SellmeierTerm> terms = [];
        foreach ((CatalogueColumn b, CatalogueColumn c) in CatalogueFormat.SellmeierTerms)
        {
            if (row.Has(b) != row.Has(c))
            {
                row.Error($"Is empty, but {(row.Has(b) ? b : c).Name} is not: a term has both.", row.Has(b) ? c : b);
            }
            else if (row.Number(b) is { } strength && row.Number(c) is { } resonance)
            {
                terms.Add(new SellmeierTerm(strength, resonance));
            }
        }

        RefuseOthers(row, CatalogueFormat.Sellmeier, [CatalogueFormat.Constant, .. CatalogueFormat.PowerTerms.Select(t => t.Column), CatalogueFormat.MeasuredIndices]);
        if (!CatalogueFormat.SellmeierTerms.Any(t => row.Has(t.B)))
        {
            row.Error("The form sellmeier needs b1 and c1_um2 at least.", CatalogueFormat.SellmeierTerms[0].B);
        }

        return terms.Count > 0 ? new SellmeierFormula(terms) : null;
    }

    private static PowerSeriesFormula? PowerSeriesOf(CsvRow row)
    {
        List<PowerTerm> terms = [];
        foreach ((int exponent, CatalogueColumn column) in CatalogueFormat.PowerTerms)
        {
            if (row.Number(column) is { } coefficient)
            {
                terms.Add(new PowerTerm(exponent, coefficient));
            }
        }

        RefuseOthers(row, CatalogueFormat.PowerSeries, [.. CatalogueFormat.SellmeierTerms.SelectMany(t => new[] { t.B, t.C }), CatalogueFormat.MeasuredIndices]);
        if (!row.Has(CatalogueFormat.Constant) || !CatalogueFormat.PowerTerms.Any(t => row.Has(t.Column)))
        {
            row.Error("The form power-series needs a_0 and one more coefficient at least.", CatalogueFormat.Constant);
        }

        return row.Number(CatalogueFormat.Constant) is { } constant && terms.Count > 0 ? new PowerSeriesFormula(constant, terms) : null;
    }

    private static (DispersionFormula Formula, WavelengthRange Range, DispersionFit? Fit)? Stated(CsvRow row, DispersionFormula? formula)
    {
        double? from = row.Number(CatalogueFormat.RangeFrom);
        double? to = row.Number(CatalogueFormat.RangeTo);
        foreach (CatalogueColumn end in new[] { CatalogueFormat.RangeFrom, CatalogueFormat.RangeTo })
        {
            if (!row.Has(end))
            {
                row.Error("Is empty; a formula needs the range for which it holds.", end);
            }
        }

        if (from is not { } shortest || to is not { } longest)
        {
            return null;
        }

        if (!(shortest < longest))
        {
            row.Error(FormattableString.Invariant($"Must lie below range_to_nm, which is {longest}."), CatalogueFormat.RangeFrom);
            return null;
        }

        if (formula is null)
        {
            return null;
        }

        var range = WavelengthRange.FromNanometers(shortest, longest);
        if (FormulaCheck.FindFault(formula, range) is { } fault)
        {
            row.Error($"{fault} Wavelengths in coefficients are in micrometers, c in square micrometers.");
            return null;
        }

        foreach (string oddity in FormulaCheck.FindOddities(formula, range))
        {
            row.Note(oddity);
        }

        return (formula, range, null);
    }

    private static (DispersionFormula Formula, WavelengthRange Range, DispersionFit? Fit)? Fitted(CsvRow row, List<string> remarks)
    {
        RefuseOthers(row, CatalogueFormat.Measured, [
            CatalogueFormat.RangeFrom, CatalogueFormat.RangeTo, .. CatalogueFormat.SellmeierTerms.SelectMany(t => new[] { t.B, t.C }),
            CatalogueFormat.Constant, .. CatalogueFormat.PowerTerms.Select(t => t.Column)]);
        if (!row.Has(CatalogueFormat.MeasuredIndices))
        {
            row.Error("Is empty; the form measured needs its indices, such as 365 1.54879; 404.66 1.54111; 435.83 1.536704.", CatalogueFormat.MeasuredIndices);
        }

        ImmutableArray<(double At, double Value)> samples = row.Samples(CatalogueFormat.MeasuredIndices);
        if (samples.IsEmpty)
        {
            return null;
        }

        FitOutcome outcome = DispersionFitter.FitLeavingOutMisprints([.. samples.Select(s => new MeasuredIndex(Wavelength.FromNanometers(s.At), s.Value))]);
        if (outcome is not DispersionFit fit)
        {
            row.Error(string.Join(" ", ((NoDispersionFit)outcome).Faults.Select(f => f.Sentence)), CatalogueFormat.MeasuredIndices);
            return null;
        }

        if (FormulaCheck.FindFault(fit.Formula, fit.Range) is { } fault)
        {
            row.Error($"No formula fits these indices. {fault}", CatalogueFormat.MeasuredIndices);
            return null;
        }

        remarks.AddRange(fit.LeftOut.Select(left => $"A measured index was left out of the fit: {left.Reason}"));
        remarks.AddRange(fit.Warnings);
        return (fit.Formula, fit.Range, fit);
    }

    private static void RefuseOthers(CsvRow row, string form, IEnumerable<CatalogueColumn> others)
    {
        foreach (CatalogueColumn column in others.Where(row.Has))
        {
            row.Error($"Does not belong to the form {form}: leave it empty, or change the form.", column);
        }
    }

    private static string? Code(CsvRow row)
    {
        string? code = row.Text(CatalogueFormat.Code);
        if (code is null || (code.Length >= 6 && code.AsSpan(0, 6).IndexOfAnyExceptInRange('0', '9') < 0 && IsDensityPart(code.AsSpan(6))))
        {
            return code;
        }

        row.Error("Must be six digits, with a point and density digits where the maker adds them, such as 517642.251.", CatalogueFormat.Code);
        return null;
    }

    private static bool IsDensityPart(ReadOnlySpan<char> text) => text.Length == 0 || (text.Length > 1 && text[0] == '.' && text[1..].IndexOfAnyExceptInRange('0', '9') < 0);

    private static ThermalIndex? ThermalOf(CsvRow row)
    {
        if (!CatalogueFormat.Thermal.Any(row.Has))
        {
            return null;
        }

        foreach (CatalogueColumn column in CatalogueFormat.Thermal.Where(c => !row.Has(c)))
        {
            row.Error("Is empty, but other coefficients of the change with temperature are given: write 0 where the maker states none.", column);
        }

        double[] values = [.. CatalogueFormat.Thermal.Select(c => row.Number(c) ?? 0.0)];
        return new ThermalIndex(values[0], values[1], values[2], values[3], values[4], values[5]);
    }

    private static ImmutableArray<ExtinctionSample> ExtinctionOf(CsvRow row, List<string> remarks)
    {
        ImmutableArray<(double At, double Value)> stated = row.Samples(CatalogueFormat.Extinction);
        if (stated.Zip(stated.Skip(1)).Any(pair => pair.First.At > pair.Second.At))
        {
            remarks.Add("The extinction coefficients are stated out of order; they were sorted by wavelength.");
        }

        List<ExtinctionSample> kept = [];
        foreach ((double at, double value) in stated.OrderBy(s => s.At))
        {
            if (value < 0.0)
            {
                remarks.Add(FormattableString.Invariant($"A negative extinction coefficient, {value}, is stated at {at} nm; it was left out."));
            }
            else if (kept.Count > 0 && kept[^1].Wavelength.Nanometers == at)
            {
                remarks.Add(FormattableString.Invariant($"Two extinction coefficients are stated at {at} nm, {kept[^1].Coefficient} and {value}; the first is used."));
            }
            else
            {
                kept.Add(new ExtinctionSample(Wavelength.FromNanometers(at), value));
            }
        }

        return [.. kept];
    }

    private static double? DensityOf(CsvRow row, List<string> remarks)
    {
        if (row.Number(CatalogueFormat.Density) is not 1.0)
        {
            return row.Number(CatalogueFormat.Density);
        }

        remarks.Add("A density of exactly 1 g/cm³ is stated, which no optical glass has; it was left out.");
        return null;
    }
}
