namespace GlassPair.Web.Hosting;

/// <summary>Settings of how the site is reached, section <c>GlassPair:Site</c>.</summary>
public sealed class SiteOptions
{
    /// <summary>Gets or sets whether plain HTTP is sent on to HTTPS, and browsers are told to stay there; needs an HTTPS address or a proxy that has one.</summary>
    public bool HttpsOnly { get; set; }
}
