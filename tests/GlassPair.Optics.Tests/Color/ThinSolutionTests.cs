using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Color;

public sealed class ThinSolutionTests
{
    public static TheoryData<PublishedRow> DepthsOfFocus => Published.Theory("depth-of-focus.csv");

    [Theory, MemberData(nameof(DepthsOfFocus))]
    public void DepthOfFocus_PublishedValue_Agrees(PublishedRow row)
    {
        Wavelength design = Wavelength.FromNanometers(row.Number("nanometers"));
        var requirement = new Requirement(100.0, row.Number("f_number"), Band.Even(Wavelength.FromNanometers(500), design, Wavelength.FromNanometers(650), 3));

        row.AssertPrints("micrometers", requirement.DepthOfFocus, 1e-3);
        row.AssertPrints("waves", requirement.DepthOfFocus / (8.0 * requirement.FNumber * requirement.FNumber * design.Millimeters));
    }

    [Fact]
    public void UsualSupply_PublishedGrades_IsTheWidest()
    {
        PublishedRow widest = Published.Rows("tolerance-grades.csv").MaxBy(r => r.Number("abbe_percent"))!;

        Assert.Equal("3", widest["step"]);
        widest.AssertPrints("abbe_percent", DataQuality.UsualSupply.AbbeTolerance, 0.01);
    }

    [Fact]
    public void FocalShiftAt_AnyWavelength_EqualsTheLensFormulaInDecimals() => Law.Holds(ThinCase.Any, c =>
    {
        foreach (double space in new[] { 0.0, c.AirSpace })
        {
            ThinSolution solution = ThinPairTests.Solved(ThinPair.Solve(c.Requirement(ColorBalance.BandBalanced, space), c.Crown, c.Flint));
            foreach (BandSample sample in c.Band.Samples)
            {
                // b = (1 − d φ₁)/(φ₁ + φ₂ − d φ₁ φ₂) behind the rear element, with each φ in proportion to n − 1
                decimal[] powers = [.. solution.Elements.Select((e, i) => (decimal)solution.RelativePowers[i]
                    * (1m + (((decimal)e.Glass.IndexAt(sample.Wavelength) - (decimal)e.DesignIndex) / ((decimal)e.DesignIndex - 1m))))];
                decimal d = (decimal)space / (decimal)c.FocalLength;
                decimal image = (1m - (d * powers[0])) / (powers[0] + powers[1] - (d * powers[0] * powers[1]));
                decimal design = 1m - (d * (decimal)solution.RelativePowers[0]);

                // the powers of the air-spaced pair meet Σ yᵢ pᵢ = 1 to rounding only
                Assert.Equal((double)((image - design) * (decimal)c.FocalLength), solution.FocalShiftAt(sample.Wavelength), 1e-13 * c.FocalLength * solution.SumOfPowers);
            }
        }
    });

    [Fact]
    public void RmsAndPeakToValley_OfTheSamples_AreTheirDefinitions() => Law.Holds(ThinCase.Any, c =>
    {
        ThinSolution solution = ThinPairTests.Solved(ThinPair.Solve(c.Requirement(), c.Crown, c.Flint));
        double[] shifts = [.. c.Band.Samples.Select(s => solution.FocalShiftAt(s.Wavelength))];
        double mean = shifts.Zip(c.Band.Samples, (shift, s) => shift * s.Weight).Sum();

        Assert.Equal(Math.Sqrt(shifts.Zip(c.Band.Samples, (shift, s) => s.Weight * (shift - mean) * (shift - mean)).Sum()), solution.RmsFocalShift, 1e-14 * c.FocalLength);
        Assert.Equal(shifts.Max() - shifts.Min(), solution.PeakToValleyFocalShift, 1e-14 * c.FocalLength);
        Assert.Equal(0.25, 0.5 * solution.PeakToValleyFocalShift / (8.0 * Math.Pow(solution.ColorLimitedFNumber, 2.0) * c.Band.Design.Millimeters), 1e-12);
    });

    [Fact]
    public void FocalLengths_InContact_AddUpToTheWhole() => Law.Holds(ThinCase.Any, c =>
    {
        ThinSolution solution = ThinPairTests.Solved(ThinPair.Solve(c.Requirement(), c.Crown, c.Flint));

        Assert.Equal(1.0 / c.FocalLength, solution.FocalLengths.Sum(f => 1.0 / f), 1e-12 / c.FocalLength);
    });

    [Fact]
    public void DataFloor_AbbeNumbersOffEitherWay_IsTheMeanOfWhatTheyAdd() => Law.Holds(ThinCase.Any, c =>
    {
        // each glass's curve steeper or flatter by σ, all four cases alike: the mean square of the residual is residual² + floor², exactly to first order in t
        const double tolerance = 0.005;
        foreach (double space in new[] { 0.0, c.AirSpace })
        {
            ThinSolution solution = ThinPairTests.Solved(ThinPair.Solve(c.Requirement(ColorBalance.BandBalanced, space), c.Crown, c.Flint));
            double height = 1.0 - (space / c.FocalLength * solution.RelativePowers[0]);
            double Variance(double frontError, double rearError) => c.VarianceOf(
                (solution.RelativePowers[0] * (1.0 + frontError), c.Crown),
                (height * height * solution.RelativePowers[1] * (1.0 + rearError), c.Flint));
            double mean = (from front in new[] { -tolerance, tolerance } from rear in new[] { -tolerance, tolerance } select Variance(front, rear)).Average();

            double floor = solution.DataFloor(new DataQuality(tolerance, 0.0)) / c.FocalLength;

            Assert.Equal(mean, Variance(0.0, 0.0) + (floor * floor), 1e-12 * mean);
        }
    });

    [Fact]
    public void DataFloor_OfQuality_GrowsInProportionAndVanishes() => Law.Holds(ThinCase.Any, c =>
    {
        ThinSolution solution = ThinPairTests.Solved(ThinPair.Solve(c.Requirement(), c.Crown, c.Flint));
        double once = solution.DataFloor(DataQuality.UsualSupply);

        Assert.Equal(0.0, solution.DataFloor(new DataQuality(0.0, 0.0)));
        Assert.Equal(2.0 * once, solution.DataFloor(new DataQuality(2.0 * DataQuality.UsualSupply.AbbeTolerance, 2.0 * DataQuality.UsualSupply.IndexPrecision)), 1e-12 * once);
        Assert.Equal(double.Hypot(solution.RmsFocalShift, once), solution.ExpectedRmsFocalShift(DataQuality.UsualSupply), 1e-12 * once);
        Assert.True(once > 0.0);
    });
}
