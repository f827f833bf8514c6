using System.Net;
using System.Text.Json;
using Microsoft.AspNetCore.Mvc.Testing;

namespace GlassPair.Web.Tests.Api;

public sealed class GlassTests(WebApplicationFactory<Program> factory) : ApiTests(factory)
{
    [Fact]
    public async Task Stocks_Listed_HaveTheFieldsOfTheContract()
    {
        JsonElement stock = Assert.Single((await Get("/api/v1/stocks")).EnumerateArray(), s => s.GetProperty("isDefault").GetBoolean());
        Assert.Matches("^[0-9a-f]{12}$", stock.GetProperty("id").GetString()!);
        Assert.NotEmpty(stock.GetProperty("title").GetString()!);
        Assert.True(stock.GetProperty("glasses").GetInt32() > 1_000);
    }

    /// <summary>The maker's data sheet of N-BK7, recalled: n_d 1.5168, n_e 1.51872, v_d 64.17, v_e 63.96, P_g,F 0.5349, ΔP_g,F −0.0009.</summary>
    [Theory]
    [InlineData("nd", 1.5168, 5e-6)]
    [InlineData("ne", 1.51872, 5e-6)]
    [InlineData("abbeD", 64.17, 5e-3)]
    [InlineData("abbeE", 63.96, 5e-3)]
    [InlineData("partialDispersionGF", 0.5349, 5e-5)]
    [InlineData("deltaPartialDispersionGF", -0.0009, 5e-5)]
    public async Task Glass_ComputedValue_AgreesWithTheDataSheet(string field, double printed, double halfLastDigit)
    {
        JsonElement glass = await Get("/api/v1/glasses/schott/N-BK7");
        Assert.Equal(printed, glass.GetProperty(field).GetDouble(), halfLastDigit);
    }

    [Fact]
    public async Task Glass_AnyCase_HasTheFieldsOfTheContract()
    {
        JsonElement glass = await Get("/api/v1/glasses/SCHOTT/n-bk7");
        Assert.Equal("schott", glass.GetProperty("maker").GetString());
        Assert.Equal("N-BK7", glass.GetProperty("name").GetString());
        Assert.Equal("sellmeier", glass.GetProperty("form").GetString());
        Assert.Equal([300.0, 2500.0], Numbers(glass.GetProperty("rangeNm")));
        Assert.Equal(6, Numbers(glass.GetProperty("coefficients")).Length);
        Assert.Equal("listed", glass.GetProperty("supply").GetString());
    }

    [Fact]
    public async Task Glass_PowerSeries_GivesItsExponents()
    {
        JsonElement glass = await Get("/api/v1/glasses/hoya/BAC4");
        double[] coefficients = Numbers(glass.GetProperty("coefficients"));
        int[] exponents = [.. glass.GetProperty("exponents").EnumerateArray().Select(e => e.GetInt32())];
        Assert.Equal(coefficients.Length, exponents.Length + 1);

        // n² = a₀ + Σ aₑ λᵉ at the d line
        double squared = coefficients[0] + exponents.Select((e, i) => coefficients[i + 1] * Math.Pow(0.5875618, e)).Sum();
        Assert.Equal(Math.Sqrt(squared), glass.GetProperty("nd").GetDouble(), 1e-13);
    }

