using System.Runtime.Intrinsics;
using GlassPair.Optics.Color;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Tests.Rankings;

public sealed class PairKernelTests
{
    public static TheoryData<int, string> LengthsAndCases
    {
        get
        {
            TheoryData<int, string> data = [];
            foreach (string name in RankingCases.All.Keys.Where(n => n.EndsWith("ColorResidual", StringComparison.Ordinal)))
            {
                foreach (int length in new[] { 0, 1, 3, 4, 5, 7, 8, 9, 1600 })
                {
                    data.Add(length, name);
                }
            }

            return data;
        }
    }

    [Fact]
    public void Widths_SwitchedOffInTheEnvironment_AreNotUsed()
    {
        // test.sh repeats these tests so; a switch under a new name would go unnoticed otherwise
        Assert.False(Vector512.IsHardwareAccelerated && (IsOff("DOTNET_EnableAVX512") || IsOff("DOTNET_EnableAVX2")));
        Assert.False(Vector256.IsHardwareAccelerated && IsOff("DOTNET_EnableAVX2"));

        static bool IsOff(string name) => Environment.GetEnvironmentVariable(name) == "0";
    }

    [Theory, MemberData(nameof(LengthsAndCases))]
    public void FillVector_AnyNumberOfGlasses_EqualsScalarTwinBitForBit(int length, string name)
    {
        Requirement requirement = RankingCases.All[name].Requirement;
        GlassIndices[] rows = [.. RankingCases.Every(1, requirement.Band).Rows];
        // to reach 1,600 over a band that fewer glasses cover, the rest stand there twice: a pair of equal dispersions has no solution
        var glasses = new GlassColumns(requirement, DataQuality.UsualSupply, rows.Concat(rows).Take(length));
        (RowFigures scalar, RowFigures eight, RowFigures four) = (new(glasses, 2), new(glasses, 2), new(glasses, 2));
        // the shortest row and the longest are among them
        for (int front = 0; front < glasses.Count; front += 1 + (glasses.Count / 40))
        {
            PairKernel.FillScalar(glasses, front, scalar);
            PairKernel.FillVector<Lanes512>(glasses, front, eight);
            PairKernel.FillVector<Lanes256>(glasses, front, four);
            for (int rear = front + 1; rear < glasses.Count; rear++)
            {
                double[] expected = Figures(scalar, rear, requirement);
                Assert.True(expected.SequenceEqual(Figures(eight, rear, requirement)), $"Eight lanes, pair {front} {rear}");
                Assert.True(expected.SequenceEqual(Figures(four, rear, requirement)), $"Four lanes, pair {front} {rear}");
            }
        }
    }

    [Theory, MemberData(nameof(RankingCases.Names), MemberType = typeof(RankingCases))]
    public void Fill_EveryPair_EqualsTheSolverBitForBit(string name)
    {
        ShortlistRequest request = RankingCases.All[name];
        Requirement requirement = request.Requirement;
        var glasses = new GlassColumns(requirement, request.Quality, RankingCases.Every(12, requirement.Band).Rows);
        var row = new RowFigures(glasses, 2);
        int solved = 0;
        for (int front = 0; front < glasses.Count; front++)
        {
            PairKernel.Fill(glasses, front, row);
            for (int rear = front + 1; rear < glasses.Count; rear++)
            {
                if (PairRanking.Solve(requirement, glasses.Glasses[front], glasses.Glasses[rear]) is not ThinSolution solution)
                {
                    Assert.Equal(double.NaN, row.Powers[0][rear]);
                    continue;
                }

                solved++;
                int first = solution.Elements[0] == glasses.Glasses[front] ? 0 : 1;
                Assert.Equal([solution.RelativePowers[first], solution.RelativePowers[1 - first]], [row.Powers[0][rear], row.Powers[1][rear]]);
                if (!(solution.LargestElementPower > requirement.ElementPowerLimit))
                {
                    Assert.Equal(
                        [solution.RmsFocalShift, solution.PeakToValleyFocalShift, solution.SecondarySpectrum, solution.ExpectedRmsFocalShift(request.Quality)],
                        [row.Rms[rear], row.PeakToValley[rear], row.SecondarySpectrum[rear], row.ExpectedRms[rear]]);
                }
            }
        }

        Assert.True(solved > 500, $"Only {solved} pairs have a solution: the check says little.");
    }

    /// <summary>The figures of one pair; past the power limit only the powers are defined, and without powers nothing is.</summary>
    private static double[] Figures(RowFigures row, int rear, Requirement requirement)
    {
        (double p1, double p2) = (row.Powers[0][rear], row.Powers[1][rear]);
        return !double.IsFinite(p1) || Math.Max(Math.Abs(p1), Math.Abs(p2)) > requirement.ElementPowerLimit
            ? [p1, p2]
            : [p1, p2, row.Rms[rear], row.PeakToValley[rear], row.SecondarySpectrum[rear], row.ExpectedRms[rear]];
    }
}
