using System.ComponentModel.DataAnnotations;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;

namespace GlassPair.Web.Api;

/// <summary>What to rank.</summary>
public sealed record ShortlistRequestJson
{
    /// <summary>The most names in a list.</summary>
    public const int MostNames = 2_000;

    /// <summary>Gets what the lens must do.</summary>
    public required RequirementJson Requirement { get; init; }

    /// <summary>Gets the stock's id; left out, the default stock.</summary>
    public string? Stock { get; init; }

    /// <summary>Gets the makers to keep; left out, all.</summary>
    /// <example>["schott", "ohara"]</example>
    [MinLength(1)]
    [MaxLength(MostNames)]
    public string[]? Makers { get; init; }

    /// <summary>Gets the supply states to keep; left out, all.</summary>
    [MinLength(1)]
    [MaxLength(MostNames)]
    public Supply[]? Supply { get; init; }

    /// <summary>Gets glasses, <c>maker/name</c>, never to use.</summary>
    [MaxLength(MostNames)]
    public string[]? Exclude { get; init; }

    /// <summary>Gets glasses, <c>maker/name</c>, of which every combination holds at least one; they pass the limits on maker, supply, lead, and molding.</summary>
    [MaxLength(MostNames)]
    public string[]? Include { get; init; }

    /// <summary>Gets the figure to rank by, smallest first; left out, <c>colorResidual</c>.</summary>
    public RankBy? RankBy { get; init; }

    /// <summary>Gets how many elements, 2 or 3; left out, 2. Three stand in contact, and the element power is limited to 4 where the requirement sets no limit.</summary>
    [Range(2, 3)]
    public int? Elements { get; init; }

    /// <summary>Gets how many candidates to answer with, 1 to 5,000; left out, 50.</summary>
    [Range(1, ShortlistRequest.MaxTake)]
    public int? Take { get; init; }

    /// <summary>Gets in how many candidates one glass may stand, 1 to 5,000; left out, any number.</summary>
    [Range(1, ShortlistRequest.MaxTake)]
    public int? PairsPerGlass { get; init; }

    /// <summary>Gets the relative Abbe tolerance of the grade ordered, percent, 0 to 5; left out, 0.5.</summary>
    [Range(0.0, 5.0)]
    public double? AbbeTolerancePercent { get; init; }

    /// <summary>Gets what an index of the catalogue can be off, 0 to 0.01; left out, 0.00001.</summary>
    [Range(0.0, 0.01)]
    public double? IndexPrecision { get; init; }

    /// <summary>Gets the largest difference in linear expansion (−30 °C to +70 °C) between the glasses, per kelvin, 0 to 0.0001; left out, any.</summary>
    [Range(0.0, 1e-4)]
    public double? MaxExpansionDifferencePerK { get; init; }

    /// <summary>Gets whether glasses known to contain lead may be used; left out, they may.</summary>
    public bool? AllowLead { get; init; }

    /// <summary>Gets whether glasses made for molding may be used; left out, they may.</summary>
    public bool? AllowMolding { get; init; }
}
