namespace GlassPair.Optics.Tests;

internal static class TestFiles
{
    /// <summary>Finds a file of the repository by its path from the top level.</summary>
    public static string Path(string relative)
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(System.IO.Path.Combine(folder.FullName, "GlassPair.sln")))
        {
            folder = folder.Parent;
        }

        return System.IO.Path.Combine(folder?.FullName ?? throw new InvalidOperationException("No GlassPair.sln above the tests."), relative);
    }
}
