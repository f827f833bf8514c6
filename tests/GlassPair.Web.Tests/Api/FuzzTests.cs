using System.Globalization;
using System.Net;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using CsCheck;
using Microsoft.AspNetCore.Mvc.Testing;

namespace GlassPair.Web.Tests.Api;

/// <summary>Whatever a client sends is answered: sound calls broken at random places never end in a fault of the server.</summary>
public sealed class FuzzTests(WebApplicationFactory<Program> factory)
    : ApiTests(factory.WithWebHostBuilder(builder => builder.UseSetting("GlassPair:Limits:ApiCallsPerMinute", "1000000")))
{
    private const int Bodies = 1_500;
    private const string Seed = "0N0XIzNsQ0O2";

    private static readonly (string Path, string Body)[] Sound =
    [
        ("pair", $$"""{"requirement":{{Requirement}},"glasses":["schott/N-BK7","schott/F2"],"abbeTolerancePercent":0.5,"stock":null}"""),
        ("pair", """{"requirement":{"focalLengthMm":100,"fNumber":4,"band":{"samplesNm":[450,500,550,600],"weights":[1,2,2,1]},"construction":"airSpaced","spacingMm":2,"balance":"endsUnited"},"glasses":["schott/N-BK7","schott/F2"]}"""),
        ("triplet", $$"""{"requirement":{{Requirement}},"glasses":["schott/N-FK58","schott/N-KZFS4","schott/N-SF6"]}"""),
        ("shortlist", $$"""{"requirement":{{Requirement}},"makers":["lzos"],"supply":["unconfirmed"],"exclude":["schott/N-BK7"],"include":[],"rankBy":"expectedResidual","take":3,"pairsPerGlass":1,"allowLead":true}"""),
        ("fit", """{"form":"sellmeier","terms":1,"nm":[450,500,550,600],"index":[1.53,1.525,1.521,1.518]}"""),
    ];

    private static readonly Gen<JsonNode?> Values = Gen.OneOf(
        Gen.Double.Select(d => double.IsFinite(d) ? (JsonNode?)d : "NaN"),
        AnyOf(0.0, -0.0, 1.0, -1.0, 1e-308, 1e308, 100.0, 20_000.0, 1e-5, 3.0, 41.0).Select(d => (JsonNode?)d),
        Gen.Double[100.0, 3_000.0].Select(d => (JsonNode?)d),
        Gen.Int.Select(i => (JsonNode?)i),
        Gen.Bool.Select(b => (JsonNode?)b),
        Gen.String[0, 80].Select(s => (JsonNode?)s),
        AnyOf("schott/N-BK7", "ohara/S-FPL53", "bandBalanced", "endsUnited", "airSpaced", "cemented", "sellmeier", "powerSeries").Select(s => (JsonNode?)s),
        Gen.Bool.Select(_ => (JsonNode?)null),
        Gen.Int[0, 50].Select(n => (JsonNode?)new JsonArray([.. Enumerable.Range(0, n).Select(i => (JsonNode?)(400.0 + i))])),
        Gen.Int[0, 20].Select(Nested));

    [Fact]
    public void Post_BrokenAtRandom_IsNeverAFaultOfTheServer() =>
        Gen.Select(Gen.Int[0, Sound.Length - 1], Gen.Select(Gen.Int[0, 1_000], Gen.Int[0, 9], Values, Gen.Double[-2.0, 2.0]).Array[1, 3])
            .Select((call, changes) => (Sound[call].Path, Body: Break(Sound[call].Body, changes)))
            .Array[Bodies]
            .Sample(all => Array.ForEach(all, sent => Check(sent.Path, Encoding.UTF8.GetBytes(sent.Body))), iter: 1, seed: Seed, threads: 1);

    [Fact]
    public void Post_BytesBrokenAtRandom_IsNeverAFaultOfTheServer() =>
        Gen.Select(Gen.Int[0, Sound.Length - 1], Gen.Select(Gen.Int[0, 10_000], Gen.Frequency((1, Gen.Byte), (9, Gen.Char["0123456789.-,e\"[]{}:"].Select(c => (byte)c)))).Array[1, 3])
            .Select((call, changes) => (Sound[call].Path, Body: BreakBytes(Sound[call].Body, changes)))
            .Array[Bodies]
            .Sample(all => Array.ForEach(all, sent => Check(sent.Path, sent.Body)), iter: 1, seed: Seed, threads: 1);

    private void Check(string path, byte[] body)
    {
        using var content = new ByteArrayContent(body);
        content.Headers.ContentType = new("application/json");
        HttpResponseMessage answer = Client.PostAsync(new Uri($"/api/v1/{path}", UriKind.Relative), content).GetAwaiter().GetResult();
        string text = answer.Content.ReadAsStringAsync().GetAwaiter().GetResult();
        if ((int)answer.StatusCode >= 500)
        {
            throw new InvalidOperationException($"{(int)answer.StatusCode}: {text}\n{Encoding.UTF8.GetString(body)}");
        }

        if (answer.StatusCode == HttpStatusCode.BadRequest)
        {
            Assert.NotEmpty(Parse(text).GetProperty("errors").EnumerateObject());
        }
    }

    /// <summary>Changes a few places of a body: drops, adds, replaces, or scales what stands there.</summary>
    private static string Break(string body, (int Place, int How, JsonNode? Value, double Power)[] changes)
    {
        JsonNode root = JsonNode.Parse(body)!;
        foreach ((int place, int how, JsonNode? value, double power) in changes)
        {
            (JsonNode Parent, object Key)[] places = [.. Places(root)];
            if (places.Length == 0)
            {
                break;
            }

            (JsonNode parent, object key) = places[place % places.Length];
            JsonNode? there = parent is JsonObject whole ? whole[(string)key] : ((JsonArray)parent)[(int)key];
            if (how > 3 && there?.GetValueKind() == JsonValueKind.Number)
            {
                // Most numbers stay sound, or almost.
                there.ReplaceWith(Finite(double.Parse(there.ToJsonString(), CultureInfo.InvariantCulture) * Math.Pow(10.0, Math.Pow(power, 3))));
                continue;
            }

            switch (parent)
            {
                case JsonObject fields when how == 0:
                    fields.Remove((string)key);
                    break;
                case JsonObject fields when how == 1:
                    fields[(string)key + "x"] = value?.DeepClone();
                    break;
                case JsonObject fields:
                    fields[(string)key] = value?.DeepClone();
                    break;
                case JsonArray items when how == 0:
                    items.RemoveAt((int)key);
                    break;
                case JsonArray items when how == 1:
                    items.Add(value?.DeepClone());
                    break;
                case JsonArray items:
                    items[(int)key] = value?.DeepClone();
                    break;
            }
        }

        return root.ToJsonString();
    }

    private static byte[] BreakBytes(string body, (int Place, byte Value)[] changes)
    {
        byte[] bytes = Encoding.UTF8.GetBytes(body);
        foreach ((int place, byte value) in changes)
        {
            bytes[place % bytes.Length] = value;
        }

        return bytes;
    }

    private static IEnumerable<(JsonNode Parent, object Key)> Places(JsonNode node) => node switch
    {
        JsonObject fields => fields.SelectMany(f => Below(fields, f.Key, f.Value)),
        JsonArray items => items.SelectMany((item, i) => Below(items, i, item)),
        _ => [],
    };

    private static IEnumerable<(JsonNode Parent, object Key)> Below(JsonNode parent, object key, JsonNode? value) =>
        value is null ? [(parent, key)] : [(parent, key), .. Places(value)];

    private static double Finite(double value) => double.IsFinite(value) ? value : double.MaxValue;

    private static Gen<T> AnyOf<T>(params T[] values) => Gen.Int[0, values.Length - 1].Select(i => values[i]);

    private static JsonNode? Nested(int levels)
    {
        JsonNode node = new JsonObject();
        for (int i = 0; i < levels; i++)
        {
            node = new JsonArray(node);
        }

        return node;
    }
}
