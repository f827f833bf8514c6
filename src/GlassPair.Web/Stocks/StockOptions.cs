namespace GlassPair.Web.Stocks;

/// <summary>Settings of the stock served, section <c>GlassPair:Stock</c>.</summary>
public sealed class StockOptions
{
    /// <summary>Gets or sets the folder of the catalogue; empty means the catalogue shipped with the program.</summary>
    public string Folder { get; set; } = "";

    /// <summary>Gets or sets what people call the catalogue; empty names it after its folder.</summary>
    public string Title { get; set; } = "";

    /// <summary>
    /// Gets or sets the folder that keeps every stock ever served, so that a link to an old one still opens; empty means
    /// <c>GlassPair/stocks</c> in the user's folder for local data, or in the folder for temporary files where that cannot be written to.
    /// </summary>
    public string ArchiveFolder { get; set; } = "";

    /// <summary>Gets or sets how often the folder is looked at in case the system reported no change; at least 0.1 s.</summary>
    public TimeSpan LookEvery { get; set; } = TimeSpan.FromSeconds(5);
}
