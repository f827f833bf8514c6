using CsCheck;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Components.Glasses;

namespace GlassPair.Web.Tests.Glasses;

public sealed class FitAnswerTests
{
    private const double MisprintNanometers = 852.11;

    [Fact]
    public void Of_Example_PointsAtTheMisprint()
    {
        FitAnswer answer = FitAnswer.Of(FitExample.State);
        Assert.Equal(MisprintNanometers, answer.Made!.Worst.Wavelength.Nanometers);
        Assert.Contains(answer.Made.Warnings, w => w.Contains("852.11", StringComparison.Ordinal));
    }

    [Fact]
    public void Of_MisprintLeftOut_ShowsTheEffect()
    {
        FitAnswer answer = FitAnswer.Of(FitExample.State.With(MisprintNanometers, isUsed: false));
        Assert.Equal(1, answer.LeftOutCount);
        Assert.True(answer.Made!.RmsResidual < answer.WithAll!.RmsResidual / 10.0);
        FitLine line = Assert.Single(answer.Lines, l => !l.IsUsed);
        Assert.Equal(answer.Made.LeftOut.Single().Residual, line.Residual);
        Assert.Equal(line.Row.Measured!.Value.Index, line.Fitted!.Value + line.Residual!.Value, 12);
    }

    [Fact]
    public void Of_EndLeftOut_DoesNotExtrapolate()
    {
        FitAnswer answer = FitAnswer.Of(FitExample.State.With(1128.60, isUsed: false));
        Assert.Null(answer.Lines.Single(l => !l.IsUsed).Residual);
        Assert.Empty(answer.Made!.LeftOut);
    }

    [Theory]
    [InlineData(DispersionForm.Sellmeier, 2)]
    [InlineData(DispersionForm.PowerSeries, 4)]
    public void Of_FormAndTerms_AreWhatWasAsked(DispersionForm form, int terms)
    {
        DispersionFormula formula = FitAnswer.Of(FitExample.State with { Form = form, Terms = terms }).Made!.Formula;
        Assert.Equal(form == DispersionForm.Sellmeier ? 2 * terms : 1 + terms, formula.Coefficients.Length);
    }

    [Fact]
    public void Of_TooFewForTheTerms_SaysHowManyAreNeeded()
    {
        FitAnswer answer = FitAnswer.Of(FitState.Empty with { Text = "486.1 1.52238\n587.6 1.5168\n656.3 1.51432", Form = DispersionForm.Sellmeier, Terms = 3 });
        Assert.Null(answer.Made);
        Assert.Contains("at least 7", Assert.Single(answer.Faults), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("Lab/Melt 7", "lab", "Melt 7")]
    [InlineData("", "measured", "fit")]
    [InlineData(" / ", "measured", "fit")]
    [InlineData("\u0001x", "measured", "x")]
    public void CatalogueText_ReadsBackAsTheSameGlass(string typed, string maker, string name)
    {
        FitAnswer answer = FitAnswer.Of(FitExample.State with { Name = typed });
        StockReading reading = StockReader.Read([CatalogueFile.FromBytes("fit.csv", System.Text.Encoding.UTF8.GetBytes(answer.CatalogueText()))], "Test");
        Glass glass = Assert.Single(reading.Stock!.Glasses);
        Assert.Equal((maker, name), (glass.Maker, glass.Name));
        Assert.Equal(answer.Glass!.Formula, glass.Formula);
        Assert.Equal(answer.Glass.Range, glass.Range);
    }

    [Fact]
    public void Of_AnyState_Answers() => FitAddressTests.States.Sample(state =>
    {
        FitAnswer answer = FitAnswer.Of(state);
        return answer.Made is null || double.IsFinite(answer.Made.RmsResidual);
    });
}
