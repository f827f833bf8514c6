using System.Net;
using System.Net.Http.Headers;
using System.Text;
using System.Text.Json;
using Microsoft.AspNetCore.Mvc.Testing;

namespace GlassPair.Web.Tests.Api;

/// <summary>What a client may get wrong, and which field the answer names.</summary>
public sealed class BadRequestTests(WebApplicationFactory<Program> factory) : ApiTests(factory)
{
    /// <summary>A body for <c>pair</c>, the paths that must be named, and a part of what is said of the first of them.</summary>
    public static TheoryData<string, string[], string> BadPairs => new()
    {
        // No JSON, or not the kind that is wanted.
        { "", ["$"], "Not JSON" },
        { "null", ["$"], "Must be an object with the fields" },
        { "[]", ["$"], "Must be an object" },
        { "\"x\"", ["$"], "Must be an object" },
        { "{\"requirement\":{", ["$"], "LineNumber: 0 | BytePositionInLine: 16" },
        { "{/* why */}", ["$"], "Not JSON" },
        { "{\"glasses\":[\"schott/F2\",]}", ["$"], "trailing comma" },
        { "{\"glasses\":NaN}", ["$"], "Not JSON" },
        { new string('[', 100) + new string(']', 100), ["$"], "depth" },
        { Deep(100), ["$"], "depth" },

        // Fields that are missing, unknown, twice, or misspelled.
        { "{}", ["requirement", "glasses"], "required" },
        { With("\"fNumber\":8", "\"fnumber\":8"), ["requirement.fnumber", "requirement.fNumber"], "Known here: balance, band, construction, fNumber" },
        { With("\"fNumber\":8", "\"fNumber\":8,\"fNumber\":9"), ["requirement.fNumber"], "more than once" },
        { With("\"fNumber\":8", "\"fNumber\":8,\"price\":1"), ["requirement.price"], "Unknown field" },
        { With("\"fNumber\":8,", ""), ["requirement.fNumber"], "required" },
        { With("\"fNumber\":8", "\"fNumber\":null"), ["requirement.fNumber"], "required" },
        { With("\"shortNm\":486.1327,", ""), ["requirement.band.shortNm"], "required" },
        { With(",\"samples\":9", ""), ["requirement.band.samples"], "required" },

        // Values of a wrong type or out of range.
        { With("\"fNumber\":8", "\"fNumber\":\"8\""), ["requirement.fNumber"], "from 0.7 to 200. Given: the text \"8\"" },
        { With("\"fNumber\":8", "\"fNumber\":true"), ["requirement.fNumber"], "Must be a number" },
        { With("\"fNumber\":8", "\"fNumber\":[8]"), ["requirement.fNumber"], "Given: a list of 1" },
        { With("\"fNumber\":8", "\"fNumber\":1e400"), ["requirement.fNumber"], "Given: 1e400" },
        { With("\"fNumber\":8", "\"fNumber\":-0"), ["requirement.fNumber"], "from 0.7" },
        { With("\"fNumber\":8", "\"fNumber\":0.69999999999"), ["requirement.fNumber"], "from 0.7" },
        { With("320", "1e-400"), ["requirement.focalLengthMm"], "from 1 to 100000" },
        { With("320", "-320"), ["requirement.focalLengthMm"], "from 1 to 100000" },
        { With("320", "\"" + new string('9', 7000) + "\""), ["requirement.focalLengthMm"], "…" },
        { With("\"samples\":9", "\"samples\":9.5"), ["requirement.band.samples"], "whole number from 3 to 41" },
        { With("\"samples\":9", "\"samples\":42"), ["requirement.band.samples"], "whole number from 3 to 41" },
        { With("\"samples\":9", "\"samples\":1e300"), ["requirement.band.samples"], "whole number" },
        { With("486.1327", "0.4861327"), ["requirement.band.shortNm"], "from 100 to 20000" },
        { With("\"fNumber\":8", "\"fNumber\":8,\"halfFieldDeg\":40.1"), ["requirement.halfFieldDeg"], "from 0 to 40" },
        { With("\"fNumber\":8", "\"fNumber\":8,\"balance\":\"EndsUnited\""), ["requirement.balance"], "\"bandBalanced\", \"endsUnited\"" },
        { With("\"fNumber\":8", "\"fNumber\":8,\"balance\":1"), ["requirement.balance"], "Given: 1" },
        { With("\"fNumber\":8", "\"fNumber\":8,\"limits\":{\"maxElementPower\":0.5}"), ["requirement.limits.maxElementPower"], "from 1 to 100" },
        { With("\"fNumber\":8", "\"fNumber\":8,\"limits\":[]"), ["requirement.limits"], "Must be an object with the fields maxElementPower" },
        { With("\"schott/F2\"", "\"\\ud800\""), ["glasses[1]"], "not valid Unicode" },
        { With("\"schott/F2\"", "7"), ["glasses[1]"], "Given: 7" },
        { With("\"schott/F2\"", "null"), ["glasses[1]"], "Given: null" },
        { With("\"schott/F2\"", "\"\""), ["glasses[1]"], "1 to 64 characters" },
        { With("\"schott/F2\"", "\"a\\u0000b\""), ["glasses[1]"], "control characters" },
        { With("\"schott/F2\"", "\"" + new string('x', 1_000_000) + "\""), ["glasses[1]"], "1 to 64 characters" },
        { With(",\"schott/F2\"", ""), ["glasses"], "a list of 2 items. Given: a list of 1" },
        { With("\"schott/F2\"", string.Join(',', Enumerable.Repeat("\"schott/F2\"", 100_000))), ["glasses"], "Given: a list of 100001" },
        { With("\"glasses\"", "\"abbeTolerancePercent\":-1,\"indexPrecision\":\"x\",\"glasses\""), ["abbeTolerancePercent", "indexPrecision"], "from 0 to 5" },

        // Fields that contradict one another.
        { With("587.5618", "486"), ["requirement.band.designNm"], "between the short end, 486.1327 nm, and the long end, 656.2725 nm" },
        { With("656.2725", "486.5"), ["requirement.band.longNm"], "at least 1 nm above the short end" },
        { With("\"fNumber\":8", "\"fNumber\":8,\"spacingMm\":3"), ["requirement.spacingMm"], "airSpaced" },
        { With("\"fNumber\":8", "\"fNumber\":8,\"construction\":\"airSpaced\""), ["requirement.spacingMm"], "required" },
        { With("\"fNumber\":8", "\"fNumber\":8,\"construction\":\"airSpaced\",\"spacingMm\":320"), ["requirement.spacingMm"], "less than the focal length, 320 mm" },
        { With("\"fNumber\":8", "\"fNumber\":8,\"temperature\":{\"fromC\":20,\"toC\":10,\"housingCtePerK\":0}"), ["requirement.temperature.toC"], "below fromC, 20" },
        { With("\"samples\":9", "\"samples\":9,\"samplesNm\":[486.1327,550,656.2725]"), ["requirement.band.samples"], "left out" },
        { With("\"samples\":9", "\"weights\":[1,1,1]"), ["requirement.band.weights", "requirement.band.samples"], "samplesNm" },
        { With("\"samples\":9", "\"samplesNm\":[486.1327,656.2725]"), ["requirement.band.samplesNm"], "3 to 41" },
        { With("\"samples\":9", "\"samplesNm\":[486.1327,600,550]"), ["requirement.band.samplesNm[2]"], "must rise" },
        { With("\"samples\":9", "\"samplesNm\":[400,600,700]"), ["requirement.band.samplesNm[0]", "requirement.band.samplesNm[2]"], "in the band" },
        { With("\"samples\":9", "\"samplesNm\":[500,550,600],\"weights\":[1,1]"), ["requirement.band.weights"], "3 to 41" },
        { With("\"samples\":9", "\"samplesNm\":[500,550,600],\"weights\":[1,1,1,1]"), ["requirement.band.weights"], "3, not 4" },
        { With("\"samples\":9", "\"samplesNm\":[500,550,600],\"weights\":[0,0,0]"), ["requirement.band.weights"], "At least one" },
        { With("\"samples\":9", "\"samplesNm\":[500,550,600],\"weights\":[1,-1,1]"), ["requirement.band.weights[1]"], "from 0" },

        // Everything at once.
        {
            """{"requirement":{"focalLengthMm":0,"fNumber":"8","band":{"shortNm":1,"designNm":2,"longNm":3,"samples":2},"spacingMm":1},"glasses":[1,2],"colour":1}""",
            ["colour", "glasses[0]", "glasses[1]", "requirement.focalLengthMm", "requirement.fNumber", "requirement.band.shortNm", "requirement.band.designNm", "requirement.band.longNm", "requirement.band.samples", "requirement.spacingMm"],
            "Unknown field"
        },
    };

