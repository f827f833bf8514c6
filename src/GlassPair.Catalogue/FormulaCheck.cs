using System.Globalization;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Catalogue;

/// <summary>Whether a dispersion formula can be a glass's over its stated range.</summary>
internal static class FormulaCheck
{
    private const double LargestIndex = 5.0;
    private const double NearPole = 0.02;
    private const int Steps = 200;

    /// <summary>Finds why the formula cannot be a glass's, as a sentence; null where it can.</summary>
    public static string? FindFault(DispersionFormula formula, WavelengthRange range)
    {
        if (formula.FindPole(range) is { } pole)
        {
            return Text($"The index is infinite at {pole.Nanometers:0.#} nm, inside the stated range, {range}.");
        }

        foreach (double nanometers in Samples(range.Shortest.Nanometers, range.Longest.Nanometers))
        {
            double squared = formula.IndexSquaredAt(nanometers / 1000.0);
            if (!(squared > 1.0 && squared <= LargestIndex * LargestIndex))
            {
                return squared > 0.0
                    ? Text($"The index is {Math.Sqrt(squared):0.####} at {nanometers:0.#} nm; it must lie above 1 and not above {LargestIndex} over the whole range, {range}.")
                    : Text($"n² is {squared:0.####} at {nanometers:0.#} nm, so that there is no index; it must lie above 1 over the whole range, {range}.");
            }
        }

        (Wavelength f, Wavelength c) = (SpectralLine.HydrogenF.Wavelength, SpectralLine.HydrogenC.Wavelength);
        if (range.Contains(f) && range.Contains(c))
        {
            double dispersion = Math.Sqrt(formula.IndexSquaredAt(f.Micrometers)) - Math.Sqrt(formula.IndexSquaredAt(c.Micrometers));
            if (!(dispersion > 1e-6))
            {
                return Text($"n_F - n_C is {dispersion:0.######}, so that there is no Abbe number; the index must fall from the F to the C line.");
            }
        }

        return null;
    }

    /// <summary>Finds what is unusual in a formula that <see cref="FindFault"/> passed, as sentences.</summary>
    public static IEnumerable<string> FindOddities(DispersionFormula formula, WavelengthRange range)
    {
        (double shortest, double longest) = (range.Shortest.Nanometers, range.Longest.Nanometers);
        var wider = WavelengthRange.FromNanometers(
            Math.Max(shortest * (1.0 - NearPole), Wavelength.MinNanometers), Math.Min(longest * (1.0 + NearPole), Wavelength.MaxNanometers));
        if (formula.FindPole(wider) is { } pole)
        {
            yield return Text($"The index is infinite at {pole.Nanometers:0.#} nm, just outside the stated range, {range}.");
        }

        (double from, double to) = (Math.Max(shortest, 400.0), Math.Min(longest, 700.0));
        if (from < to && Samples(from, to).Any(nm => formula.SlopeOfIndexSquaredAt(nm / 1000.0) > 0.0))
        {
            yield return "The index rises with the wavelength in the visible; are coefficients swapped?";
        }
    }

    private static IEnumerable<double> Samples(double from, double to) => Enumerable.Range(0, Steps + 1).Select(i => from + ((to - from) * i / Steps));

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
