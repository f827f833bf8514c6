using System.Globalization;
using System.Text;

namespace GlassPair.Catalogue.Tests;

/// <summary>Faulty catalogues, each with what must be said about it and where: the rows of <c>bad-catalogues.tsv</c>, and those too large to write down.</summary>
public class BadCatalogueTests
{
    private const string File = "catalogue.csv";
    private static readonly string[] Header = "maker,name,form,range_from_nm,range_to_nm,b1,c1_um2,b2,c2_um2,b3,c3_um2,nd,vd,supply".Split(',');
    private static readonly string[] Good = "schott,N-BK7,sellmeier,300,2500,1.03961212,0.00600069867,0.231792344,0.0200179144,1.01046945,103.560653,1.5168,64.17,listed".Split(',');

    public static TheoryData<string> Cases => [.. Rows().Select(r => r[0])];

    [Theory, MemberData(nameof(Cases))]
    public void Read_Case_SaysWhatIsWrongAndWhere(string name)
    {
        string[] row = Rows().Single(r => r[0] == name);
        (string kind, string input, string outcome, string line, string column, string message) = (row[1], row[2], row[3], row[4], row[5], row[6]);
        StockReading reading = Read(kind == "cell" ? WithCells(Unescape(input)) : BytesOf(kind, Unescape(input)));
        string found = string.Join(Environment.NewLine, reading.Issues) + string.Join(Environment.NewLine, reading.Stock?.Remarks ?? []);
        Assert.True((reading.Stock is null) == (outcome == "error"), found);
        switch (outcome)
        {
            case "ok":
                Assert.Single(reading.Stock!.Glasses);
                Assert.Empty(reading.Issues);
                break;
            case "remark":
                Assert.True(reading.Stock!.Remarks.Any(r => r.Message.Contains(message, StringComparison.Ordinal)), found);
                Assert.Empty(reading.Issues);
                break;
            default:
                IssueSeverity severity = outcome == "error" ? IssueSeverity.Error : IssueSeverity.Note;
                Assert.True(
                    reading.Issues.Any(i => i.Severity == severity && i.File == File && i.Line == int.Parse(line, CultureInfo.InvariantCulture)
                        && i.Column == column && i.Message.Contains(message, StringComparison.Ordinal)),
                    found);
                break;
        }
    }

    [Fact]
    public void Read_SemicolonsAndCommas_GivesTheSameGlassAsCommasAndPoints()
    {
        StockReading commas = Read(Encoding.UTF8.GetBytes($"{string.Join(',', Header)}\n{string.Join(',', Good)}\n"));
        StockReading semicolons = Read(Encoding.UTF8.GetBytes(Unescape("sep=;\\n{H;}\\n{G;}\\n")));
        Assert.Equal(commas.Stock!.Glasses[0].Formula, semicolons.Stock!.Glasses[0].Formula);
        Assert.Equal(commas.Stock.Glasses[0].Stated, semicolons.Stock.Glasses[0].Stated);
    }

    [Fact]
    public void Read_FieldOfOneMegabyte_NamesLineAndLimit() =>
        AssertRefused(Encoding.UTF8.GetBytes($"{string.Join(',', Header)}\n{new string('x', 1_000_000)}\n"), 2, "longer than 64 KB");

    [Fact]
    public void Read_HundredThousandColumns_NamesTheLimit() =>
        AssertRefused(Encoding.UTF8.GetBytes($"maker,name,form{string.Concat(Enumerable.Repeat(",x", 20_000))}\n"), 1, "20003 columns; the limit is 64.");

    [Fact]
    public void Read_MoreThanTwentyThousandRows_NamesTheLimit() =>
        AssertRefused(Encoding.UTF8.GetBytes("maker,name,form\n" + string.Concat(Enumerable.Repeat("a,b,c\n", 20_001))), 20_002, "More than 20,000 rows");

    [Fact]
    public void Read_FileOverTheLimit_NamesTheLimit() => AssertRefused(new byte[CatalogueFile.MaxBytes + 1], 0, "larger than 4 MB");

    [Fact]
    public void FromStream_EndlessStream_StopsJustPastTheLimit() =>
        Assert.Equal(CatalogueFile.MaxBytes + 1, CatalogueFile.FromStream(File, new EndlessStream()).Content.Length);

    [Fact]
    public void Read_ManyFaults_ListsTheFirstHundredAndCountsTheRest()
    {
        string rows = string.Concat(Enumerable.Range(0, 130).Select(i => $"schott,A{i},sellmeier,300,2500,x,0.01,,,,,,,listed\n"));
        StockReading reading = Read(Encoding.UTF8.GetBytes($"{string.Join(',', Header)}\n{rows}"));
        Assert.Null(reading.Stock);
        Assert.Equal((100, 30), (reading.Issues.Length, reading.FurtherIssues));
        Assert.Equal(Enumerable.Range(2, 100), reading.Issues.Select(i => i.Line));
    }

    [Fact]
    public void Read_LongValue_IsCutToFortyCharacters()
    {
        StockIssue issue = Read(WithCells($"nd={new string('9', 500)}")).Issues.Single(i => i.Column == "nd");
        Assert.Equal(40, issue.Value.Length);
    }

    [Fact]
    public void Read_InvisibleCharacterInAValue_IsWrittenOut() =>
        Assert.Equal("N-BK[U+202E]7", Read(WithCells("name=N-BK\u202E7")).Issues.Single(i => i.Column == "name").Value);

    [Theory]
    [InlineData("../../etc/x.csv", "x.csv")]
    [InlineData(@"C:\data\y.csv", "y.csv")]
    [InlineData("evil\u202Evsc.exe", "evilvsc.exe")]
    [InlineData("..", "catalogue.csv")]
    [InlineData("", "catalogue.csv")]
    [InlineData("a\0b\n.csv", "ab.csv")]
    public void FromBytes_NameFromOutside_IsCleaned(string name, string expected) => Assert.Equal(expected, CatalogueFile.FromBytes(name, [1]).Name);

