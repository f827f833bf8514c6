using System.Threading.Channels;
using GlassPair.Catalogue;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Stocks;

/// <summary>Reads the catalogue anew when its folder changes. The system's events only say "look now"; looking by the clock finds what they miss.</summary>
internal sealed partial class StockWatcher(StockLibrary library, IOptions<StockOptions> options, TimeProvider time, ILogger<StockWatcher> log) : BackgroundService
{
    private static readonly TimeSpan Settle = TimeSpan.FromMilliseconds(300);
    private const int MostRounds = 20;

    private readonly Channel<bool> _looks = Channel.CreateBounded<bool>(new BoundedChannelOptions(1) { FullMode = BoundedChannelFullMode.DropWrite });

    /// <inheritdoc/>
    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        TimeSpan lookEvery = options.Value.LookEvery < TimeSpan.FromSeconds(0.1) ? TimeSpan.FromSeconds(0.1) : options.Value.LookEvery;
        using FileSystemWatcher? events = TryWatch();
        while (!stoppingToken.IsCancellationRequested)
        {
            // Looks before it waits: the folder may have changed since the library read it.
            if (library.NeedsReading)
            {
                await WaitUntilStillAsync(stoppingToken).ConfigureAwait(false);
                Reload();
            }

            await WaitForLookAsync(lookEvery, stoppingToken).ConfigureAwait(false);
        }
    }

    private async Task WaitForLookAsync(TimeSpan atMost, CancellationToken stopping)
    {
        using var clock = new CancellationTokenSource(atMost, time);
        using var either = CancellationTokenSource.CreateLinkedTokenSource(clock.Token, stopping);
        try
        {
            await _looks.Reader.ReadAsync(either.Token).ConfigureAwait(false);
        }
        catch (OperationCanceledException) when (!stopping.IsCancellationRequested)
        {
            // Nothing was reported: look all the same.
        }
    }

    /// <summary>An editor writes a file in several steps; waits until two looks in a row see the same.</summary>
    private async Task WaitUntilStillAsync(CancellationToken stopping)
    {
        string before = "";
        for (int i = 0; i < MostRounds && CatalogueFolder.StampOf(library.Folder) is var now && now != before; i++)
        {
            before = now;
            await Task.Delay(Settle, time, stopping).ConfigureAwait(false);
        }
    }

    private void Reload()
    {
        try
        {
            library.Reload();
        }
#pragma warning disable CA1031 // A fault here would otherwise end the whole server, which has a stock to serve.
        catch (Exception e)
#pragma warning restore CA1031
        {
            LogNotReloaded(e, library.Folder);
        }
    }

    private FileSystemWatcher? TryWatch()
    {
        try
        {
            var events = new FileSystemWatcher(library.Folder);
            events.Changed += (_, _) => _looks.Writer.TryWrite(true);
            events.Created += (_, _) => _looks.Writer.TryWrite(true);
            events.Deleted += (_, _) => _looks.Writer.TryWrite(true);
            events.Renamed += (_, _) => _looks.Writer.TryWrite(true);
            events.EnableRaisingEvents = true;
            return events;
        }
        catch (Exception e) when (e is IOException or ArgumentException or UnauthorizedAccessException)
        {
            LogNoEvents(e, library.Folder);
            return null;
        }
    }

    [LoggerMessage(LogLevel.Error, "{Folder} could not be read anew; the stock served before is kept")]
    private partial void LogNotReloaded(Exception exception, string folder);

    [LoggerMessage(LogLevel.Warning, "Changes of {Folder} are not reported by the system; it is looked at by the clock only")]
    private partial void LogNoEvents(Exception exception, string folder);
}
