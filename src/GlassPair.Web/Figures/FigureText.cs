using System.Globalization;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;

namespace GlassPair.Web.Figures;

/// <summary>Writes figures for people: fixed digits, a real minus sign, no exponent, the unit left to the place that shows them.</summary>
public static class FigureText
{
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
