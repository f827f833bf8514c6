using CsCheck;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Spectrum;

public sealed class BandTests
{
    private static readonly Wavelength s_short = Wavelength.FromNanometers(450);
    private static readonly Wavelength s_design = Wavelength.FromNanometers(550);
    private static readonly Wavelength s_long = Wavelength.FromNanometers(650);

    [Fact]
    public void Even_AnyCount_ReachesBothEndsInEqualSteps() => Law.Holds(Gen.Int[Band.MinSamples, Band.MaxSamples], count =>
    {
        Band band = Band.Even(s_short, s_design, s_long, count);

        Assert.Equal(count, band.Samples.Length);
        Assert.Equal((s_short, s_long), (band.Samples[0].Wavelength, band.Samples[^1].Wavelength));
        Assert.Equal(1.0, band.Samples.Sum(s => s.Weight), 1e-14);
        Assert.All(
            band.Samples.Skip(1).Zip(band.Samples),
            pair => Assert.Equal(200.0 / (count - 1), pair.First.Wavelength.Nanometers - pair.Second.Wavelength.Nanometers, 1e-10));
    });

    [Theory]
    [InlineData(2)]
    [InlineData(42)]
    public void Even_CountOutsideThreeToFortyOne_Throws(int count) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => Band.Even(s_short, s_design, s_long, count));

    [Fact]
    public void Even_DesignWavelengthNotBetweenTheEnds_Throws()
    {
        Assert.Throws<ArgumentException>(() => Band.Even(s_short, s_short, s_long, 9));
        Assert.Throws<ArgumentException>(() => Band.Even(s_short, s_long, s_long, 9));
        Assert.Throws<ArgumentException>(() => Band.Even(s_long, s_design, s_short, 9));
    }

    [Fact]
    public void FromSamples_WeightsOfAnySum_AreScaledToOne()
    {
        Band band = Band.FromSamples(s_short, s_design, s_long, [new(s_short, 1), new(s_design, 6), new(s_long, 1)]);

        Assert.Equal([0.125, 0.75, 0.125], band.Samples.Select(s => s.Weight));
    }

    [Theory]
    [InlineData(-1.0)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void FromSamples_WeightNotZeroOrMore_ThrowsAndNamesTheWavelength(double weight) =>
        Assert.Contains(
            "550 nm",
            Assert.Throws<ArgumentException>(() => Band.FromSamples(s_short, s_design, s_long, [new(s_short, 1), new(s_design, weight), new(s_long, 1)])).Message,
            StringComparison.Ordinal);

    [Fact]
    public void FromSamples_NoWeightNoOrderOrOutsideTheEnds_Throws()
    {
        Assert.Throws<ArgumentException>(() => Band.FromSamples(s_short, s_design, s_long, [new(s_short, 0), new(s_design, 0), new(s_long, 0)]));
        Assert.Throws<ArgumentException>(() => Band.FromSamples(s_short, s_design, s_long, [new(s_short, 1), new(s_long, 1), new(s_design, 1)]));
        Assert.Throws<ArgumentException>(() => Band.FromSamples(s_short, s_design, s_long, [new(s_short, 1), new(s_short, 1), new(s_long, 1)]));
        Assert.Throws<ArgumentException>(() => Band.FromSamples(s_short, s_design, s_long, [new(s_short, 1), new(s_design, 1), new(Wavelength.FromNanometers(651), 1)]));
        Assert.Throws<ArgumentOutOfRangeException>(() => Band.FromSamples(s_short, s_design, s_long, [new(s_short, 1), new(s_long, 1)]));
    }

    [Fact]
    public void Equals_SameSamples_IsEqualHoweverMade()
    {
        Band even = Band.Even(s_short, s_design, s_long, 5);
        Band stated = Band.FromSamples(s_short, s_design, s_long, [.. even.Samples]);

        Assert.Equal(even, stated);
        Assert.Equal(even.GetHashCode(), stated.GetHashCode());
        Assert.NotEqual(even, Band.Even(s_short, s_design, s_long, 6));
    }
}
