using System.Net;
using System.Text;
using System.Text.Json;
using GlassPair.Web.Work;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Options;

namespace GlassPair.Web.Tests.Hosting;

/// <summary>What a user sees of a fault in the program itself; here the gate for heavy work is broken.</summary>
public sealed class FaultTests : IDisposable
{
    private readonly SiteFactory _site = new() { Replace = services => services.AddSingleton(_ => BrokenGate()) };
    private readonly HttpClient _client;

    public FaultTests() => _client = _site.Open();

    public void Dispose()
    {
        _client.Dispose();
        _site.Dispose();
    }

    [Fact]
    public async Task Call_OfAFaultyProgram_IsAProblemThatTellsNothingOfTheInside()
    {
        using var content = new StringContent(
            """{"requirement":{"focalLengthMm":100,"fNumber":8,"band":{"shortNm":486.1327,"designNm":587.5618,"longNm":656.2725,"samples":3}}}""", Encoding.UTF8, "application/json");
        HttpResponseMessage answer = await _client.PostAsync(new Uri("/api/v1/shortlist", UriKind.Relative), content);
        Assert.Equal(HttpStatusCode.InternalServerError, answer.StatusCode);
        Assert.Equal("application/problem+json", answer.Content.Headers.ContentType?.MediaType);
        string text = await answer.Content.ReadAsStringAsync();
        Assert.Equal(["type", "title", "status", "traceId"], JsonDocument.Parse(text).RootElement.EnumerateObject().Select(p => p.Name));
        Assert.DoesNotContain("Disposed", text, StringComparison.OrdinalIgnoreCase);
        Assert.True(answer.Headers.Contains("Content-Security-Policy"));
    }

    [Fact]
    public async Task Page_OfAFaultyProgram_IsAPageThatTellsNothingOfTheInside()
    {
        HttpResponseMessage answer = await _client.GetAsync(new Uri("/", UriKind.Relative));
        string text = await answer.Content.ReadAsStringAsync();
        Assert.Equal(HttpStatusCode.InternalServerError, answer.StatusCode);
        Assert.Equal("text/html", answer.Content.Headers.ContentType?.MediaType);
        Assert.Contains("<h1", text, StringComparison.Ordinal);
        Assert.DoesNotContain("Disposed", text, StringComparison.OrdinalIgnoreCase);
        Assert.True(answer.Headers.Contains("Content-Security-Policy"));
    }

    private static WorkGate BrokenGate()
    {
        var gate = new WorkGate(Options.Create(new WorkOptions()));
        gate.Dispose();
        return gate;
    }
}
