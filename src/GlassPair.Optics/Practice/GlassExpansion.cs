using GlassPair.Optics.Glasses;

namespace GlassPair.Optics.Practice;

/// <summary>The expansion of a glass near room temperature, as well as its maker states it.</summary>
internal static class GlassExpansion
{
    /// <summary>Per kelvin, from −30 °C to +70 °C or else from +20 °C to +300 °C; null where neither is stated.</summary>
    public static double? TryOf(Glass glass) => glass.ExpansionPerKelvin ?? glass.HighExpansionPerKelvin;

    /// <summary>What to know of a glass whose expansion is stated for higher temperatures only.</summary>
    public static IEnumerable<string> CautionsOf(IEnumerable<Glass> glasses) => glasses
        .Where(g => g is { ExpansionPerKelvin: null, HighExpansionPerKelvin: not null })
        .Select(g => $"{g.Id} states its expansion from +20 °C to +300 °C only; near room temperature it is lower.");
}
