using System.Globalization;

namespace GlassPair.Web.Components.Charts;

/// <summary>Numbers as people read them: a true minus sign, a point, units after a space that does not break.</summary>
public static class NumberText
{
    private const string Superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹";

    /// <summary>Writes a number with a fixed count of decimals, such as <c>−1.59</c>.</summary>
    public static string Fixed(double value, int decimals)
    {
        string digits = Math.Abs(value).ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return value < 0.0 && digits.AsSpan().ContainsAnyInRange('1', '9') ? "−" + digits : digits;
    }

    /// <summary>Writes a number with its sign, plus or minus; zero has none.</summary>
    public static string WithSign(double value, int decimals)
    {
        string text = Fixed(value, decimals);
        return value > 0.0 && text.AsSpan().ContainsAnyInRange('1', '9') ? "+" + text : text;
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
}
