using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Addresses;

namespace GlassPair.Web.Components.Glasses;

/// <summary>What the page of a glass can be asked for, as it stands in its address. Numbers are kept as typed. Immutable.</summary>
/// <param name="Thickness">The path through the glass.</param>
/// <param name="ShortEnd">The short end of the band in which other glasses come near.</param>
/// <param name="Design">The design wavelength of that band.</param>
/// <param name="LongEnd">The long end of that band.</param>
/// <param name="StockId">The id of the stock that the page was made with; null stands for today's.</param>
public sealed record GlassPageState(string Thickness, string ShortEnd, string Design, string LongEnd, string? StockId)
{
    /// <summary>Gets the field of the thickness.</summary>
    public static NumberField ThicknessField { get; } = new(
        "thickness", "Thickness", "mm", 0.01, 1000.0, "10", "The path through the glass. The makers print 10 mm and 25 mm, mostly.");

    /// <summary>Gets the field of the short end.</summary>
    public static NumberField ShortField { get; } = NumberField.ShortEnd with { Default = "F" };

    /// <summary>Gets the field of the design wavelength.</summary>
    public static NumberField DesignField { get; } = NumberField.Design with { Default = "d" };

    /// <summary>Gets the field of the long end.</summary>
    public static NumberField LongField { get; } = NumberField.LongEnd with { Default = "C" };

    /// <summary>Gets the state of an untouched page: 10 mm, the lines F, d and C.</summary>
    public static GlassPageState Empty { get; } = new(ThicknessField.Default, ShortField.Default, DesignField.Default, LongField.Default, null);
}

/// <summary>What the state of a glass's page amounts to.</summary>
/// <param name="Thickness">The path through the glass, mm; null where it cannot be read.</param>
/// <param name="Band">The band; null where it cannot be read.</param>
/// <param name="Problems">What is wrong with a field, by its key, as sentences.</param>
public sealed record GlassPageReading(double? Thickness, Band? Band, ImmutableDictionary<string, string> Problems)
{
    /// <summary>Reads the fields. Never throws.</summary>
    public static GlassPageReading Of(GlassPageState state)
    {
        var problems = ImmutableDictionary.CreateBuilder<string, string>();
        double? thickness = Read(GlassPageState.ThicknessField, state.Thickness);
        double? shortEnd = Read(GlassPageState.ShortField, state.ShortEnd);
        double? design = Read(GlassPageState.DesignField, state.Design);
        double? longEnd = Read(GlassPageState.LongField, state.LongEnd);
        if (shortEnd >= design)
        {
            problems[GlassPageState.ShortField.Key] = "The short end must lie below the design wavelength.";
        }

        if (design >= longEnd)
        {
            problems[GlassPageState.LongField.Key] = "The long end must lie above the design wavelength.";
        }

        Band? band = shortEnd < design && design < longEnd
            ? Band.Even(Wavelength.FromNanometers(shortEnd.Value), Wavelength.FromNanometers(design.Value), Wavelength.FromNanometers(longEnd.Value), Band.MinSamples)
            : null;
        return new GlassPageReading(thickness, band, problems.ToImmutable());

        double? Read(NumberField field, string text)
        {
            string? problem = string.IsNullOrWhiteSpace(text) ? $"A value is needed. Allowed: {field.AllowedRange}." : null;
            double value = 0.0;
            problem ??= field.FindProblem(text, out value);
            if (problem is null)
            {
                return value;
            }

            problems[field.Key] = problem;
            return null;
        }
    }
}
