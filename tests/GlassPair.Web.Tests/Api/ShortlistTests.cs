using System.Net;
using System.Text.Json;
using Microsoft.AspNetCore.Mvc.Testing;

namespace GlassPair.Web.Tests.Api;

public sealed class ShortlistTests(WebApplicationFactory<Program> factory) : ApiTests(factory)
{
    private static readonly string[] AnswerFields =
        ["stock", "glassesConsidered", "combinationsExamined", "combinationsFeasible", "elapsedMs", "candidates"];

    [Fact]
    public async Task Shortlist_LeftAlone_Answers50CandidatesInOrder()
    {
        JsonElement answer = await Rank("");
        Assert.Empty(AnswerFields.Except(answer.EnumerateObject().Select(p => p.Name)));
        JsonElement[] candidates = [.. answer.GetProperty("candidates").EnumerateArray()];
        Assert.Equal(Enumerable.Range(1, 50), candidates.Select(c => c.GetProperty("rank").GetInt32()));
        double[] residuals = [.. candidates.Select(c => c.GetProperty("rmsFocalShiftMm").GetDouble())];
        Assert.Equal(residuals.Order(), residuals);
        Assert.All(candidates, c => Assert.True(Numbers(c.GetProperty("relativePowers"))[0] > 0.0));
        long distinct = answer.GetProperty("distinctGlasses").GetInt64();
        Assert.Equal(distinct * (distinct - 1) / 2, answer.GetProperty("combinationsExamined").GetInt64());
        Assert.Equal(
            answer.GetProperty("combinationsExamined").GetInt64(),
            answer.GetProperty("combinationsFeasible").GetInt64() + answer.GetProperty("droppedCombinations").EnumerateObject().Sum(d => d.Value.GetInt64()));
        Assert.Equal(
            (await Get("/api/v1/stocks"))[0].GetProperty("glasses").GetInt32(),
            answer.GetProperty("glassesConsidered").GetInt32() + answer.GetProperty("droppedGlasses").EnumerateObject().Sum(d => d.Value.GetInt32()));
    }

    [Theory]
    [InlineData("colorResidual", "rmsFocalShiftMm")]
    [InlineData("expectedResidual", "expectedRmsFocalShiftMm")]
    [InlineData("secondarySpectrum", "secondarySpectrumMm")]
    public async Task Shortlist_RankedByAFigure_RisesInIt(string rankBy, string figure)
    {
        JsonElement answer = await Rank($$""","rankBy":"{{rankBy}}","makers":["schott"],"take":5000""");
        double[] keys = [.. answer.GetProperty("candidates").EnumerateArray().Select(c => Math.Abs(c.GetProperty(figure).GetDouble()))];
        Assert.Equal(5_000, keys.Length);

        // Equal to 12 digits counts as a tie, and a tie may stand in either order.
        Assert.All(keys.Zip(keys.Skip(1)), k => Assert.True(k.First <= k.Second * (1.0 + 1e-11)));
    }

    [Fact]
    public async Task Shortlist_Candidate_IsWhatPairSaysOfItsGlasses()
    {
        JsonElement candidate = (await Rank(""","take":1""")).GetProperty("candidates")[0];
        JsonElement pair = await Post("/api/v1/pair", $$"""{"requirement":{{Requirement}},"glasses":{{candidate.GetProperty("glasses").GetRawText()}}}""");
        Assert.All(pair.EnumerateObject(), p => Assert.Equal(p.Value.GetRawText(), candidate.GetProperty(p.Name).GetRawText()));
    }

    [Fact]
    public async Task Shortlist_OfThreeElements_IsWhatTripletSaysOfItsGlasses()
    {
        JsonElement answer = await Rank(""","elements":3,"makers":["lzos","schott"],"take":20""");
        long distinct = answer.GetProperty("distinctGlasses").GetInt64();
        Assert.Equal(distinct * (distinct - 1) * (distinct - 2) / 6, answer.GetProperty("combinationsExamined").GetInt64());
        double limit = answer.GetProperty("maxElementPower").GetDouble();
        JsonElement[] candidates = [.. answer.GetProperty("candidates").EnumerateArray()];
        Assert.Equal(20, candidates.Length);
        Assert.All(candidates, c =>
        {
            double[] powers = Numbers(c.GetProperty("relativePowers"));
            Assert.Equal(3, powers.Length);
            Assert.Equal(powers.OrderDescending(), powers);
            Assert.InRange(powers.Max(Math.Abs), 0.0, limit);
        });
        JsonElement triplet = await Post("/api/v1/triplet", $$"""{"requirement":{{Requirement}},"glasses":{{candidates[0].GetProperty("glasses").GetRawText()}}}""");
        Assert.All(triplet.EnumerateObject(), p => Assert.Equal(p.Value.GetRawText(), candidates[0].GetProperty(p.Name).GetRawText()));
    }

