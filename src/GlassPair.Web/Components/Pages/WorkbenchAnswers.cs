using System.Collections.Concurrent;
using GlassPair.Catalogue;
using GlassPair.Optics.Rankings;
using GlassPair.Web.Addresses;
using GlassPair.Web.Work;

namespace GlassPair.Web.Components.Pages;

/// <summary>Answers states of the working page, and keeps the last few, 12,000 pairs in all: a prerendered page, Back and a colleague's link find theirs at once.</summary>
/// <remarks>One instance for the whole process; safe to use from any thread.</remarks>
public sealed class WorkbenchAnswers(ShortlistService shortlists)
{
    private const int MostPairs = 12_000;
    private readonly ConcurrentDictionary<string, WorkbenchAnswer> _kept = new(StringComparer.Ordinal);
    private readonly ConcurrentQueue<string> _order = new();
    private int _pairs;

    /// <summary>Finds an answer that is still kept.</summary>
    public WorkbenchAnswer? Find(WorkbenchState state, Stock stock) => _kept.GetValueOrDefault(KeyOf(state, stock));

    /// <summary>Ranks for a state.</summary>
    /// <param name="state">The state.</param>
    /// <param name="request">What it amounts to.</param>
    /// <param name="stock">The stock to rank.</param>
    /// <param name="cancellation">Stops the work.</param>
    public async Task<WorkbenchAnswer> AnswerAsync(WorkbenchState state, ShortlistRequest request, Stock stock, CancellationToken cancellation)
    {
        string key = KeyOf(state, stock);
        if (_kept.TryGetValue(key, out WorkbenchAnswer? kept))
        {
            return kept;
        }

        ShortlistAnswer ranked = await shortlists.RankAsync(stock, request, cancellation).ConfigureAwait(false);
        var answer = new WorkbenchAnswer(ranked, shortlists.TableOf(stock, request.Requirement.Band));
        if (_kept.TryAdd(key, answer))
        {
            _order.Enqueue(key);
            Interlocked.Add(ref _pairs, answer.Pairs.Length);
            while (Volatile.Read(ref _pairs) > MostPairs && _order.TryDequeue(out string? oldest))
            {
                if (_kept.TryRemove(oldest, out WorkbenchAnswer? removed))
                {
                    Interlocked.Add(ref _pairs, -removed.Pairs.Length);
                }
            }
        }

        return answer;
    }

    /// <summary>Counts the pairs that hold for a state; null where the state cannot be ranked.</summary>
    public async Task<long?> CountHoldingAsync(WorkbenchState state, Stock stock, CancellationToken cancellation) =>
        FormReading.Of(state, stock).Request is { } request
            ? (await shortlists.RankAsync(stock, request with { Take = 1 }, cancellation).ConfigureAwait(false)).Shortlist.CombinationsHolding
            : null;

    private static string KeyOf(WorkbenchState state, Stock stock) => stock.Id + WorkbenchAddress.Write(state.ForRanking() with { StockId = null });
}
