using System.Globalization;
using CsCheck;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Components.Glasses;

namespace GlassPair.Web.Tests.Glasses;

public sealed class MeasuredTableTests
{
    private static readonly string[] Pieces =
    [
        "587.5618", "1.5168", "0,5876", "1,5168", "0.4861", "486.13", ";", ",", "\t", "|", " ", "\n", "\r\n", "\r", "\"", "#", "nm", "µm", "NaN", "1e400", "-5", "sep=;", "1.234,5", "\u00A0", "\u0000", "\uFEFF", "é",
    ];

    public static TheoryData<string, string, string> WrittenAlike { get; } = new()
    {
        { "blanks", "587.56 1.5168\n656.27  1.51432\n486.13 1.52238", "nm, blank, point" },
        { "comma", "587.56,1.5168\n656.27, 1.51432\n486.13,1.52238", "nm, comma, point" },
        { "tabulator, micrometers", "0.58756\t1.5168\n0.65627\t1.51432\n0.48613\t1.52238\n", "µm, tabulator, point" },
        { "semicolon, decimal comma", "587,56;1,5168\n656,27;1,51432\n486,13;1,52238", "nm, semicolon, comma" },
        { "blanks, decimal comma", "0,58756 1,5168\r\n0,65627 1,51432\r\n0,48613 1,52238\r\n", "µm, blank, comma" },
        { "bar, heading, blank lines, comment", "# lab\nλ (nm) | n\n\n587.56|1.5168\n656.27|1.51432\n;;;\n486.13|1.52238", "nm, vertical bar, point" },
        { "stated separator", "sep=;\r587,56;1,5168\r656,27;1,51432\r486,13;1,52238;;\r", "nm, semicolon, comma" },
        { "byte order mark", "\uFEFF587.56;1.5168\n656.27;1.51432\n486.13;1.52238", "nm, semicolon, point" },
        { "exponents and signs", "5.8756e2 +1.5168\n6.5627E+2 15.1432e-1\n486.13 1.52238", "nm, blank, point" },
        { "quoted", "\"587.56\",\"1.5168\"\n\"656.27\",\"1.51432\"\n\"486.13\",\"1.52238\"", "nm, comma, point" },
        { "no-break blanks", "587.56\u00A01.5168\n656.27\u00A01.51432\n486.13\u00A01.52238", "nm, blank, point" },
    };

    /// <summary>Items 10 to 14 and 41 to 47 of common bad inputs to tables: read, or refused with the reason, never guessed.</summary>
    public static TheoryData<string, string> Refused { get; } = new()
    {
        { "587,6,1,5168", "decimal commas" },
        { "\"587,6\",\"1,5168\"", "choose “decimal comma”" },
        { "587.6;1.516.8", "not a number" },
        { "1,234.5;1.5168", "both a comma and a point" },
        { "1 234,5;1,5168", "holds a blank" },
        { "587.6 nm 1.5168", "Leave out names and units" },
        { "0x24B 1.5168", "not a number" },
        { "NaN 1.5168", "not a number" },
        { "587.6;Infinity", "not a number" },
        { "587.6;#N/A", "not a number" },
        { "587.6;-", "not a number" },
        { "587.6;", "where 2 are expected" },
        { ";1.5168", "A number is missing" },
        { "1e400 1.5168", "not a number" },
        { "1e-400 1.5168", "not a number" },
        { "٥٨٧ 1.5168", "not a number" },
        { "５８７ 1.5168", "not a number" },
        { "-587.6 1.5168", "above zero" },
        { "0 1.5168", "above zero" },
        { "50 1.5168", "100 to 20,000 nm" },
        { "30000 1.5168", "100 to 20,000 nm" },
        { "587.6 1", "above 1" },
        { "587.6 15168", "not above 5" },
        { "1.5168 587.6", "index stands first" },
        { "587.6 1.5168 1.5", "3 fields" },
        { "\"587.6;1.5168", "not closed" },
        { "\"587.6\"x;1.5168", "not a number" },
        { "587.6 1.51\u000768", "cannot be seen" },
        { "587.6 1.5168\n0.4861 1.52238\n656.3 1.51432", "looks like µm" },
        { "0.5876 1.5168\n486.1 1.52238\n0.6563 1.51432", "looks like nm" },
        { "λ in µm\n587.6 1.5168", "looks like nm" },
        { "0.5876 1.5168\n486.1 1.52238", "Choose the unit" },
        { "587.6 1.5168\n656.3 1.51432\n587.60 1.5168", "stands in line 1 already" },
        { "587,6;1,5168\n656,3;1.51432\n486,1;1,52238", "has a decimal point" },
    };

