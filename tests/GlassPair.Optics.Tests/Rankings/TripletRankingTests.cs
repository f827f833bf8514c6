using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Rankings;

public sealed class TripletRankingTests
{
    public static TheoryData<ColorBalance, RankBy, double, int?> Cases
    {
        get
        {
            TheoryData<ColorBalance, RankBy, double, int?> data = [];
            foreach (ColorBalance balance in Enum.GetValues<ColorBalance>())
            {
                foreach (RankBy rankBy in Enum.GetValues<RankBy>())
                {
                    data.Add(balance, rankBy, 4.0, null);
                    data.Add(balance, rankBy, 10.0, 2);
                }
            }

            return data;
        }
    }

    [Theory, MemberData(nameof(Cases))]
    public void Rank_PartOfTheCatalogue_IsThePlainRanking(ColorBalance balance, RankBy rankBy, double limit, int? perGlass)
    {
        var requirement = new Requirement(320.0, 8.0, RankingCases.Weighted) { Balance = balance, ElementPowerLimit = limit };
        ShortlistRequest request = Three(requirement, rankBy) with { PairsPerGlass = perGlass };
        Compare(RankingCases.Every(40, requirement.Band), request);
    }

    [Fact]
    public void Rank_LimitsOnExpansionAndGlassesToInclude_IsThePlainRanking()
    {
        IndexTable table = RankingCases.Every(40, RankingCases.Visible);
        ShortlistRequest request = Three(RankingCases.Objective with { ElementPowerLimit = 10.0 }, RankBy.ColorResidual) with
        {
            Limits = new GlassLimits
            {
                ExpansionDifference = 3e-6,
                Include = GlassLimits.None.Include.Union(table.Rows.Where((_, i) => i % 5 == 0).Select(r => r.Glass.Id)),
            },
        };
        Compare(table, request);
        Assert.Equal(
            [PairDropReason.NotIncluded, PairDropReason.ElementPower, PairDropReason.ExpansionDifference, PairDropReason.ExpansionUnknown],
            TripletRanking.Rank(table, request).DroppedCombinations.Keys.Where(r => r != PairDropReason.DispersionsAlike));
    }

    [Fact]
    public void Rank_BestTriplet_LeavesNoMoreThanTheBestPair()
    {
        // A pair is a triplet whose third power is zero; the third glass can only help.
        var requirement = new Requirement(320.0, 8.0, RankingCases.Visible) { ElementPowerLimit = 4.0 };
        IndexTable table = RankingCases.Every(20, requirement.Band);

        Candidate triplet = TripletRanking.Rank(table, Three(requirement, RankBy.ColorResidual)).Candidates[0];
        Candidate pair = PairRanking.Rank(table, requirement.By(RankBy.ColorResidual)).Candidates[0];

        Assert.True(triplet.Solution.RmsFocalShift < pair.Solution.RmsFocalShift);
    }

    [Fact]
    public void Rank_NoLimitOnPower_TakesTheUsualOneAndSaysSo()
    {
        IndexTable table = RankingCases.Every(40, RankingCases.Visible);

        Shortlist shortlist = TripletRanking.Rank(table, Three(RankingCases.Objective, RankBy.ColorResidual));

        Assert.Equal(TripletRanking.UsualPowerLimit, shortlist.Request.Requirement.ElementPowerLimit);
        Assert.All(shortlist.Candidates, c => Assert.InRange(c.Solution.LargestElementPower, 0.0, TripletRanking.UsualPowerLimit));
        Assert.True(shortlist.DroppedCombinations[PairDropReason.ElementPower] > 0);
    }

    [Fact]
    public void Rank_Shown_StandsByFallingPower() =>
        Assert.All(
            TripletRanking.Rank(RankingCases.Every(30, RankingCases.Visible), Three(RankingCases.Objective, RankBy.ExpectedResidual)).Candidates,
            c => Assert.Equal(c.Solution.RelativePowers.OrderDescending(), c.Solution.RelativePowers));

    [Fact]
    public void Rank_FewerThanThreeGlasses_GivesAnEmptyShortlist()
    {
        Shortlist shortlist = TripletRanking.Rank(
            IndexTable.Of(TestGlasses.All.Take(2), RankingCases.Visible), Three(RankingCases.Objective, RankBy.ColorResidual));

        Assert.Empty(shortlist.Candidates);
        Assert.Equal(0, shortlist.CombinationsExamined);
    }

    [Fact]
    public void FindFault_AirSpaceOrThreeSamples_SaysWhyAndRankRefuses()
    {
        Band three = Band.Even(SpectralLine.HydrogenF.Wavelength, SpectralLine.HeliumD.Wavelength, SpectralLine.HydrogenC.Wavelength, 3);
        ShortlistRequest[] refused =
        [
            Three(RankingCases.Objective with { AirSpace = 2.0 }, RankBy.ColorResidual),
            Three(new Requirement(320.0, 8.0, three), RankBy.ColorResidual),
        ];

        Assert.All(refused, r => Assert.NotNull(TripletRanking.FindFault(r)));
        Assert.All(refused, r => Assert.Throws<ArgumentException>(() => TripletRanking.Rank(RankingCases.Every(40, r.Requirement.Band), r)));
        Assert.Null(TripletRanking.FindFault(Three(new Requirement(320.0, 8.0, three) { Balance = ColorBalance.EndsUnited }, RankBy.ColorResidual)));
    }

    [Fact]
    public void Rank_NumberOfElementsOfTheOtherRanking_IsRefused()
    {
        IndexTable table = RankingCases.Every(40, RankingCases.Visible);

        Assert.Throws<ArgumentException>(() => PairRanking.Rank(table, Three(RankingCases.Objective, RankBy.ColorResidual)));
        Assert.Throws<ArgumentException>(() => TripletRanking.Rank(table, RankingCases.Objective.By(RankBy.ColorResidual)));
        Assert.Throws<ArgumentOutOfRangeException>(() => RankingCases.Objective.By(RankBy.ColorResidual) with { Elements = 4 });
    }

    [Fact]
    public void Rank_Cancelled_Stops()
    {
        using var source = new CancellationTokenSource();
        source.Cancel();

        Assert.Throws<OperationCanceledException>(() =>
            TripletRanking.Rank(RankingCases.Every(40, RankingCases.Visible), Three(RankingCases.Objective, RankBy.ColorResidual), source.Token));
    }

    private static ShortlistRequest Three(Requirement requirement, RankBy rankBy) => requirement.By(rankBy) with { Elements = 3 };

    private static void Compare(IndexTable table, ShortlistRequest request)
    {
        PlainRanking plain = PlainRanking.Of(table, request);
        Assert.True(plain.Solutions.Count > 100, $"Only {plain.Solutions.Count} are feasible: the check says little.");

        Shortlist shortlist = TripletRanking.Rank(table, request);

        Assert.Equal(plain.Best(request).Select(PlainRanking.NameOf), shortlist.Candidates.Select(c => PlainRanking.NameOf(c.Solution)));
        Assert.Equal(plain.Dropped, shortlist.DroppedCombinations);
        Assert.Equal(plain.Examined, shortlist.CombinationsExamined);
        Assert.Equal(plain.Solutions.Count, shortlist.CombinationsFeasible);
        Assert.Equal(plain.Solutions.Count(s => s.Holds), shortlist.CombinationsHolding);
        Assert.Equal(shortlist.CombinationsExamined, shortlist.CombinationsFeasible + shortlist.DroppedCombinations.Values.Sum());
    }
}
