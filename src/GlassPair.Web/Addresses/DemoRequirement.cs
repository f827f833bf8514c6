using System.Text.Json;
using System.Text.Json.Serialization;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Api;

namespace GlassPair.Web.Addresses;

/// <summary>The invented example that a first visit shows.</summary>
/// <param name="Title">What it is, in a few words.</param>
/// <param name="State">The state that it fills in.</param>
public sealed record DemoRequirement(string Title, WorkbenchState State)
{
    private static readonly JsonSerializerOptions _json = new(JsonSerializerDefaults.Web) { Converters = { new JsonStringEnumConverter(JsonNamingPolicy.CamelCase) } };

    /// <summary>Reads the file that travels with the program, written as the API's requirement with a title.</summary>
    /// <exception cref="InvalidDataException">The file is not what it should be: the program is not whole.</exception>
    public static DemoRequirement Read(string path)
    {
        using FileStream file = File.OpenRead(path);
        try
        {
            using JsonDocument document = JsonDocument.Parse(file);
            RequirementJson requirement = document.RootElement.Deserialize<RequirementJson>(_json) ?? throw new InvalidDataException($"{path} is empty.");
            return new DemoRequirement(document.RootElement.GetProperty("title").GetString() ?? "", StateOf(requirement));
        }
        catch (Exception e) when (e is JsonException or KeyNotFoundException)
        {
            throw new InvalidDataException($"{path} is no requirement with a title. {e.Message}", e);
        }
    }

    private static WorkbenchState StateOf(RequirementJson requirement)
    {
        WorkbenchState state = WorkbenchState.Empty with
        {
            Balance = requirement.Balance ?? ColorBalance.BandBalanced,
            AirSpaced = requirement.Construction == Construction.AirSpaced,
        };
        return state
            .With(NumberField.FocalLength, TypedNumber.Write(requirement.FocalLengthMm))
            .With(NumberField.FNumber, TypedNumber.Write(requirement.FNumber))
            .With(NumberField.HalfField, TextOf(requirement.HalfFieldDeg ?? 0.0))
            .With(NumberField.ShortEnd, LineOrNumber(requirement.Band.ShortNm))
            .With(NumberField.Design, LineOrNumber(requirement.Band.DesignNm))
            .With(NumberField.LongEnd, LineOrNumber(requirement.Band.LongNm))
            .With(NumberField.Samples, TextOf(requirement.Band.Samples))
            .With(NumberField.AirSpace, requirement.SpacingMm is { } space ? TypedNumber.Write(space) : NumberField.AirSpace.Default)
            .With(NumberField.ElementPower, TextOf(requirement.Limits?.MaxElementPower))
            .With(NumberField.FromCelsius, TextOf(requirement.Temperature?.FromC))
            .With(NumberField.ToCelsius, TextOf(requirement.Temperature?.ToC))
            .With(NumberField.Housing, requirement.Temperature is { } span ? TypedNumber.Write(Math.Round(span.HousingCtePerK * 1e6, 9)) : NumberField.Housing.Default);
    }

    private static string TextOf(double? value) => value is { } number ? TypedNumber.Write(number) : "";

    private static string LineOrNumber(double? nanometers) => nanometers is not { } number ? ""
        : WavelengthText.LineAt(Wavelength.FromNanometers(number)) is { } line ? line.Symbol : TypedNumber.Write(number);
}
