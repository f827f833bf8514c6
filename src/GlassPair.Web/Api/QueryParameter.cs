using System.Globalization;

namespace GlassPair.Web.Api;

/// <summary>What a parameter of a query string holds.</summary>
public enum QueryKind
{
    /// <summary>A text of at most <see cref="StrictJson.LongestText"/> characters.</summary>
    Text,

    /// <summary>Words separated by commas.</summary>
    Words,

    /// <summary>A whole number.</summary>
    Whole,

    /// <summary>A number.</summary>
    Number,

    /// <summary>Numbers separated by commas.</summary>
    Numbers,
}

/// <summary>A parameter of a query string: what is read is what the OpenAPI document describes.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Kind">What it holds.</param>
/// <param name="Description">What it means.</param>
/// <param name="Minimum">The smallest number allowed.</param>
/// <param name="Maximum">The largest number allowed.</param>
/// <param name="Most">The most numbers in a list.</param>
/// <param name="Usual">The value where it is left out.</param>
/// <param name="IsRequired">Whether it must not be left out.</param>
public sealed record QueryParameter(
    string Name,
    QueryKind Kind,
    string Description,
    double Minimum = double.MinValue,
    double Maximum = double.MaxValue,
    int Most = 1,
    int Usual = 0,
    bool IsRequired = false)
{
    /// <summary>Gets the sentence that says what is allowed.</summary>
    public string Allowed => Kind switch
    {
        QueryKind.Whole => string.Create(CultureInfo.InvariantCulture, $"Must be a whole number from {Minimum} to {Maximum}."),
        _ => StrictJson.RangeSentence(Minimum, Maximum),
    };
}
