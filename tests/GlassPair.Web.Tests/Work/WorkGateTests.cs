using GlassPair.Web.Work;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Tests.Work;

public sealed class WorkGateTests
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(30);

    [Fact]
    public async Task RunAsync_MoreThanMayWait_RefusesTheRestAndFinishesTheOthers()
    {
        using WorkGate gate = Gate(new WorkOptions { AtOnce = 2, MostWaiting = 3 });
        using var open = new ManualResetEventSlim();
        Task<int>[] inside = [.. Enumerable.Range(0, 5).Select(i => gate.RunAsync(_ => Hold(open, i), CancellationToken.None))];
        ServerBusyException busy = await Assert.ThrowsAsync<ServerBusyException>(() => gate.RunAsync(_ => 5, CancellationToken.None));
        Assert.True(busy.RetryAfter > TimeSpan.Zero);
        open.Set();
        int[] answers = await Task.WhenAll(inside).WaitAsync(Patience);
        Assert.Equal([0, 1, 2, 3, 4], answers);
        Assert.Equal(6, await gate.RunAsync(_ => 6, CancellationToken.None));
    }

    [Fact]
    public async Task RunAsync_ManyAtOnce_RunsNoMoreThanAllowed()
    {
        using WorkGate gate = Gate(new WorkOptions { AtOnce = 2, MostWaiting = 100 });
        int running = 0;
        int most = 0;
        int Count()
        {
            int now = Interlocked.Increment(ref running);
            InterlockedMax(ref most, now);
            Thread.Sleep(2);
            return Interlocked.Decrement(ref running);
        }

        await Task.WhenAll(Enumerable.Range(0, 40).Select(_ => gate.RunAsync(_ => Count(), CancellationToken.None))).WaitAsync(Patience);
        Assert.Equal(2, most);
    }

    [Fact]
    public async Task RunAsync_CanceledWhileWaiting_GivesItsPlaceBack()
    {
        using WorkGate gate = Gate(new WorkOptions { AtOnce = 1, MostWaiting = 1 });
        using var open = new ManualResetEventSlim();
        using var left = new CancellationTokenSource();
        Task<int> first = gate.RunAsync(_ => Hold(open, 1), CancellationToken.None);
        Task<int> second = gate.RunAsync(_ => 2, left.Token);
        await left.CancelAsync();
        await Assert.ThrowsAnyAsync<OperationCanceledException>(() => second);
        Task<int> third = gate.RunAsync(_ => 3, CancellationToken.None);
        open.Set();
        int[] answers = await Task.WhenAll(first, third).WaitAsync(Patience);
        Assert.Equal([1, 3], answers);
    }

    [Fact]
    public async Task RunAsync_LongerThanAllowed_IsStoppedWithASentence()
    {
        using WorkGate gate = Gate(new WorkOptions { AtOnce = 1, LongestSeconds = 0.1 });
        ServerBusyException stopped = await Assert.ThrowsAsync<ServerBusyException>(() => gate.RunAsync(Forever, CancellationToken.None).WaitAsync(Patience));
        Assert.Contains("0.1 seconds", stopped.Message, StringComparison.Ordinal);
        Assert.Equal(1, await gate.RunAsync(_ => 1, CancellationToken.None));
    }

    [Fact]
    public async Task RunAsync_WorkThatFails_FreesItsSlot()
    {
        using WorkGate gate = Gate(new WorkOptions { AtOnce = 1, MostWaiting = 0 });
        await Assert.ThrowsAsync<InvalidTimeZoneException>(() => gate.RunAsync<int>(_ => throw new InvalidTimeZoneException(), CancellationToken.None));
        Assert.Equal(1, await gate.RunAsync(_ => 1, CancellationToken.None));
    }

    private static WorkGate Gate(WorkOptions options) => new(Options.Create(options));

    private static int Hold(ManualResetEventSlim until, int answer) => until.Wait(Patience) ? answer : throw new TimeoutException();

    private static int Forever(CancellationToken stop)
    {
        stop.WaitHandle.WaitOne(Patience);
        stop.ThrowIfCancellationRequested();
        return 0;
    }

    private static void InterlockedMax(ref int target, int value)
    {
        for (int seen = target; value > seen; seen = target)
        {
            if (Interlocked.CompareExchange(ref target, value, seen) == seen)
            {
                return;
            }
        }
    }
}
