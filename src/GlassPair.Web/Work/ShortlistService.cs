using System.Diagnostics;
using GlassPair.Catalogue;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Work;

/// <summary>A shortlist, and how long it took.</summary>
/// <param name="Stock">The stock it was made from.</param>
/// <param name="Shortlist">The ranked candidates.</param>
/// <param name="Elapsed">The time from the call to the answer.</param>
public sealed record ShortlistAnswer(Stock Stock, Shortlist Shortlist, TimeSpan Elapsed);

/// <summary>Ranks for pages and API alike. One instance for the whole process; safe to use from any thread.</summary>
/// <param name="gate">The gate for heavy work.</param>
public sealed class ShortlistService(WorkGate gate)
{
    /// <summary>How many tables are kept: about 0.5 MB each.</summary>
    public const int MostTables = 32;

    // The last used stands first.
    private readonly LinkedList<((string Stock, Band Band) Key, Lazy<IndexTable> Table)> _tables = [];
    private readonly Lock _lock = new();

    /// <summary>Gets the indices of a stock over a band. The last used tables are kept; of callers that ask for the same new one, one evaluates it and the others wait.</summary>
    public IndexTable TableOf(Stock stock, Band band)
    {
        (string, Band) key = (stock.Id, band);
        Lazy<IndexTable> table;
        lock (_lock)
        {
            var known = _tables.FirstOrDefault(t => t.Key.Equals(key));
            table = known.Table ?? new Lazy<IndexTable>(() => IndexTable.Of(stock.Glasses, band));
            _tables.Remove(known);
            _tables.AddFirst((key, table));
            if (_tables.Count > MostTables)
            {
                _tables.RemoveLast();
            }
        }

        return table.Value;
    }

    /// <summary>Ranks the pairs or triplets of a stock.</summary>
    /// <exception cref="ServerBusyException">Too much is waiting, or the work ran too long; the message is a sentence for the user.</exception>
    /// <exception cref="OperationCanceledException">The caller ended it.</exception>
    public Task<ShortlistAnswer> RankAsync(Stock stock, ShortlistRequest request, CancellationToken cancellation) => gate.RunAsync(
        stop =>
        {
            long start = Stopwatch.GetTimestamp();
            IndexTable table = TableOf(stock, request.Requirement.Band);
            Shortlist shortlist = request.Elements == 3 ? TripletRanking.Rank(table, request, stop) : PairRanking.Rank(table, request, stop);
            return new ShortlistAnswer(stock, shortlist, Stopwatch.GetElapsedTime(start));
        },
        cancellation);
}
