using System.Security.Cryptography;
using System.Text;

namespace GlassPair.Catalogue;

/// <summary>The name of a stock: the first 12 hexadecimal digits of a SHA-256 hash over the names and contents of its files.</summary>
internal static class StockId
{
    public const int Length = 12;

    /// <summary>Hashes files in the order given. Line ends CR LF count as LF, so that a checkout on any system has the same id.</summary>
    public static string Of(IEnumerable<CatalogueFile> files)
    {
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        foreach (CatalogueFile file in files)
        {
            hash.AppendData(Encoding.UTF8.GetBytes(file.Name));
            hash.AppendData([0]);
            AppendLines(hash, file.Content.AsSpan());
            hash.AppendData([0]);
        }

        return Convert.ToHexStringLower(hash.GetHashAndReset())[..Length];
    }

    /// <summary>Tells whether a text could be an id.</summary>
    public static bool IsWellFormed(string id) => id.Length == Length && id.All(char.IsAsciiHexDigitLower);

    private static void AppendLines(IncrementalHash hash, ReadOnlySpan<byte> rest)
    {
        while (rest.IndexOf("\r\n"u8) is >= 0 and int end)
        {
            hash.AppendData(rest[..end]);
            rest = rest[(end + 1)..];
        }

        hash.AppendData(rest);
    }
}
