using System.Globalization;

namespace GlassPair.Web.Api;

/// <summary>Reads the parameters of a query string and notes everything that is wrong.</summary>
/// <remarks>A parameter must be known and stand once. An empty one counts as left out.</remarks>
public sealed class QueryReading
{
    private const NumberStyles Decimal = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;

    private readonly IQueryCollection _query;

    /// <summary>Starts to read.</summary>
    /// <param name="query">What the client sent.</param>
    /// <param name="known">The parameters that there are.</param>
    public QueryReading(IQueryCollection query, params string[] known)
    {
        _query = query;
        foreach (string name in query.Keys)
        {
            if (!known.Contains(name))
            {
                Faults.Add(Shown(name), known.Length > 0 ? $"Unknown parameter. Known here: {string.Join(", ", known)}." : "Unknown parameter. There are none here.");
            }
            else if (query[name].Count > 1)
            {
                Faults.Add(name, "Stands more than once.");
            }
        }
    }

    /// <summary>Gets what is wrong.</summary>
    public FieldFaults Faults { get; } = new();

    /// <summary>Gets a text; null where it is left out or faulty.</summary>
    public string? Text(string name)
    {
        if (Raw(name) is not { } text)
        {
            return null;
        }

        if (text.Length <= StrictJson.LongestText && !text.Any(char.IsControl))
        {
            return text;
        }

        Faults.Add(name, FormattableString.Invariant($"Must be a text of at most {StrictJson.LongestText} characters without control characters."));
        return null;
    }

    /// <summary>Gets a whole number, or the usual value where it is left out or faulty.</summary>
    public int Whole(string name, int minimum, int maximum, int usual)
    {
        if (Raw(name) is not { } text)
        {
            return usual;
        }

        if (int.TryParse(text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out int value) && value >= minimum && value <= maximum)
        {
            return value;
        }

        Faults.Add(name, FormattableString.Invariant($"Must be a whole number from {minimum} to {maximum}. Given: {Shown(text)}."));
        return usual;
    }

    /// <summary>Gets a number; null where it is left out or faulty.</summary>
    public double? Number(string name, double minimum, double maximum) =>
        Raw(name) is { } text ? NumberIn(name, text, minimum, maximum) : null;

    /// <summary>Gets numbers separated by commas, at least one; empty where one is faulty.</summary>
    public double[] Numbers(string name, double minimum, double maximum, int most)
    {
        string[] texts = Raw(name)?.Split(',', StringSplitOptions.TrimEntries) ?? [];
        if (texts.Length == 0 || texts.Length > most)
        {
            Faults.Add(name, FormattableString.Invariant($"Must hold 1 to {most} numbers separated by commas; it holds {texts.Length}."));
            return [];
        }

        double?[] values = [.. texts.Select((t, i) => NumberIn(FormattableString.Invariant($"{name}[{i}]"), t, minimum, maximum))];
        return values.Contains(null) ? [] : [.. values.Select(v => v!.Value)];
    }

    /// <summary>Gets words separated by commas, out of those allowed; null where the parameter is left out or faulty.</summary>
    public string[]? Words(string name, IEnumerable<string> allowed)
    {
        if (Raw(name) is not { } text)
        {
            return null;
        }

        string[] words = text.Split(',', StringSplitOptions.TrimEntries);
        if (words.All(w => allowed.Contains(w, StringComparer.OrdinalIgnoreCase)))
        {
            return words;
        }

        Faults.Add(name, $"Must hold words out of {string.Join(", ", allowed)}, separated by commas. Given: {Shown(text)}.");
        return null;
    }

    /// <summary>Gets words of an enumeration separated by commas; null where the parameter is left out or faulty.</summary>
    public T[]? Words<T>(string name)
        where T : struct, Enum =>
        Words(name, StrictJson.WordsOf(typeof(T)))?.Select(w => Enum.Parse<T>(w, ignoreCase: true)).ToArray();

    private string? Raw(string name) => _query[name] is [{ Length: > 0 } text] ? text : null;

    private double? NumberIn(string path, string text, double minimum, double maximum)
    {
        if (double.TryParse(text, Decimal, CultureInfo.InvariantCulture, out double value) && value >= minimum && value <= maximum)
        {
            return value;
        }

        Faults.Add(path, StrictJson.RangeSentence(minimum, maximum) + $" Given: {Shown(text)}.");
        return null;
    }

    private static string Shown(string text) => StrictJson.Shown(text);
}
