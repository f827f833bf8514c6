using System.Collections.Concurrent;
using Microsoft.AspNetCore.Hosting;
using Microsoft.AspNetCore.Hosting.Server;
using Microsoft.AspNetCore.Hosting.Server.Features;
using Microsoft.AspNetCore.Mvc.Testing;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Playwright;

namespace GlassPair.Browser.Tests;

/// <summary>The app on a port of its own, and one browser, for all tests of the collection.</summary>
public sealed class AppFixture : WebApplicationFactory<Program>, IAsyncLifetime
{
    private static readonly string[] BrowserPlaces =
        ["/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome", "/usr/bin/microsoft-edge"];

    private readonly string _archive = Directory.CreateTempSubdirectory("glasspair-browser-tests").FullName;
    private readonly ConcurrentDictionary<IPage, ConcurrentQueue<string>> _errors = new();
    private IPlaywright? _playwright;

    public AppFixture() => UseKestrel(k => k.Listen(System.Net.IPAddress.Loopback, 0));

    public IBrowser Browser { get; private set; } = null!;

    public string BaseUrl { get; private set; } = "";

    public async Task InitializeAsync()
    {
        StartServer();
        BaseUrl = Services.GetRequiredService<IServer>().Features.Get<IServerAddressesFeature>()!.Addresses.First().TrimEnd('/');
        _playwright = await Playwright.CreateAsync();
        Browser = await _playwright.Chromium.LaunchAsync(new()
        {
            ExecutablePath = FindBrowser(),
            Args = ["--no-sandbox", "--disable-gpu", "--disable-quic", "--disable-background-networking", "--disable-component-update", "--disable-sync", "--no-first-run"],
        });
    }

    async Task IAsyncLifetime.DisposeAsync()
    {
        await Browser.DisposeAsync();
        _playwright?.Dispose();
        await base.DisposeAsync();
        Directory.Delete(_archive, recursive: true);
    }

    /// <summary>Opens an address of the app and waits until the page answers to clicks.</summary>
    public async Task<IPage> OpenAsync(string address, int width = 1440, int height = 900, ColorScheme scheme = ColorScheme.Light)
    {
        IBrowserContext context = await Browser.NewContextAsync(new()
        {
            BaseURL = BaseUrl,
            ViewportSize = new() { Width = width, Height = height },
            ColorScheme = scheme,
            HasTouch = width < 640,
        });
        IPage page = await context.NewPageAsync();
        ConcurrentQueue<string> errors = _errors[page] = [];
        page.PageError += (_, error) => errors.Enqueue(error);
        page.Console += (_, message) =>
        {
            // A page that says 404 is itself such a message.
            if (message.Type == "error" && !message.Text.Contains("status of 404", StringComparison.Ordinal))
            {
                errors.Enqueue(message.Text);
            }
        };
        await page.GotoAsync(BaseUrl + address);
        await page.WaitForSelectorAsync("[data-ready]", new() { State = WaitForSelectorState.Attached, Timeout = 60_000 });
        return page;
    }

    /// <summary>Gets what the browser complained about: script errors, and what the content-security policy refused.</summary>
    public IReadOnlyCollection<string> ErrorsOf(IPage page) => _errors[page];

    protected override void ConfigureWebHost(IWebHostBuilder builder)
    {
        builder.UseEnvironment("BrowserTests");
        builder.UseSetting("GlassPair:Stock:ArchiveFolder", _archive);
    }

    private static string FindBrowser() =>
        Environment.GetEnvironmentVariable("GLASSPAIR_BROWSER") is { Length: > 0 } set ? set
        : BrowserPlaces.FirstOrDefault(File.Exists)
            ?? throw new InvalidOperationException($"No browser found. Set GLASSPAIR_BROWSER to the path of Chromium, or install one at {string.Join(", ", BrowserPlaces)}; ./test.sh does so on Debian and Ubuntu.");
}

/// <summary>The tests that share the app and the browser; they run one after the other.</summary>
[CollectionDefinition(Name)]
public sealed class SharedApp : ICollectionFixture<AppFixture>
{
    public const string Name = "app";
}
