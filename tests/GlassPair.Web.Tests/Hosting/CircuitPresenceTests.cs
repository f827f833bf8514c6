using GlassPair.Web.Hosting;

namespace GlassPair.Web.Tests.Hosting;

public sealed class CircuitPresenceTests : IDisposable
{
    private readonly HandClock _clock = new();

    public void Dispose() => _clock.Dispose();

    [Fact]
    public async Task WhilePresent_ConnectionDownForLong_IsCanceledAndNewAfterTheReturn()
    {
        using var presence = new CircuitPresence(_clock);
        int returns = 0;
        presence.Returned += (_, _) => returns++;
        CancellationToken work = presence.WhilePresent;
        await presence.OnConnectionDownAsync(null!, CancellationToken.None);
        Assert.Equal(CircuitPresence.Grace, _clock.Due);
        Assert.False(work.IsCancellationRequested);
        _clock.Ring();
        Assert.True(work.IsCancellationRequested);
        await presence.OnConnectionUpAsync(null!, CancellationToken.None);
        Assert.Equal(1, returns);
        Assert.False(presence.WhilePresent.IsCancellationRequested);
    }

    [Fact]
    public async Task WhilePresent_ConnectionBackInTime_GoesOn()
    {
        using var presence = new CircuitPresence(_clock);
        int returns = 0;
        presence.Returned += (_, _) => returns++;
        CancellationToken work = presence.WhilePresent;
        await presence.OnConnectionDownAsync(null!, CancellationToken.None);
        await presence.OnConnectionUpAsync(null!, CancellationToken.None);
        _clock.Ring();
        Assert.False(work.IsCancellationRequested);
        Assert.Equal(0, returns);
    }

    [Fact]
    public void WhilePresent_PageClosed_IsCanceled()
    {
        var presence = new CircuitPresence(_clock);
        CancellationToken work = presence.WhilePresent;
        presence.Dispose();
        Assert.True(work.IsCancellationRequested);
    }

    /// <summary>A clock whose one timer rings by hand.</summary>
    private sealed class HandClock : TimeProvider, IDisposable
    {
        private HandTimer? _timer;

        public TimeSpan? Due { get; private set; }

        public void Ring() => _timer?.Ring();

        public void Dispose() => _timer?.Dispose();

        public override ITimer CreateTimer(TimerCallback callback, object? state, TimeSpan dueTime, TimeSpan period)
        {
            Due = dueTime;
            return _timer = new HandTimer(callback);
        }

        private sealed class HandTimer(TimerCallback callback) : ITimer
        {
            private bool _disposed;

            public void Ring()
            {
                if (!_disposed)
                {
                    callback(null);
                }
            }

            public bool Change(TimeSpan dueTime, TimeSpan period) => true;

            public void Dispose() => _disposed = true;

            public ValueTask DisposeAsync()
            {
                Dispose();
                return ValueTask.CompletedTask;
            }
        }
    }
}
