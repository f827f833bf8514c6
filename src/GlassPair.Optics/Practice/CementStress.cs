using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Practice;

/// <summary>What the strength of a cemented joint is judged by. Every value is an assumption that the user can replace.</summary>
public sealed record CementAssumptions
{
    /// <summary>Gets the assumption of most shops: 80 GPa, 10 MPa, 20 °C. Source: [cement].</summary>
    public static CementAssumptions Usual { get; } = new();

    /// <summary>Gets Young's modulus of both glasses, 10 to 200 GPa; glass has 50 to 130.</summary>
    public double YoungGigapascals { get; init => field = Guard.InRange(value, 10.0, 200.0); } = 80.0;

    /// <summary>Gets the tensile stress that glass bears for years, 0.1 to 100 MPa.</summary>
    public double LimitMegapascals { get; init => field = Guard.InRange(value, 0.1, 100.0); } = 10.0;

    /// <summary>Gets the temperature at which the cement set and the joint is free of stress, −100 °C to +140 °C.</summary>
    public double StressFreeCelsius { get; init => field = Guard.InRange(value, AirIndex.MinCelsius, AirIndex.MaxCelsius); } = 20.0;
}

/// <summary>How much two glasses that expand differently strain the cement between them: a quick check, not a proof of strength. Source: [cement].</summary>
/// <param name="ExpansionDifference">α of the rear minus α of the front glass, per kelvin.</param>
/// <param name="TemperatureChange">The largest departure from the stress-free temperature, K, with its sign.</param>
/// <param name="GlassMegapascals">Tensile stress in the glass near the edge of a thin hard joint, E |Δα ΔT|, MPa; the diameter hardly matters.</param>
/// <param name="CementMegapascals">Shear stress in the cement, two thirds of it, MPa.</param>
/// <param name="EdgeSlip">How far the edges would move past each other if nothing held them, |Δα ΔT| D/2, mm: what a soft or thick layer must take up.</param>
/// <param name="Holds">Whether the stress in the glass stays inside the limit.</param>
/// <param name="Cautions">What a user should know, in words.</param>
public sealed record CementStress(
    double ExpansionDifference,
    double TemperatureChange,
    double GlassMegapascals,
    double CementMegapascals,
    double EdgeSlip,
    bool Holds,
    ImmutableArray<string> Cautions)
{
    /// <summary>Up to this difference in expansion, per kelvin, any usual size is cemented. Common practice, no source.</summary>
    public const double HarmlessDifference = 1.5e-6;

    /// <summary>Up to this difference, per kelvin, small elements are. Common practice, no source.</summary>
    public const double DelicateDifference = 3e-6;

    /// <summary>The diameter of a small element, mm. Common practice, no source.</summary>
    public const double SmallDiameter = 50.0;

    /// <summary>Judges a joint; null where a maker does not state the expansion of a glass.</summary>
    /// <param name="front">The glass before the joint.</param>
    /// <param name="rear">The glass behind it.</param>
    /// <param name="diameter">The diameter of the joint, above 0 mm.</param>
    /// <param name="span">The temperatures that the joint must stand.</param>
    /// <param name="assumptions">What it is judged by.</param>
    /// <exception cref="ArgumentOutOfRangeException">The diameter is not above 0 mm and finite.</exception>
    public static CementStress? TryOf(Glass front, Glass rear, double diameter, TemperatureSpan span, CementAssumptions assumptions)
    {
        Guard.InRange(diameter, double.Epsilon, double.MaxValue);
        if (GlassExpansion.TryOf(front) is not { } frontExpansion || GlassExpansion.TryOf(rear) is not { } rearExpansion)
        {
            return null;
        }

        double difference = rearExpansion - frontExpansion;
        (double down, double up) = (span.FromCelsius - assumptions.StressFreeCelsius, span.ToCelsius - assumptions.StressFreeCelsius);
        double change = Math.Abs(down) > Math.Abs(up) ? down : up;
        double strain = Math.Abs(difference * change);
        double stress = strain * assumptions.YoungGigapascals * 1000.0;
        bool holds = stress <= assumptions.LimitMegapascals;
        return new CementStress(
            difference, change, stress, 2.0 / 3.0 * stress, strain * diameter / 2.0, holds,
            [.. CautionsOf(front, rear, Math.Abs(difference), diameter)]);
    }

    private static IEnumerable<string> CautionsOf(Glass front, Glass rear, double difference, double diameter)
    {
        string pair = FormattableString.Invariant($"{front.Id} and {rear.Id} differ in expansion by {difference * 1e6:0.0}e-6 per kelvin");
        if (difference > DelicateDifference)
        {
            yield return $"{pair}: take a soft cement or an air space.";
        }
        else if (difference > HarmlessDifference && diameter >= SmallDiameter)
        {
            yield return $"{pair}: cement below {SmallDiameter:0} mm diameter or for mild temperatures only.";
        }

        foreach (string caution in GlassExpansion.CautionsOf([front, rear]))
        {
            yield return caution;
        }
    }
}
