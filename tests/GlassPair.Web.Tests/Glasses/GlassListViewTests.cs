using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Components.Glasses;

namespace GlassPair.Web.Tests.Glasses;

public sealed class GlassListViewTests
{
    private static IReadOnlyList<GlassFigures> All => GlassFigures.Of(ServedStock.Stock);

    [Theory]
    [InlineData("n-bk7", "schott/N-BK7")]
    [InlineData("nbk7", "schott/N-BK7")]
    [InlineData("schott bk7", "schott/N-BK7")]
    [InlineData("517642", "schott/N-BK7")]
    public void Of_Search_FindsByNameMakerAndCode(string search, string id)
    {
        IReadOnlyList<GlassFigures> found = GlassListView.Of(All, new GlassListState { Search = search });
        Assert.Contains(found, g => g.Glass.Id == id);
        Assert.True(found.Count < 20);
    }

    [Fact]
    public void Of_MakersAndSupply_KeepsOnlyThose()
    {
        IReadOnlyList<GlassFigures> found = GlassListView.Of(All, new GlassListState { Makers = ["hoya"], Supply = [Supply.Recommended] });
        Assert.NotEmpty(found);
        Assert.All(found, g => Assert.True(g.Glass is { Maker: "hoya", Supply: Supply.Recommended }));
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void Of_Density_SortsAndPutsTheUnknownLast(bool descending)
    {
        double?[] densities = [.. GlassListView.Of(All, new GlassListState { SortBy = "density", SortDescending = descending }).Select(g => g.Glass.DensityGramsPerCm3)];
        double[] known = [.. densities.TakeWhile(d => d is not null).Select(d => d!.Value)];
        Assert.All(densities.Skip(known.Length), d => Assert.Null(d));
        Assert.Equal(descending ? known.OrderDescending() : known.Order(), known);
        Assert.True(known.Length > 1000);
    }

    [Fact]
    public void Of_Names_CountsDigitsByValue()
    {
        ImmutableArray<string> names = [.. GlassListView.Of(All, new GlassListState { Search = "N-SF", Makers = ["schott"] }).Select(g => g.Glass.Name)];
        Assert.True(names.IndexOf("N-SF2") < names.IndexOf("N-SF10"));
    }
}