    [Theory]
    [MemberData(nameof(BadPairs))]
    public async Task Pair_BadBody_NamesEveryFaultyField(string body, string[] paths, string said)
    {
        JsonElement problem = await Post("/api/v1/pair", body, HttpStatusCode.BadRequest);
        Dictionary<string, string> errors = problem.GetProperty("errors").EnumerateObject().ToDictionary(e => e.Name, e => string.Join(' ', Texts(e.Value)));
        Assert.Equal(paths.Order(StringComparer.Ordinal), errors.Keys.Order(StringComparer.Ordinal));
        Assert.Contains(said, errors[paths[0]], StringComparison.Ordinal);
        Assert.All(errors.Values, message => Assert.InRange(message.Length, 1, 1_000));
    }

    [Fact]
    public async Task Triplet_AirSpaced_IsRefused()
    {
        string body = $$"""{"requirement":{{Requirement.Replace("\"fNumber\"", "\"construction\":\"airSpaced\",\"spacingMm\":1,\"fNumber\"", StringComparison.Ordinal)}},"glasses":["schott/N-BK7","schott/F2","schott/N-SF6"]}""";
        JsonElement problem = await Post("/api/v1/triplet", body, HttpStatusCode.BadRequest);
        Assert.Equal(["requirement.construction"], problem.GetProperty("errors").EnumerateObject().Select(e => e.Name));
    }

