using System.ComponentModel.DataAnnotations;

namespace GlassPair.Web.Hosting;

/// <summary>Settings of what one client may ask for, section <c>GlassPair:Limits</c>.</summary>
public sealed class LimitOptions
{
    /// <summary>Gets or sets the calls of the API that one address may make in a minute, 1 to 1,000,000.</summary>
    [Range(1, 1_000_000)]
    public int ApiCallsPerMinute { get; set; } = 6_000;

    /// <summary>Gets or sets the largest body of a call of the API, 1 to 65,536 KB.</summary>
    [Range(1, 65_536)]
    public int ApiBodyKilobytes { get; set; } = 256;

    /// <summary>Gets or sets the largest body of any request, uploads among them, 1 to 65,536 KB.</summary>
    [Range(1, 65_536)]
    public int BodyKilobytes { get; set; } = 4_096;

    /// <summary>Gets or sets the longest query string, 1 to 64 KB.</summary>
    [Range(1, 64)]
    public int QueryKilobytes { get; set; } = 8;

    /// <summary>Gets or sets how long a call of the API may take, 0.1 to 3,600 seconds.</summary>
    [Range(0.1, 3_600)]
    public double ApiSeconds { get; set; } = 15;

    /// <summary>Gets or sets how many pages may be connected at once, 1 to 100,000.</summary>
    [Range(1, 100_000)]
    public int ConnectedPages { get; set; } = 500;
}
