using Bunit;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Addresses;
using GlassPair.Web.Components.Controls;
using GlassPair.Web.Tests.Glasses;

namespace GlassPair.Web.Tests.Controls;

public sealed class RequirementFormTests : BunitContext
{
    private WorkbenchState? _typed;
    private WorkbenchState? _picked;

    [Fact]
    public void EveryField_IsNamedAndExplained()
    {
        var form = Form("?f=240&n=6&space=air&from=-20&to=50");

        foreach (NumberField field in NumberField.All.Where(f => f != NumberField.AbbeTolerance))
        {
            var input = form.Find($"#field-{field.Key}");
            Assert.Single(form.FindAll($"label[for=field-{field.Key}]"));
            Assert.Contains($"field-{field.Key}-meaning", input.GetAttribute("aria-describedby"), StringComparison.Ordinal);
            Assert.NotEmpty(form.Find($"#field-{field.Key}-meaning").TextContent);
        }
    }

    [Fact]
    public void Field_Typed_ReportsTheStateWithIt()
    {
        Form("?f=240&n=6").Find("#field-f").Input("250");

        Assert.Equal("250", _typed!.TextOf(NumberField.FocalLength));
        Assert.Equal("6", _typed.TextOf(NumberField.FNumber));
    }

    [Fact]
    public void WrongText_StaysAndIsExplained()
    {
        var form = Form("?f=abc&n=6");

        Assert.Equal("abc", form.Find("#field-f").GetAttribute("value"));
        Assert.Contains("1 to 100,000 mm", form.Find("#field-f-problem").TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public void DerivedValues_StandBetweenTheInputs()
    {
        string[] derived = [.. Form("?f=240&n=6&field=1.5&design=e").FindAll("output").Select(o => o.TextContent)];

        Assert.Equal(["40.00", "±39.3", "6.28"], derived);
    }

    [Fact]
    public void Preset_Picked_FillsTheLines()
    {
        Form("?f=240&n=6").Find("#band-preset").Change("near-infrared");

        Assert.Equal(("r", "s", "t"), (_picked!.TextOf(NumberField.ShortEnd), _picked.TextOf(NumberField.Design), _picked.TextOf(NumberField.LongEnd)));
    }

    [Fact]
    public void Preset_NotOffered_IsIgnored()
    {
        Form("?f=240&n=6").Find("#band-preset").Change("x-rays");

        Assert.Null(_picked);
    }

    [Fact]
    public void OwnBand_IsSaidToBeOne() => Assert.Equal("own band", Form("?f=240&n=6&short=450").Find("#band-preset option[selected]").TextContent);

    [Fact]
    public void Presets_AllCanBeRanked() =>
        Assert.All(BandPreset.All, p => Assert.NotNull(FormReading.Of(p.In(Ranked.StateOf("?f=240&n=6")), ServedStock.Stock).Request));

    [Fact]
    public void Maker_SwitchedOff_KeepsTheOthers()
    {
        Chip(Form("?f=240&n=6"), "hoya").Change(false);

        Assert.DoesNotContain("hoya", _picked!.Makers!);
        Assert.Contains("schott", _picked.Makers!);
    }

    [Fact]
    public void Maker_LastOneSwitchedOn_LimitsNothing()
    {
        string all = string.Join(',', ServedStock.Stock.Glasses.Select(g => g.Maker).Distinct().Where(m => m != "hoya"));

        Chip(Form($"?f=240&n=6&makers={all}"), "hoya").Change(true);

        Assert.Null(_picked!.Makers);
    }

    [Fact]
    public void Supply_SwitchedOn_IsAdded()
    {
        Chip(Form("?f=240&n=6"), "discontinued").Change(true);

        Assert.Contains(Supply.Discontinued, _picked!.Supply);
    }

    [Fact]
    public void AirSpace_IsAskedForOnlyWhereThereIsOne()
    {
        Assert.Empty(Form("?f=240&n=6").FindAll("#field-air"));
        Assert.Single(Form("?f=240&n=6&space=air").FindAll("#field-air"));
    }

    [Fact]
    public void Balance_Picked_IsReported()
    {
        Form("?f=240&n=6").FindAll("input[name=balance]")[0].Change("on");

        Assert.Equal(ColorBalance.EndsUnited, _picked!.Balance);
    }

    [Fact]
    public void Grade_OfTheAddress_StaysInTheList() =>
        Assert.Equal("±0.35 %", Form("?f=240&n=6&grade=0.35").Find("#field-grade option[selected]").TextContent);

    [Fact]
    public void Glass_PutOnTheList_IsReported()
    {
        var form = Form("?f=240&n=6");

        form.Find("#include").Input("schott/N-BK7");
        form.Find("#include").KeyDown("Enter");

        Assert.Equal(["schott/N-BK7"], _picked!.Include);
    }

    [Fact]
    public void Wavelength_AsNumberOfALine_ShowsItsName()
    {
        var form = Form("?f=240&n=6&short=435.8343&long=C");

        Assert.Equal("nm, g", form.Find("#field-short-unit").TextContent);
        Assert.Equal("656.3 nm", form.Find("#field-long-unit").TextContent);
    }

    private static AngleSharp.Dom.IElement Chip(IRenderedComponent<RequirementForm> form, string name) =>
        form.FindAll("label.chip").Single(c => c.TextContent.Trim() == name).QuerySelector("input")!;

    private IRenderedComponent<RequirementForm> Form(string query)
    {
        WorkbenchState state = Ranked.StateOf(query);
        return Render<RequirementForm>(p => p
            .Add(f => f.State, state).Add(f => f.Reading, FormReading.Of(state, ServedStock.Stock))
            .Add(f => f.Makers, [.. ServedStock.Stock.Glasses.Select(g => g.Maker).Distinct()]).Add(f => f.Glasses, ServedStock.Stock.Glasses)
            .Add(f => f.Typed, s => _typed = s).Add(f => f.Picked, s => _picked = s));
    }
}
