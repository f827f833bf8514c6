using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Rankings;

public sealed class PairRankingTests
{
    [Theory, MemberData(nameof(RankingCases.Names), MemberType = typeof(RankingCases))]
    public void Rank_PartOfTheCatalogue_IsThePlainRanking(string name)
    {
        ShortlistRequest request = RankingCases.All[name];
        IndexTable table = RankingCases.Every(7, request.Requirement.Band);
        PlainRanking plain = PlainRanking.Of(table, request);

        Shortlist shortlist = PairRanking.Rank(table, request);

        Assert.Equal(plain.Best(request).Select(PlainRanking.NameOf), shortlist.Candidates.Select(c => PlainRanking.NameOf(c.Solution)));
        Assert.Equal(plain.Dropped, shortlist.DroppedCombinations);
        Assert.Equal(plain.Examined, shortlist.CombinationsExamined);
        Assert.Equal(plain.Solutions.Count, shortlist.CombinationsFeasible);
        Assert.Equal(plain.Solutions.Count(s => s.Holds), shortlist.CombinationsHolding);
        Assert.NotEmpty(shortlist.Candidates);
    }

    [Theory, MemberData(nameof(RankingCases.Names), MemberType = typeof(RankingCases))]
    public void Rank_WholeCatalogue_ReasonsAndFeasibleAddUpToEveryPair(string name)
    {
        ShortlistRequest request = RankingCases.All[name];

        Shortlist shortlist = PairRanking.Rank(RankingCases.Every(1, request.Requirement.Band), request);

        long distinct = shortlist.DistinctGlasses;
        Assert.Equal(distinct * (distinct - 1) / 2, shortlist.CombinationsExamined);
        Assert.Equal(shortlist.CombinationsExamined, shortlist.CombinationsFeasible + shortlist.DroppedCombinations.Values.Sum());
        Assert.Equal(TestGlasses.All.Count, shortlist.GlassesConsidered + shortlist.DroppedGlasses.Length);
        Assert.InRange(shortlist.CombinationsHolding, 0, shortlist.CombinationsFeasible);
        Assert.Equal(Enumerable.Range(1, shortlist.Candidates.Length), shortlist.Candidates.Select(c => c.Rank));
    }

    // An index rounds to 2e-16; n − 1 in the divisor, the samples' differences and the powers together magnify that to less than 40 times.
    private const double RoundingPerPower = 1e-14;

    [Theory]
    [InlineData(ColorBalance.BandBalanced, RankBy.ColorResidual)]
    [InlineData(ColorBalance.EndsUnited, RankBy.ColorResidual)]
    [InlineData(ColorBalance.BandBalanced, RankBy.SecondarySpectrum)]
    [InlineData(ColorBalance.EndsUnited, RankBy.SecondarySpectrum)]
    public void Rank_AgainstDecimalsOf28Digits_HasTheSameFiguresAndOrder(ColorBalance balance, RankBy rankBy)
    {
        Requirement requirement = new(250.0, 6.0, RankingCases.Weighted) { Balance = balance };
        ShortlistRequest request = requirement.By(rankBy, ShortlistRequest.MaxTake);

        Shortlist shortlist = PairRanking.Rank(RankingCases.Every(28, request.Requirement.Band), request);

        Assert.True(shortlist.Candidates.Length > 1_000);
        double previous = 0.0;
        foreach (Candidate candidate in shortlist.Candidates)
        {
            (decimal rms, decimal secondary) = DecimalPair.Of(
                candidate.Solution.Elements[0].Glass, candidate.Solution.Elements[1].Glass, requirement.Band, balance)!.Value;
            double exact = 250.0 * (double)(rankBy == RankBy.ColorResidual ? rms : secondary);
            double key = rankBy == RankBy.ColorResidual ? candidate.Solution.RmsFocalShift : Math.Abs(candidate.Solution.SecondarySpectrum);
            double rounding = 250.0 * RoundingPerPower * candidate.Solution.SumOfPowers * candidate.Solution.SumOfPowers;
            Assert.Equal(exact, key, rounding);
            Assert.True(exact >= previous - rounding, $"{candidate.Name} stands too low.");
            previous = Math.Max(previous, exact);
        }
    }

    [Fact]
    public void Rank_MoreThanThereAre_GivesEveryFeasiblePairInOrder()
    {
        ShortlistRequest request = RankingCases.Objective.By(RankBy.ColorResidual, ShortlistRequest.MaxTake);
        IndexTable table = RankingCases.Every(40, request.Requirement.Band);

        Shortlist shortlist = PairRanking.Rank(table, request);

        Assert.Equal(PlainRanking.Of(table, request).Solutions.Select(PlainRanking.NameOf), shortlist.Candidates.Select(c => PlainRanking.NameOf(c.Solution)));
        Assert.Equal(shortlist.CombinationsFeasible, shortlist.Candidates.Length);
    }

