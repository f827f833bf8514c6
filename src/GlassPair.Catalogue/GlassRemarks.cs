using System.Globalization;
using GlassPair.Optics.Glasses;

namespace GlassPair.Catalogue;

/// <summary>What is found by computing a glass's stated values anew.</summary>
internal static class GlassRemarks
{
    private const double IndexTolerance = 1e-5;

    /// <summary>The v_d of some makers differs from their own coefficients by up to 0.009: less than this says nothing about a glass.</summary>
    private const double AbbeTolerance = 0.01;

    /// <summary>Half a unit of the only decimal that some makers print; a trailing zero may be gone.</summary>
    private const double OneDecimal = 0.05;

    /// <summary>Fewer extinction coefficients than this do not show where a glass begins to absorb.</summary>
    private const int FewestExtinctionSamples = 5;

    /// <summary>Gets every remark on a glass but those that need the maker's other glasses.</summary>
    public static IEnumerable<string> On(GlassRow read)
    {
        (Glass glass, CsvRow row) = (read.Glass, read.Row);
        StatedValues stated = glass.Stated;
        double? nd = glass.Range.Contains(Optics.Spectrum.SpectralLine.HeliumD.Wavelength) ? glass.IndexAt(Optics.Spectrum.SpectralLine.HeliumD.Wavelength) : null;
        double? vd = AbbeNumber.TryD(glass);
        foreach (string remark in read.Remarks)
        {
            yield return remark;
        }

        if (stated.Nd is { } statedNd && nd is { } computedNd && Differ(statedNd, computedNd, IndexTolerance))
        {
            yield return Text($"The maker states nd {statedNd}; the formula gives {computedNd:0.000000}.");
        }

        if (stated.Vd is { } statedVd && vd is { } computedVd && Differ(statedVd, computedVd, row.DecimalsOf(CatalogueFormat.Vd) > 1 ? AbbeTolerance : OneDecimal))
        {
            yield return Text($"The maker states vd {statedVd}; the formula gives {computedVd:0.00}.");
        }

        if (stated.Code is { } code && (stated.Nd ?? nd) is { } codedNd && (stated.Vd ?? vd) is { } codedVd
            && (Math.Abs(Digits(code, 0) - ((codedNd - 1.0) * 1000.0 % 1000.0)) > 1.0 || Math.Abs(Digits(code, 3) - (codedVd * 10.0)) > 1.0))
        {
            yield return Text($"The maker states the code {code}; nd {codedNd:0.00000} and vd {codedVd:0.00} make {(codedNd - 1.0) * 1000.0 % 1000.0:000}{codedVd * 10.0:000}.");
        }

        if (stated.DeltaPgF is { } deltaPgF && PartialDispersion.TryGF(glass) is null)
        {
            yield return Text($"The maker states ΔP_g,F {deltaPgF}, which cannot be checked: the formula holds from {glass.Range}.");
        }

        if (glass.Extinction.Length is > 0 and < FewestExtinctionSamples)
        {
            yield return Text($"Only {glass.Extinction.Length} extinction coefficients are stated; transmittance between them is uncertain.");
        }

        if (glass.Thermal is null)
        {
            yield return "No coefficients of the index's change with temperature are stated.";
        }
        else if (glass.Thermal is { D0: not 0.0, D1: 0.0, D2: 0.0, E0: 0.0, E1: 0.0 })
        {
            yield return "Of the coefficients of the index's change with temperature only D0 is stated: the change comes out nearly the same at every wavelength and temperature.";
        }

        if (glass.Thermal is { ResonanceMicrometers: < 0.0 } thermal)
        {
            yield return Text($"λ_TK is stated as {thermal.ResonanceMicrometers} um; it enters squared, so that its sign does not matter.");
        }

        if (glass.ExpansionPerKelvin is null)
        {
            yield return glass.HighExpansionPerKelvin is { } high
                ? Text($"No expansion from -30 °C to +70 °C is stated, only {high} per kelvin from +20 °C to +300 °C.")
                : "No expansion is stated.";
        }
    }

    private static bool Differ(double stated, double computed, double tolerance) => Math.Abs(stated - computed) > tolerance + 1e-12;

    private static int Digits(string code, int from) => int.Parse(code.AsSpan(from, 3), CultureInfo.InvariantCulture);

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
