using System.Collections.Concurrent;
using System.Collections.Immutable;
using GlassPair.Catalogue;
using GlassPair.Web.Stocks;
using Microsoft.Extensions.Logging;
using Microsoft.Extensions.Logging.Abstractions;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Tests.Stocks;

/// <summary>What is served when the catalogue's folder changes, turns faulty, or the program starts again.</summary>
public sealed class StockLibraryTests : IDisposable
{
    private const string Header = "maker,name,form,range_from_nm,range_to_nm,b1,c1_um2,supply\n";
    private const string OneGlass = Header + "schott,A,sellmeier,400,700,1.25,0.01,listed\n";
    private const string TwoGlasses = OneGlass + "schott,B,sellmeier,400,700,1.5,0.012,listed\n";
    private const string Faulty = Header + "schott,A,sellmeier,400,700,x,0.01,listed\n";

    /// <summary>Long enough for a busy machine; a test that passes does not wait for it.</summary>
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(30);

    private readonly string _root = Directory.CreateTempSubdirectory("glasspair-test-").FullName;
    private readonly LogList _log = new();

    private string Folder => Path.Combine(_root, "catalogue");

    private string Archive => Path.Combine(_root, "archive");

    public void Dispose() => Directory.Delete(_root, recursive: true);

    [Fact]
    public void Current_NoSettings_IsTheShippedCatalogue()
    {
        StockLibrary library = Library(new StockOptions { ArchiveFolder = Archive });
        Assert.Equal(("Open catalogue", 1636), (library.Current.Title, library.Current.Glasses.Length));
        Assert.Null(library.Problem);
        Assert.Empty(_log.Entries);
    }

    [Fact]
    public void Reload_FileChanged_ServesTheNewStockAndStillFindsTheOld()
    {
        Write(OneGlass);
        StockLibrary library = Library();
        Stock old = library.Current;
        int changes = 0;
        library.Changed += () => changes++;
        Write(TwoGlasses);
        library.Reload();
        Assert.Equal((2, 1), (library.Current.Glasses.Length, changes));
        Assert.Equal([library.Current, old], library.All.AsEnumerable());
        Assert.True(library.TryFind(old.Id.ToUpperInvariant(), out Stock? found));
        Assert.Same(old, found);
    }

    [Fact]
    public void Reload_NothingChanged_RaisesNothing()
    {
        Write(OneGlass);
        StockLibrary library = Library();
        library.Changed += () => Assert.Fail("Nothing has changed.");
        Stock before = library.Current;
        library.Reload();
        Assert.Same(before, library.Current);
    }

    [Fact]
    public void Reload_FaultyFile_KeepsTheOldStockAndSaysWhy()
    {
        Write(OneGlass);
        StockLibrary library = Library();
        Stock before = library.Current;
        int changes = 0;
        library.Changed += () => changes++;
        Write(Faulty);
        library.Reload();
        library.Reload();
        Assert.Same(before, library.Current);
        StockIssue issue = Assert.Single(library.Problem!.Issues);
        Assert.Equal(("own.csv", 2, "b1", "x"), (issue.File, issue.Line, issue.Column, issue.Value));
        Assert.Equal(1, changes);
        Write(OneGlass);
        library.Reload();
        Assert.Null(library.Problem);
        Assert.Same(before, library.Current);
        Assert.Equal(2, changes);
    }

    [Fact]
    public void Problem_OtherFaultLater_KeepsTheTimeOfTheFirst()
    {
        Write(Faulty);
        var clock = new StoppedClock();
        var library = new StockLibrary(Options.Create(new StockOptions { Folder = Folder, ArchiveFolder = Archive }), clock, _log);
        clock.Now += TimeSpan.FromMinutes(5);
        Write(Faulty.Replace("x,", "y,", StringComparison.Ordinal));
        library.Reload();
        Assert.Equal(("y", StoppedClock.Start), (library.Problem!.Issues[0].Value, library.Problem.Since));
    }

    [Fact]
    public void Start_FaultyFolder_ServesTheShippedCatalogueUntilItIsMended()
    {
        Write(Faulty);
        StockLibrary library = Library();
        Assert.Equal(1636, library.Current.Glasses.Length);
        Assert.NotNull(library.Problem);
        Write(OneGlass);
        library.Reload();
        Assert.Equal(("Own glasses", 1), (library.Current.Title, library.Current.Glasses.Length));
        Assert.Null(library.Problem);
    }

    [Fact]
    public void Start_NoSuchFolder_ServesTheShippedCatalogue()
    {
        StockLibrary library = Library();
        Assert.Equal(1636, library.Current.Glasses.Length);
        Assert.Contains("does not exist", library.Problem!.Issues.Single().Message, StringComparison.Ordinal);
    }

    [Fact]
    public void TryFind_StockServedBeforeARestart_IsReadFromTheArchive()
    {
        Write(OneGlass);
        string old = Library().Current.Id;
        Write(TwoGlasses);
        StockLibrary restarted = Library();
        Assert.DoesNotContain(restarted.All, s => s.Id == old);
        Assert.True(restarted.TryFind(old, out Stock? found));
        Assert.Equal(("Own glasses", "schott/A"), (found.Title, found.Glasses.Single().Id));
        Assert.True(restarted.TryFind(old, out Stock? again));
        Assert.Same(found, again);
        Assert.Contains(found, restarted.All);
        Assert.Equal(2, restarted.Current.Glasses.Length);
    }

    [Theory]
    [InlineData("000000000000")]
    [InlineData("")]
    [InlineData("../../etc/passwd")]
    [InlineData("\0")]
    public void TryFind_UnknownId_IsFalse(string id)
    {
        Write(OneGlass);
        Assert.False(Library().TryFind(id, out _));
    }

