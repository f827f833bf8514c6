using Microsoft.AspNetCore.Components.Server;
using Microsoft.AspNetCore.Components.Server.Circuits;
using Microsoft.AspNetCore.DataProtection;
using Microsoft.AspNetCore.HttpsPolicy;
using Microsoft.AspNetCore.SignalR;
using Microsoft.Extensions.DependencyInjection.Extensions;

namespace GlassPair.Web.Hosting;

/// <summary>Registers and orders what stands between the network and the pages: limits, headers, errors, health.</summary>
public static class HostingSetup
{
    private static readonly string[] AddressSettings = ["urls", "http_ports", "https_ports", "Kestrel:Endpoints"];

    /// <summary>Adds what hosting needs.</summary>
    public static WebApplicationBuilder AddGlassPairHosting(this WebApplicationBuilder builder)
    {
        if (!AddressSettings.Any(s => builder.Configuration.GetSection(s).Exists()))
        {
            builder.WebHost.UseUrls(Startup.UsualAddress);
        }

        if (!builder.Environment.IsDevelopment())
        {
            builder.Logging.ClearProviders().AddJsonConsole(options => (options.UseUtcTimestamp, options.TimestampFormat) = (true, "O"));
        }

        builder.Services.AddWordsAtStart();
        IDataProtectionBuilder keys = builder.Services.AddDataProtection().SetApplicationName("GlassPair");
        if (SiteOf(builder.Configuration).KeysFolder is { Length: > 0 } folder)
        {
            keys.PersistKeysToFileSystem(new DirectoryInfo(folder));
        }

        builder.Services.AddRequestLimits(builder.Configuration);
        builder.Services.AddAntiforgery(options =>
        {
            options.SuppressXFrameOptionsHeader = true;
            options.Cookie.Name = "glasspair-form";
            options.Cookie.SameSite = SameSiteMode.Strict;
            options.Cookie.SecurePolicy = CookieSecurePolicy.SameAsRequest;
        });
        builder.Services.Configure<HstsOptions>(options => options.MaxAge = TimeSpan.FromDays(365));
        builder.Services.TryAddSingleton(TimeProvider.System);
        builder.Services.AddScoped<CircuitPresence>().AddScoped<CircuitHandler>(services => services.GetRequiredService<CircuitPresence>());
        builder.Services.Configure<CircuitOptions>(options =>
        {
            options.DisconnectedCircuitMaxRetained = 50;
            options.DisconnectedCircuitRetentionPeriod = TimeSpan.FromSeconds(60);
            options.JSInteropDefaultCallTimeout = TimeSpan.FromSeconds(15);
            options.PersistedCircuitInMemoryMaxRetained = 200;
            options.PersistedCircuitInMemoryRetentionPeriod = TimeSpan.FromMinutes(30);
        });
        builder.Services.Configure<HubOptions>(options =>
        {
            options.MaximumReceiveMessageSize = 64 * 1_024;
            options.HandshakeTimeout = TimeSpan.FromSeconds(10);
        });
        return builder;
    }

    /// <summary>Puts headers, error pages, and limits into the pipeline; the API's own error handling comes inside.</summary>
    public static WebApplication UseGlassPairHosting(this WebApplication app)
    {
        app.UseSecurityHeaders();
        if (!app.Environment.IsDevelopment())
        {
            app.UseExceptionHandler("/error", createScopeForErrors: true);
        }

        if (SiteOf(app.Configuration).HttpsOnly)
        {
            // Whoever watches over the process asks inside the proxy.
            app.UseHsts();
            app.UseWhen(context => !Health.IsAskedBy(context.Request), pages => pages.UseHttpsRedirection());
        }

        app.UseStatusCodePagesWithReExecute("/not-found", createScopeForStatusCodePages: true);
        return app;
    }

    private static SiteOptions SiteOf(IConfiguration configuration) => configuration.GetSection("GlassPair:Site").Get<SiteOptions>() ?? new();
}
