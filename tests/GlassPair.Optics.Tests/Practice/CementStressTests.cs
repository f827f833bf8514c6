using CsCheck;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Practice;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Practice;

public sealed class CementStressTests
{
    private static readonly TemperatureSpan s_cold = new(-20.0, 40.0, 23e-6);

    [Fact]
    public void TryOf_QuickCheck_IsTheProductOfModulusExpansionAndTemperature()
    {
        // "Quick Checks for Stress in Glass" (aehinc.com): (E₁ + E₂)/2 · Δα · ΔT = 80 GPa · 5e-6/K · 40 K = 16 MPa, two thirds of it in the cement
        CementStress stress = CementStress.TryOf(WithExpansion(7e-6), WithExpansion(12e-6), 60.0, s_cold, CementAssumptions.Usual)!;

        Assert.Equal(16.0, stress.GlassMegapascals, 1e-12);
        Assert.Equal(16.0 * 2.0 / 3.0, stress.CementMegapascals, 1e-12);
        Assert.Equal(0.006, stress.EdgeSlip, 1e-15); // 5e-6 · 40 · 30 mm
        Assert.Equal((5e-6, -40.0), (Math.Round(stress.ExpansionDifference, 12), stress.TemperatureChange));
        Assert.False(stress.Holds);
        Assert.Equal(["test/12 and test/7 differ"], stress.Cautions.Select(c => c.Replace("test/7 and test/12", "test/12 and test/7", StringComparison.Ordinal)[..25]));
    }

    [Fact]
    public void TryOf_GlassesSwapped_ChangesTheSignOnly() => Law.Holds(
        Gen.Select(Gen.Double[3e-6, 16e-6], Gen.Double[3e-6, 16e-6], Gen.Double[1.0, 300.0]),
        joint =>
        {
            CementStress once = CementStress.TryOf(WithExpansion(joint.Item1), WithExpansion(joint.Item2), joint.Item3, s_cold, CementAssumptions.Usual)!;
            CementStress swapped = CementStress.TryOf(WithExpansion(joint.Item2), WithExpansion(joint.Item1), joint.Item3, s_cold, CementAssumptions.Usual)!;
            CementStress wider = CementStress.TryOf(WithExpansion(joint.Item1), WithExpansion(joint.Item2), 2.0 * joint.Item3, s_cold, CementAssumptions.Usual)!;

            Assert.Equal(-once.ExpansionDifference, swapped.ExpansionDifference);
            Assert.Equal((once.GlassMegapascals, once.EdgeSlip), (swapped.GlassMegapascals, swapped.EdgeSlip));
            Assert.Equal((once.GlassMegapascals, 2.0 * once.EdgeSlip), (wider.GlassMegapascals, wider.EdgeSlip)); // the diameter stresses nothing
            Assert.Equal(once.GlassMegapascals <= 10.0, once.Holds);
        });

    [Fact]
    public void TryOf_Temperatures_TakesTheLargerDeparture()
    {
        var hot = new TemperatureSpan(0.0, 70.0, 23e-6);

        Assert.Equal(50.0, CementStress.TryOf(WithExpansion(7e-6), WithExpansion(8e-6), 20.0, hot, CementAssumptions.Usual)!.TemperatureChange);
        Assert.Equal(-80.0, CementStress.TryOf(WithExpansion(7e-6), WithExpansion(8e-6), 20.0, hot, new CementAssumptions { StressFreeCelsius = 80.0 })!.TemperatureChange);
    }

    [Theory]
    [InlineData(1.4e-6, 100.0, 0)]
    [InlineData(2.0e-6, 49.0, 0)]
    [InlineData(2.0e-6, 51.0, 1)]
    [InlineData(3.1e-6, 10.0, 1)]
    public void TryOf_DifferenceAndDiameter_WarnAsPracticeHasIt(double difference, double diameter, int cautions) =>
        Assert.Equal(cautions, CementStress.TryOf(WithExpansion(7e-6), WithExpansion(7e-6 + difference), diameter, s_cold, CementAssumptions.Usual)!.Cautions.Length);

    [Fact]
    public void TryOf_ExpansionNotStated_IsNullOrCautioned()
    {
        Glass unknown = new("test", "unknown", new PowerSeriesFormula(2.25, []), WavelengthRange.FromNanometers(300, 2000));
        Glass hotOnly = new("test", "hot", new PowerSeriesFormula(2.25, []), WavelengthRange.FromNanometers(300, 2000)) { HighExpansionPerKelvin = 8e-6 };

        Assert.Null(CementStress.TryOf(WithExpansion(7e-6), unknown, 20.0, s_cold, CementAssumptions.Usual));
        Assert.Null(CementStress.TryOf(unknown, WithExpansion(7e-6), 20.0, s_cold, CementAssumptions.Usual));
        Assert.Contains("test/hot states its expansion from +20 °C to +300 °C only", CementStress.TryOf(WithExpansion(7e-6), hotOnly, 20.0, s_cold, CementAssumptions.Usual)!.Cautions.Single(), StringComparison.Ordinal);
    }

    [Fact]
    public void Assumptions_OutsideTheirRanges_Throw()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => new CementAssumptions { YoungGigapascals = 5.0 });
        Assert.Throws<ArgumentOutOfRangeException>(() => new CementAssumptions { LimitMegapascals = double.NaN });
        Assert.Throws<ArgumentOutOfRangeException>(() => new CementAssumptions { StressFreeCelsius = 200.0 });
        Assert.Throws<ArgumentOutOfRangeException>(() => CementStress.TryOf(WithExpansion(7e-6), WithExpansion(8e-6), 0.0, s_cold, CementAssumptions.Usual));
    }

    private static Glass WithExpansion(double perKelvin) =>
        new("test", FormattableString.Invariant($"{perKelvin * 1e6:0.###}"), new PowerSeriesFormula(2.25, []), WavelengthRange.FromNanometers(300, 2000))
        {
            ExpansionPerKelvin = perKelvin,
        };
}
