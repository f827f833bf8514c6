using GlassPair.Web.Addresses;

namespace GlassPair.Web.Components;

/// <summary>Registers and maps the pages.</summary>
public static class PagesSetup
{
    /// <summary>Adds what the pages need.</summary>
    public static IServiceCollection AddGlassPairPages(this IServiceCollection services, IConfiguration configuration)
    {
        services.AddSingleton<Pages.WorkbenchAnswers>();
        services.AddScoped<LastRequirement>();
        services.AddSingleton(_ => DemoRequirement.Read(Path.Combine(AppContext.BaseDirectory, "data", "demo", "requirement.json")));
        services.AddRazorComponents().AddInteractiveServerComponents();
        return services;
    }

    /// <summary>Maps the pages.</summary>
    public static WebApplication MapGlassPairPages(this WebApplication app)
    {
        // The policy of the security headers covers frames.
        app.MapRazorComponents<App>().AddInteractiveServerRenderMode(options => options.ContentSecurityFrameAncestorsPolicy = null);
        Pages.WorkbenchExport.Map(app);
        Glasses.GlassListCsv.Map(app);
        return app;
    }
}
