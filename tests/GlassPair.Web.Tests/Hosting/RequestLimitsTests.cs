using System.Net;
using System.Text;
using System.Text.Json;
using GlassPair.Web.Work;
using Microsoft.Extensions.DependencyInjection;

namespace GlassPair.Web.Tests.Hosting;

public sealed class RequestLimitsTests
{
    [Fact]
    public async Task Calls_OneMoreThanAllowed_AreAnswered429WithTheTimeToWait()
    {
        using var site = new SiteFactory(("GlassPair:Limits:ApiCallsPerMinute", "5"));
        using HttpClient client = site.Open();
        for (int i = 0; i < 5; i++)
        {
            Assert.Equal(HttpStatusCode.OK, (await client.GetAsync(Path("/api/v1/stocks"))).StatusCode);
        }

        HttpResponseMessage refused = await client.GetAsync(Path("/api/v1/stocks"));
        Assert.Equal(HttpStatusCode.TooManyRequests, refused.StatusCode);
        Assert.InRange(refused.Headers.RetryAfter!.Delta!.Value.TotalSeconds, 1, 60);
        Assert.Contains("5 calls a minute", (await Problem(refused)).GetProperty("detail").GetString(), StringComparison.Ordinal);

        // Health and pages are not calls of the API.
        Assert.Equal(HttpStatusCode.OK, (await client.GetAsync(Path("/healthz"))).StatusCode);
    }

    [Fact]
    public async Task Body_LargerThanAllowed_IsAnswered413()
    {
        using var site = new SiteFactory(("GlassPair:Limits:ApiBodyKilobytes", "2"));
        using HttpClient client = site.Open();
        using var large = new StringContent(new string(' ', 2_049), Encoding.UTF8, "application/json");
        HttpResponseMessage refused = await client.PostAsync(Path("/api/v1/pair"), large);
        Assert.Equal(HttpStatusCode.RequestEntityTooLarge, refused.StatusCode);
        Assert.Contains("2048 bytes", (await Problem(refused)).GetProperty("detail").GetString(), StringComparison.Ordinal);

        using var small = new StringContent(new string(' ', 2_048), Encoding.UTF8, "application/json");
        Assert.Equal(HttpStatusCode.BadRequest, (await client.PostAsync(Path("/api/v1/pair"), small)).StatusCode);
    }

    [Theory]
    [InlineData("/")]
    [InlineData("/api/v1/stocks")]
    public async Task Query_LongerThanAllowed_IsAnswered414InWords(string path)
    {
        using var site = new SiteFactory();
        using HttpClient client = site.Open();
        HttpResponseMessage refused = await client.GetAsync(Path($"{path}?{new string('a', 8_192)}"));
        Assert.Equal(HttpStatusCode.RequestUriTooLong, refused.StatusCode);
        Assert.Contains("too long", await refused.Content.ReadAsStringAsync(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Shortlist_LongerThanAllowed_IsAnsweredWith504()
    {
        using var site = new SiteFactory(("GlassPair:Limits:ApiSeconds", "0.1"), ("GlassPair:Work:AtOnce", "1"));
        using HttpClient client = site.Open();
        using var held = new ManualResetEventSlim();
        WorkGate gate = site.Services.GetRequiredService<WorkGate>();
        Task<bool> other = gate.RunAsync(stop => held.Wait(TimeSpan.FromSeconds(30), stop), CancellationToken.None);
        HttpResponseMessage late = await client.PostAsync(Path("/api/v1/shortlist"), Shortlist());
        held.Set();
        Assert.True(await other);
        Assert.Equal(HttpStatusCode.GatewayTimeout, late.StatusCode);
        Assert.Equal(504, (await Problem(late)).GetProperty("status").GetInt32());
    }

    [Fact]
    public async Task Shortlist_WhileTooManyWait_IsAnswered503WithTheTimeToWait()
    {
        using var site = new SiteFactory(("GlassPair:Work:MostWaiting", "0"), ("GlassPair:Work:AtOnce", "1"));
        using HttpClient client = site.Open();
        using var held = new ManualResetEventSlim();
        WorkGate gate = site.Services.GetRequiredService<WorkGate>();
        Task<bool> other = gate.RunAsync(stop => held.Wait(TimeSpan.FromSeconds(30), stop), CancellationToken.None);
        HttpResponseMessage busy = await client.PostAsync(Path("/api/v1/shortlist"), Shortlist());
        held.Set();
        Assert.True(await other);
        Assert.Equal(HttpStatusCode.ServiceUnavailable, busy.StatusCode);
        Assert.InRange(busy.Headers.RetryAfter!.Delta!.Value.TotalSeconds, 1, 60);
        Assert.Contains("Try again", (await Problem(busy)).GetProperty("detail").GetString(), StringComparison.Ordinal);
        Assert.Equal(HttpStatusCode.OK, (await client.PostAsync(Path("/api/v1/shortlist"), Shortlist())).StatusCode);
    }

    private static Uri Path(string path) => new(path, UriKind.Relative);

    private static StringContent Shortlist() => new(
        """{"requirement":{"focalLengthMm":100,"fNumber":8,"band":{"shortNm":486.1327,"designNm":587.5618,"longNm":656.2725,"samples":3}},"makers":["schott"],"take":1}""",
        Encoding.UTF8,
        "application/json");

    private static async Task<JsonElement> Problem(HttpResponseMessage response)
    {
        Assert.Equal("application/problem+json", response.Content.Headers.ContentType?.MediaType);
        return JsonDocument.Parse(await response.Content.ReadAsStringAsync()).RootElement;
    }
}
