using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Color;

public sealed class PartnerWedgeTests
{
    private const double ByAHair = 1e-9;

    private static readonly Band s_visible = Band.Even(TestGlasses.Line("F").Wavelength, TestGlasses.Line("d").Wavelength, TestGlasses.Line("C").Wavelength, 9);
    private static readonly GlassIndices s_crown = GlassIndices.Of(TestGlasses.Named("schott/N-BK7"), s_visible);

    public static TheoryData<PublishedRow> Depths => Published.Theory("depth-of-focus.csv");

    [Theory, MemberData(nameof(Depths))]
    public void SteepestSlope_PublishedDepth_GivesTwiceItAsSecondarySpectrum(PublishedRow row)
    {
        Band band = Band.Even(TestGlasses.Line("F").Wavelength, Wavelength.FromNanometers(row.Number("nanometers")), TestGlasses.Line("C").Wavelength, 9);
        PartnerWedge wedge = PartnerWedge.Of(new Requirement(250.0, row.Number("f_number"), band), GlassIndices.Of(TestGlasses.Named("schott/N-BK7"), band));
        row.AssertPrints("micrometers", wedge.SteepestSlope * 250.0 / 2.0, unit: 1e-3);
    }

    [Theory, InlineData(0.0), InlineData(0.01), InlineData(0.04)]
    public void NearEdge_PartnerThere_HasTheLargestPowerAllowed(double space)
    {
        const double limit = 2.5;
        PartnerWedge wedge = PartnerWedge.Of(Asked(space, limit), s_crown);
        Assert.Equal(limit, LargestPower(s_crown.AbbeNumber, wedge.NegativePartnersBelow, space), 1e-6);
        Assert.Equal(limit, LargestPower(wedge.PositivePartnersAbove, s_crown.AbbeNumber, space), 1e-6);
    }

    [Fact]
    public void NearEdge_WideAirSpaceWithoutPowerLimit_IsWhereTheTwoSolutionsMeet()
    {
        const double space = 0.09;
        PartnerWedge wedge = PartnerWedge.Of(Asked(space, null), s_crown);
        Assert.Equal(100.0 * space, ThinPair.LargestAirSpace(100.0, s_crown.AbbeNumber, wedge.NegativePartnersBelow), 1e-9);
    }

    [Fact]
    public void HalfWidthAt_InContact_GrowsInAStraightLineFromTheGlass()
    {
        PartnerWedge wedge = PartnerWedge.Of(Asked(0.0, 3.0), s_crown);
        foreach (double abbe in new[] { 20.0, 30.0, 42.0, 97.0, 120.0 })
        {
            Assert.Equal(wedge.SteepestSlope * Math.Abs(abbe - s_crown.AbbeNumber), wedge.HalfWidthAt(abbe)!.Value, 1e-12);
        }
    }

    [Theory, InlineData(0.0), InlineData(0.03)]
    public void HalfWidthAt_OutsideTheEdges_IsNone(double space)
    {
        PartnerWedge wedge = PartnerWedge.Of(Asked(space, 3.0), s_crown);
        Assert.NotNull(wedge.HalfWidthAt(wedge.NegativePartnersBelow * (1.0 - ByAHair)));
        Assert.Null(wedge.HalfWidthAt(wedge.NegativePartnersBelow * (1.0 + ByAHair)));
        Assert.Null(wedge.HalfWidthAt(s_crown.AbbeNumber));
        Assert.Null(wedge.HalfWidthAt(wedge.PositivePartnersAbove * (1.0 - ByAHair)));
        Assert.NotNull(wedge.HalfWidthAt(wedge.PositivePartnersAbove * (1.0 + ByAHair)));
        Assert.Null(wedge.HalfWidthAt(0.0));
        Assert.Null(wedge.HalfWidthAt(double.NaN));
    }

    [Theory, InlineData(0.0), InlineData(0.02)]
    public void HalfWidthAt_RealPartner_SeparatesByTheSecondarySpectrumOfUnitedEnds(double space)
    {
        var requirement = new Requirement(100.0, 4.8, s_visible) { AirSpace = space * 100.0, ElementPowerLimit = 3.0 };
        PartnerWedge wedge = PartnerWedge.Of(requirement, s_crown);
        int inside = 0;
        int outside = 0;
        foreach (Glass glass in TestGlasses.All.Where(g => g.Covers(s_visible)))
        {
            GlassIndices partner = GlassIndices.Of(glass, s_visible);
            if (wedge.HalfWidthAt(partner.AbbeNumber) is { } half)
            {
                bool isInside = Math.Abs(partner.PartialDispersion - s_crown.PartialDispersion) <= half;
                Assert.Equal(isInside, Math.Abs(Chord.SecondarySpectrum(requirement, s_crown, partner)!.Value) <= 2.0 * requirement.DepthOfFocus);
                (inside, outside) = isInside ? (inside + 1, outside) : (inside, outside + 1);
            }
        }

        Assert.True(inside > 0 && outside > 0, $"{inside} inside, {outside} outside: the requirement tells nothing apart.");
    }

    private static Requirement Asked(double space, double? powerLimit) =>
        new(100.0, 4.0, s_visible) { AirSpace = space * 100.0, ElementPowerLimit = powerLimit };

    /// <summary>The powers of the textbook condition, from the equations Σ yᵢ φᵢ = Φ and Σ yᵢ² φᵢ/Vᵢ = 0 put in by hand.</summary>
    private static double LargestPower(double positiveAbbe, double negativeAbbe, double space)
    {
        double b = 1.0 + space - (negativeAbbe / positiveAbbe);
        double first = space == 0.0 ? 1.0 / b : (b - Math.Sqrt((b * b) - (4.0 * space))) / (2.0 * space);
        double height = 1.0 - (space * first);
        double second = (1.0 - first) / height;
        Assert.Equal(0.0, (first / positiveAbbe) + (height * height * second / negativeAbbe), 1e-9);
        return Math.Max(Math.Abs(first), Math.Abs(second));
    }
}
