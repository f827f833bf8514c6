using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Addresses;
using GlassPair.Web.Tests.Glasses;

namespace GlassPair.Web.Tests.Addresses;

public sealed class FormReadingTests
{
    private static readonly WorkbenchState _good = WorkbenchAddress.Read("?f=240&n=6").State;

    /// <summary>A query, the field that is wrong, and words that the message must hold: what is wrong, and what is allowed.</summary>
    public static TheoryData<string, string, string[]> WrongNumbers => new()
    {
        { "f=abc", "f", ["“abc”", "not a number", "1 to 100,000 mm"] },
        { "f=%00", "f", ["not a number", "1 to 100,000 mm"] },
        { "f=%F0%9F%94%AD", "f", ["🔭", "not a number"] },
        { "f=1,5", "f", ["“1,5” has a decimal comma; write 1.5"] },
        { "f=1.234,5", "f", ["not a number"] },
        { "f=NaN", "f", ["not a number"] },
        { "f=Infinity", "f", ["not a number"] },
        { "f=1e999", "f", ["not a number"] },
        { "f=0x10", "f", ["not a number"] },
        { "f=1e-400", "f", ["not a number"] },
        { "f=-0", "f", ["too small", "1 to 100,000 mm"] },
        { "f=0", "f", ["too small", "1 to 100,000 mm"] },
        { "f=-240", "f", ["too small", "1 to 100,000 mm"] },
        { "f=100001", "f", ["too large", "1 to 100,000 mm"] },
        { "n=0", "n", ["too small", "0.7 to 200"] },
        { "n=0.3", "n", ["too small", "0.7 to 200"] },
        { "n=201", "n", ["too large"] },
        { "field=41", "field", ["too large", "0 to 40 °"] },
        { "field=", "field", ["A value is needed", "0 to 40 °"] },
        { "short=q", "short", ["“q”", "or a line such as F'"] },
        { "short=50", "short", ["too small", "100 to 20,000 nm"] },
        { "short=700", "short", ["short end, 700 nm, must lie below the design wavelength, 546.074 nm"] },
        { "short=e", "short", ["must lie below"] },
        { "long=g", "long", ["long end, 435.8343 nm, must lie above the design wavelength"] },
        { "short=546.0&design=546.3&long=546.6", "long", ["at least 1 nm wide"] },
        { "samples=2", "samples", ["too small", "3 to 41"] },
        { "samples=42", "samples", ["too large", "3 to 41"] },
        { "samples=9.5", "samples", ["not a whole number", "3 to 41"] },
        { "space=air&air=-1", "air", ["too small"] },
        { "space=air&air=240", "air", ["less than the focal length, 240 mm"] },
        { "power=0.5", "power", ["too small", "1 to 100"] },
        { "from=50&to=-20", "from", ["coldest, 50 °C, must not lie above the hottest, -20 °C"] },
        { "from=-20", "to", ["needs a hottest"] },
        { "to=50", "from", ["needs a coldest"] },
        { "from=-300&to=20", "from", ["too small"] },
        { "grade=9", "grade", ["too large"] },
        { "precision=0", "precision", ["too small"] },
        { "expansion=x", "expansion", ["not a number"] },
    };

    [Theory, MemberData(nameof(WrongNumbers))]
    public void Of_WrongNumber_SaysWhatIsWrongAndWhatIsAllowed(string query, string key, string[] words)
    {
        FormReading reading = Read(query);

        string? problem = reading.ProblemWith(NumberField.All.Single(f => f.Key == key));
        Assert.NotNull(problem);
        Assert.All(words, word => Assert.Contains(word, problem, StringComparison.Ordinal));
        Assert.Null(reading.Request);
    }

    [Fact]
    public void Of_EmptyForm_AsksForNothingAndIsNotWrong()
    {
        var reading = FormReading.Of(WorkbenchState.Empty, ServedStock.Stock);

        Assert.False(reading.IsStarted);
        Assert.Empty(reading.Problems);
        Assert.Null(reading.Request);
    }

