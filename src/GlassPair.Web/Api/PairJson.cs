using System.ComponentModel.DataAnnotations;
using GlassPair.Optics.Requirements;

namespace GlassPair.Web.Api;

/// <summary>A question about glasses that are already chosen.</summary>
public abstract record ChosenGlassesJson
{
    /// <summary>Gets what the lens must do.</summary>
    public required RequirementJson Requirement { get; init; }

    /// <summary>Gets the stock's id; left out, the default stock.</summary>
    public string? Stock { get; init; }

    /// <summary>Gets the relative Abbe tolerance of the grade ordered, percent, 0 to 5; left out, 0.5.</summary>
    [Range(0.0, 5.0)]
    public double? AbbeTolerancePercent { get; init; }

    /// <summary>Gets what an index of the catalogue can be off, 0 to 0.01; left out, 0.00001.</summary>
    [Range(0.0, 0.01)]
    public double? IndexPrecision { get; init; }

    /// <summary>Gets how well the glass is known.</summary>
    internal DataQuality Quality() => QualityOf(AbbeTolerancePercent, IndexPrecision);

    /// <summary>Fills in the usual supply where a value is left out.</summary>
    internal static DataQuality QualityOf(double? abbeTolerancePercent, double? indexPrecision) => new(
        abbeTolerancePercent / 100.0 ?? DataQuality.UsualSupply.AbbeTolerance,
        indexPrecision ?? DataQuality.UsualSupply.IndexPrecision);
}

/// <summary>A question about a pair.</summary>
public sealed record PairJson : ChosenGlassesJson
{
    /// <summary>Gets the front and the rear glass, <c>maker/name</c>.</summary>
    [MinLength(2)]
    [MaxLength(2)]
    public required string[] Glasses { get; init; }
}

/// <summary>A question about a triplet in contact.</summary>
public sealed record TripletJson : ChosenGlassesJson
{
    /// <summary>Gets the three glasses, <c>maker/name</c>, in the order in which light meets them.</summary>
    [MinLength(3)]
    [MaxLength(3)]
    public required string[] Glasses { get; init; }
}
