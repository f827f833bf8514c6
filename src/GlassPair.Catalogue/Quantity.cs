using System.Globalization;

namespace GlassPair.Catalogue;

/// <summary>What numbers a column takes: their unit, their range, and another unit in which people may have written them.</summary>
/// <param name="Unit">The unit; empty for a pure number.</param>
/// <param name="Min">The smallest value, included.</param>
/// <param name="Max">The largest value, included.</param>
public sealed record Quantity(string Unit, double Min, double Max)
{
    /// <summary>Gets a unit that is often mistaken for the right one: its name, and how to convert from it.</summary>
    internal (string Name, Func<double, double> Convert)? Mistaken { get; init; }

    /// <summary>Finds what is wrong with a value, as a sentence; null where it lies in the range.</summary>
    internal string? FindFault(double value)
    {
        if (value >= Min && value <= Max)
        {
            return null;
        }

        string unit = Unit.Length > 0 ? " " + Unit : "";
        string allowed = string.Create(CultureInfo.InvariantCulture, $"Must lie from {Min} to {Max}{unit}.");
        return Mistaken is { } other && other.Convert(value) is double converted && converted >= Min && converted <= Max
            ? string.Create(CultureInfo.InvariantCulture, $"{allowed} In {other.Name}? Then write {converted:G6}.")
            : allowed;
    }
}
