using System.Collections.Immutable;
using GlassPair.Optics.Color;
using GlassPair.Optics.Practice;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;
using static GlassPair.Web.Figures.FigureText;

namespace GlassPair.Web.Figures;

/// <summary>What a pair's figures mean, in sentences: the number, the limit and the consequence.</summary>
public static class PairFindings
{
    /// <summary>Gets the findings, the most weighty first: color, cement, temperature, lead.</summary>
    public static ImmutableArray<Finding> Of(RankedPair pair) =>
    [
        Color(pair),
        .. pair.Solution.Requirement.AirSpace is null ? Cement(pair) : [],
        .. pair.Solution.Requirement.Temperature is null ? [] : Temperature(pair),
        .. Lead(pair),
    ];

    /// <summary>Compares the secondary spectrum with what ordinary pairs leave; null outside the usual visible band, for which the rule of thumb holds.</summary>
    /// <remarks>f/2000 for a pair of ordinary glasses between the F and C lines. Source: [thin-achromat].</remarks>
    public static string? AgainstOrdinaryPairs(ThinSolution solution)
    {
        Band band = solution.Requirement.Band;
        bool isVisible = Near(band.ShortEnd, SpectralLine.HydrogenF, SpectralLine.CadmiumFPrime) && Near(band.LongEnd, SpectralLine.HydrogenC, SpectralLine.CadmiumCPrime);
        double spectrum = Math.Abs(solution.SecondarySpectrum);
        double ordinary = solution.Requirement.FocalLength / 2000.0;
        return !isVisible || spectrum == 0.0 ? null
            : $"Secondary spectrum {ShortLength(spectrum)}, f/{Count((long)Math.Round(solution.Requirement.FocalLength / spectrum))}, "
                + $"where ordinary pairs leave about f/2,000, {ShortLength(ordinary)}.";
    }

    private static bool Near(Wavelength wavelength, params ReadOnlySpan<SpectralLine> lines)
    {
        const double asGood = 3.0;
        foreach (SpectralLine line in lines)
        {
            if (Math.Abs(line.Wavelength.Nanometers - wavelength.Nanometers) <= asGood)
            {
                return true;
            }
        }

        return false;
    }

    private static Finding Color(RankedPair pair)
    {
        Requirement requirement = pair.Solution.Requirement;
        int digits = MicrometerDecimals(requirement);
        string half = Fixed(0.5e3 * pair.PeakToValley, digits);
        string depth = Fixed(1e3 * requirement.DepthOfFocus, digits);
        string n = "f/" + Plain(requirement.FNumber);
        string limit = FNumber(pair.ColorLimitedFNumber);
        return pair.Verdict switch
        {
            Verdict.Holds => new Finding(Verdict.Holds, "Color holds", $"within ±{half} µm of one focus, {n} allows ±{depth} µm; holds down to {limit}"),
            Verdict.Tight => new Finding(Verdict.Tight, "Color is tight", $"within ±{half} µm of one focus, {n} allows ±{depth} µm; the limit is {limit}"),
            _ => new Finding(Verdict.Exceeds, "Color exceeds", $"±{half} µm about one focus, {n} allows ±{depth} µm; holds from {limit} on"),
        };
    }

    private static IEnumerable<Finding> Cement(RankedPair pair)
    {
        Requirement requirement = pair.Solution.Requirement;
        var usual = CementAssumptions.Usual;
        if (requirement.Temperature is { } span)
        {
            if (CementStress.TryOf(pair.Positive.Glass, pair.Negative.Glass, requirement.ApertureDiameter, span, usual) is not { } stress)
            {
                yield return new Finding(Verdict.Tight, "Cement not known", "a maker states no expansion; ask before cementing");
                yield break;
            }

            Verdict verdict = Verdicts.Of(stress.GlassMegapascals, usual.LimitMegapascals);
            string difference = ThreeDigits(Math.Abs(stress.ExpansionDifference) * 1e6);
            string at = Plain(usual.StressFreeCelsius + stress.TemperatureChange);
            yield return new Finding(
                verdict,
                verdict switch { Verdict.Holds => "Cement holds", Verdict.Tight => "Cement is tight", _ => "Cement strained" },
                $"Δα {difference}·10⁻⁶/K: a hard cement sees about {ThreeDigits(stress.GlassMegapascals)} MPa at {at} °C, limit {Plain(usual.LimitMegapascals)} MPa"
                    + (verdict == Verdict.Exceeds ? $"; soft cement (edges slip {ShortLength(stress.EdgeSlip)}) or an air space" : ""));
        }
        else if (pair.ExpansionDifference is { } difference && Math.Abs(difference) > CementStress.HarmlessDifference)
        {
            bool isLarge = Math.Abs(difference) > CementStress.DelicateDifference;
            yield return new Finding(
                isLarge ? Verdict.Exceeds : Verdict.Tight,
                isLarge ? "Cement strained" : "Cement with care",
                $"Δα {ThreeDigits(Math.Abs(difference) * 1e6)}·10⁻⁶/K, usual up to {Plain(CementStress.HarmlessDifference * 1e6)}; give temperatures to see the stress");
        }
    }

    private static IEnumerable<Finding> Temperature(RankedPair pair)
    {
        if (ThermalDefocus.Of(pair.Solution) is not ThermalDefocus defocus)
        {
            string why = ThermalDefocus.Of(pair.Solution) is NoThermalDefocus none ? none.Sentence : "";
            yield return new Finding(Verdict.Tight, "Drift not known", why);
            yield break;
        }

        Verdict verdict = Verdicts.Of(Math.Abs(defocus.Worst), defocus.DepthOfFocus);
        double at = ReferenceEquals(WorstOf(defocus), defocus.Coldest) ? defocus.Coldest.Celsius : defocus.Hottest.Celsius;
        yield return new Finding(
            verdict,
            verdict switch { Verdict.Holds => "Focus holds over temperature", Verdict.Tight => "Focus drift is tight", _ => "Drifts with heat" },
            $"{WithSign(defocus.DefocusPerKelvin * 1e3, 2)} µm/K against the housing: {ShortLength(defocus.Worst)} at {Plain(at)} °C where ±{ShortLength(defocus.DepthOfFocus)} is allowed"
                + (verdict == Verdict.Exceeds ? "; needs a focus travel or another housing" : ""));
    }

    private static ThermalState WorstOf(ThermalDefocus defocus) =>
        Math.Abs(defocus.Coldest.Defocus) > Math.Abs(defocus.Hottest.Defocus) ? defocus.Coldest : defocus.Hottest;

    private static IEnumerable<Finding> Lead(RankedPair pair)
    {
        string[] leaded = [.. pair.Solution.Elements.Where(e => e.Glass.ContainsLead).Select(e => e.Glass.Name)];
        if (leaded.Length > 0)
        {
            yield return new Finding(Verdict.Tight, "Contains lead", $"{string.Join(" and ", leaded)}: dust and waste need care; check what the product’s market allows");
        }
    }
}
