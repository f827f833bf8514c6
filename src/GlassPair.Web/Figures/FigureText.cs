using System.Globalization;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;

namespace GlassPair.Web.Figures;

/// <summary>Writes figures for people: fixed digits, a real minus sign, the unit left to the place that shows them unless the method says otherwise.</summary>
public static class FigureText
{
    private const string Superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹";

    /// <summary>Writes a number with so many decimals.</summary>
    public static string Fixed(double value, int decimals)
    {
        string text = value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return text.AsSpan().ContainsAnyInRange('1', '9') ? text.Replace('-', '−') : text.TrimStart('-');
    }

    /// <summary>Writes a number with its sign, plus as well as minus.</summary>
    public static string WithSign(double value, int decimals)
    {
        string text = Fixed(value, decimals);
        return text[0] != '−' && text.AsSpan().ContainsAnyInRange('1', '9') ? "+" + text : text;
    }

    /// <summary>Writes a number with a power of ten, such as <c>−1.24·10⁻⁴</c>.</summary>
    public static string PowerOfTen(double value, int decimals)
    {
        if (value == 0.0)
        {
            return Fixed(0.0, decimals);
        }

        // The rounded digits decide on the exponent: 9.996 is 1.00·10¹.
        string[] parts = value.ToString("E" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture).Split('E');
        int exponent = int.Parse(parts[1], CultureInfo.InvariantCulture);
        string mantissa = parts[0].Replace('-', '−');
        return exponent == 0 ? mantissa : $"{mantissa}·10{(exponent < 0 ? "⁻" : "")}{string.Concat(Math.Abs(exponent).ToString(CultureInfo.InvariantCulture).Select(d => Superscripts[d - '0']))}";
    }

    /// <summary>Writes a small length in the unit that suits it, such as <c>−30 µm</c> or <c>0.38 mm</c>.</summary>
    public static string ShortLength(double millimeters) => Math.Abs(millimeters) switch
    {
        >= 9.995 => Fixed(millimeters, 1) + "\u00A0mm",
        >= 0.9995 => Fixed(millimeters, 2) + "\u00A0mm",
        >= 0.009995 => Fixed(millimeters * 1e3, 0) + "\u00A0µm",
        >= 0.0009995 => Fixed(millimeters * 1e3, 1) + "\u00A0µm",
        _ => Fixed(millimeters * 1e3, 2) + "\u00A0µm",
    };

    /// <summary>Writes a number with three significant digits, or all digits before the point.</summary>
    public static string ThreeDigits(double value) => Fixed(value, DecimalsFor(Math.Abs(value)));

    /// <summary>Writes a number in the fewest digits, at most four after the point.</summary>
    public static string Plain(double value) => value.ToString("#,0.####", CultureInfo.InvariantCulture).Replace('-', '−');

    /// <summary>Writes a count with its thousands parted.</summary>
    public static string Count(long value) => value.ToString("#,0", CultureInfo.InvariantCulture);

    /// <summary>Writes an f-number with the mark of the trade, such as <c>f/4.1</c>.</summary>
    public static string FNumber(double value) => "f/" + ThreeDigits(value);

    /// <summary>Gets the digits after the point that micrometers deserve at a depth of focus in mm.</summary>
    public static int MicrometerDecimals(Requirement requirement) => requirement.DepthOfFocus switch
    {
        >= 0.01 => 1,
        >= 0.001 => 2,
        _ => 3,
    };

    /// <summary>Gets the words for a supply state.</summary>
    public static string Of(Supply supply) => supply switch
    {
        Supply.Recommended => "recommended",
        Supply.Listed => "listed",
        Supply.OnRequest => "on request",
        Supply.Discontinued => "discontinued",
        _ => "unconfirmed",
    };

    /// <summary>Gets the sign for a supply state: the fuller, the surer.</summary>
    public static char SignOf(Supply supply) => supply switch
    {
        Supply.Recommended => '●',
        Supply.Listed => '○',
        Supply.OnRequest => '◔',
        Supply.Discontinued => '×',
        _ => '?',
    };

    private static int DecimalsFor(double size) => size switch
    {
        >= 99.95 => 0,
        >= 9.995 => 1,
        >= 0.9995 => 2,
        >= 0.09995 => 3,
        _ => 4,
    };
}
