using GlassPair.Optics.Glasses;

namespace GlassPair.Catalogue.Tests;

/// <summary>The catalogue that is shipped, read once.</summary>
internal static class Shipped
{
    public static string Folder { get; } = Path.Combine(AppContext.BaseDirectory, "data", "catalogue");

    private static readonly Lazy<StockReading> Read = new(() => StockReader.ReadFolder(Folder, "Shipped"));

    public static StockReading Reading => Read.Value;

    public static Stock Stock => Reading.Stock ?? throw new InvalidDataException(string.Join(Environment.NewLine, Reading.Issues));

    public static Glass Glass(string id) => Stock.TryFind(id, out Glass? glass) ? glass : throw new KeyNotFoundException(id);
}
