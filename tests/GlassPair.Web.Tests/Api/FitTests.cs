using System.Globalization;
using System.Text.Json;
using Microsoft.AspNetCore.Mvc.Testing;

namespace GlassPair.Web.Tests.Api;

public sealed class FitTests(WebApplicationFactory<Program> factory) : ApiTests(factory)
{
    /// <summary>Indices printed on the maker's data sheet of N-BK7, recalled; five decimals.</summary>
    private const string Sheet =
        """
        "nm":[365.0146,404.6561,435.8343,486.1327,546.074,587.5618,656.2725,852.11,1013.98,1529.6],
        "index":[1.53627,1.53024,1.52668,1.52238,1.51872,1.5168,1.51432,1.5098,1.50731,1.50091]
        """;

    [Theory]
    [InlineData("sellmeier", 3)]
    [InlineData("powerSeries", 5)]
    public async Task Fit_OfPrintedIndices_LeavesTheirRounding(string form, int terms)
    {
        JsonElement fit = await Post("/api/v1/fit", $$"""{"form":"{{form}}","terms":{{terms}},{{Sheet}}}""");
        double[] residuals = Numbers(fit.GetProperty("residuals"));
        double rms = Math.Sqrt(residuals.Average(r => r * r));
        Assert.InRange(rms, 0.0, 5e-6);
        Assert.Equal(rms, fit.GetProperty("rmsResidual").GetDouble(), 1e-12);
        Assert.Equal(residuals.Max(Math.Abs), Math.Abs(fit.GetProperty("worstResidual").GetDouble()), 1e-15);
        Assert.Equal([365.0146, 1529.6], Numbers(fit.GetProperty("rangeNm")));
        Assert.Equal(6, Numbers(fit.GetProperty("coefficients")).Length);
    }

    [Fact]
    public async Task Fit_OfAnExactFormula_FindsIt()
    {
        // n² = 2.25 + 0.01/λ² − 0.01 λ², an invented glass
        double[] nm = [.. Enumerable.Range(0, 12).Select(i => 400.0 + (50.0 * i))];
        double[] index = [.. nm.Select(w => Math.Sqrt(2.25 + (0.01 * 1e6 / (w * w)) - (0.01 * w * w * 1e-6)))];
        JsonElement fit = await Post("/api/v1/fit", $$"""{"form":"powerSeries","terms":2,"nm":[{{List(nm)}}],"index":[{{List(index)}}]}""");
        double[] coefficients = Numbers(fit.GetProperty("coefficients"));
        Assert.Equal([2, -2], fit.GetProperty("exponents").EnumerateArray().Select(e => e.GetInt32()));
        Assert.Equal(2.25, coefficients[0], 1e-10);
        Assert.Equal(-0.01, coefficients[1], 1e-10);
        Assert.Equal(0.01, coefficients[2], 1e-10);
    }

    private static string List(double[] values) => string.Join(',', values.Select(v => v.ToString("R", CultureInfo.InvariantCulture)));
}
