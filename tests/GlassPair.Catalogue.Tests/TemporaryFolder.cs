namespace GlassPair.Catalogue.Tests;

/// <summary>An empty folder that is taken away at the end of a test.</summary>
internal sealed class TemporaryFolder : IDisposable
{
    public string Path { get; } = Directory.CreateTempSubdirectory("glasspair-test-").FullName;

    public void Dispose() => Directory.Delete(Path, recursive: true);
}
