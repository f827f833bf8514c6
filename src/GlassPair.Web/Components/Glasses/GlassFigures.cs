using System.Collections.Immutable;
using System.Runtime.CompilerServices;
using System.Text.RegularExpressions;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Components.Glasses;

/// <summary>A glass with the figures that the list of all glasses shows. What cannot be had inside the range of its formula is null.</summary>
/// <param name="Glass">The glass.</param>
/// <param name="Nd">Index at the d line.</param>
/// <param name="AbbeD">Abbe number v_d.</param>
/// <param name="Ne">Index at the e line.</param>
/// <param name="AbbeE">Abbe number v_e.</param>
/// <param name="PartialGF">Partial dispersion P_g,F.</param>
/// <param name="DeltaGF">ΔP_g,F, its distance from the normal line.</param>
/// <param name="Remarks">What the reader of the catalogue noticed about the glass, as sentences.</param>
public sealed partial record GlassFigures(
    Glass Glass, double? Nd, double? AbbeD, double? Ne, double? AbbeE, double? PartialGF, double? DeltaGF, ImmutableArray<string> Remarks)
{
    private static readonly ConditionalWeakTable<Stock, GlassFigures[]> _kept = [];

    /// <summary>Gets the name as it sorts: without regard to case, and by the value of the numbers in it, so that SF2 stands before SF10.</summary>
    public string NameInOrder { get; } = Digits().Replace(Glass.Name.ToUpperInvariant(), number => number.Value.PadLeft(8, '0'));

    /// <summary>Gets the figures of every glass of a stock, in ordinal order of their ids; computed once and shared by all pages.</summary>
    public static IReadOnlyList<GlassFigures> Of(Stock stock) =>
        _kept.GetValue(stock, s => [.. s.Glasses.Select(g => Of(g, s))]);

    /// <summary>Computes the figures of one glass.</summary>
    public static GlassFigures Of(Glass glass, Stock stock) => new(
        glass,
        IndexAt(glass, SpectralLine.HeliumD),
        AbbeNumber.TryD(glass),
        IndexAt(glass, SpectralLine.MercuryE),
        AbbeNumber.TryE(glass),
        PartialDispersion.TryGF(glass),
        PartialDispersion.TryDeltaGF(glass),
        [.. stock.RemarksOn(glass).Select(r => r.Message)]);

    /// <summary>Gets the index at a line; null outside the range of the formula.</summary>
    public static double? IndexAt(Glass glass, SpectralLine line) =>
        glass.Range.Contains(line.Wavelength) ? glass.IndexAt(line.Wavelength) : null;

    [GeneratedRegex("[0-9]+")]
    private static partial Regex Digits();
}
