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
    public QueryReading(IQueryCollection query, params QueryParameter[] known)
    {
        _query = query;
        foreach (string name in query.Keys)
        {
            if (!known.Any(p => p.Name == name))
            {
                Faults.Add(
                    StrictJson.Shown(name),
                    known.Length > 0 ? $"Unknown parameter. Known here: {string.Join(", ", known.Select(p => p.Name))}." : "Unknown parameter. There are none here.");
            }
            else if (query[name].Count > 1)
            {
                Faults.Add(name, "Stands more than once.");
            }
        }

        foreach (QueryParameter parameter in known.Where(p => p.IsRequired && Raw(p) is null))
        {
            Faults.Add(parameter.Name, "Missing; the parameter is required.");
        }
    }

    /// <summary>Gets what is wrong.</summary>
    public FieldFaults Faults { get; } = new();

    /// <summary>Gets a text; null where it is left out or faulty.</summary>
    public string? Text(QueryParameter parameter)
    {
        if (Raw(parameter) is not { } text)
        {
            return null;
        }

        if (text.Length <= StrictJson.LongestText && !text.Any(char.IsControl))
        {
            return text;
        }

        Faults.Add(parameter.Name, FormattableString.Invariant($"Must be a text of at most {StrictJson.LongestText} characters without control characters."));
        return null;
    }

    /// <summary>Gets a whole number, or the usual value where it is left out or faulty.</summary>
    public int Whole(QueryParameter parameter)
    {
        if (Raw(parameter) is not { } text)
        {
            return parameter.Usual;
        }

        if (int.TryParse(text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out int value) && value >= parameter.Minimum && value <= parameter.Maximum)
        {
            return value;
        }

        Faults.Add(parameter.Name, $"{parameter.Allowed} Given: {StrictJson.Shown(text)}.");
        return parameter.Usual;
    }

    /// <summary>Gets a number; null where it is left out or faulty.</summary>
    public double? Number(QueryParameter parameter) => Raw(parameter) is { } text ? NumberIn(parameter, parameter.Name, text) : null;

    /// <summary>Gets numbers separated by commas; empty where they are left out or one is faulty.</summary>
    public double[] Numbers(QueryParameter parameter)
    {
        string[] texts = Raw(parameter)?.Split(',', StringSplitOptions.TrimEntries) ?? [];
        if (texts.Length > parameter.Most)
        {
            Faults.Add(parameter.Name, FormattableString.Invariant($"Must hold at most {parameter.Most} numbers separated by commas; it holds {texts.Length}."));
            return [];
        }

        double?[] values = [.. texts.Select((t, i) => NumberIn(parameter, FormattableString.Invariant($"{parameter.Name}[{i}]"), t))];
        return values.Contains(null) ? [] : [.. values.Select(v => v!.Value)];
    }

    /// <summary>Gets words separated by commas, out of those allowed; null where the parameter is left out or faulty.</summary>
    public string[]? Words(QueryParameter parameter, IEnumerable<string> allowed)
    {
        if (Raw(parameter) is not { } text)
        {
            return null;
        }

        string[] words = text.Split(',', StringSplitOptions.TrimEntries);
        if (words.All(w => allowed.Contains(w, StringComparer.OrdinalIgnoreCase)))
        {
            return words;
        }

        Faults.Add(parameter.Name, $"Must hold words out of {string.Join(", ", allowed)}, separated by commas. Given: {StrictJson.Shown(text)}.");
        return null;
    }

    /// <summary>Gets words of an enumeration separated by commas; null where the parameter is left out or faulty.</summary>
    public T[]? Words<T>(QueryParameter parameter)
        where T : struct, Enum =>
        Words(parameter, StrictJson.WordsOf(typeof(T)))?.Select(w => Enum.Parse<T>(w, ignoreCase: true)).ToArray();

    private string? Raw(QueryParameter parameter) => _query[parameter.Name] is [{ Length: > 0 } text] ? text : null;

    private double? NumberIn(QueryParameter parameter, string path, string text)
    {
        if (double.TryParse(text, Decimal, CultureInfo.InvariantCulture, out double value) && value >= parameter.Minimum && value <= parameter.Maximum)
        {
            return value;
        }

        Faults.Add(path, $"{parameter.Allowed} Given: {StrictJson.Shown(text)}.");
        return null;
    }
}
