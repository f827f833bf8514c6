using System.Collections.Immutable;
using System.Diagnostics.CodeAnalysis;
using GlassPair.Catalogue;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Stocks;

/// <summary>
/// The stocks that are served: the current one, read from the catalogue's folder, and those served before. One instance for the
/// whole process; safe to use from any thread.
/// </summary>
public sealed partial class StockLibrary
{
    /// <summary>The most stocks held in memory beside the current one; older ones are read from the archive when asked for.</summary>
    private const int MostOlder = 8;

    private readonly string _shipped = Path.Combine(AppContext.BaseDirectory, "data", "catalogue");
    private readonly string _title;
    private readonly TimeProvider _time;
    private readonly ILogger<StockLibrary> _log;
    private readonly StockArchive? _archive;
    private readonly Lock _reloading = new();
    private readonly Lock _loading = new();
    private ImmutableHashSet<string> _damaged = [];
    private volatile State _state;

    /// <summary>Reads the catalogue; where the folder that the settings name cannot be used, the shipped catalogue is served and <see cref="Problem"/> set.</summary>
    /// <exception cref="InvalidDataException">The shipped catalogue itself cannot be read: the program is not whole.</exception>
    public StockLibrary(IOptions<StockOptions> options, TimeProvider time, ILogger<StockLibrary> log)
    {
        (_time, _log) = (time, log);
        StockOptions settings = options.Value;
        Folder = settings.Folder.Length > 0 ? Path.GetFullPath(settings.Folder) : _shipped;
        _title = settings.Title.Length > 0 ? settings.Title : Folder == _shipped ? "Open catalogue" : Path.GetFileName(Path.TrimEndingDirectorySeparator(Folder));
        _archive = FindArchive(settings.ArchiveFolder);
        string stamp = CatalogueFolder.StampOf(Folder);
        StockReading reading = StockReader.ReadFolder(Folder, _title);
        StockReading served = reading.Stock is null ? StockReader.ReadFolder(_shipped, "Open catalogue") : reading;
        Stock current = served.Stock
            ?? throw new InvalidDataException($"The catalogue shipped with the program cannot be read. {string.Join(" ", served.Issues.Take(3))}");
        _state = new State(current, [], ProblemOf(reading, null), stamp);
        Keep(current);
    }

    /// <summary>Raised after <see cref="Current"/> or <see cref="Problem"/> has changed, on any thread; a handler must be quick.</summary>
    public event Action? Changed;

    /// <summary>Gets the folder that is read and watched.</summary>
    public string Folder { get; }

    /// <summary>Gets the stock served by default.</summary>
    public Stock Current => _state.Current;

    /// <summary>Gets what is wrong with the folder as it is now; null where <see cref="Current"/> was read from it.</summary>
    public StockProblem? Problem => _state.Problem;

    /// <summary>Gets the current stock, then those served or asked for before that are at hand, the latest first.</summary>
    public ImmutableArray<Stock> All => _state is var state ? [state.Current, .. state.Older] : [];

    /// <summary>Finds a stock by its id, upper and lower case alike, even one served before the program was last started.</summary>
    public bool TryFind(string id, [NotNullWhen(true)] out Stock? stock)
    {
        id = id.ToLowerInvariant();
        stock = AtHand(id) ?? FromArchive(id);
        return stock is not null;
    }

    /// <summary>Tells whether the folder has changed since it was last read, or could not be used then.</summary>
    internal bool NeedsReading => _state is var state && (state.Problem is not null || CatalogueFolder.StampOf(Folder) != state.Stamp);

    /// <summary>Reads the folder again. A faulty catalogue sets <see cref="Problem"/> and leaves the stock that is served.</summary>
    public void Reload()
    {
        bool changed;
        lock (_reloading)
        {
            // Taken before the files are read: a change while they are read is seen the next time.
            string stamp = CatalogueFolder.StampOf(Folder);
            StockReading reading = StockReader.ReadFolder(Folder, _title);
            if (reading.Stock is { } read && read.Id != Current.Id)
            {
                Keep(read);
            }

            lock (_loading)
            {
                State before = _state;
                State after = reading.Stock is not { } stock ? before with { Problem = ProblemOf(reading, before.Problem), Stamp = stamp }
                    : stock.Id == before.Current.Id ? before with { Problem = null, Stamp = stamp }
                    : new State(stock, WithOlder(before.Older.RemoveAll(s => s.Id == stock.Id), before.Current), null, stamp);
                changed = after.Current != before.Current || after.Problem != before.Problem;
                _state = after;
            }
        }

        if (changed)
        {
            LogReloaded(Current.Id, Current.Glasses.Length, Problem?.Issues[0].ToString() ?? "none");
            RaiseChanged();
        }
    }