    [Theory]
    [InlineData("9", ",\"construction\":\"airSpaced\",\"spacingMm\":1", "requirement.construction")]
    [InlineData("3", "", "elements")]
    public async Task Shortlist_OfThreeElementsThatCannotBeRanked_IsRefusedWithTheReason(string samples, string more, string path)
    {
        string body = $$"""
            {"elements":3,"makers":["lzos"],"requirement":{"focalLengthMm":250,"fNumber":6{{more}},
            "band":{"shortNm":486,"designNm":550,"longNm":656,"samples":{{samples}} } } }
            """;
        JsonElement problem = await Post("/api/v1/shortlist", body, HttpStatusCode.BadRequest);
        Assert.Equal([path], problem.GetProperty("errors").EnumerateObject().Select(e => e.Name));
    }

    [Theory]
    [InlineData("\"rankBy\":\"price\"", "rankBy", "\"colorResidual\", \"expectedResidual\", \"secondarySpectrum\"")]
    [InlineData("\"rankBy\":\"designedWavefront\"", "rankBy", "\"colorResidual\"")]
    [InlineData("\"take\":0", "take", "1 to 5000")]
    [InlineData("\"take\":5001", "take", "1 to 5000")]
    [InlineData("\"take\":\"10\"", "take", "1 to 5000")]
    [InlineData("\"elements\":4", "elements", "2 to 3")]
    [InlineData("\"makers\":[]", "makers", "1 to 2000")]
    [InlineData("\"makers\":[\"schott\",\"nobody\"]", "makers[1]", "Makers: cdgm")]
    [InlineData("\"supply\":[\"onrequest\"]", "supply[0]", "\"onRequest\"")]
    [InlineData("\"exclude\":[\"N-BK7\"]", "exclude[0]", "maker/name")]
    [InlineData("\"include\":\"schott/N-BK7\"", "include", "Must be a list")]
    [InlineData("\"allowLead\":0", "allowLead", "true or false")]
    [InlineData("\"maxExpansionDifferencePerK\":1", "maxExpansionDifferencePerK", "0.0001")]
    [InlineData("\"pairsPerGlass\":0", "pairsPerGlass", "1 to 5000")]
    public async Task Shortlist_BadField_IsNamedWithWhatIsAllowed(string field, string path, string said)
    {
        JsonElement problem = await Post("/api/v1/shortlist", $$"""{"requirement":{{Requirement}},{{field}}}""", HttpStatusCode.BadRequest);
        JsonProperty error = Assert.Single(problem.GetProperty("errors").EnumerateObject());
        Assert.Equal(path, error.Name);
        Assert.Contains(said, Texts(error.Value)[0], StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("\"form\":\"cauchy\"", "form", "\"sellmeier\", \"powerSeries\"")]
    [InlineData("\"form\":\"sellmeier\",\"terms\":7", "terms", "1 to 6")]
    [InlineData("\"form\":\"powerSeries\",\"terms\":9", "terms", "1 to 8")]
    [InlineData("\"form\":\"sellmeier\",\"terms\":3", "nm", "at least 7")]
    [InlineData("\"form\":\"sellmeier\",\"nm\":[1,2]", "nm", "more than once")]
    public async Task Fit_BadField_IsNamedWithWhatIsAllowed(string fields, string path, string said)
    {
        JsonElement problem = await Post("/api/v1/fit", $$"""{"nm":[486.1327,587.5618,656.2725],"index":[1.52238,1.5168,1.51432],{{fields}}}""", HttpStatusCode.BadRequest);
        JsonProperty error = Assert.Single(problem.GetProperty("errors").EnumerateObject());
        Assert.Equal(path, error.Name);
        Assert.Contains(said, Texts(error.Value)[0], StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("[486,587,656]", "[1.52,1.51]", "index", "Must be a list of 3 to 1000")]
    [InlineData("[486,587,656]", "[1.53,1.52,1.51,1.5]", "index", "3, not 4")]
    [InlineData("[486,587,587]", "[1.53,1.52,1.51]", "nm[2]", "keep one")]
    [InlineData("[486,587,656]", "[1.53,1,1.51]", "index[1]", "above 1")]
    [InlineData("[486,587,656]", "[1.53,6,1.51]", "index[1]", "from 1 to 5")]
    public async Task Fit_BadTable_NamesTheRow(string nm, string index, string path, string said)
    {
        JsonElement problem = await Post("/api/v1/fit", $$"""{"form":"sellmeier","nm":{{nm}},"index":{{index}}}""", HttpStatusCode.BadRequest);
        JsonProperty error = Assert.Single(problem.GetProperty("errors").EnumerateObject());
        Assert.Equal(path, error.Name);
        Assert.Contains(said, Texts(error.Value)[0], StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("glasses?take=0", "take", "1 to 2000")]
    [InlineData("glasses?take=abc", "take", "Given: abc")]
    [InlineData("glasses?take=1,5", "take", "whole number")]
    [InlineData("glasses?take=1&take=2", "take", "more than once")]
    [InlineData("glasses?skip=-1", "skip", "0 to 1000000")]
    [InlineData("glasses?skip=99999999999999999999", "skip", "whole number")]
    [InlineData("glasses?maker=schott,nobody", "maker", "cdgm, hikari")]
    [InlineData("glasses?supply=sold", "supply", "recommended, listed")]
    [InlineData("glasses?search=%00", "search", "control characters")]
    [InlineData("glasses?limit=5", "limit", "Known here: stock, maker, supply, search, take, skip")]
    [InlineData("glasses/schott/N-BK7/index", "nm", "required")]
    [InlineData("glasses/schott/N-BK7/index?nm=", "nm", "required")]
    [InlineData("glasses/schott/N-BK7/index?nm=500,abc", "nm[1]", "Given: abc")]
    [InlineData("glasses/schott/N-BK7/index?nm=NaN", "nm[0]", "from 100 to 20000")]
    [InlineData("glasses/schott/N-BK7/index?nm=Infinity", "nm[0]", "from 100 to 20000")]
    [InlineData("glasses/schott/N-BK7/index?nm=1e999", "nm[0]", "from 100 to 20000")]
    [InlineData("glasses/schott/N-BK7/index?nm=0x1F4", "nm[0]", "from 100 to 20000")]
    [InlineData("glasses/schott/N-BK7/index?nm=0.5876", "nm[0]", "from 100 to 20000")]
    [InlineData("glasses/schott/N-BK7/index?nm=500,,600", "nm[1]", "from 100 to 20000")]
    [InlineData("glasses/schott/N-BK7/index?nm=500&temperatureC=141", "temperatureC", "from -100 to 140")]
    [InlineData("stocks?all=1", "all", "Unknown parameter")]
    public async Task Get_BadParameter_IsNamedWithWhatIsAllowed(string path, string parameter, string said)
    {
        JsonElement problem = await Get($"/api/v1/{path}", HttpStatusCode.BadRequest);
        JsonProperty error = Assert.Single(problem.GetProperty("errors").EnumerateObject());
        Assert.Equal(parameter, error.Name);
        Assert.Contains(said, Texts(error.Value)[0], StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("text/plain")]
    [InlineData("application/x-www-form-urlencoded")]
    [InlineData("multipart/form-data")]
    [InlineData(null)]
    public async Task Post_OtherContentType_IsAnswered415(string? type)
    {
        using var content = new ByteArrayContent("{}"u8.ToArray());
        content.Headers.ContentType = type is null ? null : new MediaTypeHeaderValue(type);
        HttpResponseMessage answer = await Client.PostAsync(new Uri("/api/v1/pair", UriKind.Relative), content);
        Assert.Equal(HttpStatusCode.UnsupportedMediaType, answer.StatusCode);
        Assert.Equal("application/problem+json", answer.Content.Headers.ContentType?.MediaType);
    }

    [Theory]
    [InlineData("GET", "pair", "POST")]
    [InlineData("PUT", "shortlist", "POST")]
    [InlineData("OPTIONS", "shortlist", "POST")]
    [InlineData("POST", "stocks", "GET")]
    [InlineData("DELETE", "glasses/schott/N-BK7", "GET")]
    public async Task Call_WrongMethod_IsAnswered405WithTheRightOne(string method, string path, string allowed)
    {
        using var request = new HttpRequestMessage(new HttpMethod(method), new Uri($"/api/v1/{path}", UriKind.Relative));
        request.Headers.Add("Origin", "https://other.example");
        HttpResponseMessage answer = await Client.SendAsync(request);
        Assert.Equal(HttpStatusCode.MethodNotAllowed, answer.StatusCode);
        Assert.Equal([allowed], answer.Content.Headers.Allow);
        Assert.DoesNotContain(answer.Headers, h => h.Key.StartsWith("Access-Control", StringComparison.OrdinalIgnoreCase));
    }

    [Fact]
    public async Task Post_Utf8WithByteOrderMark_IsRead()
    {
        using var content = new ByteArrayContent([.. Encoding.UTF8.GetPreamble(), .. Encoding.UTF8.GetBytes(With("", ""))]);
        content.Headers.ContentType = new MediaTypeHeaderValue("application/json");
        Assert.Equal(HttpStatusCode.OK, (await Client.PostAsync(new Uri("/api/v1/pair", UriKind.Relative), content)).StatusCode);
    }

    [Theory]
    [InlineData("utf-16")]
    [InlineData("latin1")]
    public async Task Post_OtherEncoding_IsRefusedInWords(string encoding)
    {
        using var content = new ByteArrayContent(Encoding.GetEncoding(encoding).GetBytes(With("schott/F2", "schött/F2")));
        content.Headers.ContentType = new MediaTypeHeaderValue("application/json");
        HttpResponseMessage answer = await Client.PostAsync(new Uri("/api/v1/pair", UriKind.Relative), content);
        Assert.Equal(HttpStatusCode.BadRequest, answer.StatusCode);
    }

    [Fact]
    public async Task Call_UnknownRoute_IsAProblem()
    {
        JsonElement problem = await Get("/api/v1/nothing", HttpStatusCode.NotFound);
        Assert.Equal(404, problem.GetProperty("status").GetInt32());
    }

    /// <summary>The body of a sound call, changed in one place.</summary>
    private static string With(string part, string instead)
    {
        string sound = $$"""{"requirement":{{Requirement}},"glasses":["schott/N-BK7","schott/F2"]}""";
        Assert.Contains(part, sound, StringComparison.Ordinal);
        return part.Length > 0 ? sound.Replace(part, instead, StringComparison.Ordinal) : sound;
    }

    private static string Deep(int levels) =>
        string.Concat(Enumerable.Repeat("{\"requirement\":", levels)) + "1" + new string('}', levels);
}