    [Fact]
    public void Of_FullForm_IsTheRequestTyped()
    {
        ShortlistRequest request = Read(
            "f=100&n=4&field=2&short=480&design=d&long=C&samples=5&space=air&air=0.6&power=&balance=ends&from=−20&to=50&housing=9&grade=0.1&precision=30&expansion=3&lead=no&molding=no&makers=hoya&supply=listed&exclude=HOYA/fcd1&rank=residual&each=2&take=7").Request!;

        Requirement requirement = request.Requirement;
        Assert.Equal((100.0, 4.0, 2.0), (requirement.FocalLength, requirement.FNumber, requirement.HalfFieldDegrees));
        Assert.Equal((480.0, 587.5618, 656.2725, 5), (requirement.Band.ShortEnd.Nanometers, requirement.Band.Design.Nanometers, requirement.Band.LongEnd.Nanometers, requirement.Band.Samples.Length));
        Assert.Equal((ColorBalance.EndsUnited, 0.6, null), (requirement.Balance, requirement.AirSpace, requirement.ElementPowerLimit));
        Assert.Equal(new TemperatureSpan(-20.0, 50.0, 9e-6), requirement.Temperature);
        Assert.Equal(0.001, request.Quality.AbbeTolerance, 12);
        Assert.Equal(3e-5, request.Quality.IndexPrecision, 12);
        Assert.Equal(3e-6, request.Limits.ExpansionDifference!.Value, 15);
        Assert.False(request.Limits.AllowLead || request.Limits.AllowMolding);
        Assert.Equal(["hoya"], request.Limits.Makers!);
        Assert.Equal([Optics.Glasses.Supply.Listed], request.Limits.Supply!);
        Assert.Equal(["hoya/FCD1"], request.Limits.Exclude);
        Assert.Equal((RankBy.ColorResidual, 2, 7), (request.RankBy, request.PairsPerGlass, request.Take));
    }

    [Fact]
    public void Of_EveryMakerAndState_LimitsNothing()
    {
        GlassLimits limits = Read("supply=recommended,listed,on-request,unconfirmed,discontinued&power=").Request!.Limits;

        Assert.Null(limits.Makers);
        Assert.Null(limits.Supply);
    }

    /// <summary>The depth of focus is that of W. J. Smith, Modern Optical Engineering: 2 λ N²; the aperture f/N; the height f tan w.</summary>
    [Fact]
    public void Of_NumbersGiven_DerivesTheValuesBetween()
    {
        FormReading reading = Read("f=200&n=5&design=500");

        Assert.Equal(40.0, reading.ApertureDiameter!.Value, 12);
        Assert.Equal(0.025, reading.DepthOfFocus!.Value, 12);
        Assert.Equal(200.0 * Math.Tan(Math.PI / 9), Read("f=200&n=5&field=20").ImageHeight!.Value, 12);
    }

    [Fact]
    public void Of_NumbersMissing_DerivesWhatItCan()
    {
        FormReading reading = Read("f=&n=5");

        Assert.Null(reading.ApertureDiameter);
        Assert.NotNull(reading.DepthOfFocus);
    }

    [Theory]
    [InlineData("include=schott/NOPE", "schott/NOPE is not in this stock")]
    [InlineData("include=schott/N-BK7&exclude=schott/n-bk7", "both demanded and excluded")]
    [InlineData("makers=", "No maker is kept")]
    [InlineData("supply=", "No supply state is kept")]
    public void Of_GlassesThatCannotBe_NamesThem(string query, string words)
    {
        FormReading reading = Read(query);

        Assert.Contains(words, reading.GlassProblem, StringComparison.OrdinalIgnoreCase);
        Assert.Null(reading.Request);
    }

    private static FormReading Read(string query)
    {
        // What the query does not say is good.
        WorkbenchState state = WorkbenchAddress.Read(query).State;
        foreach (NumberField field in new[] { NumberField.FocalLength, NumberField.FNumber })
        {
            state = query.Split('&').Any(p => p.StartsWith(field.Key + "=", StringComparison.Ordinal)) ? state : state.With(field, _good.TextOf(field));
        }

        return FormReading.Of(state, ServedStock.Stock);
    }
}
