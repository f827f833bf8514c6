using System.Net;
using System.Text.RegularExpressions;
using GlassPair.Web.Hosting;

namespace GlassPair.Web.Tests.Hosting;

public sealed class SiteTests(SiteFactory site) : IClassFixture<SiteFactory>
{
    private readonly HttpClient _client = site.Open();

    [Theory]
    [InlineData("/")]
    [InlineData("/no/such/page")]
    [InlineData("/healthz")]
    [InlineData("/api/v1/stocks")]
    [InlineData("/api/v1/glasses/schott/none")]
    [InlineData("/app.css")]
    public async Task Answer_Any_CarriesTheSecurityHeaders(string path)
    {
        HttpResponseMessage answer = await Get(path);
        string policy = Assert.Single(answer.Headers.GetValues("Content-Security-Policy"));
        Assert.Contains("default-src 'self'", policy, StringComparison.Ordinal);
        Assert.Contains("frame-ancestors 'none'", policy, StringComparison.Ordinal);
        Assert.DoesNotContain("unsafe-eval", policy, StringComparison.Ordinal);
        Assert.DoesNotMatch("script-src[^;]*unsafe-inline", policy);
        Assert.DoesNotMatch("style-src [^;]*unsafe-inline", policy);
        Assert.Equal("nosniff", Assert.Single(answer.Headers.GetValues("X-Content-Type-Options")));
        Assert.Equal("no-referrer", Assert.Single(answer.Headers.GetValues("Referrer-Policy")));
        Assert.Equal("DENY", Assert.Single(answer.Headers.GetValues("X-Frame-Options")));
        Assert.Equal("same-origin", Assert.Single(answer.Headers.GetValues("Cross-Origin-Opener-Policy")));
        Assert.False(answer.Headers.Contains("Server"));
        Assert.False(answer.Headers.Contains("Access-Control-Allow-Origin"));
        Assert.False(answer.Headers.Contains("Strict-Transport-Security"));
    }

    [Fact]
    public async Task Page_InlineScripts_BearTheNonceOfTheirAnswer()
    {
        HttpResponseMessage first = await Get("/");
        string nonce = NonceOf(first);
        MatchCollection scripts = Regex.Matches(await first.Content.ReadAsStringAsync(), "<script(?![^>]*src=)[^>]*>");
        Assert.NotEmpty(scripts);
        Assert.All(scripts, s => Assert.Contains($"nonce=\"{nonce}\"", WebUtility.HtmlDecode(s.Value), StringComparison.Ordinal));
        Assert.NotEqual(nonce, NonceOf(await Get("/")));
    }

    [Theory]
    [InlineData("/healthz")]
    [InlineData("/readyz")]
    public async Task Health_OfARunningSite_IsGood(string path)
    {
        Assert.Equal(HttpStatusCode.OK, (await Get(path)).StatusCode);
        using var head = new HttpRequestMessage(HttpMethod.Head, new Uri(path, UriKind.Relative));
        Assert.Equal(HttpStatusCode.OK, (await _client.SendAsync(head)).StatusCode);
    }

    [Fact]
    public async Task HealthSwitch_AsksTheRunningSite()
    {
        Assert.Equal(0, await Health.AskAsync(new Uri(_client.BaseAddress!, "/healthz").AbsoluteUri));
        Assert.Equal(1, await Health.AskAsync(new Uri(_client.BaseAddress!, "/no/such/page").AbsoluteUri));
        Assert.Equal(1, await Health.AskAsync("http://127.0.0.1:1/healthz"));
        Assert.Equal(1, await Health.AskAsync("nonsense"));
    }

    [Fact]
    public async Task Page_Unknown_IsAnswered404()
    {
        HttpResponseMessage answer = await Get("/no/such/page");
        Assert.Equal(HttpStatusCode.NotFound, answer.StatusCode);
    }

    [Theory]
    [InlineData("/api/v1/glasses/schott/%00")]
    [InlineData("/%00")]
    [InlineData("/api/v1/stocks?%00=%ff")]
    public async Task Address_Malformed_IsABadRequest(string path)
    {
        Assert.Equal(HttpStatusCode.BadRequest, (await Get(path)).StatusCode);
    }

    [Fact]
    public async Task Https_WhereSet_IsAskedForAndKept()
    {
        using var secure = new SiteFactory(("GlassPair:Site:HttpsOnly", "true"), ("https_port", "443"));
        using HttpClient client = secure.Open();
        HttpResponseMessage answer = await client.GetAsync(new Uri("/", UriKind.Relative));
        Assert.Equal(HttpStatusCode.TemporaryRedirect, answer.StatusCode);
        Assert.Equal("https", answer.Headers.Location!.Scheme);
        Assert.Equal(HttpStatusCode.OK, (await client.GetAsync(new Uri("/healthz", UriKind.Relative))).StatusCode);
    }

    private static string NonceOf(HttpResponseMessage answer) =>
        Regex.Match(Assert.Single(answer.Headers.GetValues("Content-Security-Policy")), "'nonce-([^']+)'").Groups[1].Value;

    private Task<HttpResponseMessage> Get(string path) => _client.GetAsync(new Uri(path, UriKind.Relative));
}
