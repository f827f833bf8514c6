using System.Collections.Immutable;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Components.Glasses;

/// <summary>A column of the list of all glasses.</summary>
/// <param name="Key">Its name in the address.</param>
/// <param name="Title">Its heading.</param>
/// <param name="Unit">The unit of what is shown; empty where there is none.</param>
/// <param name="Meaning">What it tells, as a sentence.</param>
/// <param name="Value">What it sorts by; null where the catalogue does not say.</param>
/// <param name="Text">What the table shows.</param>
/// <param name="IsNumber">Whether its cells stand at the right.</param>
/// <param name="Class">Classes that hide it on narrow screens.</param>
public sealed record GlassColumn(
    string Key, string Title, string Unit, string Meaning, Func<GlassFigures, IComparable?> Value, Func<GlassFigures, string> Text, bool IsNumber = true, string? Class = null)
{
    /// <summary>The key of the column that names the glass.</summary>
    public const string NameKey = "name";

    /// <summary>The key of the column with the supply state.</summary>
    public const string SupplyKey = "supply";

    /// <summary>What is shown where the catalogue does not say.</summary>
    public const string Unknown = "–";

    /// <summary>Gets the columns in the order of the table.</summary>
    public static ImmutableArray<GlassColumn> All { get; } =
    [
        new(NameKey, "Glass", "", "The maker's name of the glass.", g => g.NameInOrder, g => g.Glass.Name, false),
        new("maker", "Maker", "", "Who makes it.", g => g.Glass.Maker, g => g.Glass.Maker, false, "c1"),
        Number("nd", "nd", "587.6 nm", "Index at the d line, computed from the coefficients.", g => g.Nd, 5),
        Number("vd", "vd", "", "Abbe number (n_d − 1)/(n_F − n_C).", g => g.AbbeD, 2),
        Number("ne", "ne", "546.1 nm", "Index at the e line, computed from the coefficients.", g => g.Ne, 5, "c3"),
        Number("ve", "ve", "", "Abbe number (n_e − 1)/(n_F' − n_C').", g => g.AbbeE, 2, "c3"),
        Number("partial", "Pg,F", "", "Partial dispersion (n_g − n_F)/(n_F − n_C).", g => g.PartialGF, 4, "c2"),
        new("delta", "ΔPg,F", "", "Distance of P_g,F from the normal line 0.6438 − 0.001682 v_d, one line for all makers.", g => g.DeltaGF,
            g => g.DeltaGF is { } v ? FigureText.WithSign(v, 4) : Unknown, true, "c1"),
        Number("density", "Density", "g/cm³", "As the maker states it.", g => g.Glass.DensityGramsPerCm3, 2, "c2"),
        Number("expansion", "α", "10⁻⁶/K", "Linear expansion from −30 to +70 °C.", g => g.Glass.ExpansionPerKelvin * 1e6, 1, "c2"),
        new(SupplyKey, "Supply", "", "As the maker's list of that edition said; confirm with the maker before an order.", g => g.Glass.Supply,
            g => FigureText.Of(g.Glass.Supply), false, "c2"),
        new("edition", "List of", "", "The year of the maker's list.", g => g.Glass.Edition, g => g.Glass.Edition ?? Unknown, false, "c3"),
        new("remarks", "Remarks", "", "How many things our recomputation of the catalogue's row found worth knowing; they stand on the glass's page.", g => g.Remarks.Length,
            g => g.Remarks.Length == 0 ? "" : FigureText.Count(g.Remarks.Length), true, "c3"),
    ];

    /// <summary>Finds a column by its key, upper and lower case alike.</summary>
    public static GlassColumn? Find(string key) => All.FirstOrDefault(c => string.Equals(c.Key, key, StringComparison.OrdinalIgnoreCase));

    private static GlassColumn Number(string key, string title, string unit, string meaning, Func<GlassFigures, double?> value, int decimals, string? @class = null) =>
        new(key, title, unit, meaning, g => value(g), g => value(g) is { } v ? FigureText.Fixed(v, decimals) : Unknown, true, @class);
}
