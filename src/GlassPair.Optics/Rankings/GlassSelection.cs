using System.Collections.Immutable;
using GlassPair.Optics.Color;

namespace GlassPair.Optics.Rankings;

/// <summary>The glasses of a table that a request leaves, twins put together, and why the others fell.</summary>
internal sealed class GlassSelection
{
    private readonly Dictionary<GlassIndices, ImmutableArray<string>> _twins;

    private GlassSelection(
        int considered, ImmutableArray<GlassIndices> distinct, Dictionary<GlassIndices, ImmutableArray<string>> twins, HashSet<GlassIndices>? mustInclude, ImmutableArray<DroppedGlass> dropped)
    {
        (Considered, Distinct, _twins, MustInclude, Dropped) = (considered, distinct, twins, mustInclude, dropped);
    }

    /// <summary>Gets how many glasses are left, twins included.</summary>
    public int Considered { get; }

    /// <summary>Gets the glasses left, in ordinal order; of twins the one that comes first.</summary>
    public ImmutableArray<GlassIndices> Distinct { get; }

    /// <summary>Gets those of <see cref="Distinct"/> of which each combination must hold one, by their own name or a twin's; null where none is asked for.</summary>
    public IReadOnlySet<GlassIndices>? MustInclude { get; }

    /// <summary>Gets the glasses that fell.</summary>
    public ImmutableArray<DroppedGlass> Dropped { get; }

    /// <summary>Applies a request's limits to a table.</summary>
    /// <exception cref="ArgumentException">The table was made for another band.</exception>
    public static GlassSelection From(IndexTable table, ShortlistRequest request)
    {
        if (!table.Band.Equals(request.Requirement.Band))
        {
            throw new ArgumentException("The table was made for another band.", nameof(table));
        }

        GlassLimits limits = request.Limits;
        var dropped = ImmutableArray.CreateBuilder<DroppedGlass>();
        dropped.AddRange(table.Uncovered.Select(g => new DroppedGlass(g, GlassDropReason.Band)));
        var groups = new List<GlassIndices>[table.Rows.Length];
        int considered = 0;
        for (int i = 0; i < table.Rows.Length; i++)
        {
            if (limits.ReasonAgainst(table.Rows[i].Glass) is { } reason)
            {
                dropped.Add(new DroppedGlass(table.Rows[i].Glass, reason));
                continue;
            }

            considered++;
            (groups[table.FirstTwins[i]] ??= []).Add(table.Rows[i]);
        }

        var distinct = ImmutableArray.CreateBuilder<GlassIndices>();
        var twins = new Dictionary<GlassIndices, ImmutableArray<string>>();
        HashSet<GlassIndices>? mustInclude = limits.Include.Count > 0 ? [] : null;
        foreach (List<GlassIndices>? group in groups)
        {
            if (group is null)
            {
                continue;
            }

            distinct.Add(group[0]);
            if (group.Count > 1)
            {
                twins.Add(group[0], [.. group.Skip(1).Select(t => t.Glass.Id)]);
            }

            if (group.Any(t => limits.Include.Contains(t.Glass.Id)))
            {
                mustInclude?.Add(group[0]);
            }
        }

        // A group lies where its first row in the whole table lies; limits may have taken that one away.
        distinct.Sort((a, b) => string.CompareOrdinal(a.Glass.Id, b.Glass.Id));
        return new GlassSelection(considered, distinct.ToImmutable(), twins, mustInclude, dropped.ToImmutable());
    }

    /// <summary>Gets the ids of a distinct glass's other names.</summary>
    public ImmutableArray<string> TwinsOf(GlassIndices glass) => _twins.GetValueOrDefault(glass, []);
}
