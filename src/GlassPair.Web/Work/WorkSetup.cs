namespace GlassPair.Web.Work;

/// <summary>Registers what computes for pages and API alike.</summary>
public static class WorkSetup
{
    /// <summary>Adds the ranking service.</summary>
    public static IServiceCollection AddGlassPairWork(this IServiceCollection services, IConfiguration configuration) =>
        services.AddSingleton<ShortlistService>();
}
