using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Api;

/// <summary>A glass: values computed from its coefficients, and what the catalogue says of it. What the catalogue does not say is null.</summary>
public sealed record GlassJson
{
    private readonly FormulaJson _formula;

    /// <summary>Writes a glass.</summary>
    /// <param name="glass">The glass.</param>
    /// <param name="stock">The stock that it is of.</param>
    /// <param name="ids">The ids of the stock's glasses by their formulas.</param>
    public GlassJson(Glass glass, Stock stock, ILookup<DispersionFormula, string> ids)
    {
        (Maker, Name) = (glass.Maker, glass.Name);
        _formula = new FormulaJson(glass.Formula);
        RangeNm = Problems.RangeNm(glass.Range);
        Nd = IndexOf(glass, SpectralLine.HeliumD);
        Ne = IndexOf(glass, SpectralLine.MercuryE);
        AbbeD = AbbeNumber.TryD(glass);
        AbbeE = AbbeNumber.TryE(glass);
        PartialDispersionGF = PartialDispersion.TryGF(glass);
        DeltaPartialDispersionGF = PartialDispersion.TryDeltaGF(glass);
        Supply = glass.Supply;
        ReplacedBy = glass.ReplacedBy;
        ContainsLead = glass.ContainsLead;
        Process = glass.Process;
        Edition = glass.Edition;
        ReferenceTemperatureC = glass.ReferenceCelsius;
        ExpansionPerK = glass.ExpansionPerKelvin;
        HighExpansionPerK = glass.HighExpansionPerKelvin;
        DensityGPerCm3 = glass.DensityGramsPerCm3;
        Stated = glass.Stated;
        Resistance = glass.Resistance;
        SameAs = [.. ids[glass.Formula].Where(id => id != glass.Id)];
        Remarks = [.. stock.RemarksOn(glass).Select(r => r.Message)];
        Fit = glass.Fit is { } fit ? new FitJson(fit) : null;
    }

    /// <summary>Gets the maker.</summary>
    /// <example>schott</example>
    public string Maker { get; }

    /// <summary>Gets the maker's name of the glass.</summary>
    /// <example>N-BK7</example>
    public string Name { get; }

    /// <summary>Gets the form of the dispersion formula.</summary>
    public DispersionForm Form => _formula.Form;

    /// <summary>Gets the coefficients, wavelengths in micrometers: B₁, C₁, B₂, C₂, … of the Sellmeier form; a₀, then one for each of <c>exponents</c> of the power series.</summary>
    public double[] Coefficients => _formula.Coefficients;

    /// <summary>Gets the exponents of the power series; null for the Sellmeier form.</summary>
    public int[]? Exponents => _formula.Exponents;

    /// <summary>Gets the shortest and longest wavelength for which the formula holds, nm.</summary>
    public double[] RangeNm { get; }

    /// <summary>Gets the index at the d line, 587.5618 nm.</summary>
    public double? Nd { get; }

    /// <summary>Gets the index at the e line, 546.0740 nm.</summary>
    public double? Ne { get; }

    /// <summary>Gets v_d = (n_d − 1)/(n_F − n_C).</summary>
    public double? AbbeD { get; }

    /// <summary>Gets v_e = (n_e − 1)/(n_F' − n_C').</summary>
    public double? AbbeE { get; }

    /// <summary>Gets P_g,F = (n_g − n_F)/(n_F − n_C).</summary>
    public double? PartialDispersionGF { get; }

    /// <summary>Gets ΔP_g,F, the distance of P_g,F above the normal line 0.6438 − 0.001682 v_d.</summary>
    public double? DeltaPartialDispersionGF { get; }

    /// <summary>Gets how the glass could be had, as the edition of the catalogue said.</summary>
    public Supply Supply { get; }

    /// <summary>Gets the glass that replaces this one.</summary>
    public string? ReplacedBy { get; }

    /// <summary>Gets whether the catalogue says that the glass contains lead.</summary>
    public bool ContainsLead { get; }

    /// <summary>Gets remarks on how the glass is worked, such as precision molding.</summary>
    public string? Process { get; }

    /// <summary>Gets the edition of the maker's list.</summary>
    public string? Edition { get; }

    /// <summary>Gets the temperature of the index data, degrees Celsius.</summary>
    public double? ReferenceTemperatureC { get; }

    /// <summary>Gets the linear expansion from −30 °C to +70 °C, per kelvin.</summary>
    public double? ExpansionPerK { get; }

    /// <summary>Gets the linear expansion from +20 °C to +300 °C, per kelvin.</summary>
    public double? HighExpansionPerK { get; }

    /// <summary>Gets the density, g/cm³.</summary>
    public double? DensityGPerCm3 { get; }

    /// <summary>Gets what the maker states, rounded; nothing is computed from it.</summary>
    public StatedValues Stated { get; }

    /// <summary>Gets the maker's resistance classes; the tests differ between makers.</summary>
    public ResistanceClasses Resistance { get; }

    /// <summary>Gets the other glasses of the stock with identical coefficients.</summary>
    public string[] SameAs { get; }

    /// <summary>Gets what was noticed when the catalogue was read, such as stated values that disagree with the formula.</summary>
    public string[] Remarks { get; }

    /// <summary>Gets the fit behind the formula where the maker states measured indices only.</summary>
    public FitJson? Fit { get; }

    private static double? IndexOf(Glass glass, SpectralLine line) => glass.Range.Contains(line.Wavelength) ? glass.IndexAt(line.Wavelength) : null;
}

/// <summary>A part of the glasses that match a search.</summary>
/// <param name="Stock">The stock's id.</param>
/// <param name="Total">How many glasses match.</param>
/// <param name="Skip">How many of them come before this part.</param>
/// <param name="Glasses">The glasses, in ordinal order of <c>maker/name</c>.</param>
public sealed record GlassPageJson(string Stock, int Total, int Skip, GlassJson[] Glasses);

/// <summary>Indices of a glass at a temperature.</summary>
/// <param name="Nm">The wavelengths, nm.</param>
/// <param name="Index">The index at each, relative to air of the same temperature and 101,325 Pa.</param>
/// <param name="DnDtAbsolutePerK">The change of the index relative to vacuum, per kelvin; null where the catalogue states no coefficients.</param>
/// <param name="DnDtRelativePerK">The change of the index relative to air that warms with the glass, per kelvin; null where the catalogue states no coefficients.</param>
/// <param name="TemperatureC">The temperature, degrees Celsius; null where the catalogue does not state the glass's reference temperature.</param>
public sealed record IndexJson(double[] Nm, double[] Index, double?[] DnDtAbsolutePerK, double?[] DnDtRelativePerK, double? TemperatureC);

/// <summary>A stock that is served.</summary>
/// <param name="Id">Its id: the start of the hash of its content.</param>
/// <param name="Title">What people call it.</param>
/// <param name="Glasses">How many glasses it holds.</param>
/// <param name="IsDefault">Whether it serves where no stock is named.</param>
public sealed record StockJson(string Id, string Title, int Glasses, bool IsDefault);
