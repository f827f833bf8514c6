using Bunit;
using GlassPair.Web.Components.Controls;

namespace GlassPair.Web.Tests.Controls;

public sealed class DataTableTests : BunitContext
{
    private static readonly string[] _three = ["ant", "bee", "cow"];
    private readonly List<string> _chosen = [];
    private readonly List<string> _pinned = [];
    private readonly List<(string Key, bool Descending)> _sorted = [];

    [Fact]
    public void Row_Clicked_IsChosen()
    {
        Table(_three).FindAll("tbody tr")[1].Click();

        Assert.Equal(["bee"], _chosen);
    }

    [Fact]
    public void RowButton_Clicked_IsChosenOnce()
    {
        Table(_three).FindAll("tbody button")[2].Click();

        Assert.Equal(["cow"], _chosen);
    }

    [Theory]
    [InlineData("p", 1)]
    [InlineData("P", 1)]
    [InlineData("Enter", 0)]
    public void Key_OnRow_PinsWithPOnly(string key, int pins)
    {
        Table(_three).FindAll("tbody button")[0].KeyDown(key);

        Assert.Equal(pins, _pinned.Count);
    }

    [Fact]
    public void Key_PWithControl_IsTheBrowsersOwn()
    {
        Table(_three).FindAll("tbody button")[0].KeyDown(new Microsoft.AspNetCore.Components.Web.KeyboardEventArgs { Key = "p", CtrlKey = true });

        Assert.Empty(_pinned);
    }

    [Fact]
    public void Rows_HaveOneTabStop_TheChosenOrTheFirst()
    {
        Assert.Equal("ant", Assert.Single(Table(_three).FindAll("tbody button[tabindex='0']")).TextContent);
        Assert.Equal("cow", Assert.Single(Table(_three, current: "cow").FindAll("tbody button[tabindex='0']")).TextContent);
    }

    [Fact]
    public void Row_Current_IsMarkedForAll() => Assert.Equal("bee", Table(_three, current: "bee").Find("tr[aria-current=true] button").TextContent);

    [Fact]
    public void Heading_Clicked_SortsUpThenDown()
    {
        Table(_three).FindAll("thead button")[0].Click();
        Table(_three, sortBy: "name").FindAll("thead button")[0].Click();

        Assert.Equal([("name", false), ("name", true)], _sorted);
    }

    [Fact]
    public void Heading_SortedColumn_SaysHow() =>
        Assert.Equal(["ascending", null], Table(_three, sortBy: "name").FindAll("thead th").Select(h => h.GetAttribute("aria-sort")));

    [Fact]
    public void GroupHeading_StandsBeforeItsRow()
    {
        var table = Table(_three, headings: new() { [1] = "bee and cow tie" });

        Assert.Equal(["ant", "bee and cow tie", "bee", "cow"], table.FindAll("tbody tr").Select(r => r.FirstElementChild!.TextContent.Trim()));
        Assert.Equal(["2", "3", "4", "5"], table.FindAll("tbody tr").Select(r => r.GetAttribute("aria-rowindex")));
    }

    [Fact]
    public void Pinned_StandsOnTopAndIsNoTabStop()
    {
        var table = Table(_three, pinned: ["cow"]);

        Assert.Equal("cow", table.Find("tbody tr.pinned button").TextContent);
        Assert.Equal("-1", table.Find("tbody tr.pinned button").GetAttribute("tabindex"));
        Assert.Equal("5", table.Find("table").GetAttribute("aria-rowcount"));
    }

    [Fact]
    public void ManyRows_OnlyTheFirstAndThoseInSightAreDrawn()
    {
        string[] many = [.. Enumerable.Range(0, 5_000).Select(i => $"row {i}")];

        var table = Table(many);

        Assert.InRange(table.FindAll("tbody tr").Count, 60, 400);
        Assert.Equal("5001", table.Find("table").GetAttribute("aria-rowcount"));
    }

    [Fact]
    public void NoRows_SaysWhy() => Assert.Contains("No pair.", Table([]).Find(".empty").TextContent, StringComparison.Ordinal);

    private IRenderedComponent<DataTable<string>> Table(
        string[] items, string? current = null, string? sortBy = null, Dictionary<int, string>? headings = null, string[]? pinned = null) => Render<DataTable<string>>(p => p
        .Add(t => t.Label, "Animals").Add(t => t.Items, items).Add(t => t.RowHeader, "name").Add(t => t.KeyOf, i => i)
        .Add(t => t.Columns,
        [
            new DataColumn<string>("name", "Name", "", "What it is called.", item => builder => builder.AddContent(0, item), true, false),
            new DataColumn<string>("legs", "Legs", "count", "How many.", _ => builder => builder.AddContent(0, "4"), false, true),
        ])
        .Add(t => t.IsCurrent, i => i == current).Add(t => t.SortBy, sortBy).Add(t => t.Headings, headings ?? []).Add(t => t.Pinned, pinned ?? []).Add(t => t.Empty, "No pair.")
        .Add(t => t.Chosen, _chosen.Add).Add(t => t.PinToggled, _pinned.Add).Add(t => t.Sorted, _sorted.Add));
}
