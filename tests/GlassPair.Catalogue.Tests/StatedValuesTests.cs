using System.Globalization;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Catalogue.Tests;

/// <summary>What each maker states against what our formulas compute, for every glass. Source: the heads of the two tables.</summary>
public class StatedValuesTests
{
    /// <summary>The exceptions' computed values are given with seven decimals of nd and four of vd.</summary>
    private const double HalfLastOfSeven = 0.5e-7 + 1e-12;
    private const double HalfLastOfFour = 0.5e-4 + 1e-9;

    private static readonly Dictionary<(string Glass, string Quantity), double> Exceptions = Published.Rows("glasses-stated-exceptions.csv")
        .ToDictionary(r => ($"{r[0]}/{r[1]}", r[2]), r => Number(r[4]));

    [Fact]
    public void EveryGlass_NdAndVd_AgreeWithWhatTheMakerStates()
    {
        List<string> failures = [];
        int compared = 0;
        foreach (string[] row in Published.Rows("glasses-stated.csv"))
        {
            Glass glass = Shipped.Glass($"{row[0]}/{row[1]}");
            compared += Compare(failures, glass, "nd", Number(row[2]), int.Parse(row[3], CultureInfo.InvariantCulture), glass.IndexAt(SpectralLine.HeliumD.Wavelength));
            compared += Compare(failures, glass, "vd", Number(row[4]), int.Parse(row[5], CultureInfo.InvariantCulture), AbbeNumber.TryD(glass) ?? double.NaN);
        }

        Assert.Empty(failures);
        Assert.Equal(2 * 1609, compared);
    }

    [Fact]
    public void Exceptions_ComputedHere_AgreeWithTheSeparateProgram()
    {
        foreach (((string id, string quantity), double expected) in Exceptions)
        {
            Glass glass = Shipped.Glass(id);
            (double computed, double tolerance) = quantity == "nd"
                ? (glass.IndexAt(SpectralLine.HeliumD.Wavelength), HalfLastOfSeven)
                : (AbbeNumber.TryD(glass) ?? double.NaN, HalfLastOfFour);
            Assert.InRange(computed, expected - tolerance, expected + tolerance);
        }
    }

    [Fact]
    public void Catalogue_StatedColumns_AreThoseOfTheTable()
    {
        foreach (string[] row in Published.Rows("glasses-stated.csv"))
        {
            StatedValues stated = Shipped.Glass($"{row[0]}/{row[1]}").Stated;
            Assert.Equal((Number(row[2]), Number(row[4])), (stated.Nd, stated.Vd));
        }
    }

    private static int Compare(List<string> failures, Glass glass, string quantity, double stated, int decimals, double computed)
    {
        double tolerance = (0.5 * Math.Pow(10.0, -decimals)) + 1e-12;
        bool agrees = Math.Abs(stated - computed) <= tolerance;
        if (agrees == Exceptions.ContainsKey((glass.Id, quantity)))
        {
            failures.Add(FormattableString.Invariant($"{glass} {quantity}: stated {stated}, computed {computed:R}; {(agrees ? "listed as an exception but agrees" : "disagrees")}"));
        }

        return 1;
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
