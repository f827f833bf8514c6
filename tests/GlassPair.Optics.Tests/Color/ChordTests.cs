using CsCheck;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Color;

public sealed class ChordTests
{
    /// <summary>In contact the chord leaves out only s² of s/(1 + s), with s the secondary spectrum in units of the focal length.</summary>
    private const double InContact = 0.005;

    private static readonly Band s_visible = Band.Even(TestGlasses.Line("F").Wavelength, TestGlasses.Line("d").Wavelength, TestGlasses.Line("C").Wavelength, 9);

    public static TheoryData<PublishedRow> Rule => Published.Theory("secondary-spectrum-rule.csv");

    [Theory, MemberData(nameof(Rule))]
    public void SecondarySpectrum_UsualPair_IsThatOfTheRule(PublishedRow row)
    {
        var requirement = new Requirement(1000.0, 10.0, s_visible);
        double spectrum = Chord.SecondarySpectrum(requirement, Over(row["front"]), Over(row["rear"]))!.Value;
        Assert.Equal(-row.Number("fraction_of_f"), spectrum / 1000.0, row.Number("allowed"));
    }

    [Fact]
    public void SecondarySpectrum_AnyPairAndAirSpace_IsThatOfUnitedEnds() => Law.Holds(
        from i in Gen.Int[0, TestGlasses.All.Count - 1]
        from j in Gen.Int[0, TestGlasses.All.Count - 1]
        from space in Gen.Double[0.0, 0.05]
        select (i, j, space),
        c =>
        {
            (Glass a, Glass b) = (TestGlasses.All[c.i], TestGlasses.All[c.j]);
            if (!a.Covers(s_visible) || !b.Covers(s_visible))
            {
                return;
            }

            (GlassIndices front, GlassIndices rear) = (GlassIndices.Of(a, s_visible), GlassIndices.Of(b, s_visible));
            (front, rear) = front.AbbeNumber >= rear.AbbeNumber ? (front, rear) : (rear, front);
            var requirement = new Requirement(100.0, 10.0, s_visible) { Balance = ColorBalance.EndsUnited, AirSpace = c.space * 100.0 };
            double? spectrum = Chord.SecondarySpectrum(requirement, rear, front);
            if (ThinPair.Solve(requirement, front, rear) is ThinSolution { LargestElementPower: < 5.0 } solution)
            {
                // An air space adds products of the two relative changes of power, p₁/V₁ each.
                double change = solution.RelativePowers[0] / front.AbbeNumber;
                double products = 400.0 * c.space * change * change;
                Assert.Equal(solution.SecondarySpectrum, spectrum!.Value, (InContact * Math.Abs(solution.SecondarySpectrum)) + products + 1e-9);
            }
        });

    [Fact]
    public void SlopeOf_InContact_TimesFocalLengthIsSecondarySpectrum()
    {
        (GlassIndices a, GlassIndices b) = (Over("schott/N-BK7"), Over("schott/F2"));
        double slope = Chord.SlopeOf(a, b)!.Value;
        Assert.Equal(slope, Chord.SlopeOf(b, a)!.Value);
        Assert.Equal(Chord.SecondarySpectrum(new Requirement(320.0, 8.0, s_visible), a, b)!.Value, 320.0 * slope, 1e-12);
    }

    [Fact]
    public void SlopeOf_GlassWithItself_IsNone()
    {
        GlassIndices glass = Over("schott/N-BK7");
        Assert.Null(Chord.SlopeOf(glass, glass));
        Assert.Null(Chord.SecondarySpectrum(new Requirement(100.0, 8.0, s_visible), glass, glass));
    }

    private static GlassIndices Over(string id) => GlassIndices.Of(TestGlasses.Named(id), s_visible);
}
