using System.Text;
using System.Text.Unicode;

namespace GlassPair.Catalogue;

/// <summary>The text of a CSV file once its bytes have been found to be text: UTF-8, no control characters, lines of bounded length.</summary>
internal sealed class CsvText
{
    public const int LongestLine = 64 * 1024;

    private static readonly UnicodeEncoding StrictUtf16LittleEndian = new(bigEndian: false, byteOrderMark: false, throwOnInvalidBytes: true);
    private static readonly UnicodeEncoding StrictUtf16BigEndian = new(bigEndian: true, byteOrderMark: false, throwOnInvalidBytes: true);

    private CsvText(string file, byte[] utf8, char? statedSeparator, int linesBefore, int comments, int lastLine, bool endsWithLineBreak)
    {
        (File, Bytes, StatedSeparator, LinesBefore) = (file, utf8, statedSeparator, linesBefore);
        (Comments, LastLine, EndsWithLineBreak) = (comments, lastLine, endsWithLineBreak);
    }

    public string File { get; }

    /// <summary>Gets the text from the header on, without a byte order mark or a first line <c>sep=;</c>.</summary>
    public byte[] Bytes { get; }

    /// <summary>Gets the separator that a first line <c>sep=;</c> names.</summary>
    public char? StatedSeparator { get; }

    /// <summary>Gets the number of lines of the file that stand before <see cref="Bytes"/>.</summary>
    public int LinesBefore { get; }

    /// <summary>Gets the number of comment lines.</summary>
    public int Comments { get; }

    /// <summary>Gets the number of the last line that is not blank.</summary>
    public int LastLine { get; }

    public bool EndsWithLineBreak { get; }

    /// <summary>Opens a file; null where it is no text, with the reason in the list.</summary>
    public static CsvText? TryOpen(CatalogueFile file, IssueList issues)
    {
        CsvText? Refuse(string message, int line = 0)
        {
            issues.Error(file.Name, line, message);
            return null;
        }

        ReadOnlySpan<byte> bytes = file.Content.AsSpan();
        if (bytes.Length == 0)
        {
            return Refuse("The file is empty.");
        }

        if (bytes.Length > CatalogueFile.MaxBytes)
        {
            return Refuse($"The file is larger than {CatalogueFile.MaxBytes / 1024 / 1024} MB, the limit for one file.");
        }

        if (FindOtherKind(bytes) is { } kind)
        {
            return Refuse($"This is {kind}, not CSV: save the table as \"CSV UTF-8\".");
        }

        byte[] utf8;
        bool isBigEndian = bytes.StartsWith<byte>([0xFE, 0xFF]);
        if (isBigEndian || bytes.StartsWith<byte>([0xFF, 0xFE]))
        {
            try
            {
                utf8 = Encoding.UTF8.GetBytes((isBigEndian ? StrictUtf16BigEndian : StrictUtf16LittleEndian).GetString(bytes[2..]));
            }
            catch (DecoderFallbackException)
            {
                return Refuse("The file begins as UTF-16 but holds bytes that are not: save it as \"CSV UTF-8\".");
            }

            issues.Note(file.Name, 0, "Read as UTF-16.");
        }
        else
        {
            utf8 = (bytes.StartsWith<byte>([0xEF, 0xBB, 0xBF]) ? bytes[3..] : bytes).ToArray();
        }

        return utf8.AsSpan().IndexOf((byte)0) is >= 0 and int zero
            ? Refuse("The file holds NUL bytes, as UTF-16 text without its mark does: save it as \"CSV UTF-8\".", LineAt(utf8, zero))
            : !Utf8.IsValid(utf8)
                ? RefuseBadUtf8(file, utf8, bytes.Length - utf8.Length, issues)
                : SplitLines(file, utf8, issues);
    }

    private static CsvText? RefuseBadUtf8(CatalogueFile file, ReadOnlySpan<byte> utf8, int markLength, IssueList issues)
    {
        int at = 0;
        while (Rune.DecodeFromUtf8(utf8[at..], out _, out int length) == System.Buffers.OperationStatus.Done)
        {
            at += length;
        }

        issues.Error(
            file.Name,
            LineAt(utf8, at),
            FormattableString.Invariant($"Not UTF-8: byte {utf8[at]:X2} (hexadecimal) at offset {at + markLength}. Save the file as \"CSV UTF-8\"; an older Windows or Latin-1 encoding cannot be told with certainty, so it is not guessed."));
        return null;
    }