    [Fact]
    public async Task Shortlist_WithLimits_KeepsToThem()
    {
        JsonElement answer = await Rank(
            ""","makers":["Schott","hoya"],"supply":["recommended","listed"],"exclude":["schott/n-bk7"],"allowLead":false,"maxExpansionDifferencePerK":1e-6,"take":500""");
        JsonElement[] candidates = [.. answer.GetProperty("candidates").EnumerateArray()];
        Assert.NotEmpty(candidates);
        Dictionary<string, JsonElement> glasses = (await Get("/api/v1/glasses?take=2000")).GetProperty("glasses").EnumerateArray()
            .ToDictionary(g => $"{g.GetProperty("maker")}/{g.GetProperty("name")}");
        Assert.All(candidates.Select(c => Texts(c.GetProperty("glasses"))), pair =>
        {
            Assert.DoesNotContain("schott/N-BK7", pair);
            Assert.All(pair, id =>
            {
                Assert.Matches("^(schott|hoya)/", id);
                Assert.Contains(glasses[id].GetProperty("supply").GetString(), new[] { "recommended", "listed" });
                Assert.False(glasses[id].GetProperty("containsLead").GetBoolean());
            });
            Assert.InRange(Math.Abs(glasses[pair[0]].GetProperty("expansionPerK").GetDouble() - glasses[pair[1]].GetProperty("expansionPerK").GetDouble()), 0.0, 1e-6);
        });
        string[] reasons = [.. answer.GetProperty("droppedGlasses").EnumerateObject().Select(d => d.Name)];
        Assert.Contains("maker", reasons);
        Assert.Contains("excluded", reasons);
    }

    [Fact]
    public async Task Shortlist_WithIncludedGlass_HoldsItInEveryCandidateThoughItsMakerIsNotKept()
    {
        JsonElement answer = await Rank(""","makers":["hoya"],"include":["schott/F2"],"take":20""");
        Assert.All(answer.GetProperty("candidates").EnumerateArray(), c => Assert.Contains(
            "schott/F2", Texts(c.GetProperty("glasses")).Concat(Texts(c.GetProperty("sameAs")))));
    }

    [Fact]
    public async Task Shortlist_WithElementPowerLimit_KeepsBelowIt()
    {
        string requirement = Requirement.Replace("\"fNumber\"", "\"limits\":{\"maxElementPower\":2},\"fNumber\"", StringComparison.Ordinal);
        JsonElement answer = await Post("/api/v1/shortlist", $$"""{"requirement":{{requirement}},"take":200}""");
        Assert.All(answer.GetProperty("candidates").EnumerateArray(), c => Assert.All(Numbers(c.GetProperty("relativePowers")), p => Assert.InRange(Math.Abs(p), 0.0, 2.0)));
        Assert.True(answer.GetProperty("droppedCombinations").GetProperty("elementPower").GetInt64() > 0);
    }

    [Fact]
    public async Task Shortlist_FewPairsPerGlass_UsesEachThatOften()
    {
        JsonElement answer = await Rank(""","makers":["schott"],"pairsPerGlass":2,"take":40""");
        Assert.All(
            answer.GetProperty("candidates").EnumerateArray().SelectMany(c => Texts(c.GetProperty("glasses"))).CountBy(id => id),
            uses => Assert.InRange(uses.Value, 1, 2));
    }

    [Fact]
    public async Task Shortlist_NothingLeft_IsAnEmptyListWithTheReasons()
    {
        string requirement = Requirement.Replace("486.1327", "150", StringComparison.Ordinal);
        JsonElement answer = await Post("/api/v1/shortlist", $$"""{"requirement":{{requirement}}}""");
        Assert.Equal(0, answer.GetProperty("candidates").GetArrayLength());
        Assert.True(answer.GetProperty("droppedGlasses").GetProperty("band").GetInt32() > 1_000);
    }

    [Fact]
    public async Task Shortlist_UnknownExcludedGlass_NamesTheClosest()
    {
        JsonElement problem = await Post("/api/v1/shortlist", $$"""{"requirement":{{Requirement}},"exclude":["schott/NBK7"],"include":["hoya/F22"]}""", HttpStatusCode.NotFound);
        Assert.Equal(2, problem.GetProperty("unknownGlasses").GetArrayLength());
    }

    [Fact]
    public async Task Shortlist_ThousandsOfUnknownGlasses_AreAnsweredQuicklyWithTheFirstFew()
    {
        string names = string.Join(',', Enumerable.Range(0, 2_000).Select(i => FormattableString.Invariant($"\"nobody/no-such-glass-with-a-name-as-long-as-names-may-be-{i}\"")));
        JsonElement problem = await Post("/api/v1/shortlist", $$"""{"requirement":{{Requirement}},"exclude":[{{names}}]}""", HttpStatusCode.NotFound);
        Assert.Equal(10, problem.GetProperty("unknownGlasses").GetArrayLength());
        Assert.EndsWith("1990 more names are unknown.", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Shortlist_OwnSamples_AreUsedAsGiven()
    {
        string requirement = """{"focalLengthMm":100,"fNumber":5,"band":{"samplesNm":[450.123456789,550,650.5],"weights":[1,2,1]}}""";
        JsonElement candidate = (await Post("/api/v1/shortlist", $$"""{"requirement":{{requirement}},"take":1}""")).GetProperty("candidates")[0];
        Assert.Equal([450.123456789, 550.0, 650.5], Numbers(candidate.GetProperty("samplesNm")));

        // The ends and the middle of the samples stand in for those left out, and the weights are scaled to sum to 1.
        double[] shifts = Numbers(candidate.GetProperty("focalShiftMm"));
        Assert.Equal(0.0, shifts[1]);
        Assert.Equal(shifts[0] - shifts[2], candidate.GetProperty("primaryAxialColorMm").GetDouble(), 1e-12);
        double mean = (0.25 * shifts[0]) + (0.25 * shifts[2]);
        double variance = (0.25 * Math.Pow(shifts[0] - mean, 2)) + (0.5 * mean * mean) + (0.25 * Math.Pow(shifts[2] - mean, 2));
        Assert.Equal(Math.Sqrt(variance), candidate.GetProperty("rmsFocalShiftMm").GetDouble(), 1e-12);
    }

    private Task<JsonElement> Rank(string fields) => Post("/api/v1/shortlist", $$"""{"requirement":{{Requirement}}{{fields}}}""");
}
