using System.Collections.Immutable;
using GlassPair.Optics.Glasses;

namespace GlassPair.Optics.Rankings;

/// <summary>Which glasses may be used, and together.</summary>
public sealed record GlassLimits
{
    /// <summary>Every glass, with every other.</summary>
    public static GlassLimits None { get; } = new();

    /// <summary>Gets the makers to keep; null keeps all.</summary>
    public ImmutableSortedSet<string>? Makers { get; init; }

    /// <summary>Gets the supply states to keep; null keeps all.</summary>
    public ImmutableSortedSet<Supply>? Supply { get; init; }

    /// <summary>Gets whether glasses known to contain lead may be used.</summary>
    public bool AllowLead { get; init; } = true;

    /// <summary>Gets whether glasses made for molding may be used.</summary>
    public bool AllowMolding { get; init; } = true;

    /// <summary>Gets the glasses, <c>maker/name</c>, never to use.</summary>
    public ImmutableSortedSet<string> Exclude { get; init; } = ImmutableSortedSet.Create<string>(StringComparer.OrdinalIgnoreCase);

    /// <summary>Gets the glasses, <c>maker/name</c>, of which each combination must hold at least one; they pass the maker and supply limits. Empty demands none.</summary>
    public ImmutableSortedSet<string> Include { get; init; } = ImmutableSortedSet.Create<string>(StringComparer.OrdinalIgnoreCase);

    /// <summary>Gets the sign of the power that the glass of <see cref="Include"/> must take in a pair; null allows either.</summary>
    /// <remarks>Of two glasses the one with the larger Abbe number counts as the positive one.</remarks>
    public PowerSign? IncludeAs { get; init; }

    /// <summary>Gets the largest difference in linear expansion (−30 °C to +70 °C) between the glasses, per kelvin; null allows any.</summary>
    public double? ExpansionDifference { get; init; }

    /// <summary>Tells why a glass may not be used; null where it may.</summary>
    public GlassDropReason? ReasonAgainst(Glass glass)
    {
        if (Exclude.Contains(glass.Id))
        {
            return GlassDropReason.Excluded;
        }

        if (Include.Contains(glass.Id))
        {
            return null;
        }

        return Makers is { } makers && !makers.Contains(glass.Maker) ? GlassDropReason.Maker
            : Supply is { } supply && !supply.Contains(glass.Supply) ? GlassDropReason.Supply
            : !AllowLead && glass.ContainsLead ? GlassDropReason.Lead
            : !AllowMolding && glass.Process is not null ? GlassDropReason.Molding
            : null;
    }

    /// <summary>Tells why two glasses that may be used may not be used together; null where they may.</summary>
    public PairDropReason? ReasonAgainst(Glass a, Glass b) =>
        ExpansionDifference is not { } most ? null
        : a.ExpansionPerKelvin is not { } first || b.ExpansionPerKelvin is not { } second ? PairDropReason.ExpansionUnknown
        : Math.Abs(first - second) > most ? PairDropReason.ExpansionDifference
        : null;
}

/// <summary>Why a glass was not considered.</summary>
public enum GlassDropReason
{
    /// <summary>Its formula does not cover the band.</summary>
    Band,

    /// <summary>Its maker is not among those to keep.</summary>
    Maker,

    /// <summary>Its supply state is not among those to keep.</summary>
    Supply,

    /// <summary>It contains lead.</summary>
    Lead,

    /// <summary>It is made for molding.</summary>
    Molding,

    /// <summary>It is excluded by name.</summary>
    Excluded,
}

/// <summary>Why a combination of considered glasses was not ranked.</summary>
public enum PairDropReason
{
    /// <summary>It holds none of the glasses that must be included.</summary>
    NotIncluded,

    /// <summary>No finite powers balance it.</summary>
    DispersionsAlike,

    /// <summary>The air space is too large for it.</summary>
    AirSpace,

    /// <summary>An element's power exceeds the limit.</summary>
    ElementPower,

    /// <summary>The glasses expand too differently.</summary>
    ExpansionDifference,

    /// <summary>The expansion of a glass is not known, and a limit is set on it.</summary>
    ExpansionUnknown,
}
