namespace GlassPair.Web.Stocks;

/// <summary>Settings of the stock served, section <c>GlassPair:Stock</c>.</summary>
public sealed class StockOptions
{
    /// <summary>Gets or sets the folder of the catalogue; empty means the catalogue shipped with the program.</summary>
    public string Folder { get; set; } = "";
}
