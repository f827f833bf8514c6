using GlassPair.Optics.Rankings;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Tests.Glasses;
using GlassPair.Web.Work;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Tests.Work;

public sealed class ShortlistServiceTests : IDisposable
{
    private readonly WorkGate _gate = new(Options.Create(new WorkOptions()));

    public void Dispose() => _gate.Dispose();

    [Fact]
    public void TableOf_EqualBand_IsEvaluatedOnce()
    {
        var service = new ShortlistService(_gate);

        Assert.Same(service.TableOf(ServedStock.Stock, To(700.0)), service.TableOf(ServedStock.Stock, To(700.0)));
    }

    [Fact]
    public void TableOf_ManyCallersAtOnce_ShareOneTable()
    {
        var service = new ShortlistService(_gate);
        var tables = new IndexTable[16];
        Thread[] callers = [.. tables.Select((_, i) => new Thread(() => tables[i] = service.TableOf(ServedStock.Stock, To(700.0))))];
        Array.ForEach(callers, c => c.Start());
        Array.ForEach(callers, c => c.Join());

        Assert.All(tables, t => Assert.Same(tables[0], t));
    }

    [Fact]
    public void TableOf_MoreThanAreKept_LetsTheLongestUnusedGo()
    {
        var service = new ShortlistService(_gate);
        IndexTable first = service.TableOf(ServedStock.Stock, To(600.0));
        IndexTable second = service.TableOf(ServedStock.Stock, To(601.0));
        for (int i = 0; i < ShortlistService.MostTables - 1; i++)
        {
            Assert.Same(first, service.TableOf(ServedStock.Stock, To(600.0)));
            service.TableOf(ServedStock.Stock, To(610.0 + i));
        }

        Assert.Same(first, service.TableOf(ServedStock.Stock, To(600.0)));
        Assert.NotSame(second, service.TableOf(ServedStock.Stock, To(601.0)));
    }

    private static Band To(double longNanometers) =>
        Band.Even(SpectralLine.HydrogenF.Wavelength, Wavelength.FromNanometers(550.0), Wavelength.FromNanometers(longNanometers), 3);
}