    private static ImmutableList<Stock> WithOlder(ImmutableList<Stock> older, Stock stock) => [stock, .. older.Take(MostOlder - 1)];

    private StockProblem? ProblemOf(StockReading reading, StockProblem? before) =>
        reading.Stock is not null ? null
        : before is not null && before.Issues.SequenceEqual(reading.Issues) ? before
        : new StockProblem(reading.Issues, reading.FurtherIssues, before?.Since ?? _time.GetUtcNow());

    private Stock? AtHand(string id)
    {
        State state = _state;
        return state.Current.Id == id ? state.Current : state.Older.Find(s => s.Id == id);
    }

    private Stock? FromArchive(string id)
    {
        if (_archive is null || _damaged.Contains(id))
        {
            return null;
        }

        lock (_loading)
        {
            if (AtHand(id) is { } loadedMeanwhile)
            {
                return loadedMeanwhile;
            }

            try
            {
                if (_archive.Load(id) is { } stock)
                {
                    _state = _state with { Older = WithOlder(_state.Older, stock) };
                    return stock;
                }
            }
            catch (InvalidDataException e)
            {
                _damaged = _damaged.Add(id);
                LogDamaged(e, id);
            }
            catch (Exception e) when (e is IOException or UnauthorizedAccessException)
            {
                LogUnreadable(e, id);
            }

            return null;
        }
    }

    private void Keep(Stock stock)
    {
        try
        {
            _archive?.Save(stock);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            LogNotKept(e, stock.Id, _archive!.Folder);
        }
    }

    private StockArchive? FindArchive(string set)
    {
        string[] folders = set.Length > 0
            ? [Path.GetFullPath(set)]
            : [.. new[] { Environment.GetFolderPath(Environment.SpecialFolder.LocalApplicationData, Environment.SpecialFolderOption.DoNotVerify), Path.GetTempPath() }
                .Where(parent => parent.Length > 0).Select(parent => Path.Combine(parent, "GlassPair", "stocks"))];
        foreach (string folder in folders)
        {
            try
            {
                Directory.CreateDirectory(folder);
                using FileStream probe = File.Create(Path.Combine(folder, $"{Guid.NewGuid():N}.tmp"), 1, FileOptions.DeleteOnClose);
                return new StockArchive(folder);
            }
            catch (Exception e) when (e is IOException or UnauthorizedAccessException)
            {
                LogNoArchive(e, folder);
            }
        }

        return null;
    }

    private void RaiseChanged()
    {
        foreach (Action handler in Changed?.GetInvocationList().Cast<Action>() ?? [])
        {
            try
            {
                handler();
            }
#pragma warning disable CA1031 // One page's fault must not keep the others from hearing of the change.
            catch (Exception e)
#pragma warning restore CA1031
            {
                LogHandlerFailed(e);
            }
        }
    }

    [LoggerMessage(LogLevel.Information, "Stock {Id} with {Glasses} glasses is served; problem of the folder: {Problem}")]
    private partial void LogReloaded(string id, int glasses, string problem);

    [LoggerMessage(LogLevel.Error, "Archived stock {Id} is damaged and is not served")]
    private partial void LogDamaged(Exception exception, string id);

    [LoggerMessage(LogLevel.Warning, "Archived stock {Id} cannot be read")]
    private partial void LogUnreadable(Exception exception, string id);

    [LoggerMessage(LogLevel.Warning, "Stock {Id} could not be kept in {Folder}: links to it will not open once it has changed")]
    private partial void LogNotKept(Exception exception, string id, string folder);

    [LoggerMessage(LogLevel.Warning, "Stocks cannot be kept in {Folder}")]
    private partial void LogNoArchive(Exception exception, string folder);

    [LoggerMessage(LogLevel.Error, "A listener to a change of stock failed")]
    private partial void LogHandlerFailed(Exception exception);

    private sealed record State(Stock Current, ImmutableList<Stock> Older, StockProblem? Problem, string Stamp);
}
