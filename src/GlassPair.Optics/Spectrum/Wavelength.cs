using System.Globalization;

namespace GlassPair.Optics.Spectrum;

/// <summary>A wavelength of light in standard air.</summary>
/// <remarks>From 100 nm to 20,000 nm, ends included. <c>default</c> is 0 nm, outside the range of every formula.</remarks>
public readonly record struct Wavelength : IComparable<Wavelength>
{
    /// <summary>The shortest wavelength that can be stated, in nanometers.</summary>
    public const double MinNanometers = 100.0;

    /// <summary>The longest wavelength that can be stated, in nanometers.</summary>
    public const double MaxNanometers = 20_000.0;

    private Wavelength(double nanometers) => Nanometers = nanometers;

    /// <summary>Gets the value in nanometers, the unit that people and the API use.</summary>
    public double Nanometers { get; }

    /// <summary>Gets the value in micrometers, the unit that dispersion formulas take.</summary>
    public double Micrometers => Nanometers / 1000.0;

    /// <summary>Gets the value in millimeters, the unit of lengths in lenses.</summary>
    public double Millimeters => Nanometers / 1e6;

    /// <summary>Makes a wavelength from a value in nanometers.</summary>
    /// <exception cref="ArgumentOutOfRangeException">Outside 100 nm to 20,000 nm, or NaN.</exception>
    public static Wavelength FromNanometers(double nanometers) => new(Guard.InRange(nanometers, MinNanometers, MaxNanometers));

    /// <inheritdoc/>
    public int CompareTo(Wavelength other) => Nanometers.CompareTo(other.Nanometers);

    /// <summary>Compares two wavelengths.</summary>
    public static bool operator <(Wavelength left, Wavelength right) => left.Nanometers < right.Nanometers;

    /// <summary>Compares two wavelengths.</summary>
    public static bool operator >(Wavelength left, Wavelength right) => left.Nanometers > right.Nanometers;

    /// <summary>Compares two wavelengths.</summary>
    public static bool operator <=(Wavelength left, Wavelength right) => left.Nanometers <= right.Nanometers;

    /// <summary>Compares two wavelengths.</summary>
    public static bool operator >=(Wavelength left, Wavelength right) => left.Nanometers >= right.Nanometers;

    /// <summary>The value with its unit, such as <c>587.5618 nm</c>.</summary>
    public override string ToString() => Nanometers.ToString("0.####", CultureInfo.InvariantCulture) + " nm";
}
