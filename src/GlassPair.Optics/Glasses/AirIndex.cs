using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>The refractive index of dry air with 450 ppm of carbon dioxide. Source: [air].</summary>
/// <remarks>
/// Ciddor states −40 °C to +100 °C, 80 kPa to 120 kPa and 300 nm to 1690 nm; past that the same equations serve as an extrapolation, good enough for lenses
/// since air adds so little. Moisture, left out, lowers the index by less than 1e-6 at 20 °C.
/// </remarks>
public static class AirIndex
{
    /// <summary>The pressure of standard air, Pa.</summary>
    public const double StandardPascals = 101_325.0;

    /// <summary>The lowest temperature, degrees Celsius.</summary>
    public const double MinCelsius = -100.0;

    /// <summary>The highest temperature, degrees Celsius.</summary>
    public const double MaxCelsius = 140.0;

    /// <summary>The highest pressure, Pa; the lowest is zero, a vacuum.</summary>
    public const double MaxPascals = 200_000.0;

    /// <summary>The shortest wavelength, nm: at 132 nm the equations have a pole.</summary>
    public const double MinNanometers = 180.0;

    private const double AbsoluteZero = -273.15;

    // The compressibility of dry air: Z = 1 − (p/T)(a₀ + a₁ t + a₂ t²) + d (p/T)²
    private const double A0 = 1.58123e-6;
    private const double A1 = -2.9331e-8;
    private const double A2 = 1.1043e-10;
    private const double SecondVirial = 1.83e-11;

    /// <summary>Gets the index of air.</summary>
    /// <param name="wavelength">Wavelength in standard air, from 180 nm.</param>
    /// <param name="celsius">−100 °C to +140 °C.</param>
    /// <param name="pascals">0 to 200 000 Pa.</param>
    /// <exception cref="ArgumentOutOfRangeException">A value lies outside its range.</exception>
    public static double Of(Wavelength wavelength, double celsius, double pascals = StandardPascals) =>
        1.0 + RefractivityOf(wavelength, celsius, pascals);

    /// <summary>Gets the change of the index of air with temperature at constant pressure, per kelvin.</summary>
    /// <inheritdoc cref="Of"/>
    public static double RatePerKelvin(Wavelength wavelength, double celsius, double pascals = StandardPascals)
    {
        // n − 1 goes with ρ = p/(Z T): its logarithm changes by −1/T − Z′/Z
        double kelvin = celsius - AbsoluteZero;
        double ratio = pascals / kelvin;
        double slope = (ratio / kelvin * (Virial(celsius) - (2.0 * SecondVirial * ratio))) - (ratio * ((2.0 * A2 * celsius) + A1));
        return RefractivityOf(wavelength, celsius, pascals) * ((-1.0 / kelvin) - (slope / Compressibility(celsius, pascals)));
    }

    /// <summary>n − 1 at a wavelength in vacuum, micrometers.</summary>
    internal static double RefractivityAtVacuum(double micrometers, double celsius, double pascals)
    {
        // (n − 1) 10⁸ = k₁/(k₀ − σ²) + k₃/(k₂ − σ²) at 15 °C and 101 325 Pa, in proportion to the density
        double square = 1.0 / (micrometers * micrometers);
        return 1e-8 * ((5_792_105.0 / (238.0185 - square)) + (167_917.0 / (57.362 - square))) * Density(celsius, pascals) / Density(15.0, StandardPascals);
    }

    private static double RefractivityOf(Wavelength wavelength, double celsius, double pascals)
    {
        Guard.InRange(wavelength.Nanometers, MinNanometers, Wavelength.MaxNanometers, nameof(wavelength));
        Guard.InRange(celsius, MinCelsius, MaxCelsius);
        Guard.InRange(pascals, 0.0, MaxPascals);
        double vacuum = wavelength.Micrometers * (1.0 + RefractivityAtVacuum(wavelength.Micrometers, 15.0, StandardPascals));
        return RefractivityAtVacuum(vacuum, celsius, pascals);
    }

    private static double Density(double celsius, double pascals) =>
        pascals / (Compressibility(celsius, pascals) * (celsius - AbsoluteZero));

    private static double Virial(double celsius) => A0 + (A1 * celsius) + (A2 * celsius * celsius);

    private static double Compressibility(double celsius, double pascals)
    {
        double ratio = pascals / (celsius - AbsoluteZero);
        return 1.0 - (ratio * Virial(celsius)) + (SecondVirial * ratio * ratio);
    }
}
