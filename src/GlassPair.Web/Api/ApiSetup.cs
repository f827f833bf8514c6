using GlassPair.Web.Stocks;

namespace GlassPair.Web.Api;

/// <summary>Registers and maps the HTTP API.</summary>
public static class ApiSetup
{
    /// <summary>Adds what the API needs.</summary>
    public static IServiceCollection AddGlassPairApi(this IServiceCollection services, IConfiguration configuration) => services;

    /// <summary>Puts the API's error handling into the pipeline.</summary>
    public static WebApplication UseGlassPairApi(this WebApplication app) => app;

    /// <summary>Maps the API's routes.</summary>
    public static WebApplication MapGlassPairApi(this WebApplication app)
    {
        app.MapGet("/api/v1/stocks", (StockLibrary library) =>
            new[] { new { id = library.Current.Id, title = library.Current.Title, glasses = library.Current.Glasses.Length, isDefault = true } });
        return app;
    }
}
