using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearRegression;

namespace GlassPair.Optics.Tests.Color;

public sealed class ThinPairTests
{
    private static readonly Band s_visible =
        Band.Even(SpectralLine.HydrogenF.Wavelength, SpectralLine.HeliumD.Wavelength, SpectralLine.HydrogenC.Wavelength, 9);

    public static TheoryData<PublishedRow> Achromats => Published.Theory("thin-achromats.csv");

    public static TheoryData<PublishedRow> SecondarySpectra => Published.Theory("secondary-spectrum-rule.csv");

    public static TheoryData<PublishedRow> PetzvalRadii => Published.Theory("petzval-radius.csv");

    [Theory, MemberData(nameof(Achromats))]
    public void EndsUnited_PublishedAchromat_HasItsFocalLengths(PublishedRow row)
    {
        double power = ThinPair.EndsUnited(row.Number("front_abbe"), row.Number("rear_abbe"), 0.0)!.Value;

        row.AssertPrints("front_focal_length", row.Number("focal_length") / power);
        row.AssertPrints("rear_focal_length", row.Number("focal_length") / (1.0 - power));
    }

    [Theory, MemberData(nameof(SecondarySpectra))]
    public void Solve_OrdinaryPair_LeavesTheSecondarySpectrumOfTheRule(PublishedRow row)
    {
        ThinSolution solution = SolveVisible(row["front"], row["rear"]);

        // the design wavelength focuses nearer than the ends
        Assert.Equal(-row.Number("fraction_of_f"), solution.SecondarySpectrum / solution.Requirement.FocalLength, row.Number("allowed"));
    }

    [Theory, MemberData(nameof(PetzvalRadii))]
    public void Solve_OrdinaryPair_HasThePublishedPetzvalRadius(PublishedRow row)
    {
        ThinSolution solution = SolveVisible(row["front"], row["rear"]);

        row.AssertPrints("radius_over_f", solution.PetzvalRadius / solution.Requirement.FocalLength);
    }

    [Fact]
    public void Solve_FocalLengthScaled_ScalesEveryLength() => Law.Holds(ThinCase.Any, c =>
    {
        const double scale = 3.0;
        foreach (ColorBalance balance in Enum.GetValues<ColorBalance>())
        {
            ThinSolution once = Solved(ThinPair.Solve(c.Requirement(balance, c.AirSpace), c.Crown, c.Flint));
            ThinSolution scaled = Solved(ThinPair.Solve(new Requirement(scale * c.FocalLength, 8.0, c.Band) { Balance = balance, AirSpace = scale * c.AirSpace }, c.Crown, c.Flint));

            AssertRelative(once.RelativePowers, scaled.RelativePowers, 1e-10);
            AssertRelative(once.FocalLengths.Select(f => f * scale), scaled.FocalLengths, 1e-10);
            AssertRelative([once.RmsFocalShift * scale, once.PetzvalRadius * scale], [scaled.RmsFocalShift, scaled.PetzvalRadius], 1e-7);
            Assert.Equal(once.ColorLimitedFNumber * Math.Sqrt(scale), scaled.ColorLimitedFNumber, 1e-7 * scaled.ColorLimitedFNumber);
        }
    });

    [Fact]
    public void Solve_OrderSwappedInContact_SwapsThePowers() => Law.Holds(ThinCase.Any, c =>
    {
        foreach (ColorBalance balance in Enum.GetValues<ColorBalance>())
        {
            ThinSolution once = Solved(ThinPair.Solve(c.Requirement(balance), c.Crown, c.Flint));
            ThinSolution swapped = Solved(ThinPair.Solve(c.Requirement(balance), c.Flint, c.Crown));

            AssertRelative(once.RelativePowers.Reverse(), swapped.RelativePowers, 1e-12);
            AssertEqual(once.FocalShifts, swapped.FocalShifts, 1e-12 * c.FocalLength);
        }
    });

    [Fact]
    public void Solve_EndsUnitedInContact_NullsTheEnds() => Law.Holds(ThinCase.Any, c =>
    {
        ThinSolution solution = Solved(ThinPair.Solve(c.Requirement(ColorBalance.EndsUnited), c.Crown, c.Flint));

        Assert.Equal(0.0, solution.PrimaryAxialColor, 1e-14 * c.FocalLength);
        Assert.Equal(solution.FocalShiftAt(c.Band.ShortEnd), solution.FocalShiftAt(c.Band.LongEnd), 1e-14 * c.FocalLength);
        Assert.Equal(0.0, solution.FocalShiftAt(c.Band.Design));
    });

