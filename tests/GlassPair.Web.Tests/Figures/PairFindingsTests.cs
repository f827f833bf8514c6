using GlassPair.Optics.Color;
using GlassPair.Web.Addresses;
using GlassPair.Web.Figures;
using GlassPair.Web.Tests.Controls;

namespace GlassPair.Web.Tests.Figures;

public sealed class PairFindingsTests
{
    private static readonly PairName _classic = new("schott/N-BK7", "schott/F2");

    [Theory]
    [InlineData(0.9, Verdict.Holds)]
    [InlineData(0.95, Verdict.Tight)]
    [InlineData(1.0, Verdict.Tight)]
    [InlineData(1.0001, Verdict.Exceeds)]
    [InlineData(double.NaN, Verdict.Exceeds)]
    public void Verdict_IsTightWithinATenthOfTheLimit(double figure, Verdict verdict) => Assert.Equal(verdict, Verdicts.Of(figure, 1.0));

    [Fact]
    public void Of_SlowLens_ColorHoldsWithItsNumbers()
    {
        Finding color = PairFindings.Of(Pair("?f=240&n=20", _classic))[0];

        Assert.Equal(Verdict.Holds, color.Verdict);
        Assert.Contains("f/20 allows ±", color.Sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void Of_FastLens_ColorExceedsAndSaysFromWhere()
    {
        RankedPair pair = Pair("?f=240&n=4", _classic);
        Finding color = PairFindings.Of(pair)[0];

        Assert.Equal(Verdict.Exceeds, color.Verdict);
        Assert.Contains($"holds from {FigureText.FNumber(pair.ColorLimitedFNumber)} on", color.Sentence, StringComparison.Ordinal);
    }

    /// <summary>The quick check of the trade: E Δα ΔT, with E = 80 GPa, from the expansions that the maker states, 7.1 and 8.2e-6.</summary>
    [Fact]
    public void Of_ColdCementedLens_TellsTheStress()
    {
        Finding cement = PairFindings.Of(Pair("?f=240&n=6&from=-20&to=20", _classic))[1];

        Assert.Equal((Verdict.Holds, "Cement holds"), (cement.Verdict, cement.Title));
        Assert.Contains("Δα 1.10·10⁻⁶/K", cement.Sentence, StringComparison.Ordinal);
        Assert.Contains("3.52 MPa at −20 °C, limit 10 MPa", cement.Sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void Of_AirSpacedLens_SaysNothingOfCement() =>
        Assert.DoesNotContain(PairFindings.Of(Pair("?f=240&n=6&space=air&from=-20&to=20", _classic)), f => f.Title.Contains("Cement", StringComparison.Ordinal));

    [Fact]
    public void Of_NoTemperatures_SaysNothingOfDrift() =>
        Assert.DoesNotContain(PairFindings.Of(Pair("?f=240&n=6", _classic)), f => f.Title.Contains("rift", StringComparison.Ordinal) || f.Title.Contains("Focus", StringComparison.Ordinal));

    [Fact]
    public void Of_TemperaturesPastTheFormula_SaysWhatIsNotKnown() =>
        Assert.Contains(PairFindings.Of(Pair("?f=240&n=6&from=-20&to=400", _classic)), f => f.Title == "Drift not known" && f.Sentence.Contains("400 °C", StringComparison.Ordinal));

    [Fact]
    public void Of_GlassWithLead_SaysWhich()
    {
        RankedPair pair = Pair("?f=240&n=6", _classic);
        Finding lead = Assert.Single(PairFindings.Of(pair), f => f.Title == "Contains lead");

        Assert.Equal(pair.Negative.Glass.ContainsLead, lead.Sentence.Contains("F2", StringComparison.Ordinal));
        Assert.DoesNotContain("N-BK7", lead.Sentence, StringComparison.Ordinal);
    }

    /// <summary>Ordinary pairs leave f/2000: the rule of thumb of Kingslake and Johnson, Lens Design Fundamentals, chapter 5.</summary>
    [Fact]
    public void AgainstOrdinaryPairs_VisibleBand_ComparesWithTheRule()
    {
        ThinSolution solution = Pair("?f=200&n=10&short=F&design=d&long=C", _classic).Solution;

        Assert.Contains("where ordinary pairs leave about f/2,000, 100 µm", PairFindings.AgainstOrdinaryPairs(solution)!.Replace('\u00A0', ' '), StringComparison.Ordinal);
    }

    [Fact]
    public void AgainstOrdinaryPairs_OtherBand_DoesNotCompare() =>
        Assert.Null(PairFindings.AgainstOrdinaryPairs(Pair("?f=200&n=10&short=r&design=s&long=t", _classic).Solution));

    [Fact]
    public void PairFigures_AllHaveNumbersFormulaAndSource() => Assert.All(
        PairFigures.Of(Pair("?f=240&n=6", _classic), Ranked.Few.Shortlist.Request.Quality),
        f => Assert.All([f.Name, f.Value, f.Formula, f.Inputs, f.Source], Assert.NotEmpty));

    private static RankedPair Pair(string query, PairName name) => Ranked.Answer(query + "&makers=schott&take=10").Find(name, out _)!;
}
