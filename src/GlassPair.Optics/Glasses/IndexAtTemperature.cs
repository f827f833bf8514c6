using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>The index of a glass at a temperature of its own, and how it changes there.</summary>
/// <param name="Relative">The index relative to air of that temperature and pressure, which a lens in air shows.</param>
/// <param name="Absolute">The index relative to vacuum.</param>
/// <param name="RelativeRatePerKelvin">The change of <paramref name="Relative"/> with temperature, glass and air warming together.</param>
/// <param name="AbsoluteRatePerKelvin">The change of <paramref name="Absolute"/> with temperature.</param>
public sealed record IndexAtTemperature(double Relative, double Absolute, double RelativeRatePerKelvin, double AbsoluteRatePerKelvin)
{
    /// <summary>Nearer than this to the resonance of its coefficients, in units of that wavelength, the formula says nothing.</summary>
    private const double NearestToResonance = 1.1;

    /// <summary>Evaluates a glass at a temperature; null where its maker states no coefficients, or none for so short a wavelength.</summary>
    /// <remarks>Makers give the coefficients for 365 nm to 1014 nm and −100 °C to +140 °C; other wavelengths of the glass's range are an extrapolation. Source: [dn-dt].</remarks>
    /// <param name="glass">The glass.</param>
    /// <param name="wavelength">A wavelength in the glass's range.</param>
    /// <param name="celsius">−100 °C to +140 °C.</param>
    /// <param name="pascals">The pressure of the air, 0 to 200 000 Pa.</param>
    /// <exception cref="WavelengthOutOfRangeException">The wavelength lies outside the range of the glass.</exception>
    /// <exception cref="ArgumentOutOfRangeException">The temperature or the pressure lies outside its range.</exception>
    public static IndexAtTemperature? TryOf(Glass glass, Wavelength wavelength, double celsius, double pascals = AirIndex.StandardPascals)
    {
        double reference = glass.IndexAt(wavelength);
        if (glass is not { Thermal: { } thermal, ReferenceCelsius: { } referenceCelsius }
            || wavelength.Micrometers < NearestToResonance * Math.Abs(thermal.ResonanceMicrometers)
            || wavelength.Nanometers < AirIndex.MinNanometers)
        {
            return null;
        }

        // Δn = (n² − 1)/(2n) [D₀ ΔT + D₁ ΔT² + D₂ ΔT³ + (E₀ ΔT + E₁ ΔT²)/(λ² − λ_TK²)]
        double rise = celsius - referenceCelsius;
        double room = (wavelength.Micrometers * wavelength.Micrometers) - (thermal.ResonanceMicrometers * thermal.ResonanceMicrometers);
        double factor = ((reference * reference) - 1.0) / (2.0 * reference);
        double change = rise * (thermal.D0 + (rise * (thermal.D1 + (rise * thermal.D2))) + ((thermal.E0 + (rise * thermal.E1)) / room));
        double rate = thermal.D0 + (rise * ((2.0 * thermal.D1) + (3.0 * rise * thermal.D2))) + ((thermal.E0 + (2.0 * rise * thermal.E1)) / room);

        double air = AirIndex.Of(wavelength, celsius, pascals);
        double absolute = (reference * AirIndex.Of(wavelength, referenceCelsius)) + (factor * change);
        double relative = absolute / air;
        return new IndexAtTemperature(
            relative,
            absolute,
            ((factor * rate) - (relative * AirIndex.RatePerKelvin(wavelength, celsius, pascals))) / air,
            factor * rate);
    }
}
