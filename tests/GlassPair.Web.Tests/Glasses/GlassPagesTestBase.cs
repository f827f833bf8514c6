using Bunit;
using GlassPair.Web.Addresses;
using GlassPair.Web.Tests.Charts;
using GlassPair.Web.Work;
using Microsoft.AspNetCore.Components;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Tests.Glasses;

/// <summary>The pages of glasses over the shipped catalogue, in a browser that is already at work.</summary>
public abstract class GlassPagesTestBase : ChartTestBase
{
    private readonly WorkGate _gate = new(Options.Create(new WorkOptions()));

    protected GlassPagesTestBase()
    {
        Services.AddSingleton(ServedStock.Library);
        Services.AddSingleton(_gate);
        Services.AddSingleton<ShortlistService>();
        Services.AddScoped<LastRequirement>();
        JSInterop.Mode = JSRuntimeMode.Loose;
        SetRendererInfo(new RendererInfo("Server", true));
    }

    protected NavigationManager Navigation => Services.GetRequiredService<NavigationManager>();

    /// <summary>Gets the address as it stands after the site's own.</summary>
    protected string Address => Navigation.ToBaseRelativePath(Navigation.Uri);

    protected override void Dispose(bool disposing)
    {
        base.Dispose(disposing);
        _gate.Dispose();
    }
}
