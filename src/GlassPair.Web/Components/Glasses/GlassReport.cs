using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Practice;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Addresses;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Components.Glasses;

/// <summary>A figure that the maker states beside what the coefficients give.</summary>
/// <param name="Name">What it is.</param>
/// <param name="Stated">As stated.</param>
/// <param name="Computed">As computed; <see cref="GlassColumn.Unknown"/> where the range does not allow it.</param>
/// <param name="Difference">Stated less computed; empty where there is nothing to compare.</param>
/// <param name="Comment">How to read the difference; empty where it speaks for itself.</param>
public sealed record StatedFigure(string Name, string Stated, string Computed, string Difference, string Comment);

/// <summary>A partial dispersion of the glass.</summary>
/// <param name="X">The shorter line.</param>
/// <param name="Y">The longer line.</param>
/// <param name="Value">(n_x − n_y)/(n_F − n_C); null where the range does not reach.</param>
public sealed record PartialFigure(string X, string Y, double? Value);

/// <summary>The index at a named line.</summary>
/// <param name="Line">The line.</param>
/// <param name="Index">The index, relative to air at the reference temperature.</param>
/// <param name="Slope">dn/dλ per micrometer.</param>
/// <param name="Thermal">The index at 20 °C and its change with temperature; null where the maker states none.</param>
public sealed record LineFigure(SpectralLine Line, double Index, double Slope, IndexAtTemperature? Thermal);

/// <summary>A coefficient of the dispersion formula, in full.</summary>
/// <param name="Symbol">Its symbol.</param>
/// <param name="Value">Its value in the fewest digits that read back alike.</param>
/// <param name="Unit">Its unit.</param>
public sealed record Coefficient(string Symbol, string Value, string Unit);

/// <summary>What the page of a glass says of it, computed from the catalogue's row.</summary>
public static class GlassReport
{
    /// <summary>The temperature for which the change with temperature is shown, degrees Celsius.</summary>
    public const double Celsius = 20.0;

    private static readonly ImmutableArray<(string X, string Y)> _partials = [("g", "F"), ("d", "C"), ("e", "d"), ("F'", "e"), ("C", "s"), ("C", "t"), ("i", "g")];

    /// <summary>Gets what the maker states beside what the coefficients give.</summary>
    public static ImmutableArray<StatedFigure> Stated(GlassFigures figures)
    {
        StatedValues stated = figures.Glass.Stated;
        var rows = ImmutableArray.CreateBuilder<StatedFigure>();
        if (stated.Nd is { } nd)
        {
            rows.Add(Compared("nd", nd, figures.Nd, 6, ""));
        }

        if (stated.Vd is { } vd)
        {
            rows.Add(Compared("vd", vd, figures.AbbeD, 3, ""));
        }

        if (stated.Code is { } code)
        {
            string computed = figures is { Nd: { } n, AbbeD: { } v }
                ? string.Create(CultureInfo.InvariantCulture, $"{Math.Round((n - 1.0) * 1000.0) % 1000.0:000}{Math.Round(v * 10.0):000}")
                : GlassColumn.Unknown;
            rows.Add(new StatedFigure("code", code, computed, "", code.StartsWith(computed, StringComparison.Ordinal) ? "" : "nd and vd of the formula, rounded"));
        }

        if (stated.DeltaPgF is { } delta)
        {
            rows.Add(Compared("ΔPg,F", delta, figures.DeltaGF, 4, "the maker counts from a normal line of its own"));
        }

        return rows.ToImmutable();
    }

    /// <summary>Gets the usual partial dispersions over n_F − n_C.</summary>
    public static ImmutableArray<PartialFigure> Partials(Glass glass) =>
    [
        .. _partials.Select(p => new PartialFigure(
            p.X,
            p.Y,
            PartialDispersion.TryOf(glass, WavelengthText.FindLine(p.X)!.Wavelength, WavelengthText.FindLine(p.Y)!.Wavelength))),
    ];

