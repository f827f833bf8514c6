using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearRegression;

namespace GlassPair.Optics.Tests.Color;

public sealed class ThinTripletTests
{
    [Fact]
    public void Solve_EndsUnited_BringsThreeWavelengthsToOneFocus() => Law.Holds(ThinCase.Any, c =>
    {
        if (ThinTriplet.Solve(c.Requirement(ColorBalance.EndsUnited), c.Crown, c.Middle, c.Flint) is not ThinSolution solution)
        {
            return; // three glasses on one line, to within the limit of the powers
        }

        double rounding = 1e-14 * c.FocalLength * solution.SumOfPowers;
        Assert.Equal(0.0, solution.ShortShift, rounding);
        Assert.Equal(0.0, solution.LongShift, rounding);
        Assert.Equal(1.0, solution.RelativePowers.Sum(), 1e-14 * solution.SumOfPowers);
    });

    [Fact]
    public void Solve_BandBalanced_EqualsRegressionOfMathNet() => Law.Holds(ThinCase.Any, c =>
    {
        if (c.Band.Samples.Count(s => s.Weight > 0.0) < 4)
        {
            return; // three samples are nulled exactly, and the variance of rounding has no minimum
        }

        ThinSolution solution = ThinPairTests.Solved(ThinTriplet.Solve(c.Requirement(), c.Crown, c.Middle, c.Flint));
        double[] roots = [.. c.Band.Samples.Select(s => Math.Sqrt(s.Weight))];
        GlassIndices[] others = [c.Middle, c.Flint];
        var columns = Matrix<double>.Build.Dense(roots.Length, 3, (i, j) => roots[i] * (j == 0 ? 1.0 : c.Crown.Changes[i] - others[j - 1].Changes[i]));
        var target = Vector<double>.Build.Dense(roots.Length, i => roots[i] * c.Crown.Changes[i]);
        Vector<double> expected = MultipleRegression.QR(columns, target);

        Assert.Equal(expected[1], solution.RelativePowers[1], 1e-8 * solution.SumOfPowers);
        Assert.Equal(expected[2], solution.RelativePowers[2], 1e-8 * solution.SumOfPowers);
    });

    [Fact]
    public void Solve_BandBalanced_LeavesNoMoreThanEachOfItsPairs() => Law.Holds(ThinCase.Any, c =>
    {
        GlassIndices[] glasses = [c.Crown, c.Middle, c.Flint];
        if (ThinTriplet.Solve(c.Requirement(), glasses[0], glasses[1], glasses[2]) is not ThinSolution triplet)
        {
            return;
        }

        double least = c.VarianceOf([.. triplet.RelativePowers.Zip(glasses)]);
        foreach ((int i, int j) in new[] { (0, 1), (0, 2), (1, 2) })
        {
            ThinSolution pair = ThinPairTests.Solved(ThinPair.Solve(c.Requirement(), glasses[i], glasses[j]));
            Assert.True(least <= c.VarianceOf((pair.RelativePowers[0], glasses[i]), (pair.RelativePowers[1], glasses[j])) * (1.0 + 1e-9));
        }
    });

    [Fact]
    public void Solve_OrderOfGlasses_DoesNotMatter() => Law.Holds(ThinCase.Any, c =>
    {
        ThinOutcome once = ThinTriplet.Solve(c.Requirement(), c.Crown, c.Middle, c.Flint);
        ThinOutcome turned = ThinTriplet.Solve(c.Requirement(), c.Flint, c.Crown, c.Middle);

        if (once is ThinSolution first && first.LargestElementPower < 100.0)
        {
            ThinSolution second = ThinPairTests.Solved(turned);
            Assert.Equal(first.RelativePowers[0], second.RelativePowers[1], 1e-7 * first.SumOfPowers);
            Assert.Equal(first.RelativePowers[2], second.RelativePowers[0], 1e-7 * first.SumOfPowers);
        }
    });

    [Fact]
    public void Solve_GlassTwice_HasNoSolution() => Law.Holds(ThinCase.Any, c =>
    {
        foreach (ColorBalance balance in Enum.GetValues<ColorBalance>())
        {
            Assert.Equal(
                NoThinSolutionReason.DispersionsAlike,
                Assert.IsType<NoThinSolution>(ThinTriplet.Solve(c.Requirement(balance), c.Crown, c.Flint, c.Flint)).Reason);
        }
    });

    [Fact]
    public void Solve_AirSpace_Throws() => Law.Holds(ThinCase.Any, c =>
        Assert.Throws<ArgumentException>(() => ThinTriplet.Solve(c.Requirement(ColorBalance.BandBalanced, 0.01 * c.FocalLength), c.Crown, c.Middle, c.Flint)), cases: 1);
}