    [Theory]
    [InlineData("schott/NBK7", "schott/N-BK7")]
    [InlineData("schott/n bk 7", "schott/N-BK7")]
    [InlineData("shott/N-BK7", "schott/N-BK7")]
    [InlineData("ohara/SFPL53", "ohara/S-FPL53")]
    public async Task Glass_Mistyped_NamesTheOneMeantFirst(string typed, string meant)
    {
        JsonElement problem = await Get($"/api/v1/glasses/{typed}", HttpStatusCode.NotFound);
        JsonElement unknown = problem.GetProperty("unknownGlasses")[0];
        Assert.Equal(typed, unknown.GetProperty("glass").GetString());
        Assert.Equal(meant, Texts(unknown.GetProperty("closest"))[0]);
        Assert.Contains(meant, problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("%F0%9F%92%A3")]
    [InlineData("..%2f..%2fsecret")]
    public async Task Glass_OfNonsense_IsNotFound(string name)
    {
        HttpResponseMessage answer = await Client.GetAsync(new Uri($"/api/v1/glasses/schott/{name}", UriKind.Relative));
        Assert.Equal(HttpStatusCode.NotFound, answer.StatusCode);
    }

    [Fact]
    public async Task Glass_NameOf8Kilobytes_IsNotFoundQuickly()
    {
        HttpResponseMessage answer = await Client.GetAsync(new Uri($"/api/v1/glasses/schott/{new string('N', 8_000)}", UriKind.Relative));
        Assert.Equal(HttpStatusCode.NotFound, answer.StatusCode);
        Assert.InRange((await answer.Content.ReadAsStringAsync()).Length, 1, 2_000);
    }

    [Fact]
    public async Task Glasses_InParts_AreAllOfThemOnceAndInOrder()
    {
        List<string> ids = [];
        int total;
        do
        {
            JsonElement page = await Get($"/api/v1/glasses?take=700&skip={ids.Count}");
            total = page.GetProperty("total").GetInt32();
            ids.AddRange(page.GetProperty("glasses").EnumerateArray().Select(g => $"{g.GetProperty("maker")}/{g.GetProperty("name")}"));
        }
        while (ids.Count < total);
        Assert.Equal(total, ids.Distinct().Count());
        Assert.Equal(ids.Order(StringComparer.Ordinal), ids);
        Assert.Equal(total, (await Get("/api/v1/stocks"))[0].GetProperty("glasses").GetInt32());
    }

    [Fact]
    public async Task Glasses_Filtered_AllMatch()
    {
        JsonElement page = await Get("/api/v1/glasses?maker=Schott,ohara&supply=recommended,Listed&search=bk&take=2000");
        Assert.NotEqual(0, page.GetProperty("total").GetInt32());
        Assert.All(page.GetProperty("glasses").EnumerateArray(), g =>
        {
            Assert.Contains(g.GetProperty("maker").GetString(), new[] { "schott", "ohara" });
            Assert.Contains(g.GetProperty("supply").GetString(), new[] { "recommended", "listed" });
            Assert.Contains("bk", g.GetProperty("maker").GetString() + "/" + g.GetProperty("name").GetString(), StringComparison.OrdinalIgnoreCase);
        });
    }

    /// <summary>Indices printed on the maker's data sheet of N-BK7, recalled.</summary>
    [Fact]
    public async Task Index_AtSpectralLines_AgreesWithTheDataSheet()
    {
        JsonElement answer = await Get("/api/v1/glasses/schott/N-BK7/index?nm=435.8343,486.1327,587.5618,656.2725,1013.98");
        double[] printed = [1.52668, 1.52238, 1.5168, 1.51432, 1.50731];
        Assert.Equal([435.8343, 486.1327, 587.5618, 656.2725, 1013.98], Numbers(answer.GetProperty("nm")));
        Assert.All(printed.Zip(Numbers(answer.GetProperty("index"))), p => Assert.Equal(p.First, p.Second, 5e-6));
    }

    [Fact]
    public async Task Index_OutsideTheRange_NamesGlassWavelengthAndRange()
    {
        JsonElement problem = await Get("/api/v1/glasses/schott/N-BK7/index?nm=299.9,500,2600", HttpStatusCode.UnprocessableEntity);
        JsonElement[] misses = [.. problem.GetProperty("outOfRange").EnumerateArray()];
        Assert.Equal([299.9, 2600.0], misses.Select(m => m.GetProperty("nm").GetDouble()));
        Assert.All(misses, m => Assert.Equal("schott/N-BK7", m.GetProperty("glass").GetString()));
        Assert.All(misses, m => Assert.Equal([300.0, 2500.0], Numbers(m.GetProperty("rangeNm"))));
        Assert.Contains("schott/N-BK7 has no index at 299.9 nm", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    /// <summary>The maker's table of N-BK7, mean change from +20 °C to +40 °C per kelvin (pmoptics.com/Glass_Temperature_Coefficient.html): one decimal of 1e-6.</summary>
    [Theory]
    [InlineData(1060.0, 1.1e-6, 2.4e-6)]
    [InlineData(546.074, 1.6e-6, 3.0e-6)]
    [InlineData(435.8343, 2.1e-6, 3.5e-6)]
    public async Task Index_AtAnotherTemperature_ChangesAsTheMakerPrints(double nm, double absolute, double relative)
    {
        const double halfLastDigit = 0.05e-6;
        string path = FormattableString.Invariant($"/api/v1/glasses/schott/N-BK7/index?nm={nm}&temperatureC=");
        JsonElement middle = await Get(path + "30");
        Assert.Equal(absolute, Numbers(middle.GetProperty("dnDtAbsolutePerK"))[0], halfLastDigit);
        Assert.Equal(relative, Numbers(middle.GetProperty("dnDtRelativePerK"))[0], halfLastDigit);
        double change = Numbers((await Get(path + "40")).GetProperty("index"))[0] - Numbers((await Get(path + "20")).GetProperty("index"))[0];
        Assert.Equal(relative, change / 20.0, halfLastDigit);
    }

    [Fact]
    public async Task Index_WithoutCoefficients_IsGivenAtTheReferenceTemperatureOnly()
    {
        JsonElement answer = await Get("/api/v1/glasses/cdgm/BAF4/index?nm=587.5618");
        Assert.Equal(1.582712, Numbers(answer.GetProperty("index"))[0], 1e-5);
        Assert.Equal(JsonValueKind.Null, answer.GetProperty("dnDtAbsolutePerK")[0].ValueKind);
        JsonElement problem = await Get("/api/v1/glasses/cdgm/BAF4/index?nm=587.5618&temperatureC=40", HttpStatusCode.UnprocessableEntity);
        Assert.Contains("cdgm/BAF4", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Stock_Unknown_IsNotFound()
    {
        JsonElement problem = await Get("/api/v1/glasses?stock=ffffffffffff", HttpStatusCode.NotFound);
        Assert.Contains("ffffffffffff", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
        await Get("/api/v1/glasses/schott/N-BK7?stock=none", HttpStatusCode.NotFound);
        await Post("/api/v1/pair", $$"""{"requirement":{{Requirement}},"stock":"none","glasses":["schott/N-BK7","schott/F2"]}""", HttpStatusCode.NotFound);
        await Post("/api/v1/shortlist", $$"""{"requirement":{{Requirement}},"stock":"none"}""", HttpStatusCode.NotFound);
    }
}
