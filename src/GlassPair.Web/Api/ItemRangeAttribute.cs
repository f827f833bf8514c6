namespace GlassPair.Web.Api;

/// <summary>The range of each number of a list, both ends included.</summary>
/// <param name="minimum">The smallest value allowed.</param>
/// <param name="maximum">The largest value allowed.</param>
[AttributeUsage(AttributeTargets.Property)]
public sealed class ItemRangeAttribute(double minimum, double maximum) : Attribute
{
    /// <summary>Gets the smallest value allowed.</summary>
    public double Minimum { get; } = minimum;

    /// <summary>Gets the largest value allowed.</summary>
    public double Maximum { get; } = maximum;
}
