using System.ComponentModel.DataAnnotations;

namespace GlassPair.Web.Work;

/// <summary>Settings of the gate for heavy work, section <c>GlassPair:Work</c>.</summary>
public sealed class WorkOptions
{
    /// <summary>Gets or sets how much work runs at once, 0 to 256; 0 means one less than the processor has cores, at least one.</summary>
    [Range(0, 256)]
    public int AtOnce { get; set; }

    /// <summary>Gets or sets how much work may wait, 0 to 10,000.</summary>
    [Range(0, 10_000)]
    public int MostWaiting { get; set; } = 16;

    /// <summary>Gets or sets how long one piece of work may run, 1 to 3,600 seconds.</summary>
    [Range(1, 3_600)]
    public double LongestSeconds { get; set; } = 10;
}
