using GlassPair.Optics.Glasses;

namespace GlassPair.Catalogue;

/// <summary>The words for supply, in a catalogue and before the user.</summary>
public static class SupplyNames
{
    /// <summary>Gets the word for a supply, such as <c>on request</c>.</summary>
    public static string Of(Supply supply) => supply switch
    {
        Supply.Recommended => "recommended",
        Supply.Listed => "listed",
        Supply.OnRequest => "on request",
        Supply.Discontinued => "discontinued",
        _ => "unconfirmed",
    };

    internal static Supply Read(string? word) => Enum.GetValues<Supply>().FirstOrDefault(supply => Of(supply) == word, Supply.Unconfirmed);
}