    [Theory]
    [InlineData(1)]
    [InlineData(3)]
    public void Rank_FewPairsPerGlass_IsTheGreedyChoiceEvenWhereItReachesDeep(int pairsPerGlass)
    {
        // Two glasses lead most of the best pairs, so that the choice runs far past the first pool.
        ShortlistRequest request = (RankingCases.Objective with { ElementPowerLimit = 2.0 }).By(RankBy.ExpectedResidual, 60) with { PairsPerGlass = pairsPerGlass };
        IndexTable table = RankingCases.Every(4, request.Requirement.Band);
        PlainRanking plain = PlainRanking.Of(table, request);
        string[] expected = [.. plain.Best(request).Select(PlainRanking.NameOf)];
        int depth = plain.Solutions.FindIndex(s => PlainRanking.NameOf(s) == expected[^1]);
        Assert.True(depth > 1_000, $"The last choice stands at {depth}: the check says little.");

        Assert.Equal(expected, PairRanking.Rank(table, request).Candidates.Select(c => PlainRanking.NameOf(c.Solution)));
    }

    [Fact]
    public void Rank_GlassesInAnotherOrder_IsTheSame()
    {
        ShortlistRequest request = RankingCases.Objective.By(RankBy.ColorResidual, 100);
        IndexTable backwards = IndexTable.Of(TestGlasses.All.Reverse(), request.Requirement.Band);

        Assert.Equal(
            PairRanking.Rank(RankingCases.Every(1, request.Requirement.Band), request).Candidates.Select(c => c.Name),
            PairRanking.Rank(backwards, request).Candidates.Select(c => c.Name));
    }

    [Fact]
    public void Rank_Twins_StandOnceUnderTheFirstNameWithTheOthersNamed()
    {
        Glass flint = TestGlasses.Named("schott/F2");
        Glass[] glasses = [TestGlasses.Named("schott/N-BK7"), flint, Renamed(flint, "zeta", "Z"), Renamed(flint, "alpha", "A")];

        Shortlist shortlist = PairRanking.Rank(IndexTable.Of(glasses, RankingCases.Visible), RankingCases.Objective.By(RankBy.ColorResidual));

        Candidate only = Assert.Single(shortlist.Candidates);
        Assert.Equal("schott/N-BK7 + alpha/A", only.Name);
        Assert.Equal<string>(["schott/F2", "zeta/Z"], only.SameAs);
        Assert.Equal((4, 2, 1L), (shortlist.GlassesConsidered, shortlist.DistinctGlasses, shortlist.CombinationsExamined));
    }

    [Fact]
    public void Rank_FirstTwinExcluded_IsRankedUnderTheNext()
    {
        Glass flint = TestGlasses.Named("schott/F2");
        Glass[] glasses = [TestGlasses.Named("schott/N-BK7"), flint, Renamed(flint, "zeta", "Z"), Renamed(flint, "alpha", "A")];
        ShortlistRequest request = RankingCases.Objective.By(RankBy.ColorResidual) with
        {
            Limits = GlassLimits.None with { Exclude = GlassLimits.None.Exclude.Add("ALPHA/a") },
        };

        Shortlist shortlist = PairRanking.Rank(IndexTable.Of(glasses, RankingCases.Visible), request);

        Assert.Equal("schott/N-BK7 + schott/F2", Assert.Single(shortlist.Candidates).Name);
        Assert.Equal(GlassDropReason.Excluded, Assert.Single(shortlist.DroppedGlasses).Reason);
    }

    [Fact]
    public void Rank_TwinIncluded_CountsForTheGlassThatStandsForIt()
    {
        Glass flint = TestGlasses.Named("schott/F2");
        Glass[] glasses = [TestGlasses.Named("schott/N-BK7"), TestGlasses.Named("schott/SF1"), flint, Renamed(flint, "alpha", "A")];
        ShortlistRequest request = RankingCases.Objective.By(RankBy.ColorResidual) with
        {
            Limits = GlassLimits.None with { Include = GlassLimits.None.Include.Add("schott/F2") },
        };

        Shortlist shortlist = PairRanking.Rank(IndexTable.Of(glasses, RankingCases.Visible), request);

        Assert.All(shortlist.Candidates, c => Assert.Contains("alpha/A", c.Name, StringComparison.Ordinal));
        Assert.Equal(1, shortlist.DroppedCombinations[PairDropReason.NotIncluded]);
    }

    [Theory]
    [InlineData(PowerSign.Positive, "schott/N-LAK8 + schott/SF1")]
    [InlineData(PowerSign.Negative, "schott/N-BK7 + schott/N-LAK8")]
    public void Rank_GlassDemandedWithASign_StandsOnThatSideOnly(PowerSign sign, string pair)
    {
        Glass[] glasses = [TestGlasses.Named("schott/N-BK7"), TestGlasses.Named("schott/N-LAK8"), TestGlasses.Named("schott/SF1")];
        ShortlistRequest request = RankingCases.Objective.By(RankBy.ColorResidual) with
        {
            Limits = GlassLimits.None with { Include = GlassLimits.None.Include.Add("schott/N-LAK8"), IncludeAs = sign },
        };

        Shortlist shortlist = PairRanking.Rank(IndexTable.Of(glasses, RankingCases.Visible), request);

        Assert.Equal(pair, Assert.Single(shortlist.Candidates).Name);
    }

