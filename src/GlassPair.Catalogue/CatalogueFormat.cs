using System.Collections.Frozen;
using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Catalogue;

/// <summary>The columns of a catalogue file. Reader, writer and the metadata beside the shipped catalogue all follow this list.</summary>
public static class CatalogueFormat
{
    /// <summary>The forms in which the dispersion of a glass can be given.</summary>
    internal const string Sellmeier = "sellmeier", PowerSeries = "power-series", Measured = "measured";

    internal static readonly Quantity Nanometers = new("nm", Wavelength.MinNanometers, Wavelength.MaxNanometers) { Mistaken = ("micrometers", value => value * 1000.0) };
    internal static readonly Quantity Index = new("", 1.0, 5.0);

    private static readonly Quantity Strength = new("", -1e4, 1e4);
    private static readonly Quantity SquareMicrometers = new("um²", -1e4, 1e6) { Mistaken = ("nm²", value => value * 1e-6) };
    private static readonly Quantity Expansion = new("1/K", -1e-4, 1e-4) { Mistaken = ("millionths per kelvin", value => value * 1e-6) };
    private static readonly Quantity Class = new("", 0.0, 100.0);

    internal static readonly CatalogueColumn Maker = CatalogueColumn.OfText("maker", 64, "The maker; upper and lower case do not count.");
    internal static readonly CatalogueColumn Name = CatalogueColumn.OfText("name", 64, "The maker's name of the glass; once for each maker.");
    internal static readonly CatalogueColumn Form = CatalogueColumn.OfChoice("form", [Sellmeier, PowerSeries, Measured],
        "How the dispersion is given. sellmeier: n² - 1 = sum of b λ²/(λ² - c). power-series: n² = a_0 + sum of a_e λ^e. measured: a table of indices, to which the program fits a formula. λ in um.");

    internal static readonly CatalogueColumn RangeFrom = CatalogueColumn.OfNumber("range_from_nm", Nanometers, "The shortest wavelength for which the formula holds; empty for measured glasses, which hold where they were measured.");
    internal static readonly CatalogueColumn RangeTo = CatalogueColumn.OfNumber("range_to_nm", Nanometers, "The longest wavelength for which the formula holds; empty for measured glasses.");

    internal static readonly ImmutableArray<(CatalogueColumn B, CatalogueColumn C)> SellmeierTerms = [.. Enumerable.Range(1, SellmeierFormula.MaxTerms).Select(i => (
        CatalogueColumn.OfNumber($"b{i}", Strength, $"Strength of term {i} of the Sellmeier formula."),
        CatalogueColumn.OfNumber($"c{i}_um2", SquareMicrometers, $"Squared resonance wavelength of term {i} of the Sellmeier formula.")))];

    internal static readonly CatalogueColumn Constant = CatalogueColumn.OfNumber("a_0", Strength, "Constant of the power series.");
    internal static readonly ImmutableArray<(int Exponent, CatalogueColumn Column)> PowerTerms = [.. PowerSeriesFormula.Exponents
        .OrderBy(e => e < 0).ThenBy(Math.Abs)
        .Select(e => (e, CatalogueColumn.OfNumber(e < 0 ? $"a_minus_{-e}" : $"a_{e}", Strength, $"Coefficient of λ to the power {e} of the power series, λ in um.")))];

    internal static readonly CatalogueColumn MeasuredIndices = CatalogueColumn.OfSamples("index_at_nm", Index, "Measured indices, nm and index.");

    internal static readonly CatalogueColumn Nd = CatalogueColumn.OfNumber("nd", Index, "Index at the d line as the maker states it; checked against the formula, not computed with.");
    internal static readonly CatalogueColumn Vd = CatalogueColumn.OfNumber("vd", new Quantity("", 1.0, 200.0), "Abbe number of the d line as the maker states it; checked, not computed with.");
    internal static readonly CatalogueColumn DeltaPgF = CatalogueColumn.OfNumber("delta_pgf", new Quantity("", -100.0, 100.0), "Distance of the partial dispersion P_g,F from the maker's own normal line, as the maker states it; checked, not computed with.");
    internal static readonly CatalogueColumn Code = CatalogueColumn.OfText("glass_code", 12, "Six-digit code as the maker states it, with density digits where the maker adds them.");

