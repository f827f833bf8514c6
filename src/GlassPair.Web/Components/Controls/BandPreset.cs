using System.Collections.Immutable;
using GlassPair.Web.Addresses;

namespace GlassPair.Web.Components.Controls;

/// <summary>A band that the trade uses often, by its lines.</summary>
/// <param name="Key">Its name in the form.</param>
/// <param name="Title">What people call it.</param>
/// <param name="ShortEnd">The line at the short end.</param>
/// <param name="Design">The line of the design wavelength.</param>
/// <param name="LongEnd">The line at the long end.</param>
public sealed record BandPreset(string Key, string Title, string ShortEnd, string Design, string LongEnd)
{
    /// <summary>Gets every preset.</summary>
    public static ImmutableArray<BandPreset> All { get; } =
    [
        new("visible-e", "visible, F′ e C′", "F'", "e", "C'"),
        new("visible-d", "visible, F d C", "F", "d", "C"),
        new("blue-red", "blue to red, g e C", "g", "e", "C"),
        new("near-infrared", "near infrared, r s t", "r", "s", "t"),
    ];

    /// <summary>Finds the preset that a state's band is.</summary>
    public static BandPreset? Of(WorkbenchState state) => All.FirstOrDefault(p =>
        p.ShortEnd == state.TextOf(NumberField.ShortEnd) && p.Design == state.TextOf(NumberField.Design) && p.LongEnd == state.TextOf(NumberField.LongEnd));

    /// <summary>Puts the band into a state.</summary>
    public WorkbenchState In(WorkbenchState state) =>
        state.With(NumberField.ShortEnd, ShortEnd).With(NumberField.Design, Design).With(NumberField.LongEnd, LongEnd);
}
