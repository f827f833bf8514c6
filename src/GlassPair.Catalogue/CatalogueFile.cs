using System.Collections.Immutable;
using System.Globalization;
using System.Runtime.InteropServices;
using System.Text;

namespace GlassPair.Catalogue;

/// <summary>One file of a catalogue as it was found: its name and its bytes, read to the limit and not yet understood.</summary>
public sealed class CatalogueFile
{
    /// <summary>The largest file that is read, in bytes: 4 MB.</summary>
    public const int MaxBytes = 4 * 1024 * 1024;

    private const int LongestName = 80;

    private CatalogueFile(string name, byte[] content)
    {
        Name = CleanName(name);
        Content = ImmutableCollectionsMarshal.AsImmutableArray(content);
    }

    /// <summary>Gets the name without its folder, cleaned of what a file's name should not hold; at most 80 characters.</summary>
    public string Name { get; }

    /// <summary>Gets the bytes; one more than <see cref="MaxBytes"/> where the file is larger.</summary>
    public ImmutableArray<byte> Content { get; }

    /// <summary>Makes a file from bytes at hand.</summary>
    public static CatalogueFile FromBytes(string name, ReadOnlySpan<byte> content) =>
        new(name, content[..Math.Min(content.Length, MaxBytes + 1)].ToArray());

    /// <summary>Reads a stream from where it stands to its end, or to just past the limit.</summary>
    /// <exception cref="IOException">The stream cannot be read.</exception>
    public static CatalogueFile FromStream(string name, Stream content)
    {
        using var bytes = new MemoryStream();
        byte[] part = new byte[64 * 1024];
        while (bytes.Length <= MaxBytes && content.Read(part) is > 0 and int count)
        {
            bytes.Write(part, 0, count);
        }

        return FromBytes(name, bytes.GetBuffer().AsSpan(0, (int)bytes.Length));
    }

    /// <summary>Reads a stream, such as an upload, from where it stands to its end, or to just past the limit.</summary>
    /// <exception cref="IOException">The stream cannot be read.</exception>
    public static async Task<CatalogueFile> FromStreamAsync(string name, Stream content, CancellationToken cancellation)
    {
        using var bytes = new MemoryStream();
        byte[] part = new byte[64 * 1024];
        while (bytes.Length <= MaxBytes && await content.ReadAsync(part, cancellation).ConfigureAwait(false) is > 0 and int count)
        {
            bytes.Write(part, 0, count);
        }

        return FromBytes(name, bytes.GetBuffer().AsSpan(0, (int)bytes.Length));
    }

    /// <summary>Reads a small table that is no catalogue as text, from its first line on; null where it is no text, with the reason.</summary>
    /// <param name="problem">Why it cannot be read, as a sentence; null where it was.</param>
    public string? TryReadText(out string? problem)
    {
        var issues = new IssueList();
        CsvText? text = CsvText.TryOpen(this, issues);
        problem = text is null ? issues.Listed[0].Message : null;
        return text is null ? null : (text.StatedSeparator is { } separator ? $"sep={separator}\n" : "") + Encoding.UTF8.GetString(text.Bytes);
    }

    // A name comes from outside: it is shown in messages and names an entry of an archive, and nothing is ever opened by it.
    private static string CleanName(string name)
    {
        var clean = new StringBuilder();
        foreach (Rune rune in name[(name.LastIndexOfAny(['/', '\\']) + 1)..].EnumerateRunes())
        {
            bool isPlain = Rune.GetUnicodeCategory(rune) is not (UnicodeCategory.Control or UnicodeCategory.Format or UnicodeCategory.PrivateUse
                or UnicodeCategory.OtherNotAssigned or UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator) && rune != Rune.ReplacementChar;
            if (isPlain && clean.Length < LongestName - 1)
            {
                clean.Append(rune);
            }
        }

        string kept = clean.ToString().Trim();
        return kept.Trim('.').Length == 0 ? "catalogue.csv" : kept;
    }
}
