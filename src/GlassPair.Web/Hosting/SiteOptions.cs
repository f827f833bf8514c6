namespace GlassPair.Web.Hosting;

/// <summary>Settings of how the site is reached, section <c>GlassPair:Site</c>.</summary>
public sealed class SiteOptions
{
    /// <summary>
    /// Gets or sets whether plain HTTP is sent on to HTTPS, and browsers are told to stay there for a year; needs an HTTPS address, or a proxy
    /// that has one, with <c>ASPNETCORE_FORWARDEDHEADERS_ENABLED=true</c> so that its word on the scheme counts.
    /// </summary>
    public bool HttpsOnly { get; set; }

    /// <summary>
    /// Gets or sets the folder of the keys that protect what a page keeps in the browser, so that open pages outlive a restart; empty means
    /// the user's folder for such keys, or the memory of the process where there is none.
    /// </summary>
    public string KeysFolder { get; set; } = "";
}
