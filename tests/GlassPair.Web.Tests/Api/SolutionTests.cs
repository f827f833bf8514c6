using System.Net;
using System.Text.Json;
using Microsoft.AspNetCore.Mvc.Testing;

namespace GlassPair.Web.Tests.Api;

/// <summary>Pairs and triplets over HTTP, recomputed here from published coefficients with the formulas written out.</summary>
public sealed class SolutionTests(WebApplicationFactory<Program> factory) : ApiTests(factory)
{
    /// <summary>The fields that the contract fixes.</summary>
    private static readonly string[] ContractFields =
    [
        "glasses", "powersPerMm", "relativePowers", "focalLengthsMm", "abbeNumbers", "partialDispersions", "primaryAxialColorMm",
        "secondarySpectrumMm", "samplesNm", "focalShiftMm", "rmsFocalShiftMm", "peakToValleyFocalShiftMm", "expectedRmsFocalShiftMm",
        "colorWavefrontWaves", "colorLimitedFNumber", "petzvalRadiusMm",
    ];

    /// <summary>Two ways to the same double: a few dozen roundings of 1e-16 each, magnified by 1/(n − 1) and V₁/(V₁ − V₂).</summary>
    private const double Rounding = 1e-12;

    /// <summary>A difference of two focal lengths loses the digits of the focal length: 320 mm, 1e-16, some dozen roundings.</summary>
    private const double RoundingMm = 320.0 * 1e-14;

    // Sellmeier coefficients B₁ C₁ B₂ C₂ B₃ C₃ as printed on the maker's data sheets of N-BK7 and F2 (Schott, 2017 edition; CC0 copy at refractiveindex.info).
    private static readonly double[] Bk7 = [1.03961212, 0.00600069867, 0.231792344, 0.0200179144, 1.01046945, 103.560653];
    private static readonly double[] F2 = [1.34533359, 0.00997743871, 0.209073176, 0.0470450767, 0.937357162, 111.886764];

    private static readonly string EndsUnited = Requirement.Replace("\"fNumber\"", "\"balance\":\"endsUnited\",\"fNumber\"", StringComparison.Ordinal);

    [Fact]
    public async Task Pair_EndsUnited_EqualsTheClassicalAchromat()
    {
        JsonElement answer = await Post("/api/v1/pair", $$"""{"requirement":{{EndsUnited}},"glasses":["schott/N-BK7","schott/F2"]}""");

        // Thin achromat: φ₁ = Φ V₁/(V₁ − V₂), φ₂ = −Φ V₂/(V₁ − V₂); Kingslake and Johnson, Lens Design Fundamentals, chapter 5.
        double v1 = Abbe(Bk7);
        double v2 = Abbe(F2);
        double p1 = v1 / (v1 - v2);
        double p2 = -v2 / (v1 - v2);
        AssertClose([p1, p2], Numbers(answer.GetProperty("relativePowers")), Rounding);
        AssertClose([p1 / 320.0, p2 / 320.0], Numbers(answer.GetProperty("powersPerMm")), Rounding);
        AssertClose([320.0 / p1, 320.0 / p2], Numbers(answer.GetProperty("focalLengthsMm")), Rounding);
        AssertClose([v1, v2], Numbers(answer.GetProperty("abbeNumbers")), Rounding);
        Assert.Equal(0.0, answer.GetProperty("primaryAxialColorMm").GetDouble(), RoundingMm);

        // Focal length at each sample from the sum of the powers, weights equal.
        double[] samples = Numbers(answer.GetProperty("samplesNm"));
        Assert.Equal(9, samples.Length);
        double FocalLength(double nm) => 320.0 / ((p1 * Power(Bk7, nm)) + (p2 * Power(F2, nm)));
        double[] shifts = [.. samples.Select(nm => FocalLength(nm) - 320.0)];
        double mean = shifts.Average();
        double rms = Math.Sqrt(shifts.Average(s => (s - mean) * (s - mean)));
        double peakToValley = shifts.Max() - shifts.Min();
        Assert.All(shifts.Zip(Numbers(answer.GetProperty("focalShiftMm"))), s => Assert.Equal(s.First, s.Second, RoundingMm * 10));
        Assert.Equal(rms, answer.GetProperty("rmsFocalShiftMm").GetDouble(), RoundingMm * 10);
        Assert.Equal(peakToValley, answer.GetProperty("peakToValleyFocalShiftMm").GetDouble(), RoundingMm * 10);
        Assert.Equal(-0.5 * (FocalLength(486.1327) + FocalLength(656.2725) - 640.0), answer.GetProperty("secondarySpectrumMm").GetDouble(), RoundingMm * 10);
        Assert.Equal(rms / (8.0 * 64.0 * 587.5618e-6), answer.GetProperty("colorWavefrontWaves").GetDouble(), 1e-8);
        Assert.Equal(Math.Sqrt(0.5 * peakToValley / (2.0 * 587.5618e-6)), answer.GetProperty("colorLimitedFNumber").GetDouble(), 1e-8);
        Assert.Equal(-320.0 / ((p1 / Index(Bk7, 587.5618)) + (p2 / Index(F2, 587.5618))), answer.GetProperty("petzvalRadiusMm").GetDouble(), 1e-9);
    }