    private static CsvText? SplitLines(CatalogueFile file, byte[] utf8, IssueList issues)
    {
        (int line, int start, int comments, int lastLine, int linesBefore, int bodyStart) = (0, 0, 0, 0, 0, 0);
        char? statedSeparator = null;
        while (start < utf8.Length)
        {
            line++;
            ReadOnlySpan<byte> rest = utf8.AsSpan(start);
            int length = rest.IndexOfAny((byte)'\r', (byte)'\n');
            ReadOnlySpan<byte> text = length < 0 ? rest : rest[..length];
            int next = start + (length < 0 ? rest.Length : length + (rest[length..].StartsWith("\r\n"u8) ? 2 : 1));
            if (text.Length > LongestLine)
            {
                issues.Error(file.Name, line, $"The line is longer than {LongestLine / 1024} KB, the limit for one row.");
                return null;
            }

            if (FindControl(text) is { } control)
            {
                issues.Error(file.Name, line, FormattableString.Invariant($"Holds the control character U+{control:X4}; only TAB and line breaks are allowed."));
                return null;
            }

            ReadOnlySpan<byte> trimmed = text.Trim(" \t"u8);
            if (line == 1 && SeparatorStatedBy(trimmed) is { } stated)
            {
                (statedSeparator, linesBefore, bodyStart) = (stated, 1, next);
            }
            else if (trimmed.StartsWith("#"u8))
            {
                comments++;
            }
            else if (trimmed.Length > 0)
            {
                lastLine = line;
            }

            start = next;
        }

        return new CsvText(file.Name, utf8[bodyStart..], statedSeparator, linesBefore, comments, lastLine, utf8[^1] is (byte)'\n' or (byte)'\r');
    }

    // Excel's hint, "sep=;" alone in the first line.
    private static char? SeparatorStatedBy(ReadOnlySpan<byte> line)
    {
        ReadOnlySpan<byte> hint = line.Trim((byte)'"');
        return hint.Length == 5 && Ascii.EqualsIgnoreCase(hint[..4], "sep="u8) && hint[4] is (byte)',' or (byte)';' or (byte)'\t' or (byte)'|' ? (char)hint[4] : null;
    }

    private static int? FindControl(ReadOnlySpan<byte> line)
    {
        foreach (byte value in line)
        {
            if (value is (< 0x20 and not (byte)'\t') or 0x7F)
            {
                return value;
            }
        }

        return null;
    }

    private static string? FindOtherKind(ReadOnlySpan<byte> bytes)
    {
        ReadOnlySpan<byte> text = (bytes.StartsWith<byte>([0xEF, 0xBB, 0xBF]) ? bytes[3..] : bytes).TrimStart(" \t\r\n"u8);
        return bytes.StartsWith("PK\u0003\u0004"u8) ? "an Excel workbook or another zip archive"
            : bytes.StartsWith<byte>([0xD0, 0xCF, 0x11, 0xE0]) ? "an old Excel workbook or another Office file"
            : bytes.StartsWith<byte>([0x1F, 0x8B]) ? "a compressed file, and compressed files are not unpacked"
            : bytes.StartsWith("%PDF"u8) ? "a PDF document"
            : bytes.StartsWith<byte>([0x89, (byte)'P', (byte)'N', (byte)'G']) || bytes.StartsWith<byte>([0xFF, 0xD8, 0xFF]) || bytes.StartsWith("GIF8"u8) ? "a picture"
            : bytes.StartsWith("MZ"u8) && bytes.Contains((byte)0) || bytes.StartsWith("\u007FELF"u8) ? "a program"
            : text.StartsWith("<"u8) ? "a web page or XML"
            : text.StartsWith("{\\rtf"u8) ? "a rich-text document"
            : text.StartsWith("{"u8) || text.StartsWith("["u8) ? "JSON"
            : null;
    }

    private static int LineAt(ReadOnlySpan<byte> utf8, int offset)
    {
        ReadOnlySpan<byte> before = utf8[..offset];
        int line = 1;
        while (before.IndexOfAny((byte)'\r', (byte)'\n') is >= 0 and int end)
        {
            line++;
            before = before[(end + (before[end..].StartsWith("\r\n"u8) ? 2 : 1))..];
        }

        return line;
    }
}