    internal static readonly CatalogueColumn ReferenceTemperature = CatalogueColumn.OfNumber("reference_temperature_c", new Quantity("°C", -100.0, 200.0) { Mistaken = ("kelvin", value => value - 273.15) }, "Temperature of the index data.");
    internal static readonly CatalogueColumn D0 = CatalogueColumn.OfNumber("d0_per_k", new Quantity("1/K", -1e-3, 1e-3) { Mistaken = ("millionths per kelvin", value => value * 1e-6) }, "D0 of the formula for the change of the absolute index with temperature; D0 to lambda_tk are given together.");
    internal static readonly CatalogueColumn D1 = CatalogueColumn.OfNumber("d1_per_k2", new Quantity("1/K²", -1e-5, 1e-5), "D1 of that formula.");
    internal static readonly CatalogueColumn D2 = CatalogueColumn.OfNumber("d2_per_k3", new Quantity("1/K³", -1e-7, 1e-7), "D2 of that formula.");
    internal static readonly CatalogueColumn E0 = CatalogueColumn.OfNumber("e0_um2_per_k", new Quantity("um²/K", -1e-3, 1e-3), "E0 of that formula.");
    internal static readonly CatalogueColumn E1 = CatalogueColumn.OfNumber("e1_um2_per_k2", new Quantity("um²/K²", -1e-5, 1e-5), "E1 of that formula.");
    internal static readonly CatalogueColumn LambdaTk = CatalogueColumn.OfNumber("lambda_tk_um", new Quantity("um", -20.0, 20.0) { Mistaken = ("nm", value => value / 1000.0) }, "λ_TK of that formula; it enters squared.");
    internal static readonly ImmutableArray<CatalogueColumn> Thermal = [D0, D1, D2, E0, E1, LambdaTk];

    internal static readonly CatalogueColumn ExpansionLow = CatalogueColumn.OfNumber("expansion_minus30_to_70_per_k", Expansion, "Linear expansion from -30 °C to +70 °C.");
    internal static readonly CatalogueColumn ExpansionHigh = CatalogueColumn.OfNumber("expansion_20_to_300_per_k", Expansion, "Linear expansion from +20 °C to +300 °C.");
    internal static readonly CatalogueColumn Density = CatalogueColumn.OfNumber("density_g_per_cm3", new Quantity("g/cm³", 0.5, 20.0) { Mistaken = ("kg/m³", value => value / 1000.0) }, "Density.");

    internal static readonly CatalogueColumn Climatic = CatalogueColumn.OfNumber("climatic_class", Class, "Class of climatic resistance; compare classes inside one maker only.");
    internal static readonly CatalogueColumn Stain = CatalogueColumn.OfNumber("stain_class", Class, "Class of stain resistance.");
    internal static readonly CatalogueColumn Acid = CatalogueColumn.OfNumber("acid_class", Class, "Class of acid resistance.");
    internal static readonly CatalogueColumn Alkali = CatalogueColumn.OfNumber("alkali_class", Class, "Class of alkali resistance.");
    internal static readonly CatalogueColumn Phosphate = CatalogueColumn.OfNumber("phosphate_class", Class, "Class of phosphate resistance.");

    internal static readonly CatalogueColumn Extinction = CatalogueColumn.OfSamples("extinction_k_at_nm", new Quantity("", -1.0, 1.0), "Extinction coefficient k, nm and k; internal transmittance of thickness t is exp(-4π k t/λ), and 0 means that the maker prints 1.");
    internal static readonly CatalogueColumn Process = CatalogueColumn.OfText("process", 64, "How the glass is worked, such as precision molding.");
    internal static readonly CatalogueColumn AnnealRate = CatalogueColumn.OfNumber("anneal_rate_k_per_h", new Quantity("K/h", 0.001, 10_000.0), "Anneal rate of the index data.");
    internal static readonly CatalogueColumn Lead = CatalogueColumn.OfChoice("contains_lead", ["yes", "no"], "yes where a remark says that the glass contains lead; empty does not mean that it is free of lead.");
    internal static readonly CatalogueColumn ReplacedBy = CatalogueColumn.OfText("replaced_by", 64, "Name of the glass that replaces this one.");
    internal static readonly CatalogueColumn Edition = CatalogueColumn.OfText("edition", 32, "Year of the maker's list.");
    internal static readonly CatalogueColumn SupplyColumn = CatalogueColumn.OfChoice("supply", [.. Enum.GetValues<Supply>().Select(SupplyNames.Of)],
        "How the glass could be had, read from the maker's remarks in that edition; empty is unconfirmed. Confirm with the maker before an order. The last column, filled in every row: some spreadsheets cut rows that end in empty cells.");

    /// <summary>Gets the columns in the order in which they are written; a file may have them in any order, and need not have all.</summary>
    public static ImmutableArray<CatalogueColumn> Columns { get; } =
    [
        Maker, Name, Form, RangeFrom, RangeTo, .. SellmeierTerms.SelectMany(t => new[] { t.B, t.C }), Constant, .. PowerTerms.Select(t => t.Column), MeasuredIndices,
        Nd, Vd, DeltaPgF, Code, ReferenceTemperature, .. Thermal, ExpansionLow, ExpansionHigh, Density,
        Climatic, Stain, Acid, Alkali, Phosphate, Extinction, Process, AnnealRate, Lead, ReplacedBy, Edition, SupplyColumn,
    ];

    /// <summary>Gets the columns without which a file is no catalogue; which others a row needs depends on its form.</summary>
    internal static ImmutableArray<string> Required { get; } = [Maker.Name, Name.Name, Form.Name];

    internal static FrozenSet<string> Names { get; } = Columns.Select(c => c.Name).ToFrozenSet(StringComparer.Ordinal);
}
