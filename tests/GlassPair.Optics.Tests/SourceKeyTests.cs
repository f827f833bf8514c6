using System.Text.RegularExpressions;

namespace GlassPair.Optics.Tests;

/// <summary>Every source that a comment names stands in references.md, and every one that stands there is named.</summary>
public sealed partial class SourceKeyTests
{
    private static readonly string s_folder = TestFiles.Path("src/GlassPair.Optics");

    private static readonly string[] s_listed =
    [
        .. File.ReadLines(Path.Combine(s_folder, "references.md"))
            .Where(line => line.StartsWith("| [", StringComparison.Ordinal))
            .SelectMany(line => Key().Matches(line.Split('|')[1]).Select(m => m.Value)),
    ];

    private static readonly string[] s_named =
    [
        .. Directory.EnumerateFiles(s_folder, "*.cs", SearchOption.AllDirectories)
            .Where(file => !file.Contains($"{Path.DirectorySeparatorChar}obj{Path.DirectorySeparatorChar}", StringComparison.Ordinal))
            .SelectMany(file => Named().Matches(File.ReadAllText(file)))
            .SelectMany(sources => Key().Matches(sources.Value).Select(m => m.Value)),
    ];

    [Fact]
    public void Comments_Sources_AreListed() => Assert.Empty(s_named.Except(s_listed));

    [Fact]
    public void References_Keys_StandOnceAndAreNamed()
    {
        Assert.Equal(s_listed.Distinct(), s_listed);
        Assert.Empty(s_listed.Except(s_named));
        Assert.NotEmpty(s_named);
    }

    [GeneratedRegex(@"\[[a-z][a-z-]+\]")]
    private static partial Regex Key();

    [GeneratedRegex(@"Sources?: \[[^.<]+")]
    private static partial Regex Named();
}
