using System.Collections.Immutable;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Practice;

/// <summary>What looking at a thin lens over temperature came to: a <see cref="ThermalDefocus"/>, or <see cref="NoThermalDefocus"/> with the reason.</summary>
public abstract record ThermalOutcome;

/// <summary>A lens whose change with temperature cannot be told.</summary>
/// <param name="Sentence">Why, in words, with the glass that lacks data.</param>
public sealed record NoThermalDefocus(string Sentence) : ThermalOutcome;

/// <summary>A thin lens at one temperature, not refocused.</summary>
/// <param name="Celsius">The temperature, degrees Celsius.</param>
/// <param name="Defocus">Where the design wavelength focuses, counted from the detector that the housing carries, mm; positive behind it.</param>
/// <param name="RmsFocalShift">The color residual at this temperature, mm.</param>
public sealed record ThermalState(double Celsius, double Defocus, double RmsFocalShift);

/// <summary>How a thin lens, focused at 20 °C, moves its focus against its housing over the required temperatures. Source: [thermal-defocus].</summary>
/// <param name="ThermalPowers">γ = (dn/dT)/(n − 1) − α of each element at 20 °C, per kelvin, with the index relative to air.</param>
/// <param name="DefocusPerKelvin">The change of <see cref="ThermalState.Defocus"/> at 20 °C, mm per kelvin.</param>
/// <param name="Coldest">The lens at the lowest temperature.</param>
/// <param name="Hottest">The lens at the highest temperature.</param>
/// <param name="DepthOfFocus">The quarter-wave depth of focus, ± this many mm.</param>
/// <param name="Cautions">What a user should know, in words.</param>
public sealed record ThermalDefocus(
    ImmutableArray<double> ThermalPowers,
    double DefocusPerKelvin,
    ThermalState Coldest,
    ThermalState Hottest,
    double DepthOfFocus,
    ImmutableArray<string> Cautions) : ThermalOutcome
{
    /// <summary>The temperature at which lens and detector are put together, degrees Celsius.</summary>
    public const double FocusedCelsius = 20.0;

    /// <summary>Gets the defocus of larger size, mm, with its sign.</summary>
    public double Worst => Math.Abs(Coldest.Defocus) > Math.Abs(Hottest.Defocus) ? Coldest.Defocus : Hottest.Defocus;

    /// <summary>Gets whether the defocus stays inside the depth of focus at both ends.</summary>
    public bool Holds => Math.Abs(Worst) <= DepthOfFocus;

    /// <summary>Evaluates a solution over the temperatures of its requirement.</summary>
    public static ThermalOutcome Of(ThinSolution solution)
    {
        if (solution.Requirement.Temperature is not { } span)
        {
            return new NoThermalDefocus("The requirement names no temperatures.");
        }

        if (!(span.FromCelsius >= AirIndex.MinCelsius && span.ToCelsius <= AirIndex.MaxCelsius))
        {
            return new NoThermalDefocus(FormattableString.Invariant(
                $"The index of glass is known from {AirIndex.MinCelsius:0} °C to {AirIndex.MaxCelsius:0} °C, not from {span.FromCelsius:0.#} °C to {span.ToCelsius:0.#} °C."));
        }

        Band band = solution.Requirement.Band;
        ImmutableArray<Glass> glasses = [.. solution.Elements.Select(e => e.Glass)];
        string[] gaps = [.. glasses.Distinct().SelectMany(g => GapsOf(g, band))];
        if (gaps.Length > 0)
        {
            return new NoThermalDefocus(string.Join(" ", gaps));
        }

        ImmutableArray<double> thermalPowers = [.. glasses.Select(g => ThermalPowerOf(g, band.Design))];
        return new ThermalDefocus(
            thermalPowers,
            RateOf(solution, thermalPowers, span),
            StateAt(solution, span, span.FromCelsius),
            StateAt(solution, span, span.ToCelsius),
            solution.Requirement.DepthOfFocus,
            [.. GlassExpansion.CautionsOf(glasses)]);
    }

    private static IEnumerable<string> GapsOf(Glass glass, Band band)
    {
        if (IndexAtTemperature.TryOf(glass, band.ShortEnd, FocusedCelsius) is null)
        {
            yield return glass.Thermal is null
                ? $"{glass.Id} states no change of index with temperature."
                : $"{glass.Id} states a change of index with temperature that does not reach {band.ShortEnd}.";
        }

        if (GlassExpansion.TryOf(glass) is null)
        {
            yield return $"{glass.Id} states no expansion.";
        }
    }

    private static double ThermalPowerOf(Glass glass, Wavelength wavelength)
    {
        IndexAtTemperature index = IndexAtTemperature.TryOf(glass, wavelength, FocusedCelsius)!;
        return (index.RelativeRatePerKelvin / (index.Relative - 1.0)) - GlassExpansion.TryOf(glass)!.Value;
    }

    /// <summary>−f [Σ yᵢ² pᵢ γᵢ + (b + δ p₁²) α], b = y₂ the distance to the image and δ the air space in units of f, α the housing's expansion.</summary>
    private static double RateOf(ThinSolution solution, ImmutableArray<double> thermalPowers, TemperatureSpan span)
    {
        double front = solution.RelativePowers[0];
        double space = solution.Requirement.AirSpace.GetValueOrDefault() / solution.Requirement.FocalLength;
        double height = 1.0 - (space * front);
        double sum = front * thermalPowers[0];
        for (int i = 1; i < thermalPowers.Length; i++)
        {
            sum += height * height * solution.RelativePowers[i] * thermalPowers[i];
        }

        return -solution.Requirement.FocalLength * (sum + ((height + (space * front * front)) * span.HousingExpansionPerKelvin));
    }

    private static ThermalState StateAt(ThinSolution solution, TemperatureSpan span, double celsius)
    {
        (Requirement requirement, Band band) = (solution.Requirement, solution.Requirement.Band);
        double growth = 1.0 + (span.HousingExpansionPerKelvin * (celsius - FocusedCelsius));
        double space = requirement.AirSpace.GetValueOrDefault() / requirement.FocalLength;
        double detector = (1.0 - (space * solution.RelativePowers[0])) * growth;

        double DefocusAt(Wavelength wavelength) =>
            requirement.FocalLength * (ImageDistance([.. solution.Elements.Select((e, i) => solution.RelativePowers[i] * PowerRatio(e.Glass, band.Design, wavelength, celsius))], space * growth) - detector);

        double[] defocus = [.. band.Samples.Select(s => DefocusAt(s.Wavelength))];
        return new ThermalState(celsius, DefocusAt(band.Design), Math.Sqrt(band.VarianceOf(defocus)));
    }

    /// <summary>The power of an element at a wavelength and temperature in units of that at the design wavelength and 20 °C: (n − 1) over that there, over the growth of its radii.</summary>
    private static double PowerRatio(Glass glass, Wavelength design, Wavelength wavelength, double celsius) =>
        (IndexAtTemperature.TryOf(glass, wavelength, celsius)!.Relative - 1.0)
        / (IndexAtTemperature.TryOf(glass, design, FocusedCelsius)!.Relative - 1.0)
        / (1.0 + (GlassExpansion.TryOf(glass)!.Value * (celsius - FocusedCelsius)));

    /// <summary>From the rear element to the image of a far object, in units of f: (1 − δ P₁)/(P₁ + P₂ − δ P₁ P₂); 1/ΣP for elements in contact.</summary>
    private static double ImageDistance(ReadOnlySpan<double> powers, double space)
    {
        double sum = 0.0;
        foreach (double power in powers)
        {
            sum += power;
        }

        return space == 0.0 ? 1.0 / sum : (1.0 - (space * powers[0])) / (sum - (space * powers[0] * powers[1]));
    }
}
