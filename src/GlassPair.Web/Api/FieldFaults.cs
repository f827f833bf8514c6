namespace GlassPair.Web.Api;

/// <summary>What is wrong in a request, by the path of the field as the client wrote it, such as <c>requirement.band.shortNm</c> or <c>glasses[1]</c>.</summary>
public sealed class FieldFaults
{
    /// <summary>The path of the whole body.</summary>
    public const string Body = "$";

    /// <summary>The most faults kept; further ones are counted under <see cref="Body"/>.</summary>
    public const int Most = 100;

    private readonly SortedDictionary<string, List<string>> _byPath = new(StringComparer.Ordinal);
    private int _count;

    /// <summary>Gets whether anything is wrong.</summary>
    public bool Any => _count > 0;

    /// <summary>Notes what is wrong with a field and what is allowed.</summary>
    public void Add(string path, string message)
    {
        if (_count++ >= Most)
        {
            return;
        }

        if (!_byPath.TryGetValue(path, out List<string>? messages))
        {
            _byPath[path] = messages = [];
        }

        messages.Add(message);
    }

    /// <summary>Tells whether a field, or anything inside it, is wrong.</summary>
    public bool Concern(string path) => _count > Most || _byPath.Keys.Any(p => p == Body || IsWithin(p, path));

    /// <summary>Gets the faults in the form of a problem's <c>errors</c>.</summary>
    public Dictionary<string, string[]> ToErrors()
    {
        Dictionary<string, string[]> errors = _byPath.ToDictionary(p => p.Key, p => p.Value.ToArray());
        if (_count > Most)
        {
            errors[Body] = [.. errors.GetValueOrDefault(Body, []), FormattableString.Invariant($"{_count - Most} more faults are not listed.")];
        }

        return errors;
    }

    private static bool IsWithin(string inner, string outer) =>
        inner.StartsWith(outer, StringComparison.Ordinal) && (inner.Length == outer.Length || inner[outer.Length] is '.' or '[');
}