    [Fact]
    public void TryFind_DamagedArchive_IsRefusedAndLoggedOnce()
    {
        Write(OneGlass);
        string old = Library().Current.Id;
        Write(TwoGlasses);
        StockLibrary restarted = Library();
        File.WriteAllText(Path.Combine(Archive, old + ".zip"), "no zip");
        Assert.False(restarted.TryFind(old, out _));
        Assert.False(restarted.TryFind(old, out _));
        Assert.Equal(LogLevel.Error, Assert.Single(_log.Entries).Level);
    }

    [Fact]
    public void Start_ArchiveCannotBeWritten_IsLoggedAndServesAllTheSame()
    {
        Write(OneGlass);
        File.WriteAllText(Archive, "a file where the folder should be");
        StockLibrary library = Library();
        Assert.Single(library.Current.Glasses);
        Assert.Equal(LogLevel.Warning, Assert.Single(_log.Entries).Level);
        Assert.False(library.TryFind("000000000000", out _));
    }

    [Fact]
    public void Changed_OneHandlerFails_OthersStillHear()
    {
        Write(OneGlass);
        StockLibrary library = Library();
        bool heard = false;
        library.Changed += () => throw new InvalidOperationException("A page's fault.");
        library.Changed += () => heard = true;
        Write(TwoGlasses);
        library.Reload();
        Assert.True(heard);
    }

    [Fact]
    public async Task TryFindAndReload_FromManyThreads_NeverLoseAStock()
    {
        Write(OneGlass);
        StockLibrary library = Library();
        string[] ids = new string[12];
        ids[0] = library.Current.Id;
        for (int i = 1; i < ids.Length; i++)
        {
            Write(TwoGlasses.Replace("1.5,", FormattableString.Invariant($"1.5{i},"), StringComparison.Ordinal));
            library.Reload();
            ids[i] = library.Current.Id;
        }

        Assert.Equal(9, library.All.Length);
        await Parallel.ForEachAsync(Enumerable.Range(0, 200), (i, _) =>
        {
            string id = ids[i % ids.Length];
            Assert.True(library.TryFind(id, out Stock? stock));
            Assert.Equal(id, stock.Id);
            if (i % 50 == 0)
            {
                library.Reload();
            }

            return ValueTask.CompletedTask;
        });
        Assert.Equal(ids[^1], library.Current.Id);
    }

    /// <summary>The clock is an hour away: only the system's event can tell.</summary>
    [Fact]
    public async Task Watcher_FileChanged_ReloadsAtTheSystemsEvent() => await WatcherServesTheChangeAsync(TimeSpan.FromHours(1));

    /// <summary>The folder does not exist at the start, so that the system reports nothing: only the clock can tell.</summary>
    [Fact]
    public async Task Watcher_FolderAppears_ReloadsByTheClock()
    {
        StockLibrary library = Library();
        await RunWatcherAsync(library, TimeSpan.FromSeconds(0.1), () => Write(OneGlass), () => library.Problem is null);
        Assert.Single(library.Current.Glasses);
    }

    private async Task WatcherServesTheChangeAsync(TimeSpan lookEvery)
    {
        Write(OneGlass);
        StockLibrary library = Library();
        await RunWatcherAsync(library, lookEvery, () => Write(TwoGlasses), () => library.Current.Glasses.Length == 2);
        Assert.Equal(2, library.Current.Glasses.Length);
    }

    private static async Task RunWatcherAsync(StockLibrary library, TimeSpan lookEvery, Action change, Func<bool> isServed)
    {
        var served = new TaskCompletionSource(TaskCreationOptions.RunContinuationsAsynchronously);
        library.Changed += () =>
        {
            if (isServed())
            {
                served.TrySetResult();
            }
        };
        using var watcher = new StockWatcher(library, Options.Create(new StockOptions { LookEvery = lookEvery }), TimeProvider.System, NullLogger<StockWatcher>.Instance);
        await watcher.StartAsync(CancellationToken.None);
        change();
        await served.Task.WaitAsync(Patience);
        await watcher.StopAsync(CancellationToken.None);
    }

    private void Write(string text)
    {
        Directory.CreateDirectory(Folder);
        File.WriteAllText(Path.Combine(Folder, "own.csv"), text);
    }

    private StockLibrary Library() => Library(new StockOptions { Folder = Folder, Title = "Own glasses", ArchiveFolder = Archive });

    private StockLibrary Library(StockOptions options) => new(Options.Create(options), TimeProvider.System, _log);

    private sealed class StoppedClock : TimeProvider
    {
        public static readonly DateTimeOffset Start = new(2026, 1, 2, 3, 4, 5, TimeSpan.Zero);

        public DateTimeOffset Now { get; set; } = Start;

        public override DateTimeOffset GetUtcNow() => Now;
    }

    /// <summary>Keeps what is logged at warning and above.</summary>
    private sealed class LogList : ILogger<StockLibrary>
    {
        private readonly ConcurrentQueue<(LogLevel Level, string Text)> _entries = new();

        public ImmutableArray<(LogLevel Level, string Text)> Entries => [.. _entries];

        public IDisposable? BeginScope<TState>(TState state)
            where TState : notnull => null;

        public bool IsEnabled(LogLevel logLevel) => logLevel >= LogLevel.Warning;

        public void Log<TState>(LogLevel logLevel, EventId eventId, TState state, Exception? exception, Func<TState, Exception?, string> formatter)
        {
            if (IsEnabled(logLevel))
            {
                _entries.Enqueue((logLevel, formatter(state, exception)));
            }
        }
    }
}
