using CsCheck;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Glasses;

public sealed class AirIndexTests
{
    public static TheoryData<PublishedRow> Refractivities => Published.Theory("air-index.csv");

    [Theory, MemberData(nameof(Refractivities))]
    public void RefractivityAtVacuum_PublishedValue_Agrees(PublishedRow row) => Assert.Equal(
        row.Number("refractivity_1e-8"),
        1e8 * AirIndex.RefractivityAtVacuum(row.Number("vacuum_micrometers"), row.Number("celsius"), row.Number("pascals")),
        row.Number("allowed_1e-8"));

    [Fact]
    public void Of_HeliumNeonLaserInStandardAir_IsThatOfItsWavelengthInVacuum() =>
        // 632.8 nm in air is 632.99 nm in vacuum: any table of laser lines
        Assert.Equal(1.0 + AirIndex.RefractivityAtVacuum(0.63299, 15.0, 101_325.0), AirIndex.Of(Wavelength.FromNanometers(632.816), 15.0), 1e-10);

    [Fact]
    public void RatePerKelvin_AnyAir_IsTheLimitOfDifferences() => Law.Holds(
        Gen.Select(Gen.Double[200, 2400], Gen.Double[-98, 138], Gen.Double[1000, 199_000]),
        air =>
        {
            Wavelength wavelength = Wavelength.FromNanometers(air.Item1);
            double Difference(double step) =>
                (AirIndex.Of(wavelength, air.Item2 + step, air.Item3) - AirIndex.Of(wavelength, air.Item2 - step, air.Item3)) / (2.0 * step);
            double extrapolated = ((4.0 * Difference(0.5)) - Difference(1.0)) / 3.0;

            Assert.Equal(extrapolated, AirIndex.RatePerKelvin(wavelength, air.Item2, air.Item3), 2e-14 + (1e-9 * Math.Abs(extrapolated)));
        });

    [Fact]
    public void RatePerKelvin_RoomTemperature_AgreesWithTheFormulaOfTheHandbook()
    {
        // dn/dT = −0.00367 (n − 1)/(1 + 0.00367 T): P. Hartmann, Optical Glass (SPIE Press, 2014), eq. 3.21; an ideal gas, which air is to half a percent
        Wavelength wavelength = SpectralLine.MercuryE.Wavelength;
        double expected = -0.00367 * (AirIndex.Of(wavelength, 30.0) - 1.0) / (1.0 + (0.00367 * 30.0));

        Assert.Equal(expected, AirIndex.RatePerKelvin(wavelength, 30.0), 0.005 * Math.Abs(expected));
    }

    [Fact]
    public void Of_NoPressure_IsVacuum() => Assert.Equal(1.0, AirIndex.Of(SpectralLine.HeliumD.Wavelength, 20.0, 0.0));

    [Theory]
    [InlineData(179.9, 20.0, 101_325.0)]
    [InlineData(500.0, -100.1, 101_325.0)]
    [InlineData(500.0, 140.1, 101_325.0)]
    [InlineData(500.0, double.NaN, 101_325.0)]
    [InlineData(500.0, 20.0, -1.0)]
    [InlineData(500.0, 20.0, 200_001.0)]
    public void Of_OutsideTheRange_Throws(double nanometers, double celsius, double pascals) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => AirIndex.Of(Wavelength.FromNanometers(nanometers), celsius, pascals));
}