    [Fact]
    public void Solve_EndsUnitedInContact_SecondarySpectrumIsTheSlopeOfTheChord() => Law.Holds(ThinCase.Any, c =>
    {
        ThinSolution solution = Solved(ThinPair.Solve(c.Requirement(ColorBalance.EndsUnited), c.Crown, c.Flint));
        double slope = (c.Crown.PartialDispersion - c.Flint.PartialDispersion) / (c.Crown.AbbeNumber - c.Flint.AbbeNumber);

        // f (P₁ − P₂)/(V₁ − V₂) to first order; exactly, the ends have the power 1 + slope and the focal length 1/(1 + slope)
        Assert.Equal(slope, Chord.SlopeOf(c.Crown, c.Flint)!.Value, 1e-15);
        Assert.Equal(c.FocalLength * slope / (1.0 + slope), solution.SecondarySpectrum, 1e-13 * c.FocalLength);
        Assert.Equal(c.FocalLength * slope, Chord.SecondarySpectrum(solution.Requirement, c.Flint, c.Crown)!.Value, 1e-13 * c.FocalLength);
    });

    [Fact]
    public void Solve_BandBalancedInContact_EqualsRegressionOfMathNet() => Law.Holds(ThinCase.Any, c =>
    {
        // least squares of √w [t₂ + p (t₁ − t₂) − mean]: two columns, the mean and p
        double[] roots = [.. c.Band.Samples.Select(s => Math.Sqrt(s.Weight))];
        var columns = Matrix<double>.Build.Dense(roots.Length, 2, (i, j) => roots[i] * (j == 0 ? 1.0 : c.Flint.Changes[i] - c.Crown.Changes[i]));
        var target = Vector<double>.Build.Dense(roots.Length, i => roots[i] * c.Flint.Changes[i]);
        double expected = MultipleRegression.QR(columns, target)[1];

        Assert.Equal(expected, Solved(ThinPair.Solve(c.Requirement(), c.Crown, c.Flint)).RelativePowers[0], 1e-10 * Math.Abs(expected));
    });

    [Fact]
    public void Solve_BandBalanced_NoOtherPowersLeaveLess() => Law.Holds(ThinCase.Any, c =>
    {
        foreach (double? space in new double?[] { null, c.AirSpace })
        {
            ThinSolution balanced = Solved(ThinPair.Solve(c.Requirement(ColorBalance.BandBalanced, space), c.Crown, c.Flint));
            ThinSolution united = Solved(ThinPair.Solve(c.Requirement(ColorBalance.EndsUnited, space), c.Crown, c.Flint));
            double Variance(double p1)
            {
                double height = 1.0 - (space.GetValueOrDefault() / c.FocalLength * p1);
                return c.VarianceOf((p1, c.Crown), (height * (1.0 - p1), c.Flint));
            }

            double least = Variance(balanced.RelativePowers[0]);
            foreach (double step in new[] { 1e-2, 1e-3, 1e-4, 1e-5 })
            {
                Assert.True(Variance(balanced.RelativePowers[0] + step) > least, $"{step} more leaves less");
                Assert.True(Variance(balanced.RelativePowers[0] - step) > least, $"{step} less leaves less");
            }

            Assert.True(least <= Variance(united.RelativePowers[0]) * (1.0 + 1e-9));
        }
    });

    [Fact]
    public void Solve_AirSpaced_MeetsTheConditionsOfFirstOrder() => Law.Holds(ThinCase.Any, c =>
    {
        foreach ((GlassIndices front, GlassIndices rear) in new[] { (c.Crown, c.Flint), (c.Flint, c.Crown) })
        {
            double space = Math.Min(c.AirSpace, 0.9 * ThinPair.LargestAirSpace(c.FocalLength, front.AbbeNumber, rear.AbbeNumber));
            ThinSolution solution = Solved(ThinPair.Solve(c.Requirement(ColorBalance.EndsUnited, space), front, rear));
            (double p1, double p2) = (solution.RelativePowers[0], solution.RelativePowers[1]);
            double y2 = 1.0 - (space / c.FocalLength * p1);

            Assert.Equal(1.0, p1 + (y2 * p2), 1e-10);
            Assert.Equal(0.0, ((p1 / front.AbbeNumber) + (y2 * y2 * p2 / rear.AbbeNumber)) * front.AbbeNumber / p1, 1e-9);
            Assert.True(y2 > 0.0, "the image lies behind the rear element");
        }
    });

