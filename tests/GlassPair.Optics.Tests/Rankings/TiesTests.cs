using System.Collections.Immutable;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Rankings;

public sealed class TiesTests
{
    /// <summary>r, F, r', F' of two pairs, the first the one judged.</summary>
    public static TheoryData<double, double, double, double> Pairs => new()
    {
        { 10.0, 15.0, 10.0, 15.0 },
        { 14.0, 15.0, 10.0, 15.0 },
        { 20.0, 20.0, 12.7, 15.3 },
        { 5.0, 40.0, 25.0, 3.0 },
        { 25.0, 3.0, 5.0, 40.0 },
        { 10.1, 0.01, 10.0, 0.01 },
    };

    [Theory, MemberData(nameof(Pairs))]
    public void ChanceOfBeingBetter_AgreesWithThrowingDice(double residual, double floor, double otherResidual, double otherFloor)
    {
        const int throws = 400_000;
        const double fiveSigma = 5.0 * 0.5 / 632.0;   // of a chance near one half from so many throws
        var random = new Random(20260101);
        double Normal() => Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
        double Made(double r, double f, double z) => (r * r) + (f * f * z * z);

        int better = 0;
        for (int i = 0; i < throws; i++)
        {
            better += Made(residual, floor, Normal()) < Made(otherResidual, otherFloor, Normal()) ? 1 : 0;
        }

        Assert.Equal((double)better / throws, Ties.ChanceOfBeingBetter(residual, floor, otherResidual, otherFloor), fiveSigma);
    }

    /// <summary>With equal residuals only the floors decide: the ratio of two normal deviates is Cauchy, whose distribution is an arc tangent (any text on probability).</summary>
    [Theory]
    [InlineData(1.0, 1.0)]
    [InlineData(1.0, 3.0)]
    [InlineData(5.0, 0.2)]
    public void ChanceOfBeingBetter_EqualResiduals_IsTheArcTangent(double floor, double otherFloor) =>
        Assert.Equal(2.0 / Math.PI * Math.Atan(otherFloor / floor), Ties.ChanceOfBeingBetter(7.0, floor, 7.0, otherFloor), 1e-12);

    [Theory, MemberData(nameof(Pairs))]
    public void ChanceOfBeingBetter_BothWays_SumsToOne(double residual, double floor, double otherResidual, double otherFloor) => Assert.Equal(
        1.0,
        Ties.ChanceOfBeingBetter(residual, floor, otherResidual, otherFloor) + Ties.ChanceOfBeingBetter(otherResidual, otherFloor, residual, floor),
        1e-9);

    [Theory]
    [InlineData(1.0, 2.0, 1.0)]
    [InlineData(2.0, 1.0, 0.0)]
    [InlineData(1.0, 1.0, 0.5)]
    public void ChanceOfBeingBetter_NothingUnknown_IsCertain(double residual, double otherResidual, double chance) =>
        Assert.Equal(chance, Ties.ChanceOfBeingBetter(residual, 0.0, otherResidual, 0.0));

    [Fact]
    public void Of_Ranking_GroupsWhatTheFirstCannotBeatTwoTimesInThree()
    {
        Shortlist shortlist = Rank(DataQuality.UsualSupply);

        ImmutableArray<Tie> ties = Ties.Of(shortlist.Candidates, DataQuality.UsualSupply);

        Assert.NotEmpty(ties);
        int next = 1;
        foreach (Tie tie in ties)
        {
            Assert.True(tie.First >= next && tie.Last > tie.First);
            for (int rank = tie.First + 1; rank <= tie.Last + 1 && rank <= shortlist.Candidates.Length; rank++)
            {
                double chance = Chance(shortlist.Candidates[rank - 1], shortlist.Candidates[tie.First - 1], DataQuality.UsualSupply);
                Assert.Equal(rank <= tie.Last, chance >= Ties.FairChance);
            }

            next = tie.Last + 1;
        }
    }

    [Fact]
    public void Of_BetterKnownGlass_TiesFewer()
    {
        var melt = new DataQuality(0.0, 1e-6);

        int usual = Ties.Of(Rank(DataQuality.UsualSupply).Candidates, DataQuality.UsualSupply)[0].Last;
        int known = Ties.Of(Rank(melt).Candidates, melt).Select(t => t.Last).FirstOrDefault(1);

        Assert.True(known < usual, $"{known} against {usual}");
    }

    private static double Chance(Candidate candidate, Candidate first, DataQuality quality) => Ties.ChanceOfBeingBetter(
        candidate.Solution.RmsFocalShift, candidate.Solution.DataFloor(quality), first.Solution.RmsFocalShift, first.Solution.DataFloor(quality));

    private static Shortlist Rank(DataQuality quality)
    {
        var band = Band.Even(SpectralLine.HydrogenF.Wavelength, SpectralLine.HeliumD.Wavelength, SpectralLine.HydrogenC.Wavelength, 9);
        return PairRanking.Rank(
            IndexTable.Of(TestGlasses.All, band),
            new ShortlistRequest(new Requirement(200.0, 8.0, band), GlassLimits.None, quality, RankBy.ExpectedResidual, 200));
    }
}
