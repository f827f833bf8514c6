using System.Globalization;

namespace GlassPair.Optics.Spectrum;

/// <summary>The wavelengths from a shortest to a longest one, both included.</summary>
/// <remarks><c>default</c> is empty: it contains no wavelength that can be stated.</remarks>
public readonly record struct WavelengthRange
{
    /// <summary>Makes the range from the shortest to the longest wavelength.</summary>
    /// <exception cref="ArgumentException">The shortest does not lie below the longest.</exception>
    public WavelengthRange(Wavelength shortest, Wavelength longest)
    {
        if (!(shortest < longest))
        {
            throw new ArgumentException($"The shortest wavelength, {shortest}, must lie below the longest, {longest}.", nameof(shortest));
        }

        (Shortest, Longest) = (shortest, longest);
    }

    /// <summary>Gets the short end.</summary>
    public Wavelength Shortest { get; }

    /// <summary>Gets the long end.</summary>
    public Wavelength Longest { get; }

    /// <summary>Makes a range from two values in nanometers.</summary>
    /// <exception cref="ArgumentException">An end cannot be a wavelength, or they are not in rising order.</exception>
    public static WavelengthRange FromNanometers(double shortest, double longest) =>
        new(Wavelength.FromNanometers(shortest), Wavelength.FromNanometers(longest));

    /// <summary>Tells whether a wavelength lies in the range, ends included.</summary>
    public bool Contains(Wavelength wavelength) => wavelength >= Shortest && wavelength <= Longest;

    /// <summary>Both ends with the unit, such as <c>350 to 2325 nm</c>.</summary>
    public override string ToString() =>
        string.Create(CultureInfo.InvariantCulture, $"{Shortest.Nanometers:0.####} to {Longest.Nanometers:0.####} nm");
}
