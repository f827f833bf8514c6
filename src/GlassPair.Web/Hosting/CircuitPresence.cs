using Microsoft.AspNetCore.Components.Server.Circuits;

namespace GlassPair.Web.Hosting;

/// <summary>Tells the work of one page when nobody is there to see its answer: the connection has been down for ten seconds.</summary>
/// <param name="clock">The time.</param>
public sealed class CircuitPresence(TimeProvider clock) : CircuitHandler, IDisposable
{
    /// <summary>How long a connection may be down before work stops: a browser that lost it tries again within that time.</summary>
    public static readonly TimeSpan Grace = TimeSpan.FromSeconds(10);

    private readonly Lock _lock = new();
    private CancellationTokenSource _present = new();
    private ITimer? _timer;

    /// <summary>Gets a token that is canceled when the user has been gone for <see cref="Grace"/>; after the return it is a new one.</summary>
    public CancellationToken WhilePresent
    {
        get
        {
            lock (_lock)
            {
                return _present.Token;
            }
        }
    }

    /// <summary>Occurs when the user is back after work was stopped; the page starts it anew.</summary>
    public event EventHandler? Returned;

    /// <inheritdoc/>
    public override Task OnConnectionDownAsync(Circuit circuit, CancellationToken cancellationToken)
    {
        lock (_lock)
        {
            _timer?.Dispose();
            _timer = clock.CreateTimer(_ => Stop(), state: null, Grace, Timeout.InfiniteTimeSpan);
        }

        return Task.CompletedTask;
    }

    /// <inheritdoc/>
    public override Task OnConnectionUpAsync(Circuit circuit, CancellationToken cancellationToken)
    {
        bool wasStopped;
        lock (_lock)
        {
            _timer?.Dispose();
            wasStopped = _present.IsCancellationRequested;
            if (wasStopped)
            {
                _present = new CancellationTokenSource();
            }
        }

        if (wasStopped)
        {
            Returned?.Invoke(this, EventArgs.Empty);
        }

        return Task.CompletedTask;
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        lock (_lock)
        {
            _timer?.Dispose();
        }

        Stop();
    }

    private void Stop()
    {
        // A source is left to the garbage collector: the timer and the return of the user may use it at the same time.
        CancellationTokenSource present;
        lock (_lock)
        {
            present = _present;
        }

        present.Cancel();
    }
}
