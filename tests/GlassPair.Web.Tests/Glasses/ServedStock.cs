using GlassPair.Catalogue;
using GlassPair.Web.Stocks;
using Microsoft.Extensions.Logging.Abstractions;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Tests.Glasses;

/// <summary>The shipped catalogue, read once for the tests of the pages.</summary>
internal static class ServedStock
{
    public static StockLibrary Library { get; } = new(Options.Create(new StockOptions()), TimeProvider.System, NullLogger<StockLibrary>.Instance);

    public static Stock Stock => Library.Current;
}
