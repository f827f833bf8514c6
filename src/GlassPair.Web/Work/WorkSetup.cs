namespace GlassPair.Web.Work;

/// <summary>Registers what computes for pages and API alike.</summary>
public static class WorkSetup
{
    /// <summary>Adds the gate for heavy work and the services behind it.</summary>
    public static IServiceCollection AddGlassPairWork(this IServiceCollection services, IConfiguration configuration)
    {
        services.AddOptions<WorkOptions>().Bind(configuration.GetSection("GlassPair:Work")).ValidateDataAnnotations().ValidateOnStart();
        return services.AddSingleton<WorkGate>().AddSingleton<ShortlistService>();
    }
}
