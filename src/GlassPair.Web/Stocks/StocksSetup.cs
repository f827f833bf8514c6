using Microsoft.Extensions.DependencyInjection.Extensions;

namespace GlassPair.Web.Stocks;

/// <summary>Registers what serves the stocks.</summary>
public static class StocksSetup
{
    /// <summary>Adds the library of stocks, read at the start and again whenever the catalogue's folder changes.</summary>
    public static IServiceCollection AddGlassPairStocks(this IServiceCollection services, IConfiguration configuration)
    {
        services.Configure<StockOptions>(configuration.GetSection("GlassPair:Stock"));
        services.TryAddSingleton(TimeProvider.System);
        return services.AddSingleton<StockLibrary>().AddHostedService<StockWatcher>();
    }
}