    [Fact]
    public void Rank_KeysEqualToTwelveDigits_BreakByPowersThenByName()
    {
        // The last bits of one coefficient: no twins, and figures that agree to far more than 12 digits.
        Glass flint = TestGlasses.Named("schott/F2");
        Glass[] flints = [.. new[] { "c", "a", "b" }.Select((maker, i) => Nudged(flint, maker, 1.0 + (i * 4e-16)))];
        ShortlistRequest request = RankingCases.Objective.By(RankBy.ColorResidual);

        Shortlist shortlist = PairRanking.Rank(IndexTable.Of([TestGlasses.Named("schott/N-BK7"), .. flints], RankingCases.Visible), request);

        Assert.Equal(4, shortlist.DistinctGlasses);
        Assert.Equal(["schott/N-BK7 + a/F2", "schott/N-BK7 + b/F2", "schott/N-BK7 + c/F2"], shortlist.Candidates.Take(3).Select(c => c.Name));
    }

    [Fact]
    public void Rank_InContact_PutsTheGlassOfMorePowerFirstEvenWhereItsAbbeNumberIsTheSmaller()
    {
        Band infrared = Band.Even(Wavelength.FromNanometers(1000.0), Wavelength.FromNanometers(1300.0), Wavelength.FromNanometers(2000.0), 13);

        Shortlist shortlist = PairRanking.Rank(
            RankingCases.Every(12, infrared), new Requirement(100.0, 10.0, infrared).By(RankBy.ColorResidual, ShortlistRequest.MaxTake));

        Assert.Contains(shortlist.Candidates, c => c.Solution.Elements[0].AbbeNumber < c.Solution.Elements[1].AbbeNumber);
        Assert.All(shortlist.Candidates, c => Assert.True(c.Solution.RelativePowers[0] > 0.0 && c.Solution.RelativePowers[0] >= c.Solution.RelativePowers[1], c.Name));
    }

    [Fact]
    public void Rank_FocalLengthDoubled_KeepsTheOrderAndDoublesTheResidual()
    {
        ShortlistRequest once = RankingCases.Objective.By(RankBy.ColorResidual, 100);
        ShortlistRequest twice = new Requirement(640.0, 8.0, RankingCases.Visible).By(RankBy.ColorResidual, 100);
        IndexTable table = RankingCases.Every(5, RankingCases.Visible);

        // a factor of 2 rounds nothing
        Assert.Equal(
            PairRanking.Rank(table, once).Candidates.Select(c => (c.Name, 2.0 * c.Solution.RmsFocalShift)),
            PairRanking.Rank(table, twice).Candidates.Select(c => (c.Name, c.Solution.RmsFocalShift)));
    }

    [Fact]
    public void Rank_OneGlassOrNone_GivesAnEmptyShortlist()
    {
        foreach (int count in new[] { 0, 1 })
        {
            Shortlist shortlist = PairRanking.Rank(
                IndexTable.Of(TestGlasses.All.Take(count), RankingCases.Visible), RankingCases.Objective.By(RankBy.ColorResidual));

            Assert.Empty(shortlist.Candidates);
            Assert.Equal((0L, 0L), (shortlist.CombinationsExamined, shortlist.CombinationsFeasible));
        }
    }

    [Fact]
    public void Rank_TableOfAnotherBand_IsRefused() =>
        Assert.Throws<ArgumentException>(() => PairRanking.Rank(RankingCases.Every(40, RankingCases.Weighted), RankingCases.Objective.By(RankBy.ColorResidual)));

    [Theory]
    [InlineData(0, 1)]
    [InlineData(-1, 1)]
    [InlineData(ShortlistRequest.MaxTake + 1, 1)]
    [InlineData(1, 0)]
    public void Rank_NumbersOutOfRange_AreRefused(int take, int pairsPerGlass) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => PairRanking.Rank(
            RankingCases.Every(40, RankingCases.Visible), RankingCases.Objective.By(RankBy.ColorResidual, take) with { PairsPerGlass = pairsPerGlass }));

    [Fact]
    public void Rank_Cancelled_Stops()
    {
        using var source = new CancellationTokenSource();
        source.Cancel();

        Assert.Throws<OperationCanceledException>(() =>
            PairRanking.Rank(RankingCases.Every(40, RankingCases.Visible), RankingCases.Objective.By(RankBy.ColorResidual), source.Token));
    }

    private static Glass Renamed(Glass glass, string maker, string name) => new(maker, name, glass.Formula, glass.Range);

    private static Glass Nudged(Glass glass, string maker, double factor)
    {
        ImmutableArray<SellmeierTerm> terms = Assert.IsType<SellmeierFormula>(glass.Formula).Terms;
        return new Glass(maker, glass.Name, new SellmeierFormula(terms.SetItem(0, terms[0] with { Strength = terms[0].Strength * factor })), glass.Range);
    }
}
