using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>A glass as its maker describes it: how it refracts, and what else the catalogue knows of it.</summary>
/// <remarks>
/// The index is relative to air at the glass's reference temperature and 101 325 Pa. What the catalogue does not say is null.
/// Two glasses are the same when they are the same object: compare <see cref="Id"/>, or <see cref="Formula"/> for identical dispersion.
/// </remarks>
public sealed class Glass
{
    /// <summary>Makes a glass from what every glass has.</summary>
    /// <exception cref="ArgumentException">The formula gives no index above 1 somewhere in the range.</exception>
    public Glass(string maker, string name, DispersionFormula formula, WavelengthRange range)
    {
        ArgumentException.ThrowIfNullOrWhiteSpace(maker);
        ArgumentException.ThrowIfNullOrWhiteSpace(name);
        if (formula.FindFault(range) is { } fault)
        {
            throw new ArgumentException($"The formula of {maker}/{name} gives no index above 1 at {fault}, inside its range, {range}.", nameof(formula));
        }

        (Maker, Name, Formula, Range) = (maker, name, formula, range);
        Id = $"{maker}/{name}";
    }

    /// <summary>Gets the maker, lower case.</summary>
    public string Maker { get; }

    /// <summary>Gets the maker's name of the glass.</summary>
    public string Name { get; }

    /// <summary>Gets <c>maker/name</c>, unique in a stock.</summary>
    public string Id { get; }

    /// <summary>Gets the dispersion formula.</summary>
    public DispersionFormula Formula { get; }

    /// <summary>Gets the wavelengths for which the formula holds.</summary>
    public WavelengthRange Range { get; }

    /// <summary>Gets what the maker states and the tool does not compute with.</summary>
    public StatedValues Stated { get; init; } = new();

    /// <summary>Gets the coefficients of the index's change with temperature.</summary>
    public ThermalIndex? Thermal { get; init; }

    /// <summary>Gets the temperature of the index data, degrees Celsius.</summary>
    public double? ReferenceCelsius { get; init; }

    /// <summary>Gets the extinction coefficient in rising wavelength; empty where unknown.</summary>
    public ImmutableArray<ExtinctionSample> Extinction { get; init; } = [];

    /// <summary>Gets the linear expansion from −30 °C to +70 °C, per kelvin.</summary>
    public double? ExpansionPerKelvin { get; init; }

    /// <summary>Gets the linear expansion from +20 °C to +300 °C, per kelvin.</summary>
    public double? HighExpansionPerKelvin { get; init; }

    /// <summary>Gets the density in g/cm³.</summary>
    public double? DensityGramsPerCm3 { get; init; }

    /// <summary>Gets the maker's resistance classes.</summary>
    public ResistanceClasses Resistance { get; init; } = new();

    /// <summary>Gets how the glass could be had, as the edition said.</summary>
    public Supply Supply { get; init; } = Supply.Unconfirmed;

    /// <summary>Gets the name of the glass that replaces this one.</summary>
    public string? ReplacedBy { get; init; }

    /// <summary>Gets whether the catalogue says that the glass contains lead.</summary>
    public bool ContainsLead { get; init; }

    /// <summary>Gets remarks on how the glass is worked, such as <c>precision molding</c>.</summary>
    public string? Process { get; init; }

    /// <summary>Gets the anneal rate of the index data, kelvin per hour.</summary>
    public double? AnnealRateKelvinPerHour { get; init; }

    /// <summary>Gets the year of the maker's list.</summary>
    public string? Edition { get; init; }

    /// <summary>Gets the measured indices that the formula was fitted to; null where the maker states the formula.</summary>
    public DispersionFit? Fit { get; init; }

    /// <summary>Gets the index at a wavelength, relative to air at the reference temperature.</summary>
    /// <exception cref="WavelengthOutOfRangeException">The wavelength lies outside <see cref="Range"/>.</exception>
    public double IndexAt(Wavelength wavelength) =>
        Range.Contains(wavelength)
            ? Math.Sqrt(Formula.IndexSquaredAt(wavelength.Micrometers))
            : throw new WavelengthOutOfRangeException(Id, wavelength, Range);

    /// <summary>Gets dn/dλ per micrometer at a wavelength.</summary>
    /// <exception cref="WavelengthOutOfRangeException">The wavelength lies outside <see cref="Range"/>.</exception>
    public double DispersionAt(Wavelength wavelength) =>
        Formula.SlopeOfIndexSquaredAt(wavelength.Micrometers) / (2.0 * IndexAt(wavelength));

    /// <summary>Tells whether the glass has an index over a whole band.</summary>
    public bool Covers(Band band) => Range.Contains(band.ShortEnd) && Range.Contains(band.LongEnd);

    /// <summary><see cref="Id"/>.</summary>
    public override string ToString() => Id;
}
