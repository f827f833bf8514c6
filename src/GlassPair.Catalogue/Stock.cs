using System.Collections.Immutable;
using System.Diagnostics.CodeAnalysis;
using GlassPair.Optics.Glasses;

namespace GlassPair.Catalogue;

/// <summary>A set of glasses with their supply columns, read from one catalogue. Immutable.</summary>
public sealed class Stock
{
    private readonly Dictionary<string, Glass> _byId;

    internal Stock(string id, string title, IEnumerable<Glass> glasses, ImmutableArray<GlassRemark> remarks)
    {
        (Id, Title, Remarks) = (id, title, remarks);
        Glasses = [.. glasses.OrderBy(g => g.Id, StringComparer.Ordinal)];
        _byId = Glasses.ToDictionary(g => g.Id, StringComparer.OrdinalIgnoreCase);
    }

    /// <summary>Gets the first 12 hexadecimal digits of the SHA-256 hash of the content.</summary>
    public string Id { get; }

    /// <summary>Gets what people call it.</summary>
    public string Title { get; }

    /// <summary>Gets the glasses in ordinal order of their ids.</summary>
    public ImmutableArray<Glass> Glasses { get; }

    /// <summary>Gets what the reader noticed about single glasses, such as stated values that disagree with the formula.</summary>
    public ImmutableArray<GlassRemark> Remarks { get; }

    /// <summary>Finds a glass by <c>maker/name</c>, upper and lower case alike.</summary>
    public bool TryFind(string id, [NotNullWhen(true)] out Glass? glass) => _byId.TryGetValue(id, out glass);
}

/// <summary>Something that the reader noticed about a glass.</summary>
/// <param name="GlassId">The glass, <c>maker/name</c>.</param>
/// <param name="Message">What, in words, with both values where two disagree.</param>
public sealed record GlassRemark(string GlassId, string Message);
