namespace GlassPair.Web.Stocks;

/// <summary>Registers what serves the stocks.</summary>
public static class StocksSetup
{
    /// <summary>Adds the library of stocks.</summary>
    public static IServiceCollection AddGlassPairStocks(this IServiceCollection services, IConfiguration configuration)
    {
        services.Configure<StockOptions>(configuration.GetSection("GlassPair:Stock"));
        return services.AddSingleton<StockLibrary>();
    }
}
