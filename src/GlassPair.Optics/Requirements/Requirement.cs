using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Requirements;

/// <summary>How the powers of the elements are chosen.</summary>
public enum ColorBalance
{
    /// <summary>Least weighted RMS focal shift over the samples of the band.</summary>
    BandBalanced,

    /// <summary>The short and the long end to one focus: the classical achromat.</summary>
    EndsUnited,
}

/// <summary>The temperatures that the lens must stand, and what holds it.</summary>
/// <param name="FromCelsius">The lowest temperature, degrees Celsius.</param>
/// <param name="ToCelsius">The highest temperature, degrees Celsius; not below the lowest.</param>
/// <param name="HousingExpansionPerKelvin">The housing's linear expansion, per kelvin.</param>
public sealed record TemperatureSpan(double FromCelsius, double ToCelsius, double HousingExpansionPerKelvin);

/// <summary>What the lens must do. Immutable; every value has been checked against the ranges stated here.</summary>
public sealed record Requirement
{
    /// <summary>The shortest focal length, mm.</summary>
    public const double MinFocalLength = 1.0;

    /// <summary>The longest focal length, mm.</summary>
    public const double MaxFocalLength = 100_000.0;

    /// <summary>The fastest f-number.</summary>
    public const double MinFNumber = 0.7;

    /// <summary>The slowest f-number.</summary>
    public const double MaxFNumber = 200.0;

    /// <summary>The widest half field, degrees.</summary>
    public const double MaxHalfField = 40.0;

    /// <summary>The smallest limit on element power that leaves any achromat.</summary>
    public const double MinElementPower = 1.0;

    /// <summary>The largest limit on element power.</summary>
    public const double MaxElementPower = 100.0;

    /// <summary>Makes a requirement.</summary>
    /// <param name="focalLength">Focal length, 1 to 100,000 mm.</param>
    /// <param name="fNumber">f-number, 0.7 to 200.</param>
    /// <param name="band">The wavelengths that matter.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value lies outside its range.</exception>
    public Requirement(double focalLength, double fNumber, Band band)
    {
        FocalLength = Guard.InRange(focalLength, MinFocalLength, MaxFocalLength);
        FNumber = Guard.InRange(fNumber, MinFNumber, MaxFNumber);
        Band = band;
    }

    /// <summary>Gets the focal length at the design wavelength, mm.</summary>
    public double FocalLength { get; }

    /// <summary>Gets the f-number.</summary>
    public double FNumber { get; }

    /// <summary>Gets the wavelengths that matter.</summary>
    public Band Band { get; }

    /// <summary>Gets the half field, 0 to 40 degrees.</summary>
    public double HalfFieldDegrees { get; init => field = Guard.InRange(value, 0.0, MaxHalfField); }

    /// <summary>Gets how the powers are chosen.</summary>
    public ColorBalance Balance { get; init; }

    /// <summary>Gets the air space between thin elements, mm, from 0 to less than the focal length; null where they are cemented.</summary>
    public double? AirSpace
    {
        get;
        init => field = value is null || (value >= 0.0 && value < FocalLength) ? value
            : throw new ArgumentOutOfRangeException(nameof(AirSpace), value, "Must be zero or more and less than the focal length.");
    }

    /// <summary>Gets the largest |φᵢ|/Φ allowed, 1 to 100; null where any power may be.</summary>
    public double? ElementPowerLimit
    {
        get;
        init => field = value is { } limit ? Guard.InRange(limit, MinElementPower, MaxElementPower) : null;
    }

    /// <summary>Gets the temperatures and the housing; null where they do not matter.</summary>
    public TemperatureSpan? Temperature { get; init; }

    /// <summary>Gets the diameter of the entrance pupil, mm.</summary>
    public double ApertureDiameter => FocalLength / FNumber;

    /// <summary>Gets the height of the image at the edge of the field, mm.</summary>
    public double ImageHeight => FocalLength * Math.Tan(HalfFieldDegrees * Math.PI / 180.0);

    /// <summary>Gets the quarter-wave depth of focus at the design wavelength, ± this many mm: 2 λ N². Source: [depth-of-focus].</summary>
    public double DepthOfFocus => 2.0 * Band.Design.Millimeters * FNumber * FNumber;
}
