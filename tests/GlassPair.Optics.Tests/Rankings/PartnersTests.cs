using GlassPair.Optics.Color;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Rankings;

public sealed class PartnersTests
{
    private static readonly Band s_band = Band.Even(TestGlasses.Line("g").Wavelength, TestGlasses.Line("e").Wavelength, TestGlasses.Line("C").Wavelength, 9);

    [Theory, InlineData("ohara/S-FPL53", 8.0, null), InlineData("schott/N-SF5", 16.0, null), InlineData("schott/N-FK58", 8.0, 7e-6)]
    public void HoldingWith_OneGlass_AreThoseOfTheRanking(string id, double fNumber, double? expansionDifference)
    {
        // One maker has hardly any twins, of which the ranking names one only.
        IndexTable table = IndexTable.Of(TestGlasses.All.Where(g => g.Maker == "schott" || g.Id == id), s_band);
        var requirement = new Requirement(200.0, fNumber, s_band) { ElementPowerLimit = 3.0 };
        GlassLimits limits = GlassLimits.None with { AllowLead = false, ExpansionDifference = expansionDifference };
        GlassIndices glass = table.Rows.Single(r => r.Glass.Id == id);
        Shortlist all = PairRanking.Rank(table, new ShortlistRequest(requirement, limits, DataQuality.UsualSupply, RankBy.ColorResidual, ShortlistRequest.MaxTake));
        SortedSet<string> expected = new(
            all.Candidates
                .Where(c => c.Solution.Holds && (c.Solution.Elements.Any(e => e.Glass.Id == id) || c.SameAs.Contains(id)))
                .SelectMany(c => c.Solution.Elements.Select(e => e.Glass.Id).Concat(c.SameAs)),
            StringComparer.Ordinal);
        expected.Remove(id);

        string[] found = [.. Partners.HoldingWith(table, requirement, limits, glass).Select(p => p.Glass.Id)];

        Assert.NotEmpty(found);
        Assert.Equal(all.Candidates.Length, all.CombinationsFeasible);
        Assert.Equal([.. expected], found);
    }

    [Fact]
    public void HoldingWith_GlassOutsideTheLimits_StillHasPartners()
    {
        IndexTable table = IndexTable.Of(TestGlasses.All.Where(g => g.Maker is "schott" or "hoya"), s_band);
        GlassLimits limits = GlassLimits.None with { Makers = ["hoya"] };
        GlassIndices glass = table.Rows.Single(r => r.Glass.Id == "schott/N-FK58");
        Assert.All(Partners.HoldingWith(table, new Requirement(200.0, 8.0, s_band), limits, glass), p => Assert.Equal("hoya", p.Glass.Maker));
        Assert.NotEmpty(Partners.HoldingWith(table, new Requirement(200.0, 8.0, s_band), limits, glass));
    }
}
