using System.Net;
using System.Text;
using System.Text.Json;
using Microsoft.AspNetCore.Mvc.Testing;

namespace GlassPair.Web.Tests.Api;

/// <summary>One server for every test of the API, and the few words that calls need.</summary>
public abstract class ApiTests(WebApplicationFactory<Program> factory) : IClassFixture<WebApplicationFactory<Program>>
{
    /// <summary>An invented requirement over the visible lines F, d, and C.</summary>
    protected const string Requirement =
        """{"focalLengthMm":320,"fNumber":8,"band":{"shortNm":486.1327,"designNm":587.5618,"longNm":656.2725,"samples":9}}""";

    protected HttpClient Client { get; } = factory.CreateClient();

    protected static JsonElement Parse(string json) => JsonDocument.Parse(json).RootElement;

    protected async Task<JsonElement> Get(string path, HttpStatusCode expected = HttpStatusCode.OK) =>
        await Read(await Client.GetAsync(new Uri(path, UriKind.Relative)), expected);

    protected async Task<JsonElement> Post(string path, string json, HttpStatusCode expected = HttpStatusCode.OK)
    {
        using var content = new StringContent(json, Encoding.UTF8, "application/json");
        return await Read(await Client.PostAsync(new Uri(path, UriKind.Relative), content), expected);
    }

    protected static double[] Numbers(JsonElement list) => [.. list.EnumerateArray().Select(e => e.GetDouble())];

    protected static string[] Texts(JsonElement list) => [.. list.EnumerateArray().Select(e => e.GetString()!)];

    private static async Task<JsonElement> Read(HttpResponseMessage response, HttpStatusCode expected)
    {
        string text = await response.Content.ReadAsStringAsync();
        Assert.True(expected == response.StatusCode, $"{(int)response.StatusCode}: {text}");
        Assert.Equal(response.IsSuccessStatusCode ? "application/json" : "application/problem+json", response.Content.Headers.ContentType?.MediaType);
        return Parse(text);
    }
}
