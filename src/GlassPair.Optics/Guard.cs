using System.Runtime.CompilerServices;

namespace GlassPair.Optics;

/// <summary>Checks at the public edge, written so that NaN fails them.</summary>
internal static class Guard
{
    public static double InRange(double value, double min, double max, [CallerArgumentExpression(nameof(value))] string? name = null) =>
        value >= min && value <= max
            ? value
            : throw new ArgumentOutOfRangeException(name, value, FormattableString.Invariant($"Must lie in [{min}, {max}]."));

    public static void SameLength(int expected, int actual, [CallerArgumentExpression(nameof(actual))] string? name = null)
    {
        if (expected != actual)
        {
            throw new ArgumentException(FormattableString.Invariant($"Must hold {expected} values; holds {actual}."), name);
        }
    }
}