    [Fact]
    public void Solve_AirSpaceToNothing_GoesOverToContact() => Law.Holds(ThinCase.Any, c =>
    {
        foreach (ColorBalance balance in Enum.GetValues<ColorBalance>())
        {
            ThinSolution contact = Solved(ThinPair.Solve(c.Requirement(balance), c.Crown, c.Flint));
            ThinSolution spaced = Solved(ThinPair.Solve(c.Requirement(balance, 1e-10 * c.FocalLength), c.Crown, c.Flint));
            ThinSolution zero = Solved(ThinPair.Solve(c.Requirement(balance, 0.0), c.Crown, c.Flint));

            AssertRelative(contact.RelativePowers, spaced.RelativePowers, 1e-7);
            AssertEqual(contact.FocalShifts, spaced.FocalShifts, 1e-8 * c.FocalLength);
            Assert.Equal(contact.RelativePowers.AsEnumerable(), zero.RelativePowers.AsEnumerable());
        }
    });

    [Fact]
    public void LargestAirSpace_AnyPair_IsWhereTheDiscriminantVanishes() => Law.Holds(ThinCase.Any, c =>
    {
        double largest = ThinPair.LargestAirSpace(c.FocalLength, c.Crown.AbbeNumber, c.Flint.AbbeNumber);
        double space = largest / c.FocalLength;
        double b = 1.0 - (c.Flint.AbbeNumber / c.Crown.AbbeNumber) + space;

        Assert.Equal(0.0, (b * b) - (4.0 * space), 1e-12);
        Assert.IsType<ThinSolution>(ThinPair.Solve(c.Requirement(ColorBalance.EndsUnited, largest * (1.0 - 1e-9)), c.Crown, c.Flint));
        NoThinSolution none = Assert.IsType<NoThinSolution>(ThinPair.Solve(c.Requirement(ColorBalance.EndsUnited, largest * (1.0 + 1e-9)), c.Crown, c.Flint));
        Assert.Equal(NoThinSolutionReason.AirSpaceTooLarge, none.Reason);
        Assert.Equal(largest, none.LargestAirSpace!.Value, 1e-12 * largest);
        Assert.Contains("the largest air space for them is", none.Sentence, StringComparison.Ordinal);
    });

    [Fact]
    public void Solve_GlassWithItself_HasNoSolution() => Law.Holds(ThinCase.Any, c =>
    {
        foreach (ColorBalance balance in Enum.GetValues<ColorBalance>())
        {
            foreach (double? space in new double?[] { null, 0.0, 0.1 * c.FocalLength })
            {
                NoThinSolution none = Assert.IsType<NoThinSolution>(ThinPair.Solve(c.Requirement(balance, space), c.Crown, c.Crown));
                Assert.Equal((NoThinSolutionReason.DispersionsAlike, null), (none.Reason, none.LargestAirSpace));
                Assert.Contains(c.A.Id, none.Sentence, StringComparison.Ordinal);
            }
        }
    });

    [Fact]
    public void FocalShiftAt_OutsideTheRangeOfAGlass_Throws()
    {
        ThinSolution solution = SolveVisible("schott/N-BK7", "schott/N-SF6"); // N-SF6 from 370 nm

        Assert.Throws<WavelengthOutOfRangeException>(() => solution.FocalShiftAt(SpectralLine.MercuryI.Wavelength));
    }

    internal static ThinSolution Solved(ThinOutcome outcome) => Assert.IsType<ThinSolution>(outcome);

    private static ThinSolution SolveVisible(string front, string rear) => Solved(ThinPair.Solve(
        new Requirement(100.0, 8.0, s_visible) { Balance = ColorBalance.EndsUnited },
        GlassIndices.Of(TestGlasses.Named(front), s_visible),
        GlassIndices.Of(TestGlasses.Named(rear), s_visible)));

    private static void AssertRelative(IEnumerable<double> expected, IEnumerable<double> actual, double tolerance) =>
        Assert.All(expected.Zip(actual), pair => Assert.Equal(pair.First, pair.Second, tolerance * Math.Abs(pair.First)));

    private static void AssertEqual(IEnumerable<double> expected, IEnumerable<double> actual, double tolerance) =>
        Assert.All(expected.Zip(actual), pair => Assert.Equal(pair.First, pair.Second, tolerance));
}