    [Fact]
    public void FromBytes_LongName_IsCut() => Assert.InRange(CatalogueFile.FromBytes(new string('n', 300), [1]).Name.Length, 1, 80);

    [Fact]
    public void Read_NoFiles_SaysSo() => Assert.Equal("The catalogue has no CSV file.", StockReader.Read([], "None").Issues.Single().Message);

    [Fact]
    public void Read_TwoFilesOfOneName_AreRefused()
    {
        CatalogueFile file = CatalogueFile.FromBytes(File, Encoding.UTF8.GetBytes($"{string.Join(',', Header)}\n{string.Join(',', Good)}\n"));
        Assert.Contains(StockReader.Read([file, file], "Twice").Issues, i => i.Message == "Two files have this name.");
    }

    [Fact]
    public void Read_GlassInTwoFiles_NamesBoth()
    {
        byte[] text = Encoding.UTF8.GetBytes($"{string.Join(',', Header)}\n{string.Join(',', Good)}\n");
        StockReading reading = StockReader.Read([CatalogueFile.FromBytes("b.csv", text), CatalogueFile.FromBytes("a.csv", text)], "Both");
        StockIssue issue = Assert.Single(reading.Issues);
        Assert.Equal(("b.csv", 2), (issue.File, issue.Line));
        Assert.Contains("a.csv, line 2", issue.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void ReadFolder_MissingOrEmpty_SaysSo()
    {
        using var folder = new TemporaryFolder();
        Assert.Contains("has no CSV file", StockReader.ReadFolder(folder.Path, "Empty").Issues.Single().Message, StringComparison.Ordinal);
        Assert.Contains("does not exist", StockReader.ReadFolder(Path.Combine(folder.Path, "none"), "None").Issues.Single().Message, StringComparison.Ordinal);
    }

    private static void AssertRefused(byte[] content, int line, string message)
    {
        StockReading reading = Read(content);
        Assert.Null(reading.Stock);
        Assert.Contains(reading.Issues, i => i.Line == line && i.Severity == IssueSeverity.Error && i.Message.Contains(message, StringComparison.Ordinal));
    }

    private static StockReading Read(byte[] content) => StockReader.Read([CatalogueFile.FromBytes(File, content)], "Test");

    private static IEnumerable<string[]> Rows() =>
        System.IO.File.ReadLines(Path.Combine(AppContext.BaseDirectory, "bad-catalogues.tsv")).Skip(1).Select(line => line.Split('\t'));

    /// <summary>The good row with some of its cells changed, or columns added: <c>column=value &amp; column=value</c>.</summary>
    private static byte[] WithCells(string changes)
    {
        Dictionary<string, string> cells = Header.Zip(Good).ToDictionary(p => p.First, p => p.Second);
        foreach (string change in changes.Split(" & "))
        {
            int equals = change.IndexOf('=', StringComparison.Ordinal);
            cells[change[..equals]] = change[(equals + 1)..];
        }

        return Encoding.UTF8.GetBytes($"{string.Join(',', cells.Keys)}\n{string.Join(',', cells.Values.Select(v => $"\"{v.Replace("\"", "\"\"", StringComparison.Ordinal)}\""))}\n");
    }

    /// <summary>A character \xHH stands for that byte; every other character for its UTF-8 bytes, or for UTF-16 where the kind says so.</summary>
    private static byte[] BytesOf(string kind, string text) => kind switch
    {
        "utf16le" => Encoding.Unicode.GetBytes(text),
        "utf16be" => Encoding.BigEndianUnicode.GetBytes(text),
        _ => [.. text.EnumerateRunes().SelectMany(r => r.Value is >= RawByte and < RawByte + 256 ? [(byte)(r.Value - RawByte)] : Encoding.UTF8.GetBytes(r.ToString()))],
    };

    /// <summary>Where the bytes written as \xHH are kept until the text is encoded: a private-use plane.</summary>
    private const int RawByte = 0xF0000;

    private static string Unescape(string text)
    {
        foreach (char separator in ",;\t|")
        {
            string mark = separator == ',' ? "" : separator == '\t' ? "\\t" : separator.ToString();
            string Join(string[] cells) => string.Join(separator, separator == ';' ? cells.Select(c => c.Replace('.', ',')) : cells);
            text = text.Replace($"{{H{mark}}}", Join(Header), StringComparison.Ordinal).Replace($"{{G{mark}}}", Join(Good), StringComparison.Ordinal);
        }

        text = text.Replace("{rest}", string.Join(',', Good.Skip(2)), StringComparison.Ordinal);
        var plain = new StringBuilder();
        for (int i = 0; i < text.Length; i++)
        {
            if (text[i] != '\\')
            {
                plain.Append(text[i]);
                continue;
            }

            int digits = text[++i] switch { 'x' => 2, 'u' => 4, _ => 0 };
            int value = digits == 0 ? 0 : int.Parse(text.AsSpan(i + 1, digits), NumberStyles.HexNumber, CultureInfo.InvariantCulture);
            plain.Append(text[i] switch
            {
                'n' => "\n",
                'r' => "\r",
                't' => "\t",
                'x' => char.ConvertFromUtf32(RawByte + value),
                'u' => ((char)value).ToString(),
                char other => other.ToString(),
            });
            i += digits;
        }

        return plain.ToString();
    }

    private sealed class EndlessStream : MemoryStream
    {
        public override int Read(Span<byte> buffer)
        {
            buffer.Fill((byte)'a');
            return buffer.Length;
        }
    }
}
