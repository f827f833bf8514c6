using Bunit;
using GlassPair.Web.Addresses;
using GlassPair.Web.Components.Controls;

namespace GlassPair.Web.Tests.Controls;

public sealed class SmallControlTests : BunitContext
{
    [Fact]
    public void NumberInput_Typed_ReportsTheTextAsIs()
    {
        string? typed = null;
        var input = Render<NumberInput>(p => p.Add(i => i.Field, NumberField.FocalLength).Add(i => i.Value, "240").Add(i => i.Typed, text => typed = text));

        input.Find("input").Input("1,5");

        Assert.Equal("1,5", typed);
    }

    [Fact]
    public void NumberInput_DrawnLate_OverwritesNoKeystroke_UntilItsOwnerSaysSomethingNew()
    {
        var input = Render<NumberInput>(p => p.Add(i => i.Field, NumberField.FocalLength).Add(i => i.Value, "240"));
        input.Find("input").Input("25");
        Assert.Equal("25", input.Find("input").GetAttribute("value"));

        input.Render(p => p.Add(i => i.Value, "240"));
        Assert.Equal("25", input.Find("input").GetAttribute("value"));

        input.Render(p => p.Add(i => i.Value, "300"));
        Assert.Equal("300", input.Find("input").GetAttribute("value"));
    }

    [Fact]
    public void NumberInput_WithProblem_SaysItBesideTheField()
    {
        var input = Render<NumberInput>(p => p.Add(i => i.Field, NumberField.FNumber).Add(i => i.Value, "0.3").Add(i => i.Problem, "Too small."));

        var box = input.Find("input");
        Assert.Equal("true", box.GetAttribute("aria-invalid"));
        string[] described = box.GetAttribute("aria-describedby")!.Split(' ');
        Assert.Contains(described, id => input.FindAll("#" + id).Any(e => e.TextContent.Contains("Too small.", StringComparison.Ordinal)));
    }

    [Fact]
    public void NumberInput_WithoutProblem_IsValidNamedAndHasItsUnit()
    {
        var input = Render<NumberInput>(p => p.Add(i => i.Field, NumberField.FocalLength).Add(i => i.Value, "240"));

        Assert.Null(input.Find("input").GetAttribute("aria-invalid"));
        Assert.Equal("Focal length", input.Find($"label[for={input.Find("input").Id}]").TextContent);
        Assert.Contains("mm", input.Markup, StringComparison.Ordinal);
    }

    [Fact]
    public void FieldHelp_ExplainsEachFieldWithItsRange()
    {
        var help = Render<FieldHelp>(p => p.Add(h => h.Fields, [NumberField.FNumber, NumberField.ElementPower]));

        Assert.Contains("Allowed: 0.7 to 200.", help.Find("#field-n-meaning").TextContent, StringComparison.Ordinal);
        Assert.Contains("or empty", help.Find("#field-power-meaning").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void Chip_Clicked_ReportsTheOtherState()
    {
        bool? now = null;
        var chip = Render<Chip>(p => p.Add(c => c.On, true).Add(c => c.Changed, on => now = on).AddChildContent("hoya"));

        chip.Find("input").Change(false);

        Assert.False(now);
    }

    [Fact]
    public void Choice_OtherOption_IsReported()
    {
        int picked = 0;
        var choice = Render<Choice<int>>(p => p.Add(c => c.Label, "Count").Add(c => c.Name, "count").Add(c => c.Options, [(1, "one"), (2, "two")]).Add(c => c.Value, 1).Add(c => c.Changed, v => picked = v));

        choice.FindAll("input")[1].Change("on");

        Assert.Equal(2, picked);
        Assert.Equal(["true", null], choice.FindAll("input").Select(i => i.HasAttribute("checked") ? "true" : null));
    }

    [Fact]
    public void BandBar_Impossible_DrawsTheAxisAlone()
    {
        Assert.Single(Render<BandBar>(p => p.Add(b => b.ShortEnd, 600.0).Add(b => b.Design, 500.0).Add(b => b.LongEnd, 700.0).Add(b => b.Samples, 9)).FindAll("line"));
        Assert.Single(Render<BandBar>().FindAll("line"));
    }

    [Fact]
    public void BandBar_Band_DrawsEverySampleAndThreeEnds() =>
        Assert.Equal(1 + 5 + 3, Render<BandBar>(p => p.Add(b => b.ShortEnd, 436.0).Add(b => b.Design, 546.0).Add(b => b.LongEnd, 656.0).Add(b => b.Samples, 5)).FindAll("line").Count);

    [Theory]
    [InlineData(10.0, 20.0, 40.0, "10px", "10px")]
    [InlineData(10.0, 10.0, 0.0, "0px", "0px")]
    [InlineData(400.0, 500.0, 40.0, "32px", "8px")]
    public void ResidualBar_IsToScale(double residual, double expected, double full, string dark, string pale)
    {
        var bar = Render<ResidualBar>(p => p.Add(b => b.Residual, residual).Add(b => b.Expected, expected).Add(b => b.Full, full));

        Assert.Contains($"width:{dark}", bar.Find(".r").GetAttribute("style"), StringComparison.Ordinal);
        Assert.Contains($"width:{pale}", bar.Find(".f").GetAttribute("style"), StringComparison.Ordinal);
    }
}
