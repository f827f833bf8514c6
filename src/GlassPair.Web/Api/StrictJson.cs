using System.Collections.Frozen;
using System.ComponentModel.DataAnnotations;
using System.Globalization;
using System.Reflection;
using System.Text.Json;
using System.Text.Json.Serialization.Metadata;

namespace GlassPair.Web.Api;

/// <summary>Reads JSON into a type and notes everything that is wrong, not only the first fault.</summary>
/// <remarks>
/// A field must be known, occur once, have its type, and lie in the range that its attributes state: the same attributes describe it in the OpenAPI document.
/// A faulty field is left at its default: ask the faults before using it. <c>null</c> means left out.
/// Lists hold numbers, texts, or objects; objects nest as deep as their types do.
/// </remarks>
public static class StrictJson
{
    /// <summary>The longest text of a field that sets no other limit, in characters.</summary>
    public const int LongestText = 64;

    private const int LongestShown = 40;

    /// <summary>Reads an object.</summary>
    /// <typeparam name="T">A type of init-only properties, with a constructor without parameters.</typeparam>
    public static T Read<T>(JsonElement element, JsonSerializerOptions options, FieldFaults faults)
        where T : class =>
        (T)ReadObject(element, options.GetTypeInfo(typeof(T)), "", faults);

    /// <summary>Gets an object of which nothing could be read.</summary>
    public static T Empty<T>(JsonSerializerOptions options)
        where T : class =>
        (T)options.GetTypeInfo(typeof(T)).CreateObject!();

    /// <summary>Gets the allowed words of an enumeration as JSON spells them.</summary>
    public static IEnumerable<string> WordsOf(Type enumeration) => Enum.GetNames(enumeration).Select(JsonNamingPolicy.CamelCase.ConvertName);

    /// <summary>Says what a number must be.</summary>
    public static string RangeSentence(double minimum, double maximum) =>
        string.Create(CultureInfo.InvariantCulture, $"Must be a number from {minimum} to {maximum}.");

    private static object ReadObject(JsonElement element, JsonTypeInfo type, string path, FieldFaults faults)
    {
        object result = type.CreateObject!();
        if (element.ValueKind != JsonValueKind.Object)
        {
            faults.Add(path.Length > 0 ? path : FieldFaults.Body, $"Must be an object with the fields {string.Join(", ", type.Properties.Select(p => p.Name))}.");
            return result;
        }

        FrozenDictionary<string, JsonPropertyInfo> known = type.Properties.ToFrozenDictionary(p => p.Name, StringComparer.Ordinal);
        HashSet<string> seen = new(StringComparer.Ordinal);
        foreach (JsonProperty field in element.EnumerateObject())
        {
            string? name = TextOf(() => field.Name);
            string where = Join(path, name is null ? "?" : Shown(name));
            if (name is null || !known.TryGetValue(name, out JsonPropertyInfo? property))
            {
                faults.Add(where, $"Unknown field. Known here: {string.Join(", ", known.Keys.Order(StringComparer.Ordinal))}.");
            }
            else if (!seen.Add(name))
            {
                faults.Add(where, "Stands more than once.");
            }
            else if (field.Value.ValueKind != JsonValueKind.Null && ReadValue(field.Value, property.PropertyType, property, where, faults) is { } value)
            {
                property.Set!(result, value);
            }
            else if (field.Value.ValueKind == JsonValueKind.Null)
            {
                seen.Remove(name);
            }
        }

        foreach (JsonPropertyInfo property in type.Properties.Where(p => p.IsRequired && !seen.Contains(p.Name)))
        {
            faults.Add(Join(path, property.Name), "Missing; the field is required.");
        }

        return result;
    }

    private static object? ReadValue(JsonElement element, Type type, JsonPropertyInfo property, string path, FieldFaults faults)
    {
        Type plain = Nullable.GetUnderlyingType(type) ?? type;
        return plain switch
        {
            _ when plain == typeof(double) => (object?)ReadNumber(element, property, path, faults),
            _ when plain == typeof(int) => ReadInteger(element, property, path, faults),
            _ when plain == typeof(bool) => ReadBoolean(element, path, faults),
            _ when plain == typeof(string) => ReadText(element, property, path, faults),
            _ when plain.IsEnum => ReadWord(element, plain, path, faults),
            _ when plain.IsArray => ReadList(element, plain.GetElementType()!, property, path, faults),
            _ => ReadObject(element, property.Options.GetTypeInfo(plain), path, faults),
        };
    }

    private static double? ReadNumber(JsonElement element, JsonPropertyInfo property, string path, FieldFaults faults)
    {
        (double minimum, double maximum) = RangeOf(property);
        if (element.ValueKind == JsonValueKind.Number && element.TryGetDouble(out double value) && value >= minimum && value <= maximum)
        {
            return value;
        }

        faults.Add(path, RangeSentence(minimum, maximum) + Given(element));
        return null;
    }

