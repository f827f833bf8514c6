using System.Collections.Immutable;
using GlassPair.Optics.Glasses;

namespace GlassPair.Web.Components.Glasses;

/// <summary>What the map of the list draws against the Abbe number v_d.</summary>
public enum GlassMapHeight
{
    /// <summary>The index n_d.</summary>
    Index,

    /// <summary>The partial dispersion P_g,F.</summary>
    Partial,

    /// <summary>ΔP_g,F, the distance from the normal line.</summary>
    Delta,
}

/// <summary>Everything that the list of all glasses shows, as it stands in the page's address. Immutable.</summary>
public sealed record GlassListState
{
    /// <summary>The most characters of the text that the list is searched for.</summary>
    public const int MaxSearchLength = 60;

    /// <summary>Gets the state of an untouched page: every glass, by name.</summary>
    public static GlassListState Empty { get; } = new();

    /// <summary>Gets what is searched for, in names, makers and codes.</summary>
    public string Search { get; init; } = "";

    /// <summary>Gets the makers to keep; null keeps all.</summary>
    public ImmutableSortedSet<string>? Makers { get; init; }

    /// <summary>Gets the supply states to keep; null keeps all.</summary>
    public ImmutableSortedSet<Supply>? Supply { get; init; }

    /// <summary>Gets the key of the column that the list is sorted by; null sorts by name.</summary>
    public string? SortBy { get; init; }

    /// <summary>Gets whether the largest value stands first.</summary>
    public bool SortDescending { get; init; }

    /// <summary>Gets the glass that is chosen, <c>maker/name</c>.</summary>
    public string? Chosen { get; init; }

    /// <summary>Gets what the map draws against the Abbe number.</summary>
    public GlassMapHeight Map { get; init; }

    /// <summary>Gets the id of the stock that the page was made with; null stands for today's.</summary>
    public string? StockId { get; init; }
}