    /// <summary>Gets the index at each named line in the range of the formula.</summary>
    public static ImmutableArray<LineFigure> Lines(Glass glass) =>
    [
        .. SpectralLine.All.Where(l => glass.Range.Contains(l.Wavelength)).Select(l => new LineFigure(
            l, glass.IndexAt(l.Wavelength), glass.DispersionAt(l.Wavelength), IndexAtTemperature.TryOf(glass, l.Wavelength, Celsius))),
    ];

    /// <summary>Gets the coefficients of the formula in full.</summary>
    public static ImmutableArray<Coefficient> Coefficients(DispersionFormula formula) => formula switch
    {
        SellmeierFormula sellmeier =>
        [
            .. sellmeier.Terms.SelectMany((t, i) => new[]
            {
                new Coefficient($"B{Sub(i + 1)}", TypedNumber.Write(t.Strength), ""),
                new Coefficient($"C{Sub(i + 1)}", TypedNumber.Write(t.ResonanceSquared), "µm²"),
            }),
        ],
        PowerSeriesFormula series =>
        [
            new Coefficient("a₀", TypedNumber.Write(series.Constant), ""),
            .. series.Terms.Select(t => new Coefficient($"a{Sub(t.Exponent)}", TypedNumber.Write(t.Coefficient), $"µm{Super(-t.Exponent)}")),
        ],
        _ => [],
    };

    /// <summary>Writes the formula with its symbols.</summary>
    public static string Formula(DispersionFormula formula) => formula switch
    {
        SellmeierFormula sellmeier => "n² − 1 = " + string.Join(" + ", sellmeier.Terms.Select((_, i) => $"B{Sub(i + 1)}λ²/(λ² − C{Sub(i + 1)})")),
        PowerSeriesFormula series => "n² = a₀" + string.Concat(series.Terms.Select(t => $" + a{Sub(t.Exponent)}λ{Super(t.Exponent)}")),
        _ => "",
    };

    /// <summary>Names the form with its number of terms, as the trade does.</summary>
    public static string NameOf(DispersionFormula formula) => formula is SellmeierFormula sellmeier
        ? sellmeier.Terms.Length == 1 ? "Sellmeier formula of 1 term" : $"Sellmeier formula of {FigureText.Count(sellmeier.Terms.Length)} terms"
        : $"power series of {FigureText.Count(formula.Coefficients.Length)} coefficients";

    /// <summary>Gets the glasses of a stock with the same coefficients under another name.</summary>
    public static ImmutableArray<Glass> Twins(Glass glass, Stock stock) =>
        [.. stock.Glasses.Where(g => g.Id != glass.Id && g.Formula.Equals(glass.Formula))];

    /// <summary>Gets the internal transmittance at the named lines and at the wavelengths that the maker states, in rising wavelength.</summary>
    /// <param name="glass">The glass.</param>
    /// <param name="thickness">The path through it, mm.</param>
    public static ImmutableArray<(Wavelength Wavelength, double Value)> Transmittances(Glass glass, double thickness) =>
    [
        .. glass.Extinction.Select(e => (e.Wavelength, Value: InternalTransmittance.TryOf(glass, e.Wavelength, thickness)))
            .Where(e => e.Value is not null).Select(e => (e.Wavelength, e.Value!.Value)),
    ];

    private static StatedFigure Compared(string name, double stated, double? computed, int decimals, string comment) => computed is { } value
        ? new StatedFigure(name, Plain(stated), FigureText.Fixed(value, decimals), FigureText.WithSign(stated - value, decimals), comment)
        : new StatedFigure(name, Plain(stated), GlassColumn.Unknown, "", "the formula does not reach the lines");

    private static string Plain(double value) => value.ToString("0.######", CultureInfo.InvariantCulture).Replace('-', '−');

    private static string Sub(int number) => Map(number, "₀₁₂₃₄₅₆₇₈₉", '₋');

    private static string Super(int number) => Map(number, "⁰¹²³⁴⁵⁶⁷⁸⁹", '⁻');

    private static string Map(int number, string digits, char minus) =>
        string.Concat(number.ToString(CultureInfo.InvariantCulture).Select(c => c == '-' ? minus : digits[c - '0']));
}
