using System.Text;

namespace GlassPair.Web.Addresses;

/// <summary>Writes the query of an address: readable, in the order of the calls, with what is usual left out.</summary>
public sealed class QueryWriter
{
    private readonly StringBuilder _query = new();

    /// <summary>Adds a value unless it is the usual one.</summary>
    public QueryWriter Add(string key, string? text, string usual = "")
    {
        if (text is not null && text != usual)
        {
            _query.Append(_query.Length == 0 ? '?' : '&').Append(key).Append('=').Append(Escape(text));
        }

        return this;
    }

    /// <summary>Adds a list, its items parted by commas; null is left out, an empty list stands with no item.</summary>
    /// <remarks>A comma of an item is written %2C and a percent sign %25 before the address escapes both once more.</remarks>
    public QueryWriter AddList(string key, IEnumerable<string>? items)
    {
        if (items is not null)
        {
            _query.Append(_query.Length == 0 ? '?' : '&').Append(key).Append('=').AppendJoin(',', items.Select(i => Escape(EscapeItem(i))));
        }

        return this;
    }

    /// <summary>The query from the question mark on; empty where nothing was added.</summary>
    public override string ToString() => _query.ToString();

    /// <summary>Takes an item of a list as it was before <see cref="AddList"/>.</summary>
    internal static string UnescapeItem(string item) =>
        item.Replace("%2C", ",", StringComparison.OrdinalIgnoreCase).Replace("%25", "%", StringComparison.Ordinal);

    private static string EscapeItem(string item) =>
        item.Replace("%", "%25", StringComparison.Ordinal).Replace(",", "%2C", StringComparison.Ordinal);

    /// <summary>Escapes a value, leaving readable what a query may hold as it is (RFC 3986, section 3.4).</summary>
    private static string Escape(string text) => new StringBuilder(Uri.EscapeDataString(text))
        .Replace("%20", "+").Replace("%2F", "/").Replace("%2C", ",").Replace("%3A", ":").Replace("%3B", ";").Replace("%28", "(").Replace("%29", ")")
        .ToString();
}
