using System.Collections.Immutable;
using GlassPair.Optics.Glasses;

namespace GlassPair.Web.Components.Glasses;

/// <summary>Everything that the fit page shows, as it stands in the page's address. Immutable.</summary>
public sealed record FitState
{
    /// <summary>The most characters of the name of the fitted glass.</summary>
    public const int MaxNameLength = 60;

    /// <summary>Gets the state of an untouched page.</summary>
    public static FitState Empty { get; } = new();

    /// <summary>Gets the pasted table.</summary>
    public string Text { get; init; } = "";

    /// <summary>Gets what the user says about how the table is written.</summary>
    public TableForm Table { get; init; } = TableForm.Open;

    /// <summary>Gets the form to fit; null for the one that describes the indices best.</summary>
    public DispersionForm? Form { get; init; }

    /// <summary>Gets the number of terms; null for the number that describes the indices best.</summary>
    public int? Terms { get; init; }

    /// <summary>Gets the wavelengths that are left out of the fit, nm.</summary>
    public ImmutableSortedSet<double> LeftOut { get; init; } = [];

    /// <summary>Gets the name that the fitted glass bears in a catalogue row, <c>maker/name</c>.</summary>
    public string Name { get; init; } = "";

    /// <summary>Gets the state with a line left out, or taken in again.</summary>
    public FitState With(double nanometers, bool isUsed) =>
        this with { LeftOut = isUsed ? LeftOut.Remove(nanometers) : LeftOut.Add(nanometers) };
}
