using Bunit;
using GlassPair.Web.Components.Controls;
using GlassPair.Web.Tests.Glasses;
using Microsoft.AspNetCore.Components.Web;

namespace GlassPair.Web.Tests.Controls;

public sealed class GlassPickerTests : BunitContext
{
    private readonly List<string> _added = [];
    private readonly List<string> _removed = [];

    [Fact]
    public void Type_PartOfAName_OffersTheClosestFirst()
    {
        var picker = Picker();

        picker.Find("input").Input("n-bk7");

        Assert.Equal("N-BK7", picker.Find("[role=option] .g").TextContent);
        Assert.Equal("true", picker.Find("input").GetAttribute("aria-expanded"));
        Assert.Equal(picker.Find("[aria-selected=true]").Id, picker.Find("input").GetAttribute("aria-activedescendant"));
    }

    [Fact]
    public void Type_MakerAndName_NarrowsToBoth()
    {
        var picker = Picker();

        picker.Find("input").Input("hoya FCD1");

        Assert.All(picker.FindAll("[role=option] .mk"), m => Assert.Equal("hoya", m.TextContent));
    }

    [Fact]
    public void Enter_AfterArrowDown_AddsTheSecond()
    {
        var picker = Picker();
        picker.Find("input").Input("fcd1");
        string second = picker.FindAll("[role=option]")[1].TextContent;

        picker.Find("input").KeyDown("ArrowDown");
        picker.Find("input").KeyDown("Enter");

        Assert.EndsWith(Assert.Single(_added).Split('/')[1], second.Replace("hoya", "", StringComparison.Ordinal), StringComparison.Ordinal);
        Assert.Equal("", picker.Find("input").GetAttribute("value"));
        Assert.Empty(picker.FindAll("[role=option]"));
    }

    [Fact]
    public void ArrowUp_FromTheFirst_GoesToTheLast()
    {
        var picker = Picker();
        picker.Find("input").Input("f");

        picker.Find("input").KeyDown("ArrowUp");

        Assert.Equal("true", picker.FindAll("[role=option]")[^1].GetAttribute("aria-selected"));
    }

    [Fact]
    public void Escape_ClosesTheList()
    {
        var picker = Picker();
        picker.Find("input").Input("bk7");

        picker.Find("input").KeyDown("Escape");

        Assert.Equal("false", picker.Find("input").GetAttribute("aria-expanded"));
    }

    [Fact]
    public void Enter_WithNothingOffered_AddsNothing()
    {
        var picker = Picker();
        picker.Find("input").Input("no such glass");

        picker.Find("input").KeyDown(new KeyboardEventArgs { Key = "Enter" });

        Assert.Empty(_added);
    }

    [Fact]
    public void Option_Pressed_IsAdded()
    {
        var picker = Picker();
        picker.Find("input").Input("schott/F2");

        picker.Find("[role=option]").MouseDown();

        Assert.Equal(["schott/F2"], _added);
    }

    [Fact]
    public void Chip_Pressed_TakesTheGlassOff()
    {
        var picker = Picker("schott/F2", "hoya/FCD1");

        picker.FindAll("button").Single(b => b.TextContent.Contains("hoya/FCD1", StringComparison.Ordinal)).Click();

        Assert.Equal(["hoya/FCD1"], _removed);
    }

    [Fact]
    public void Type_GlassAlreadyPicked_IsNotOfferedAgain()
    {
        var picker = Picker("schott/F2");

        picker.Find("input").Input("schott/F2");

        Assert.DoesNotContain(picker.FindAll("[role=option] .g"), g => g.TextContent == "F2");
    }

    private IRenderedComponent<GlassPicker> Picker(params string[] picked) => Render<GlassPicker>(p => p
        .Add(c => c.Id, "include").Add(c => c.Label, "Pairs must hold").Add(c => c.Glasses, ServedStock.Stock.Glasses).Add(c => c.Picked, picked)
        .Add(c => c.Added, _added.Add).Add(c => c.Removed, _removed.Add));
}
