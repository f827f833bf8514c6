using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Spectrum;

public sealed class SpectralLineTests
{
    public static TheoryData<PublishedRow> Lines => Published.Theory("spectral-lines.csv");

    [Theory, MemberData(nameof(Lines))]
    public void All_PublishedLine_HasItsWavelength(PublishedRow row)
    {
        SpectralLine line = TestGlasses.Line(row["symbol"]);

        row.AssertPrints("nanometers", line.Wavelength.Nanometers);
        Assert.Equal(row["emitter"], line.Source);
    }

    [Fact]
    public void All_Lines_RiseAndStandOnce()
    {
        Assert.Equal(Published.Rows("spectral-lines.csv").Count, SpectralLine.All.Length);
        Assert.Equal(SpectralLine.All.Length, SpectralLine.All.DistinctBy(l => l.Symbol).Count());
        Assert.Equal(SpectralLine.All.AsEnumerable(), SpectralLine.All.OrderBy(l => l.Wavelength));
    }
}
