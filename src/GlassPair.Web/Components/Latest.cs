namespace GlassPair.Web.Components;

/// <summary>Of several calls only the latest goes on: each new one ends those before it, and so does the end of the page.</summary>
internal sealed class Latest : IDisposable
{
    private CancellationTokenSource _source = new();

    /// <summary>Ends the calls before and gives the token of the new one.</summary>
    /// <param name="until">Ends the new call as well.</param>
    public CancellationToken Next(CancellationToken until = default)
    {
        Dispose();
        _source = CancellationTokenSource.CreateLinkedTokenSource(until);
        return _source.Token;
    }

    /// <summary>Ends the calls before without a new one.</summary>
    public void Stop() => _source.Cancel();

    /// <summary>Ends the calls before and waits; true where no newer call came meanwhile.</summary>
    public Task<bool> PauseAsync(TimeSpan pause) => PauseAsync(pause, Next());

    /// <summary>Waits; true where the call was not ended meanwhile.</summary>
    public static async Task<bool> PauseAsync(TimeSpan pause, CancellationToken cancellation)
    {
        await Task.Delay(pause, cancellation).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing | ConfigureAwaitOptions.ContinueOnCapturedContext);
        return !cancellation.IsCancellationRequested;
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        _source.Cancel();
        _source.Dispose();
    }
}
