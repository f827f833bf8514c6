namespace GlassPair.Optics.Tests;

public sealed class PublishedTests
{
    private static readonly string s_folder = TestFiles.Path("tests/published");

    public static TheoryData<string> Files => [.. Directory.EnumerateFiles(s_folder, "*.csv").Select(f => Path.GetFileName(f)).Order(StringComparer.Ordinal)];

    [Theory, MemberData(nameof(Files))]
    public void Rows_EveryTable_HasASourceInEachAndIsReadByATest(string file)
    {
        // a table from one place says so in lines of # at its head; otherwise each row has its own source
        if (!File.ReadLines(Path.Combine(s_folder, file)).First().StartsWith('#'))
        {
            Assert.All(Published.Rows(file), row => Assert.NotEmpty(row["source"]));
        }

        Assert.Contains(
            Directory.EnumerateFiles(TestFiles.Path("tests"), "*.cs", SearchOption.AllDirectories).Select(File.ReadAllText),
            code => code.Contains($"\"{file}\"", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("1.51680", 1.5168049, true)]
    [InlineData("1.51680", 1.5168051, false)]
    [InlineData("-83.97", -83.9749, true)]
    [InlineData("3", 3.49, true)]
    [InlineData("3", 3.51, false)]
    public void AssertPrints_OtherDigits_Fails(string printed, double actual, bool agrees)
    {
        var row = new PublishedRow(new Dictionary<string, string> { ["value"] = printed });

        Assert.Equal(agrees, Record.Exception(() => row.AssertPrints("value", actual)) is null);
    }
}
