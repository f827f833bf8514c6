using System.Collections.Immutable;
using System.Globalization;
using Microsoft.AspNetCore.WebUtilities;
using Microsoft.Extensions.Primitives;

namespace GlassPair.Web.Addresses;

/// <summary>Reads the query of an address. Never throws; what it cannot understand becomes a notice, and the usual value stands.</summary>
public sealed class QueryReader
{
    private readonly Dictionary<string, StringValues> _pairs;
    private readonly int _strange;
    private readonly ImmutableArray<string>.Builder _notices = ImmutableArray.CreateBuilder<string>();

    /// <summary>Starts to read.</summary>
    /// <param name="query">The query, with or without its question mark.</param>
    /// <param name="known">The keys that mean something.</param>
    public QueryReader(string query, params IEnumerable<string> known)
    {
        _pairs = QueryHelpers.ParseQuery(query);
        foreach ((string key, StringValues values) in _pairs.OrderBy(p => p.Key, StringComparer.Ordinal))
        {
            if (!known.Contains(key, StringComparer.OrdinalIgnoreCase))
            {
                _strange++;
                Notice($"The address holds “{TypedNumber.Shorten(key)}”, which means nothing here; it was left out.");
            }
            else if (values.Count > 1)
            {
                Notice($"The address gives “{key}” {values.Count.ToString(CultureInfo.InvariantCulture)} times; the first counts.");
            }
        }
    }

    /// <summary>Gets whether the query holds nothing that means something here, as on a first visit.</summary>
    public bool IsBlank => _pairs.Count == _strange;

    /// <summary>Gets what was not understood, and what was done about it, as sentences.</summary>
    public ImmutableArray<string> Notices => _notices.ToImmutable();

    /// <summary>Notes a link of another format; what it shares with this one is read all the same.</summary>
    public void CheckFormat(int format)
    {
        string mine = format.ToString(CultureInfo.InvariantCulture);
        if (Text("v", NumberField.MaxLength) is { } text && text != mine)
        {
            Notice(int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out int other) && other > format
                ? $"This link was written by a newer GlassPair (format {text}; this one reads {mine}). What is understood is shown."
                : $"The link's format “{TypedNumber.Shorten(text)}” is not known; it was read as format {mine}.");
        }
    }

    /// <summary>Notes what was not understood.</summary>
    public void Notice(string sentence) => _notices.Add(sentence);

    /// <summary>Gets a text, cut to a length; null where the key is absent.</summary>
    public string? Text(string key, int longest)
    {
        if (!_pairs.TryGetValue(key, out StringValues values) || values.Count == 0)
        {
            return null;
        }

        string text = values[0] ?? "";
        if (text.Length <= longest)
        {
            return text;
        }

        Notice($"“{key}” was cut to {longest.ToString(CultureInfo.InvariantCulture)} characters.");
        return text[..longest];
    }

    /// <summary>Gets the items of a list; null where the key is absent.</summary>
    public ImmutableArray<string>? List(string key, int most, int longest = 80)
    {
        if (Text(key, most * (longest + 1)) is not { } text)
        {
            return null;
        }

        string[] items = [.. text.Split(',', StringSplitOptions.RemoveEmptyEntries).Select(QueryWriter.UnescapeItem)];
        if (items.Length > most)
        {
            Notice($"“{key}” takes {most.ToString(CultureInfo.InvariantCulture)} items; the rest were left out.");
        }

        return [.. items.Take(most).Select(i => i.Length <= longest ? i : i[..longest])];
    }

    /// <summary>Gets the value that a word stands for, upper and lower case alike; the usual one where the key is absent or the word is none.</summary>
    public T Word<T>(string key, T usual, params IEnumerable<(string Word, T Value)> words)
    {
        if (Text(key, 40) is not { Length: > 0 } text)
        {
            return usual;
        }

        foreach ((string word, T value) in words)
        {
            if (string.Equals(word, text, StringComparison.OrdinalIgnoreCase))
            {
                return value;
            }
        }

        Notice($"“{TypedNumber.Shorten(text)}” is no choice for “{key}”; the usual one is shown.");
        return usual;
    }
}
