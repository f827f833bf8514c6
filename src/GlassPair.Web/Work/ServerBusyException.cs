namespace GlassPair.Web.Work;

/// <summary>Work was refused because too much is waiting, or stopped because it ran too long. The message is a sentence for the user.</summary>
public sealed class ServerBusyException : Exception
{
    private ServerBusyException(string message, TimeSpan retryAfter)
        : base(message) => RetryAfter = retryAfter;

    /// <summary>Gets after how long it makes sense to ask again.</summary>
    public TimeSpan RetryAfter { get; }

    internal static ServerBusyException TooManyWaiting() =>
        new("Too many others are computing at the moment. Try again in a few seconds.", TimeSpan.FromSeconds(5));

    internal static ServerBusyException RanTooLong(TimeSpan longest) =>
        new(FormattableString.Invariant($"The work was stopped after {longest.TotalSeconds:0.#} seconds. Narrow it, for example to fewer makers, or try again later."), TimeSpan.FromSeconds(30));
}
