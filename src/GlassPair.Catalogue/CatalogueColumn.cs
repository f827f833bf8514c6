using System.Collections.Immutable;

namespace GlassPair.Catalogue;

/// <summary>What the cells of a column hold.</summary>
public enum CellKind
{
    /// <summary>Text of one line.</summary>
    Text,

    /// <summary>One of a few words.</summary>
    Choice,

    /// <summary>A number.</summary>
    Number,

    /// <summary>A list of wavelengths with a number each, <c>nm value; nm value; …</c></summary>
    Samples,
}

/// <summary>A column of the catalogue's format.</summary>
public sealed class CatalogueColumn
{
    private CatalogueColumn(string name, CellKind kind, string meaning) => (Name, Kind, Meaning) = (name, kind, meaning);

    /// <summary>Gets the name as it stands in the header; where the values have a unit, the name ends with it.</summary>
    public string Name { get; }

    /// <summary>Gets what the cells hold.</summary>
    public CellKind Kind { get; }

    /// <summary>Gets what the values mean, as a sentence.</summary>
    public string Meaning { get; }

    /// <summary>Gets the most characters of a text.</summary>
    public int MaxLength { get; private init; }

    /// <summary>Gets the words of a choice.</summary>
    public ImmutableArray<string> Choices { get; private init; } = [];

    /// <summary>Gets unit and range of the numbers; of samples, those of the value beside the wavelength.</summary>
    public Quantity? Quantity { get; private init; }

    internal static CatalogueColumn OfText(string name, int maxLength, string meaning) => new(name, CellKind.Text, meaning) { MaxLength = maxLength };

    internal static CatalogueColumn OfChoice(string name, ImmutableArray<string> choices, string meaning) => new(name, CellKind.Choice, meaning) { Choices = choices };

    internal static CatalogueColumn OfNumber(string name, Quantity quantity, string meaning) => new(name, CellKind.Number, meaning) { Quantity = quantity };

    internal static CatalogueColumn OfSamples(string name, Quantity quantity, string meaning) => new(name, CellKind.Samples, meaning) { Quantity = quantity };
}
