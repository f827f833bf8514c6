using CsCheck;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Practice;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;
using GlassPair.Optics.Tests.Color;

namespace GlassPair.Optics.Tests.Practice;

public sealed class ThermalDefocusTests
{
    private const double Aluminum = 23.6e-6;

    private static readonly Gen<ThinCase> s_known = ThinCase.Any.Where(c => new[] { c.A, c.B, c.C }.All(g =>
        g.ExpansionPerKelvin is not null && IndexAtTemperature.TryOf(g, c.Band.ShortEnd, 20.0) is not null));

    [Fact]
    public void Of_AnyPair_EqualsTracingAParaxialRayThroughTheWarmLens() => Law.Holds(s_known, c =>
    {
        foreach (double space in new[] { 0.0, c.AirSpace })
        {
            var span = new TemperatureSpan(-40.0, 65.0, Aluminum);
            ThinSolution solution = Solve(c, space, span);
            ThermalDefocus thermal = Evaluated(ThermalDefocus.Of(solution));
            foreach (ThermalState state in new[] { thermal.Coldest, thermal.Hottest })
            {
                // plano-convex thin elements of radius R = (n − 1) f at 20 °C; height and angle of a ray parallel to the axis, from element to element
                double warming = state.Celsius - 20.0;
                double Image(Wavelength wavelength)
                {
                    (double y, double u) = (1.0, 0.0);
                    for (int i = 0; i < 2; i++)
                    {
                        Glass glass = solution.Elements[i].Glass;
                        double radius = (IndexAtTemperature.TryOf(glass, c.Band.Design, 20.0)!.Relative - 1.0) * solution.FocalLengths[i] * (1.0 + (glass.ExpansionPerKelvin!.Value * warming));
                        u -= y * (IndexAtTemperature.TryOf(glass, wavelength, state.Celsius)!.Relative - 1.0) / radius;
                        y += i == 0 ? u * space * (1.0 + (Aluminum * warming)) : 0.0;
                    }

                    return -y / u;
                }

                double detector = (c.FocalLength - (space * solution.RelativePowers[0])) * (1.0 + (Aluminum * warming));
                double[] images = [.. c.Band.Samples.Select(s => Image(s.Wavelength))];

                Assert.Equal(Image(c.Band.Design) - detector, state.Defocus, 1e-12 * c.FocalLength * solution.SumOfPowers);
                Assert.Equal(Math.Sqrt(c.Band.VarianceOf(images)), state.RmsFocalShift, 1e-12 * c.FocalLength * solution.SumOfPowers);
            }
        }
    });

    [Fact]
    public void DefocusPerKelvin_AnyPair_IsTheLimitOfDifferences() => Law.Holds(s_known, c =>
    {
        foreach (double space in new[] { 0.0, c.AirSpace })
        {
            ThinSolution solution = Solve(c, space, new TemperatureSpan(19.5, 20.5, Aluminum));
            ThermalDefocus thermal = Evaluated(ThermalDefocus.Of(solution));

            Assert.Equal(thermal.Hottest.Defocus - thermal.Coldest.Defocus, thermal.DefocusPerKelvin, 1e-9 * c.FocalLength * solution.SumOfPowers);
        }
    });

    [Fact]
    public void Of_PairInContact_IsTheSumOfThermalPowersAgainstTheHousing() => Law.Holds(s_known, c =>
    {
        // ΔF = −F (Σ φᵢ γᵢ/Φ + α) ΔT: opticsrealm.com, "lens in a housing", with β = −γ
        ThinSolution solution = Solve(c, 0.0, new TemperatureSpan(0.0, 40.0, Aluminum));
        ThermalDefocus thermal = Evaluated(ThermalDefocus.Of(solution));
        double sum = solution.RelativePowers.Zip(thermal.ThermalPowers, (p, gamma) => p * gamma).Sum();

        Assert.Equal(-c.FocalLength * (sum + Aluminum), thermal.DefocusPerKelvin, 1e-15 * c.FocalLength * solution.SumOfPowers);

        // a housing that shrinks as the focal length does keeps the focus
        ThermalDefocus athermal = Evaluated(ThermalDefocus.Of(Solve(c, 0.0, new TemperatureSpan(0.0, 40.0, -sum))));
        Assert.Equal(0.0, athermal.DefocusPerKelvin, 1e-15 * c.FocalLength * solution.SumOfPowers);
    });

