namespace GlassPair.Web.Components.Glasses;

/// <summary>The unit of pasted wavelengths.</summary>
public enum WavelengthUnit
{
    /// <summary>Nanometers.</summary>
    Nanometers,

    /// <summary>Micrometers.</summary>
    Micrometers,
}

/// <summary>What stands between two numbers of a line.</summary>
public enum FieldSeparator
{
    /// <summary>A tabulator, as spreadsheets copy.</summary>
    Tab,

    /// <summary>A semicolon.</summary>
    Semicolon,

    /// <summary>A vertical bar.</summary>
    Bar,

    /// <summary>A comma.</summary>
    Comma,

    /// <summary>One or more blanks.</summary>
    Space,
}

/// <summary>What stands before the decimals of a number.</summary>
public enum DecimalMark
{
    /// <summary>A point.</summary>
    Point,

    /// <summary>A comma.</summary>
    Comma,
}

/// <summary>How a pasted table is written. What is null is open and found out from the text.</summary>
/// <param name="Separator">What stands between two numbers.</param>
/// <param name="Mark">What stands before the decimals.</param>
/// <param name="Unit">The unit of the wavelengths.</param>
public sealed record TableForm(FieldSeparator? Separator = null, DecimalMark? Mark = null, WavelengthUnit? Unit = null)
{
    /// <summary>Gets the form of which everything is found out.</summary>
    public static TableForm Open { get; } = new();

    /// <summary>Gets whether everything is open.</summary>
    public bool IsOpen => this == Open;

    /// <summary>Names a separator.</summary>
    public static string NameOf(FieldSeparator? separator) => separator switch
    {
        FieldSeparator.Tab => "tabulator",
        FieldSeparator.Semicolon => "semicolon",
        FieldSeparator.Bar => "vertical bar",
        FieldSeparator.Comma => "comma",
        _ => "blank",
    };

    /// <summary>Names a decimal mark.</summary>
    public static string NameOf(DecimalMark? mark) => mark == DecimalMark.Comma ? "decimal comma" : "decimal point";
}
