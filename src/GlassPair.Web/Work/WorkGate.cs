using Microsoft.Extensions.Options;

namespace GlassPair.Web.Work;

/// <summary>The one gate for heavy work: only so much runs at once, only so much waits, so that pages stay quick. Safe to use from any thread.</summary>
public sealed class WorkGate : IDisposable
{
    private readonly SemaphoreSlim _slots;
    private readonly int _mostInside;
    private readonly TimeSpan _longest;
    private int _inside;

    /// <summary>Makes the gate.</summary>
    public WorkGate(IOptions<WorkOptions> options)
    {
        int atOnce = options.Value.AtOnce > 0 ? options.Value.AtOnce : Math.Max(1, Environment.ProcessorCount - 1);
        _slots = new SemaphoreSlim(atOnce);
        _mostInside = atOnce + options.Value.MostWaiting;
        _longest = TimeSpan.FromSeconds(options.Value.LongestSeconds);
    }

    /// <summary>Runs work on the thread pool when its turn comes.</summary>
    /// <param name="work">The work; it must look at the token often.</param>
    /// <param name="cancellation">Ends the waiting or the work.</param>
    /// <exception cref="ServerBusyException">Too much is waiting, or the work ran too long.</exception>
    /// <exception cref="OperationCanceledException">The caller ended it.</exception>
    public async Task<T> RunAsync<T>(Func<CancellationToken, T> work, CancellationToken cancellation)
    {
        try
        {
            if (Interlocked.Increment(ref _inside) > _mostInside)
            {
                throw ServerBusyException.TooManyWaiting();
            }

            await _slots.WaitAsync(cancellation);
            try
            {
                using var limit = CancellationTokenSource.CreateLinkedTokenSource(cancellation);
                limit.CancelAfter(_longest);
                return await Task.Run(() => work(limit.Token), limit.Token);
            }
            catch (OperationCanceledException) when (!cancellation.IsCancellationRequested)
            {
                throw ServerBusyException.RanTooLong(_longest);
            }
            finally
            {
                _slots.Release();
            }
        }
        finally
        {
            Interlocked.Decrement(ref _inside);
        }
    }

    /// <inheritdoc/>
    public void Dispose() => _slots.Dispose();
}
