using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests;

/// <summary>The shipped catalogue, read once.</summary>
internal static class TestGlasses
{
    private static readonly Stock s_stock = StockReader.ReadFolder(TestFiles.Path("data/catalogue"), "shipped").Stock
        ?? throw new InvalidOperationException("The shipped catalogue has errors.");

    public static IReadOnlyList<Glass> All => s_stock.Glasses;

    public static Glass Named(string id) =>
        s_stock.TryFind(id, out Glass? glass) ? glass : throw new ArgumentException($"The shipped catalogue has no {id}.", nameof(id));

    public static SpectralLine Line(string symbol) => SpectralLine.All.Single(l => l.Symbol == symbol);

    public static double IndexAt(this Glass glass, string line) => glass.IndexAt(Line(line).Wavelength);
}