    private static int? ReadInteger(JsonElement element, JsonPropertyInfo property, string path, FieldFaults faults)
    {
        (double minimum, double maximum) = RangeOf(property);
        if (element.ValueKind == JsonValueKind.Number && element.TryGetInt32(out int value) && value >= minimum && value <= maximum)
        {
            return value;
        }

        faults.Add(path, FormattableString.Invariant($"Must be a whole number from {minimum} to {maximum}.") + Given(element));
        return null;
    }

    private static bool? ReadBoolean(JsonElement element, string path, FieldFaults faults)
    {
        if (element.ValueKind is JsonValueKind.True or JsonValueKind.False)
        {
            return element.GetBoolean();
        }

        faults.Add(path, "Must be true or false." + Given(element));
        return null;
    }

    private static string? ReadText(JsonElement element, JsonPropertyInfo property, string path, FieldFaults faults)
    {
        int longest = AttributeOf<StringLengthAttribute>(property)?.MaximumLength ?? LongestText;
        if (element.ValueKind == JsonValueKind.String && TextOf(element.GetString) is { Length: > 0 } text
            && text.Length <= longest && !text.Any(char.IsControl))
        {
            return text;
        }

        faults.Add(path, FormattableString.Invariant($"Must be a text of 1 to {longest} characters without control characters.") + Given(element));
        return null;
    }

    private static object? ReadWord(JsonElement element, Type enumeration, string path, FieldFaults faults)
    {
        if (element.ValueKind == JsonValueKind.String && TextOf(element.GetString) is { } word)
        {
            foreach (string name in Enum.GetNames(enumeration))
            {
                if (JsonNamingPolicy.CamelCase.ConvertName(name) == word)
                {
                    return Enum.Parse(enumeration, name);
                }
            }
        }

        faults.Add(path, $"Must be one of {string.Join(", ", WordsOf(enumeration).Select(w => $"\"{w}\""))}." + Given(element));
        return null;
    }

    private static Array? ReadList(JsonElement element, Type itemType, JsonPropertyInfo property, string path, FieldFaults faults)
    {
        int fewest = AttributeOf<MinLengthAttribute>(property)?.Length ?? 0;
        int most = AttributeOf<MaxLengthAttribute>(property)?.Length ?? FieldFaults.Most;
        if (element.ValueKind != JsonValueKind.Array || element.GetArrayLength() < fewest || element.GetArrayLength() > most)
        {
            string allowed = fewest == most ? FormattableString.Invariant($"{most}") : FormattableString.Invariant($"{fewest} to {most}");
            faults.Add(path, $"Must be a list of {allowed} items." + Given(element));
            return null;
        }

        var list = Array.CreateInstance(itemType, element.GetArrayLength());
        int i = 0;
        foreach (JsonElement item in element.EnumerateArray())
        {
            if (ReadValue(item, itemType, property, FormattableString.Invariant($"{path}[{i}]"), faults) is { } value)
            {
                list.SetValue(value, i);
            }

            i++;
        }

        return faults.Concern(path) ? null : list;
    }

    private static (double Minimum, double Maximum) RangeOf(JsonPropertyInfo property) =>
        AttributeOf<RangeAttribute>(property) is { } range
            ? (Convert.ToDouble(range.Minimum, CultureInfo.InvariantCulture), Convert.ToDouble(range.Maximum, CultureInfo.InvariantCulture))
            : AttributeOf<ItemRangeAttribute>(property) is { } items ? (items.Minimum, items.Maximum)
            : (double.MinValue, double.MaxValue);

    private static T? AttributeOf<T>(JsonPropertyInfo property)
        where T : Attribute =>
        (property.AttributeProvider as MemberInfo)?.GetCustomAttribute<T>();

    /// <summary>Text with a lone surrogate or bytes that are not UTF-8 is none: null.</summary>
    private static string? TextOf(Func<string?> read)
    {
        try
        {
            return read();
        }
        catch (InvalidOperationException)
        {
            return null;
        }
    }

    private static string Given(JsonElement element) => element.ValueKind switch
    {
        JsonValueKind.Object => " Given: an object.",
        JsonValueKind.Array => FormattableString.Invariant($" Given: a list of {element.GetArrayLength()}."),
        JsonValueKind.String => TextOf(element.GetString) is { } text ? $" Given: the text \"{Shown(text)}\"." : " Given: a text that is not valid Unicode.",
        _ => $" Given: {Shown(element.GetRawText())}.",
    };

    /// <summary>Cuts what a client wrote to a length that can be shown, without control characters.</summary>
    internal static string Shown(string text)
    {
        string cut = text.Length <= LongestShown ? text : text[..LongestShown] + "…";
        return string.Concat(cut.Select(c => char.IsControl(c) || char.IsSurrogate(c) ? '�' : c));
    }

    private static string Join(string path, string name) => path.Length > 0 ? $"{path}.{name}" : name;
}
