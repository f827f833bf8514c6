using System.Net;
using System.Text.Json;
using Microsoft.AspNetCore.Mvc.Testing;

namespace GlassPair.Web.Tests.Api;

public sealed class ApiDocumentTests(WebApplicationFactory<Program> factory) : ApiTests(factory)
{
    private static readonly string[] Calls =
    [
        "get /api/v1/stocks", "get /api/v1/glasses", "get /api/v1/glasses/{maker}/{name}", "get /api/v1/glasses/{maker}/{name}/index",
        "post /api/v1/fit", "post /api/v1/pair", "post /api/v1/triplet", "post /api/v1/shortlist",
    ];

    [Fact]
    public async Task Document_OfTheApi_DescribesEveryCallOfTheContract()
    {
        JsonElement document = await Get("/openapi/v1.json");
        Assert.StartsWith("3.1", document.GetProperty("openapi").GetString(), StringComparison.Ordinal);
        (string Call, JsonElement Operation)[] operations = [.. Operations(document)];
        Assert.Empty(Calls.Except(operations.Select(o => o.Call)));
        Assert.All(operations, o =>
        {
            Assert.NotEmpty(o.Operation.GetProperty("summary").GetString()!);
            if (o.Operation.TryGetProperty("parameters", out JsonElement parameters))
            {
                Assert.All(parameters.EnumerateArray(), p => Assert.NotEmpty(p.GetProperty("description").GetString()!));
            }
        });
    }

    [Fact]
    public async Task Document_EveryField_HasADescriptionAndEveryRequestNumberARange()
    {
        JsonElement schemas = (await Get("/openapi/v1.json")).GetProperty("components").GetProperty("schemas");
        string[] undescribed =
        [
            .. from schema in schemas.EnumerateObject()
               where schema.Name != "ProblemDetails" && schema.Value.TryGetProperty("properties", out _)
               from field in schema.Value.GetProperty("properties").EnumerateObject()
               where !Describes(field.Value)
               select $"{schema.Name}.{field.Name}",
        ];
        Assert.Empty(undescribed);
        JsonElement requirement = schemas.GetProperty("Requirement").GetProperty("properties");
        Assert.Equal(0.7, requirement.GetProperty("fNumber").GetProperty("minimum").GetDouble());
        Assert.Equal(200.0, requirement.GetProperty("fNumber").GetProperty("maximum").GetDouble());
        JsonElement samples = schemas.GetProperty("Band").GetProperty("properties").GetProperty("samplesNm");
        Assert.Equal(41, samples.GetProperty("maxItems").GetInt32());
        Assert.Equal(100.0, samples.GetProperty("items").GetProperty("minimum").GetDouble());
        Assert.Equal(["focalLengthMm", "fNumber", "band"], Texts(schemas.GetProperty("Requirement").GetProperty("required")));
    }

    [Fact]
    public async Task Document_EveryExample_IsAnswered()
    {
        foreach ((string call, JsonElement operation) in Operations(await Get("/openapi/v1.json")))
        {
            if (operation.TryGetProperty("requestBody", out JsonElement body))
            {
                await Post(call["post ".Length..], body.GetProperty("content").GetProperty("application/json").GetProperty("example").GetRawText());
            }
        }
    }

    [Fact]
    public async Task ReferencePage_OfTheApi_NeedsNoOtherHost()
    {
        HttpResponseMessage answer = await Client.GetAsync(new Uri("/api-docs/", UriKind.Relative));
        Assert.Equal(HttpStatusCode.OK, answer.StatusCode);
        Assert.DoesNotMatch("(src|href)=\"(https?:)?//", await answer.Content.ReadAsStringAsync());
    }

    private static IEnumerable<(string Call, JsonElement Operation)> Operations(JsonElement document) =>
        from path in document.GetProperty("paths").EnumerateObject()
        from operation in path.Value.EnumerateObject()
        select ($"{operation.Name} {path.Name}", operation.Value);

    private static bool Describes(JsonElement field) =>
        field.TryGetProperty("description", out _) || (field.TryGetProperty("oneOf", out JsonElement parts) && parts.EnumerateArray().Any(Describes));
}
