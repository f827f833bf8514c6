using System.Reflection;
using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;
using System.Runtime.CompilerServices;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;

namespace GlassPair.Optics.Tests;

/// <summary>Rules of the whole assembly: its values cannot change, and it has no way to files, clocks or the network.</summary>
public sealed class OpticsInvariantsTests
{
    private static readonly Assembly s_optics = typeof(Glass).Assembly;

    private static IEnumerable<Type> PublicTypes => s_optics.GetExportedTypes().Where(t => !t.IsEnum && !t.IsInterface);

    [Fact]
    public void PublicTypes_Fields_AreReadOnly() => Assert.Empty(
        PublicTypes.SelectMany(t => t.GetFields(BindingFlags.Instance | BindingFlags.Static | BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.DeclaredOnly))
            .Where(f => !f.IsInitOnly && !f.IsLiteral)
            .Select(f => $"{f.DeclaringType}.{f.Name}"));

    [Fact]
    public void PublicTypes_Setters_AreForInitializationOnly() => Assert.Empty(
        PublicTypes.SelectMany(t => t.GetProperties(BindingFlags.Instance | BindingFlags.Static | BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.DeclaredOnly))
            .Where(p => p.SetMethod is { } set && !set.ReturnParameter.GetRequiredCustomModifiers().Contains(typeof(IsExternalInit)))
            .Select(p => $"{p.DeclaringType}.{p.Name}"));

    [Fact]
    public void PublicTypes_Properties_HandOutNothingThatCanBeChanged() => Assert.Empty(
        PublicTypes.SelectMany(t => t.GetProperties(BindingFlags.Instance | BindingFlags.Static | BindingFlags.Public | BindingFlags.DeclaredOnly))
            .Where(p => p.PropertyType.IsArray || typeof(System.Collections.IList).IsAssignableFrom(p.PropertyType) && !p.PropertyType.FullName!.StartsWith("System.Collections.Immutable", StringComparison.Ordinal))
            .Select(p => $"{p.DeclaringType}.{p.Name}"));

    [Fact]
    public void Assembly_BannedSymbols_AreNotUsed() => Assert.Empty(BannedIn(s_optics));

    [Fact]
    public void BannedIn_AssemblyThatReadsFiles_FindsThem() => Assert.Contains("N:System.IO", BannedIn(typeof(StockReader).Assembly));

    [Fact]
    public void Assembly_References_AreTheRuntimeAndOneLibrary() => Assert.Equal(
        ["MathNet.Numerics"],
        s_optics.GetReferencedAssemblies().Select(a => a.Name!).Where(n => !n.StartsWith("System.", StringComparison.Ordinal)));

    /// <summary>The lines of BannedSymbols.txt that name something the assembly refers to.</summary>
    private static IEnumerable<string> BannedIn(Assembly assembly)
    {
        using var file = new PEReader(File.OpenRead(assembly.Location));
        MetadataReader metadata = file.GetMetadataReader();
        HashSet<string> used = [];
        foreach (TypeReference type in metadata.TypeReferences.Select(metadata.GetTypeReference))
        {
            used.Add($"N:{metadata.GetString(type.Namespace)}");
            used.Add($"T:{metadata.GetString(type.Namespace)}.{metadata.GetString(type.Name)}");
        }

        foreach (MemberReference member in metadata.MemberReferences.Select(metadata.GetMemberReference).Where(m => m.Parent.Kind == HandleKind.TypeReference))
        {
            TypeReference type = metadata.GetTypeReference((TypeReferenceHandle)member.Parent);
            string name = metadata.GetString(member.Name);
            used.Add($"P:{metadata.GetString(type.Namespace)}.{metadata.GetString(type.Name)}.{(name.StartsWith("get_", StringComparison.Ordinal) ? name[4..] : name)}");
        }

        return File.ReadLines(TestFiles.Path("src/GlassPair.Optics/BannedSymbols.txt"))
            .Select(line => line.Split(';')[0])
            .Where(banned => used.Any(u => u == banned || (banned.StartsWith("N:", StringComparison.Ordinal) && u.StartsWith($"{banned}.", StringComparison.Ordinal))));
    }
}
