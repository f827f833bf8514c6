using System.Diagnostics.CodeAnalysis;
using GlassPair.Catalogue;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Stocks;

/// <summary>The stocks that are served. One instance for the whole process; safe to use from any thread.</summary>
public sealed class StockLibrary
{
    /// <summary>Reads the catalogue.</summary>
    public StockLibrary(IOptions<StockOptions> options)
    {
        string folder = options.Value.Folder is { Length: > 0 } set ? set : Path.Combine(AppContext.BaseDirectory, "data", "catalogue");
        StockReading reading = StockReader.ReadFolder(folder, "Open catalogue");
        Current = reading.Stock ?? throw new InvalidOperationException(string.Join(Environment.NewLine, reading.Issues));
    }

    /// <summary>Gets the stock served by default.</summary>
    public Stock Current { get; }

    /// <summary>Finds a stock by its id.</summary>
    public bool TryFind(string id, [NotNullWhen(true)] out Stock? stock)
    {
        stock = string.Equals(id, Current.Id, StringComparison.OrdinalIgnoreCase) ? Current : null;
        return stock is not null;
    }
}