    [Fact]
    public async Task Pair_OfTheTextbooks_LeavesAboutATwoThousandthOfTheFocalLength()
    {
        JsonElement answer = await Post("/api/v1/pair", $$"""{"requirement":{{EndsUnited}},"glasses":["schott/N-BK7","schott/F2"]}""");

        // The rule of thumb f/2000, here read as 1/2500 to 1/1700; common practice.
        Assert.InRange(Math.Abs(answer.GetProperty("secondarySpectrumMm").GetDouble()) / 320.0, 1.0 / 2500.0, 1.0 / 1700.0);
    }

    [Fact]
    public async Task Pair_AnyGlasses_HasTheFieldsOfTheContract()
    {
        JsonElement answer = await Post("/api/v1/pair", $$"""{"requirement":{{Requirement}},"glasses":["SCHOTT/n-bk7","schott/f2"]}""");
        Assert.Empty(ContractFields.Except(answer.EnumerateObject().Select(p => p.Name)));
        Assert.Equal(["schott/N-BK7", "schott/F2"], Texts(answer.GetProperty("glasses")));
    }

    [Fact]
    public async Task Pair_WithItself_SaysThatNoPowersBalanceIt()
    {
        JsonElement problem = await Post("/api/v1/pair", $$"""{"requirement":{{Requirement}},"glasses":["schott/N-BK7","schott/N-BK7"]}""", HttpStatusCode.UnprocessableEntity);
        Assert.Contains("schott/N-BK7", problem.GetProperty("detail").GetString(), StringComparison.Ordinal);
        Assert.Equal("dispersionsAlike", problem.GetProperty("reason").GetString());
    }

    [Fact]
    public async Task Pair_OfUnknownGlass_NamesTheClosest()
    {
        JsonElement problem = await Post("/api/v1/pair", $$"""{"requirement":{{Requirement}},"glasses":["schott/NBK7","schott/F2"]}""", HttpStatusCode.NotFound);
        Assert.Equal("schott/N-BK7", Texts(problem.GetProperty("unknownGlasses")[0].GetProperty("closest"))[0]);
    }

    [Fact]
    public async Task Triplet_EndsUnited_BringsThreeWavelengthsToOneFocus()
    {
        JsonElement answer = await Post(
            "/api/v1/triplet", $$"""{"requirement":{{EndsUnited}},"glasses":["schott/N-FK58","schott/N-KZFS4","schott/N-SF6"]}""");
        double[] shifts = Numbers(answer.GetProperty("focalShiftMm"));
        Assert.Equal(0.0, shifts[0], RoundingMm * 10);
        Assert.Equal(0.0, shifts[^1], RoundingMm * 10);
        Assert.Equal(1.0, Numbers(answer.GetProperty("relativePowers")).Sum(), Rounding);
    }

    private static double Abbe(double[] glass) =>
        (Index(glass, 587.5618) - 1.0) / (Index(glass, 486.1327) - Index(glass, 656.2725));

    private static double Power(double[] glass, double nm) => (Index(glass, nm) - 1.0) / (Index(glass, 587.5618) - 1.0);

    /// <summary>n² − 1 = Σ Bᵢ λ²/(λ² − Cᵢ), λ in micrometers (Sellmeier 1871).</summary>
    private static double Index(double[] glass, double nm)
    {
        double squared = nm * nm * 1e-6;
        return Math.Sqrt(1.0 + (glass[0] * squared / (squared - glass[1])) + (glass[2] * squared / (squared - glass[3])) + (glass[4] * squared / (squared - glass[5])));
    }

    private static void AssertClose(double[] expected, double[] actual, double relative)
    {
        Assert.Equal(expected.Length, actual.Length);
        for (int i = 0; i < expected.Length; i++)
        {
            Assert.Equal(expected[i], actual[i], relative * Math.Abs(expected[i]));
        }
    }
}