    [Theory]
    [MemberData(nameof(WrittenAlike))]
    public void Read_TheSameTableInAnyForm_GivesTheSameIndicesAndSaysHow(string name, string text, string how)
    {
        MeasuredTable table = MeasuredTable.Read(text, TableForm.Open);
        Assert.Null(table.Problem);
        Assert.Equal([(587.56, 1.5168), (656.27, 1.51432), (486.13, 1.52238)], table.Usable.Select(r => (r.Measured!.Value.Wavelength.Nanometers, r.Measured.Value.Index)));
        string[] said = how.Split(", ");
        Assert.Contains($"wavelengths in {said[0]}, {said[1]} between the numbers, decimal {said[2]}", table.Notes[0], StringComparison.Ordinal);
        Assert.False(string.IsNullOrEmpty(name));
    }

    [Theory]
    [MemberData(nameof(Refused))]
    public void Read_RowThatCannotBeUsed_SaysWhyBesideIt(string text, string reason)
    {
        MeasuredTable table = MeasuredTable.Read(text, TableForm.Open);
        MeasuredRow[] faulty = [.. table.Rows.Where(r => r.Problem is not null)];
        Assert.NotEmpty(faulty);
        Assert.All(faulty, r => Assert.Null(r.Measured));
        Assert.Contains(faulty, r => r.Problem!.Contains(reason, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("\"587,6\",\"1,5168\"", DecimalMark.Comma, null, 587.6, 1.5168)]
    [InlineData("0,5876 1,5168", DecimalMark.Comma, WavelengthUnit.Micrometers, 587.6, 1.5168)]
    public void Read_FormChosen_FollowsTheChoice(string text, DecimalMark mark, WavelengthUnit? unit, double nanometers, double index)
    {
        MeasuredIndex measured = MeasuredTable.Read(text, new TableForm(Mark: mark, Unit: unit)).Usable.Single().Measured!.Value;
        Assert.Equal((nanometers, index), (measured.Wavelength.Nanometers, measured.Index));
    }

    [Fact]
    public void Read_LinesAreCountedAsInTheText()
    {
        MeasuredTable table = MeasuredTable.Read("# a\nnm n\n\n587.6 1.5168\nabc\n", TableForm.Open);
        Assert.Equal([4, 5], table.Rows.Select(r => r.Line));
    }

    [Theory]
    [InlineData("")]
    [InlineData("  \n\n")]
    [InlineData("nm;n")]
    public void Read_NothingToRead_GivesNoRows(string text) => Assert.Empty(MeasuredTable.Read(text, TableForm.Open).Rows);

    [Fact]
    public void Read_TooLong_SaysTheLimit() =>
        Assert.Contains("10,000 are read", MeasuredTable.Read(new string('1', MeasuredTable.MaxLength + 1), TableForm.Open).Problem, StringComparison.Ordinal);

    [Fact]
    public void Read_AnyTable_ReadsBackWhatWasWritten() =>
        Gen.Select(Gen.Double[100.0, 20_000.0], Gen.Double[1.000001, 5.0]).Array[1, 40].Sample(rows =>
        {
            (double, double)[] distinct = [.. rows.DistinctBy(r => r.Item1)];
            string text = string.Join('\n', distinct.Select(r => r.Item1.ToString("R", CultureInfo.InvariantCulture) + ";" + r.Item2.ToString("R", CultureInfo.InvariantCulture)));
            MeasuredTable table = MeasuredTable.Read(text, new TableForm(FieldSeparator.Semicolon, DecimalMark.Point, WavelengthUnit.Nanometers));
            return table.Usable.Select(r => (r.Measured!.Value.Wavelength.Nanometers, r.Measured.Value.Index)).SequenceEqual(distinct.Select(r => (r.Item1, r.Item2)));
        });

    [Fact]
    public void Of_AnyPaste_EveryRowIsEitherUsedOrExplained()
    {
        Gen<string> pasted = Gen.OneOf(Gen.String, Gen.Int[0, Pieces.Length - 1].Array[0, 60].Select(picks => string.Concat(picks.Select(i => Pieces[i]))));
        Gen<TableForm> forms = Gen.Select(
            Gen.Enum<FieldSeparator>().Nullable(), Gen.Enum<DecimalMark>().Nullable(), Gen.Enum<WavelengthUnit>().Nullable(),
            (separator, mark, unit) => new TableForm(separator, mark, unit));
        Gen.Select(pasted, forms).Sample((text, form) =>
            FitAnswer.Of(FitState.Empty with { Text = text, Table = form }).Table.Rows.All(r => (r.Measured is null) == (r.Problem is not null)));
    }
}