    [Fact]
    public void ThermalPowers_BorosilicateCrown_FollowFromItsDataSheet()
    {
        // dn_rel/dT at e is printed as 2.9e-6/K for −40 °C to −20 °C and 3.0e-6/K for +20 °C to +40 °C (temperature-coefficients.csv); α = 7.1e-6/K and
        // n_e = 1.51872 (data sheet, from memory)
        ThinCase c = Visible("schott/N-BK7", "schott/F2");
        ThermalDefocus thermal = Evaluated(ThermalDefocus.Of(Solve(c, 0.0, new TemperatureSpan(0.0, 40.0, Aluminum))));

        Assert.InRange(thermal.ThermalPowers[0], (2.85e-6 / 0.51872) - 7.15e-6, (3.05e-6 / 0.51872) - 7.05e-6);
    }

    [Fact]
    public void Of_TemperatureOfFocusing_IsInFocusWithTheColorOfTheSolution() => Law.Holds(s_known.Where(c => c.A.ReferenceCelsius == 20.0 && c.C.ReferenceCelsius == 20.0), c =>
    {
        ThinSolution solution = Solve(c, 0.0, new TemperatureSpan(20.0, 20.0, Aluminum));
        ThermalDefocus thermal = Evaluated(ThermalDefocus.Of(solution));

        Assert.Equal(0.0, thermal.Worst, 1e-13 * c.FocalLength * solution.SumOfPowers);
        Assert.Equal(solution.RmsFocalShift, thermal.Coldest.RmsFocalShift, 1e-13 * c.FocalLength * solution.SumOfPowers);
        Assert.True(thermal.Holds);
    });

    [Fact]
    public void Worst_OfTwoEnds_IsComparedWithTheDepthOfFocus()
    {
        var defocus = new ThermalDefocus([], 0.0, new ThermalState(-20, 0.03, 0), new ThermalState(60, -0.04, 0), 0.035, []);

        Assert.Equal((-0.04, false), (defocus.Worst, defocus.Holds));
        Assert.True((defocus with { DepthOfFocus = 0.04 }).Holds);
    }

    [Fact]
    public void Of_DataMissing_SaysWhichGlassLacksWhat()
    {
        Glass bare = TestGlasses.All.First(g => g.Thermal is null && g.ExpansionPerKelvin is null && g.HighExpansionPerKelvin is null && g.Covers(Visible("schott/N-BK7", "schott/F2").Band));
        ThinCase c = Visible("schott/N-BK7", "schott/F2") with { C = bare };

        Assert.Equal(
            $"{bare.Id} states no change of index with temperature. {bare.Id} states no expansion.",
            Assert.IsType<NoThermalDefocus>(ThermalDefocus.Of(Solve(c, 0.0, new TemperatureSpan(0.0, 40.0, Aluminum)))).Sentence);
    }

    [Fact]
    public void Of_NoTemperaturesOrTooFar_SaysSo()
    {
        ThinCase c = Visible("schott/N-BK7", "schott/F2");
        ThinSolution without = ThinPairTests.Solved(ThinPair.Solve(c.Requirement(), c.Crown, c.Flint));

        Assert.Equal("The requirement names no temperatures.", Assert.IsType<NoThermalDefocus>(ThermalDefocus.Of(without)).Sentence);
        Assert.Equal(
            "The index of glass is known from -100 °C to 140 °C, not from -150 °C to 20 °C.",
            Assert.IsType<NoThermalDefocus>(ThermalDefocus.Of(Solve(c, 0.0, new TemperatureSpan(-150.0, 20.0, Aluminum)))).Sentence);
    }

    private static ThinCase Visible(string crown, string flint) => new(
        TestGlasses.Named(crown), TestGlasses.Named(crown), TestGlasses.Named(flint),
        Band.Even(SpectralLine.CadmiumFPrime.Wavelength, SpectralLine.MercuryE.Wavelength, SpectralLine.CadmiumCPrime.Wavelength, 9), 100.0, 0.5);

    private static ThinSolution Solve(ThinCase c, double space, TemperatureSpan span) =>
        ThinPairTests.Solved(ThinPair.Solve(c.Requirement(ColorBalance.BandBalanced, space) with { Temperature = span }, c.Crown, c.Flint));

    private static ThermalDefocus Evaluated(ThermalOutcome outcome) => Assert.IsType<ThermalDefocus>(outcome);
}
