using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Benchmarks;

/// <summary>The shipped catalogue as the benchmarks use it.</summary>
internal static class BenchmarkGlasses
{
    private static readonly Stock s_stock = StockReader.ReadFolder(PathOf("data/catalogue"), "shipped").Stock
        ?? throw new InvalidOperationException("The shipped catalogue has errors.");

    public static Band Visible { get; } = Band.Even(
        SpectralLine.HydrogenF.Wavelength, SpectralLine.HeliumD.Wavelength, SpectralLine.HydrogenC.Wavelength, 9);

    public static Requirement Objective { get; } = new(250.0, 6.0, Visible);

    public static IReadOnlyList<Glass> All => s_stock.Glasses;

    /// <summary>Takes a number of glasses of the catalogue, evenly; past its end comes each glass again with one coefficient a little changed.</summary>
    public static IndexTable Table(int count)
    {
        IEnumerable<Glass> glasses = count <= All.Count
            ? Enumerable.Range(0, count).Select(i => All[i * All.Count / count])
            : All.Concat(All.Take(count - All.Count).Select(Changed));
        return IndexTable.Of(glasses, Visible);
    }

    public static string PathOf(string relative)
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "GlassPair.sln")))
        {
            folder = folder.Parent;
        }

        return Path.Combine(folder?.FullName ?? throw new InvalidOperationException("No GlassPair.sln above the benchmarks."), relative);
    }

    private static Glass Changed(Glass glass, int place)
    {
        double factor = 1.0 + (1e-7 * (place + 1));
        DispersionFormula formula = glass.Formula switch
        {
            SellmeierFormula f => new SellmeierFormula(f.Terms.Select((t, i) => i == 0 ? t with { Strength = t.Strength * factor } : t)),
            PowerSeriesFormula f => new PowerSeriesFormula(f.Constant * factor, f.Terms),
            _ => throw new ArgumentException($"{glass.Id} has a form that the benchmarks do not know.", nameof(glass)),
        };
        return new Glass(glass.Maker, glass.Name + " changed", formula, glass.Range);
    }
}
