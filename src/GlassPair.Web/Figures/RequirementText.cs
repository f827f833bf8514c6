using System.Globalization;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Figures;

/// <summary>A requirement in one line, as head, title and files say it.</summary>
public static class RequirementText
{
    /// <summary>Gets the line in full.</summary>
    public static string Of(Requirement requirement) => $"{NameOf(requirement)}, {DetailsOf(requirement)}";

    /// <summary>Gets focal length and f-number.</summary>
    public static string NameOf(Requirement requirement) =>
        $"{FigureText.Plain(requirement.FocalLength)} mm f/{FigureText.Plain(requirement.FNumber)}";

    /// <summary>Gets both ends of a band to the nanometer.</summary>
    public static string Of(Band band) => string.Create(CultureInfo.InvariantCulture, $"{band.ShortEnd.Nanometers:0}–{band.LongEnd.Nanometers:0} nm");

    /// <summary>Gets the rest: band, field, build and temperature.</summary>
    public static string DetailsOf(Requirement requirement) => string.Join(", ", Parts(requirement));

    private static IEnumerable<string> Parts(Requirement requirement)
    {
        yield return Of(requirement.Band);
        if (requirement.HalfFieldDegrees > 0.0)
        {
            yield return $"±{FigureText.Plain(requirement.HalfFieldDegrees)}°";
        }

        yield return requirement.AirSpace is { } space ? $"air-spaced {FigureText.Plain(space)} mm" : "cemented";
        if (requirement.Temperature is { } span)
        {
            yield return $"{FigureText.Plain(span.FromCelsius)} to {FigureText.Plain(span.ToCelsius)} °C";
        }
    }
}
