using System.Collections.Immutable;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Components.Charts;

namespace GlassPair.Web.Addresses;

/// <summary>Two glasses by <c>maker/name</c>, the one of positive power first.</summary>
/// <param name="Positive">The glass of positive power.</param>
/// <param name="Negative">The other glass.</param>
public sealed record PairName(string Positive, string Negative)
{
    /// <summary>Gets the name of a solved pair.</summary>
    public static PairName Of(ThinSolution solution) => new(solution.Elements[0].Glass.Id, solution.Elements[1].Glass.Id);
}

/// <summary>Everything that the working page shows, as it stands in the page's address. Immutable.</summary>
/// <remarks>Numbers are kept as typed, so that what is wrong with one can be shown beside it.</remarks>
public sealed record WorkbenchState
{
    /// <summary>The most candidates shown where nobody says otherwise.</summary>
    public const int DefaultTake = 500;

    /// <summary>In how many pairs one glass may stand where nobody says otherwise.</summary>
    public const int DefaultPairsPerGlass = 3;

    /// <summary>The most characters of the ranking's filter.</summary>
    public const int MaxFilterLength = 60;

    /// <summary>The most glasses that can be included, and excluded.</summary>
    public const int MaxNamedGlasses = 100;

    /// <summary>Gets every supply state but the discontinued.</summary>
    public static ImmutableSortedSet<Supply> UsualSupply { get; } = [.. Enum.GetValues<Supply>().Where(s => s != Optics.Glasses.Supply.Discontinued)];

    /// <summary>A set of glasses, empty, that knows no upper and lower case.</summary>
    internal static ImmutableSortedSet<string> NoGlasses { get; } = ImmutableSortedSet.Create<string>(StringComparer.OrdinalIgnoreCase);

    // After the sets, which its own properties start from.
    /// <summary>Gets the state of an untouched form.</summary>
    public static WorkbenchState Empty { get; } = new();

    /// <summary>Gets how the powers are chosen.</summary>
    public ColorBalance Balance { get; init; }

    /// <summary>Gets whether there is an air space between the elements.</summary>
    public bool AirSpaced { get; init; }

    /// <summary>Gets the makers to keep; null keeps all.</summary>
    public ImmutableSortedSet<string>? Makers { get; init; }

    /// <summary>Gets the supply states to keep.</summary>
    public ImmutableSortedSet<Supply> Supply { get; init; } = UsualSupply;

    /// <summary>Gets whether glasses known to contain lead may be used.</summary>
    public bool AllowLead { get; init; } = true;

    /// <summary>Gets whether glasses made for molding may be used.</summary>
    public bool AllowMolding { get; init; } = true;

    /// <summary>Gets the glasses of which each pair must hold at least one.</summary>
    public ImmutableSortedSet<string> Include { get; init; } = NoGlasses;

    /// <summary>Gets the sign of the power that such a glass must take; null allows either.</summary>
    public PowerSign? IncludeAs { get; init; }

    /// <summary>Gets the glasses never to use.</summary>
    public ImmutableSortedSet<string> Exclude { get; init; } = NoGlasses;

    /// <summary>Gets the figure that candidates are ranked by.</summary>
    public RankBy RankBy { get; init; } = RankBy.ExpectedResidual;

    /// <summary>Gets in how many pairs one glass may stand; null allows any number.</summary>
    public int? PairsPerGlass { get; init; } = DefaultPairsPerGlass;

    /// <summary>Gets how many candidates are kept.</summary>
    public int Take { get; init; } = DefaultTake;

    /// <summary>Gets the key of the column that the table is sorted by; null leaves the order of rank.</summary>
    public string? SortBy { get; init; }

    /// <summary>Gets whether the largest value stands first.</summary>
    public bool SortDescending { get; init; }

    /// <summary>Gets the keys of the columns shown; null shows the usual ones.</summary>
    public ImmutableArray<string>? Columns { get; init; }

    /// <summary>Gets the text that the table is filtered by.</summary>
    public string Filter { get; init; } = "";

    /// <summary>Gets the chosen pair; null chooses the first of the ranking.</summary>
    public PairName? Chosen { get; init; }

    /// <summary>Gets the pair kept for comparison.</summary>
    public PairName? Pinned { get; init; }

    /// <summary>Gets the glass whose partners the map shades; null shades those of the chosen pair's positive glass.</summary>
    public string? ChosenGlass { get; init; }

    /// <summary>Gets what stands on the vertical axis of the map.</summary>
    public MapAxes Axes { get; init; }

    /// <summary>Gets the id of the stock that the page was made with; null stands for today's.</summary>
    public string? StockId { get; init; }

    private ImmutableSortedDictionary<string, string> Texts { get; init; } = ImmutableSortedDictionary.Create<string, string>(StringComparer.Ordinal);

    /// <summary>Gets the part of the state that the ranking depends on; the rest at its defaults.</summary>
    public WorkbenchState ForRanking() => this with
    {
        SortBy = null,
        SortDescending = false,
        Columns = null,
        Filter = "",
        Chosen = null,
        Pinned = null,
        ChosenGlass = null,
        Axes = MapAxes.PartialDispersion,
    };

    /// <summary>Gets what stands in a field.</summary>
    public string TextOf(NumberField field) => Texts.GetValueOrDefault(field.Key, field.Default);

    /// <summary>Gets the state with another text in a field, cut to <see cref="NumberField.MaxLength"/>.</summary>
    public WorkbenchState With(NumberField field, string text)
    {
        string kept = text.Length > NumberField.MaxLength ? text[..NumberField.MaxLength] : text;
        return this with { Texts = kept == field.Default ? Texts.Remove(field.Key) : Texts.SetItem(field.Key, kept) };
    }
}
