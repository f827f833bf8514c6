using GlassPair.Web.Stocks;

namespace GlassPair.Web.Hosting;

/// <summary>Tells whoever watches over the process how it is.</summary>
public static class Health
{
    /// <summary>The switch of the command line that asks a running process instead of starting one.</summary>
    public const string Switch = "--health";

    private const string Alive = "/healthz";
    private const string Ready = "/readyz";

    private static readonly string[] Methods = [HttpMethods.Get, HttpMethods.Head];

    /// <summary>Maps <c>/healthz</c>, the process answers, and <c>/readyz</c>, it has a stock and is not stopping.</summary>
    public static WebApplication MapHealth(this WebApplication app)
    {
        app.MapMethods(Alive, Methods, () => TypedResults.Ok(new { status = "alive" })).ExcludeFromDescription();
        app.MapMethods(Ready, Methods, IResult (StockLibrary library, IHostApplicationLifetime lifetime) =>
            lifetime.ApplicationStopping.IsCancellationRequested
                ? TypedResults.Problem(statusCode: StatusCodes.Status503ServiceUnavailable, detail: "Stopping.")
                : TypedResults.Ok(new { status = "ready", stock = library.Current.Id, glasses = library.Current.Glasses.Length })).ExcludeFromDescription();
        return app;
    }

    /// <summary>Tells whether a request asks for the health of the process.</summary>
    public static bool IsAskedBy(HttpRequest request) => request.Path == Alive || request.Path == Ready;

    /// <summary>Asks a running process; 0 where it answers that it is well, else 1.</summary>
    /// <param name="address">The address of its <c>/healthz</c> or <c>/readyz</c>.</param>
    public static async Task<int> AskAsync(string address)
    {
        if (!Uri.TryCreate(address, UriKind.Absolute, out Uri? uri))
        {
            await Console.Error.WriteLineAsync($"{Switch} needs an address, such as http://localhost:8080/healthz; given: {address}");
            return 1;
        }

        using var client = new HttpClient { Timeout = TimeSpan.FromSeconds(5) };
        try
        {
            using HttpResponseMessage response = await client.GetAsync(uri);
            return response.IsSuccessStatusCode ? 0 : 1;
        }
        catch (Exception problem) when (problem is HttpRequestException or TaskCanceledException)
        {
            await Console.Error.WriteLineAsync($"No answer from {uri}: {problem.Message}");
            return 1;
        }
    }
}
