using GlassPair.Catalogue;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Color;

public sealed class ThinPairTests
{
    [Fact]
    public void Solve_BorosilicateCrownWithDenseFlint_AgreesWithTextbookRules()
    {
        Stock stock = StockReader.ReadFolder(Path.Combine(AppContext.BaseDirectory, "../../../../../data/catalogue"), "x").Stock!;
        Band band = Band.Even(SpectralLine.HydrogenF.Wavelength, SpectralLine.HeliumD.Wavelength, SpectralLine.HydrogenC.Wavelength, 9);
        Assert.True(stock.TryFind("schott/n-bk7", out Glass? bk7) && stock.TryFind("schott/F2", out Glass? f2));
        stock.TryFind("schott/F2", out f2);
        var r = new Requirement(100, 8, band) { Balance = ColorBalance.EndsUnited };
        var s = Assert.IsType<ThinSolution>(ThinPair.Solve(r, GlassIndices.Of(bk7, band), GlassIndices.Of(f2!, band)));
        Assert.Equal(-0.05, s.SecondarySpectrum, 0.0025); // f/2000, rule of most textbooks; from memory
        Assert.Equal(-1.4, s.PetzvalRadius / 100, 0.05); // about −1.4 f, W. J. Smith, Modern Optical Engineering; from memory
        Assert.Equal(0, s.PrimaryAxialColor, 1e-12);
    }
}
