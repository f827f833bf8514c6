using GlassPair.Optics.Color;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Tests.Rankings;

public sealed class TripletKernelTests
{
    [Theory]
    [InlineData(ColorBalance.BandBalanced)]
    [InlineData(ColorBalance.EndsUnited)]
    public void FillVector_AnyNumberOfThirdGlasses_EqualsScalarTwinBitForBit(ColorBalance balance)
    {
        Requirement requirement = new(320.0, 8.0, RankingCases.Weighted) { Balance = balance, ElementPowerLimit = 4.0 };
        GlassIndices[] rows = [.. RankingCases.Every(1, requirement.Band).Rows];
        foreach (int length in new[] { 0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 1600 })
        {
            // past the catalogue's number glasses stand there twice: with one of them a second time no triplet has a solution
            var glasses = new GlassColumns(requirement, DataQuality.UsualSupply, rows.Concat(rows).Take(length));
            var kernel = new TripletKernel(glasses);
            (RowFigures scalar, RowFigures eight, RowFigures four) = (new(glasses, 3), new(glasses, 3), new(glasses, 3));
            int step = 1 + (glasses.Count / 6);
            for (int first = 0; first < glasses.Count; first += step)
            {
                for (int second = first + 1; second < glasses.Count; second += step)
                {
                    var row = new Row(first, second);
                    kernel.FillScalar(row, scalar);
                    kernel.FillVector<Lanes512>(row, eight);
                    kernel.FillVector<Lanes256>(row, four);
                    for (int third = row.Start; third < glasses.Count; third++)
                    {
                        double[] expected = Figures(scalar, third, requirement);
                        Assert.True(expected.SequenceEqual(Figures(eight, third, requirement)), $"Eight lanes, triplet {first} {second} {third}");
                        Assert.True(expected.SequenceEqual(Figures(four, third, requirement)), $"Four lanes, triplet {first} {second} {third}");
                    }
                }
            }
        }
    }

    [Theory]
    [InlineData(ColorBalance.BandBalanced)]
    [InlineData(ColorBalance.EndsUnited)]
    public void Fill_EveryTriplet_EqualsTheSolverBitForBit(ColorBalance balance)
    {
        Requirement requirement = new(320.0, 8.0, RankingCases.Visible) { Balance = balance, ElementPowerLimit = 6.0 };
        var glasses = new GlassColumns(requirement, DataQuality.UsualSupply, RankingCases.Every(25, requirement.Band).Rows);
        var kernel = new TripletKernel(glasses);
        var figures = new RowFigures(glasses, 3);
        (int whole, int turned) = (0, 0);
        for (int first = 0; first < glasses.Count; first++)
        {
            for (int second = first + 1; second < glasses.Count; second++)
            {
                var row = new Row(first, second);
                kernel.Fill(row, figures);
                for (int third = row.Start; third < glasses.Count; third++)
                {
                    GlassIndices[] three = [glasses.Glasses[first], glasses.Glasses[second], glasses.Glasses[third]];
                    if (TripletRanking.Solve(requirement, three) is not ThinSolution solution)
                    {
                        Assert.True(double.IsNaN(figures.Powers[0][third]));
                        continue;
                    }

                    Assert.Equal(three.Select(g => solution.RelativePowers[solution.Elements.IndexOf(g)]), figures.Powers.Select(p => p[third]));
                    if (solution.LargestElementPower <= requirement.ElementPowerLimit)
                    {
                        whole++;
                        turned += solution.Elements.SequenceEqual(three) ? 0 : 1;
                        Assert.Equal(
                            [solution.RmsFocalShift, solution.PeakToValleyFocalShift, solution.SecondarySpectrum, solution.ExpectedRmsFocalShift(DataQuality.UsualSupply)],
                            [figures.Rms[third], figures.PeakToValley[third], figures.SecondarySpectrum[third], figures.ExpectedRms[third]]);
                    }
                }
            }
        }

        Assert.True(whole > 300 && turned > 100, $"{whole} triplets within the limit, {turned} not by falling power: the check says little.");
    }

    private static double[] Figures(RowFigures row, int third, Requirement requirement)
    {
        double[] powers = [.. row.Powers.Select(p => p[third])];
        return powers.All(p => Math.Abs(p) <= requirement.ElementPowerLimit)
            ? [.. powers, row.Rms[third], row.PeakToValley[third], row.SecondarySpectrum[third], row.ExpectedRms[third]]
            : powers;
    }
}
