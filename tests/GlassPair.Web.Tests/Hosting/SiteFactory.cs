using Microsoft.AspNetCore.Hosting;
using Microsoft.AspNetCore.Hosting.Server;
using Microsoft.AspNetCore.Hosting.Server.Features;
using Microsoft.AspNetCore.Mvc.Testing;
using Microsoft.AspNetCore.TestHost;
using Microsoft.Extensions.DependencyInjection;

namespace GlassPair.Web.Tests.Hosting;

/// <summary>The site on a port of its own, with the limits of the web server, outside Development.</summary>
public class SiteFactory : WebApplicationFactory<Program>
{
    private readonly (string Name, string Value)[] _settings;

    public SiteFactory()
        : this([])
    {
    }

    internal SiteFactory(params (string Name, string Value)[] settings)
    {
        _settings = settings;
        UseKestrel(kestrel => kestrel.Listen(System.Net.IPAddress.Loopback, 0));
    }

    internal HttpClient Open()
    {
        StartServer();
        string address = Services.GetRequiredService<IServer>().Features.Get<IServerAddressesFeature>()!.Addresses.First();
        return new HttpClient(new SocketsHttpHandler { AllowAutoRedirect = false, UseCookies = false }) { BaseAddress = new Uri(address) };
    }

    /// <summary>Gets or sets what replaces services of the site.</summary>
    internal Action<IServiceCollection> Replace { get; init; } = _ => { };

    protected override void ConfigureWebHost(IWebHostBuilder builder)
    {
        builder.UseEnvironment("Tests");
        builder.ConfigureTestServices(Replace);
        foreach ((string name, string value) in _settings)
        {
            builder.UseSetting(name, value);
        }
    }
}
