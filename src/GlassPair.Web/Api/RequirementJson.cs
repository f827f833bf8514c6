using System.ComponentModel.DataAnnotations;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Api;

/// <summary>What the lens must do.</summary>
public sealed record RequirementJson
{
    /// <summary>Gets the focal length at the design wavelength, mm, 1 to 100,000.</summary>
    /// <example>320</example>
    [Range(Requirement.MinFocalLength, Requirement.MaxFocalLength)]
    public required double FocalLengthMm { get; init; }

    /// <summary>Gets the f-number, 0.7 to 200.</summary>
    /// <example>8</example>
    [Range(Requirement.MinFNumber, Requirement.MaxFNumber)]
    public required double FNumber { get; init; }

    /// <summary>Gets the half field, 0 to 40 degrees; left out, 0.</summary>
    /// <example>0.6</example>
    [Range(0.0, Requirement.MaxHalfField)]
    public double? HalfFieldDeg { get; init; }

    /// <summary>Gets the wavelengths that matter.</summary>
    public required BandJson Band { get; init; }

    /// <summary>Gets how the powers are chosen; left out, <c>bandBalanced</c>.</summary>
    public ColorBalance? Balance { get; init; }

    /// <summary>Gets how the elements are held; left out, <c>cemented</c>.</summary>
    public Construction? Construction { get; init; }

    /// <summary>Gets the air space of an air-spaced pair, mm, from 0 to less than the focal length; only with <c>airSpaced</c>.</summary>
    [Range(0.0, Requirement.MaxFocalLength)]
    public double? SpacingMm { get; init; }

    /// <summary>Gets limits on the elements; left out, there are none.</summary>
    public ElementLimitsJson? Limits { get; init; }

    /// <summary>Gets the temperatures and the housing; left out, they do not matter.</summary>
    public TemperatureJson? Temperature { get; init; }
}

/// <summary>How the elements are held.</summary>
public enum Construction
{
    /// <summary>In contact.</summary>
    Cemented,

    /// <summary>With air between them.</summary>
    AirSpaced,
}

/// <summary>
/// The wavelengths that matter: three wavelengths with a number of <c>samples</c> spaced evenly between the ends,
/// or a list <c>samplesNm</c> with <c>weights</c>, of which the ends and the middle serve where the three are left out.
/// </summary>
public sealed record BandJson
{
    /// <summary>Gets the short end, nm, 100 to 20,000.</summary>
    /// <example>486.1327</example>
    [Range(Wavelength.MinNanometers, Wavelength.MaxNanometers)]
    public double? ShortNm { get; init; }

    /// <summary>Gets the design wavelength, nm, between the ends.</summary>
    /// <example>587.5618</example>
    [Range(Wavelength.MinNanometers, Wavelength.MaxNanometers)]
    public double? DesignNm { get; init; }

    /// <summary>Gets the long end, nm, at least 1 nm above the short end.</summary>
    /// <example>656.2725</example>
    [Range(Wavelength.MinNanometers, Wavelength.MaxNanometers)]
    public double? LongNm { get; init; }

    /// <summary>Gets how many samples of equal weight are spaced evenly in wavelength from end to end, 3 to 41.</summary>
    /// <example>9</example>
    [Range(Band.MinSamples, Band.MaxSamples)]
    public int? Samples { get; init; }

    /// <summary>Gets 3 to 41 wavelengths of one's own, nm, in rising order.</summary>
    [MinLength(Band.MinSamples)]
    [MaxLength(Band.MaxSamples)]
    [ItemRange(Wavelength.MinNanometers, Wavelength.MaxNanometers)]
    public double[]? SamplesNm { get; init; }

    /// <summary>Gets the weight of each of <c>samplesNm</c>, 0 to 1,000,000, scaled to sum to 1; left out, they are equal.</summary>
    [MinLength(Band.MinSamples)]
    [MaxLength(Band.MaxSamples)]
    [ItemRange(0.0, 1e6)]
    public double[]? Weights { get; init; }
}

/// <summary>Limits on the elements.</summary>
public sealed record ElementLimitsJson
{
    /// <summary>Gets the largest |φᵢ|/Φ, 1 to 100; left out, any.</summary>
    /// <example>3</example>
    [Range(Requirement.MinElementPower, Requirement.MaxElementPower)]
    public double? MaxElementPower { get; init; }
}

/// <summary>The temperatures that the lens must stand, and what holds it.</summary>
public sealed record TemperatureJson
{
    /// <summary>Gets the lowest temperature, degrees Celsius, −200 to 500.</summary>
    /// <example>-20</example>
    [Range(-200.0, 500.0)]
    public required double FromC { get; init; }

    /// <summary>Gets the highest temperature, degrees Celsius, −200 to 500, not below the lowest.</summary>
    /// <example>50</example>
    [Range(-200.0, 500.0)]
    public required double ToC { get; init; }

    /// <summary>Gets the housing's linear expansion per kelvin, −0.0001 to 0.001.</summary>
    /// <example>0.0000236</example>
    [Range(-1e-4, 1e-3)]
    public required double HousingCtePerK { get; init; }
}
