using System.Collections.Immutable;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Addresses;

/// <summary>A number that the requirement form asks for: its name in the address, its unit, what is allowed and what it means.</summary>
/// <param name="Key">Its name in the address.</param>
/// <param name="Label">What people call it.</param>
/// <param name="Unit">The unit it is typed in.</param>
/// <param name="Min">The smallest value, included.</param>
/// <param name="Max">The largest value, included.</param>
/// <param name="Default">The text of an untouched form; it is left out of the address.</param>
/// <param name="Meaning">What it is for and what it limits, as a sentence.</param>
public sealed record NumberField(string Key, string Label, string Unit, double Min, double Max, string Default, string Meaning)
{
    /// <summary>The most characters that a field keeps.</summary>
    public const int MaxLength = 40;

    /// <summary>Focal length.</summary>
    public static NumberField FocalLength { get; } = new(
        "f", "Focal length", "mm", Requirement.MinFocalLength, Requirement.MaxFocalLength, "",
        "At the design wavelength. All focal shifts grow with it.");

    /// <summary>f-number.</summary>
    public static NumberField FNumber { get; } = new(
        "n", "f-number", "f/#", Requirement.MinFNumber, Requirement.MaxFNumber, "",
        "Focal length over aperture. It sets the depth of focus, and with it how much color may be left.");

    /// <summary>Half field.</summary>
    public static NumberField HalfField { get; } = new(
        "field", "Half field", "°", 0.0, Requirement.MaxHalfField, "0",
        "From the axis to the edge of the image. Thin-lens color does not depend on it.");

    /// <summary>Short end of the band.</summary>
    public static NumberField ShortEnd { get; } = new(
        "short", "Short end", "nm", Wavelength.MinNanometers, Wavelength.MaxNanometers, "F'",
        "In nanometers, or a line by name. A glass without an index here is left out, never extrapolated.");

    /// <summary>Design wavelength.</summary>
    public static NumberField Design { get; } = new(
        "design", "Design wavelength", "nm", Wavelength.MinNanometers, Wavelength.MaxNanometers, "e",
        "Focal length and powers hold here; focal shifts count from here. It lies between the ends.");

    /// <summary>Long end of the band.</summary>
    public static NumberField LongEnd { get; } = new(
        "long", "Long end", "nm", Wavelength.MinNanometers, Wavelength.MaxNanometers, "C'",
        "In nanometers, or a line by name.");

    /// <summary>Number of samples of the band.</summary>
    public static NumberField Samples { get; } = new(
        "samples", "Samples", "equal", Band.MinSamples, Band.MaxSamples, "9",
        "Wavelengths spaced evenly from end to end, all of equal weight, over which the color is balanced and measured.");

    /// <summary>Air space of an air-spaced pair.</summary>
    public static NumberField AirSpace { get; } = new(
        "air", "Air space", "mm", 0.0, Requirement.MaxFocalLength, "0.5",
        "Between the thin elements; less than the focal length. Past a largest space that depends on the glasses no powers unite the colors.");

    /// <summary>Limit on the power of an element.</summary>
    public static NumberField ElementPower { get; } = new(
        "power", "Element power", "× Φ", Requirement.MinElementPower, Requirement.MaxElementPower, "3",
        "The largest |φ| of an element in units of the whole power Φ. Strong elements mean steep curves; empty sets no limit.");

    /// <summary>Lowest temperature.</summary>
    public static NumberField FromCelsius { get; } = new(
        "from", "Coldest", "°C", -200.0, 500.0, "",
        "The temperatures that the lens must stand. Empty leaves temperature out.");

    /// <summary>Highest temperature.</summary>
    public static NumberField ToCelsius { get; } = new(
        "to", "Hottest", "°C", -200.0, 500.0, "",
        "Not below the coldest.");

    /// <summary>Expansion of the housing.</summary>
    public static NumberField Housing { get; } = new(
        "housing", "Housing α", "10⁻⁶/K", -100.0, 1000.0, "23.6",
        "The expansion of what holds lens and image apart: aluminum 23.6, steel about 11, titanium about 9, invar about 1.");

    /// <summary>Relative Abbe tolerance of the grade ordered.</summary>
    public static NumberField AbbeTolerance { get; } = new(
        "grade", "Abbe tolerance", "± %", 0.0, 5.0, "0.5",
        "Of the grade that will be ordered; 0 once a melt is measured. It sets the data floor: color that cannot be known before the glass is delivered.");

    /// <summary>Index precision.</summary>
    public static NumberField IndexPrecision { get; } = new(
        "precision", "Index precision", "10⁻⁶", 0.1, 1000.0, "10",
        "How far an index from the catalogue's formula can be off from line to line. A usual melt certificate is good to 30, a precise one to 10.");

    /// <summary>Limit on the difference in expansion.</summary>
    public static NumberField ExpansionDifference { get; } = new(
        "expansion", "Δα of the pair", "10⁻⁶/K", 0.0, 50.0, "",
        "The largest difference in expansion between the two glasses, −30 to +70 °C. Up to 1.5 is cemented without worry, above 3 hardly; empty sets no limit.");

    /// <summary>Gets every field in the order of the form.</summary>
    public static ImmutableArray<NumberField> All { get; } =
    [
        FocalLength, FNumber, HalfField, ShortEnd, Design, LongEnd, Samples, AirSpace, ElementPower, FromCelsius, ToCelsius, Housing,
        AbbeTolerance, IndexPrecision, ExpansionDifference,
    ];

    /// <summary>Gets whether the field may stay empty.</summary>
    public bool IsOptional => this == ElementPower || this == FromCelsius || this == ToCelsius || this == ExpansionDifference;

    /// <summary>Gets whether the field takes a wavelength, as a number or as a line.</summary>
    public bool IsWavelength => Unit == "nm";

    /// <summary>Gets the allowed range in words.</summary>
    public string AllowedRange => IsWavelength
        ? FormattableString.Invariant($"{Min:#,0.####} to {Max:#,0.####} nm, or a line such as {Default}")
        : FormattableString.Invariant($"{Min:#,0.####} to {Max:#,0.####}{(Unit is "f/#" or "equal" ? "" : $" {Unit.TrimStart('±', ' ')}")}");

    /// <summary>Reads what was typed, wavelengths in nm; the problem as a sentence that says what is allowed where it cannot be used.</summary>
    /// <param name="text">The text, not blank.</param>
    /// <param name="value">The number; 0 where there is none.</param>
    public string? FindProblem(string text, out double value)
    {
        if (IsWavelength && WavelengthText.FindLine(text) is { } line)
        {
            value = line.Wavelength.Nanometers;
            return null;
        }

        return !TypedNumber.TryRead(text, out value, out string? problem) ? $"{problem} Allowed: {AllowedRange}."
            : !(value >= Min && value <= Max) ? $"{TypedNumber.Shorten(text.Trim())} is too {(value > Max ? "large" : "small")}. Allowed: {AllowedRange}."
            : null;
    }
}
