using System.Collections.Frozen;
using System.Collections.Immutable;
using System.Diagnostics.CodeAnalysis;
using GlassPair.Optics.Glasses;

namespace GlassPair.Catalogue;

/// <summary>A set of glasses with their supply columns, read from one catalogue. Immutable.</summary>
public sealed class Stock
{
    private readonly FrozenDictionary<string, Glass> _byKey;
    private readonly ILookup<string, GlassRemark> _remarks;

    internal Stock(string id, string title, IEnumerable<Glass> glasses, ImmutableArray<GlassRemark> remarks, ImmutableArray<CatalogueFile> files)
    {
        (Id, Title, Remarks, Files) = (id, title, remarks, files);
        Glasses = [.. glasses.OrderBy(g => g.Id, StringComparer.Ordinal)];
        _byKey = Glasses.ToFrozenDictionary(g => GlassKey.Of(g.Id), StringComparer.Ordinal);
        _remarks = remarks.ToLookup(r => r.GlassId, StringComparer.Ordinal);
    }

    /// <summary>Gets the first 12 hexadecimal digits of the SHA-256 hash of the content.</summary>
    public string Id { get; }

    /// <summary>Gets what people call it.</summary>
    public string Title { get; }

    /// <summary>Gets the glasses in ordinal order of their ids.</summary>
    public ImmutableArray<Glass> Glasses { get; }

    /// <summary>Gets what the reader noticed about single glasses, such as stated values that disagree with the formula.</summary>
    public ImmutableArray<GlassRemark> Remarks { get; }

    /// <summary>Gets the files that the stock was read from, in ordinal order of their names.</summary>
    public ImmutableArray<CatalogueFile> Files { get; }

    /// <summary>Finds a glass by <c>maker/name</c>; upper and lower case, spaces and the kind of dash do not count.</summary>
    public bool TryFind(string id, [NotNullWhen(true)] out Glass? glass) => _byKey.TryGetValue(GlassKey.Of(id), out glass);

    /// <summary>Gets what the reader noticed about one glass.</summary>
    public IEnumerable<GlassRemark> RemarksOn(Glass glass) => _remarks[glass.Id];
}
