using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>An index was asked for outside the wavelengths for which the glass's formula holds.</summary>
public sealed class WavelengthOutOfRangeException : ArgumentException
{
    /// <summary>Says which glass, which wavelength and which range.</summary>
    public WavelengthOutOfRangeException(string glass, Wavelength wavelength, WavelengthRange range)
        : base($"{glass} has no index at {wavelength}: its formula holds from {range}.")
    {
        (Glass, Wavelength, Range) = (glass, wavelength, range);
    }

    /// <summary>Gets the glass, <c>maker/name</c>.</summary>
    public string Glass { get; }

    /// <summary>Gets the wavelength that was asked for.</summary>
    public Wavelength Wavelength { get; }

    /// <summary>Gets the range for which the formula holds.</summary>
    public WavelengthRange Range { get; }
}
