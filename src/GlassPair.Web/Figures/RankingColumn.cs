using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Practice;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Figures;

/// <summary>A column of the ranking: where its value comes from, how it is written, and what it means.</summary>
/// <param name="Key">Its name in the address.</param>
/// <param name="Title">Its heading.</param>
/// <param name="Unit">The unit of what is shown; empty where there is none.</param>
/// <param name="Meaning">What it tells, as a sentence.</param>
/// <param name="Value">The value in the unit shown, to sort and export by; null where there is none to sort by, and where the catalogue does not say.</param>
/// <param name="Text">What the table shows.</param>
/// <param name="IsUsual">Whether it is shown where nobody chose columns.</param>
public sealed record RankingColumn(
    string Key, string Title, string Unit, string Meaning, Func<RankedPair, double?>? Value, Func<RankedPair, string> Text, bool IsUsual = false)
{
    /// <summary>What is shown where the catalogue does not say.</summary>
    public const string Unknown = "–";

    /// <summary>The key of the residual's bar, which is drawn and not written.</summary>
    public const string BarKey = "bar";

    /// <summary>The key of the column with the verdict.</summary>
    public const string HoldsKey = "holds";

    /// <summary>The key of the supply column.</summary>
    public const string SupplyKey = "supply";

    /// <summary>Gets every column that can be chosen, in the order of the table.</summary>
    public static ImmutableArray<RankingColumn> All { get; } =
    [
        Micrometers("expected", "Expected", "µm RMS", "Color residual to be expected of the glass really delivered: residual and data floor, root-sum-square.", p => p.Expected, true),
        Micrometers("residual", "Residual", "µm RMS", "Weighted standard deviation of the focal shift over the band, from the catalogue's indices.", p => p.Solution.RmsFocalShift),
        new(BarKey, "Residual", "+ floor", "Dark: color residual. Pale: what the data floor adds to it.", p => p.Expected * 1e3, p => "", true),
        Micrometers("floor", "Data floor", "µm RMS", "The part that index data and melts leave unknown.", p => p.DataFloor),
        Micrometers("range", "Peak to valley", "µm", "Largest minus smallest focal shift over the samples.", p => p.PeakToValley),
        Micrometers("secondary", "Secondary", "µm", "Secondary spectrum: focus of the design wavelength less the mean focus of both ends.", p => p.Solution.SecondarySpectrum),
        new(HoldsKey, "Holds to", "f-number", "The fastest f-number at which half the peak-to-valley focal shift stays inside the quarter wave.",
            p => p.ColorLimitedFNumber, p => FigureText.FNumber(p.ColorLimitedFNumber), true),
        Number("power1", "φ₁", "of Φ", "Power of the positive element in units of the whole power.", p => p.Solution.RelativePowers[0], v => FigureText.WithSign(v, 2), true),
        Number("power2", "φ₂", "of Φ", "Power of the negative element in units of the whole power.", p => p.Solution.RelativePowers[1], v => FigureText.WithSign(v, 2)),
        Number("n1", "n₁", "", "Index of the positive glass at the design wavelength.", p => p.Positive.DesignIndex, v => FigureText.Fixed(v, 5)),
        Number("n2", "n₂", "", "Index of the negative glass at the design wavelength.", p => p.Negative.DesignIndex, v => FigureText.Fixed(v, 5)),
        Number("v1", "V₁", "of band", "Abbe number of the positive glass over the band.", p => p.Positive.AbbeNumber, v => FigureText.Fixed(v, 2)),
        Number("v2", "V₂", "of band", "Abbe number of the negative glass over the band.", p => p.Negative.AbbeNumber, v => FigureText.Fixed(v, 2)),
        Number("p1", "P₁", "of band", "Partial dispersion of the positive glass over the band.", p => p.Positive.PartialDispersion, v => FigureText.Fixed(v, 4)),
        Number("p2", "P₂", "of band", "Partial dispersion of the negative glass over the band.", p => p.Negative.PartialDispersion, v => FigureText.Fixed(v, 4)),
        Number("expansion", "Δα", "10⁻⁶/K", "Difference in linear expansion, −30 to +70 °C: what strains a cement layer.", p => Math.Abs(p.ExpansionDifference.GetValueOrDefault(double.NaN)) * 1e6, v => FigureText.Fixed(v, 1), true),
        Number("transmittance", "τ short", "% in 10 mm each", "Internal transmittance at the short end of the band through 10 mm of each glass.", Transmittance, v => FigureText.Fixed(v, 1)),
        Number("density1", "ρ₁", "g/cm³", "Density of the positive glass.", p => p.Positive.Glass.DensityGramsPerCm3, v => FigureText.Fixed(v, 2)),
        Number("density2", "ρ₂", "g/cm³", "Density of the negative glass.", p => p.Negative.Glass.DensityGramsPerCm3, v => FigureText.Fixed(v, 2)),
        new(SupplyKey, "Supply", "+ −", "How each glass could be had as its maker's list said: ● recommended, ○ listed, ◔ on request, ? unconfirmed, × discontinued.",
            p => Math.Max((int)p.Positive.Glass.Supply, (int)p.Negative.Glass.Supply),
            p => $"{FigureText.SignOf(p.Positive.Glass.Supply)}{FigureText.SignOf(p.Negative.Glass.Supply)}", true),
        Words("edition", "Edition", "+ −", "The year of each maker's list.", p => (p.Positive.Glass.Edition, p.Negative.Glass.Edition)),
        Words("climatic", "Climatic", "class + −", "Climatic resistance class; compare inside one maker only.", p => Classes(p, r => r.Climatic)),
        Words("stain", "Stain", "class + −", "Stain resistance class; compare inside one maker only.", p => Classes(p, r => r.Stain)),
        Words("acid", "Acid", "class + −", "Acid resistance class; compare inside one maker only.", p => Classes(p, r => r.Acid)),
        Words("alkali", "Alkali", "class + −", "Alkali resistance class; compare inside one maker only.", p => Classes(p, r => r.Alkali)),
        Words("phosphate", "Phosphate", "class + −", "Phosphate resistance class; compare inside one maker only.", p => Classes(p, r => r.Phosphate)),
    ];

    /// <summary>Gets the columns shown where nobody chose any.</summary>
    public static ImmutableArray<RankingColumn> Usual { get; } = [.. All.Where(c => c.IsUsual)];

    /// <summary>Finds a column by its key, upper and lower case alike.</summary>
    public static RankingColumn? Find(string key) => All.FirstOrDefault(c => string.Equals(c.Key, key, StringComparison.OrdinalIgnoreCase));

    private static RankingColumn Micrometers(string key, string title, string unit, string meaning, Func<RankedPair, double> millimeters, bool isUsual = false) =>
        new(key, title, unit, meaning, p => millimeters(p) * 1e3,
            p => FigureText.Fixed(millimeters(p) * 1e3, FigureText.MicrometerDecimals(p.Solution.Requirement)), isUsual);

    private static RankingColumn Number(
        string key, string title, string unit, string meaning, Func<RankedPair, double?> value, Func<double, string> text, bool isUsual = false) =>
        new(key, title, unit, meaning, p => Finite(value(p)), p => Finite(value(p)) is { } v ? text(v) : Unknown, isUsual);

    private static RankingColumn Words(string key, string title, string unit, string meaning, Func<RankedPair, (string? Positive, string? Negative)> words) =>
        new(key, title, unit, meaning, null, p => $"{words(p).Positive ?? Unknown} {words(p).Negative ?? Unknown}");

    private static (string? Positive, string? Negative) Classes(RankedPair pair, Func<ResistanceClasses, double?> of) =>
        (of(pair.Positive.Glass.Resistance) is { } p ? FigureText.Plain(p) : null, of(pair.Negative.Glass.Resistance) is { } n ? FigureText.Plain(n) : null);

    private static double? Transmittance(RankedPair pair)
    {
        const double thickness = 10.0;
        Wavelength shortEnd = pair.Solution.Requirement.Band.ShortEnd;
        return 100.0 * InternalTransmittance.TryOf(pair.Positive.Glass, shortEnd, thickness) * InternalTransmittance.TryOf(pair.Negative.Glass, shortEnd, thickness);
    }

    private static double? Finite(double? value) => value is { } v && double.IsFinite(v) ? v : null;
}
