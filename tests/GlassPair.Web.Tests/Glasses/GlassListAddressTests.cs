using System.Collections.Immutable;
using CsCheck;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Components.Glasses;

namespace GlassPair.Web.Tests.Glasses;

public sealed class GlassListAddressTests
{
    private static readonly Gen<GlassListState> States =
        from search in Gen.String[0, GlassListState.MaxSearchLength]
        from makers in Gen.String[1, 20].Array[0, 5].Null()
        from supply in Gen.Enum<Supply>().Array[0, 5].Null()
        from sort in Gen.Int[-1, GlassColumn.All.Length - 1].Select(i => i < 0 ? null : GlassColumn.All[i].Key)
        from down in Gen.Bool
        from map in Gen.Enum<GlassMapHeight>()
        from chosen in Gen.String[1, 60].Null()
        select new GlassListState
        {
            Search = search,
            Makers = makers is null ? null : ImmutableSortedSet.CreateRange(StringComparer.OrdinalIgnoreCase, makers),
            Supply = supply is null ? null : [.. supply],
            SortBy = sort,
            SortDescending = down && sort is not null,
            Map = map,
            Chosen = chosen,
        };

    [Fact]
    public void Read_WhatWasWritten_GivesTheSameState() => States.Sample(state =>
    {
        (GlassListState read, ImmutableArray<string> notices) = GlassListAddress.Read(GlassListAddress.Write(state));
        return notices.IsEmpty && GlassListAddress.Write(read) == GlassListAddress.Write(state)
            && read.Search == state.Search && read.SortBy == state.SortBy && read.Map == state.Map && read.Chosen == state.Chosen
            && (read.Makers ?? []).SetEquals(state.Makers ?? []) && (read.Makers is null) == (state.Makers is null)
            && (read.Supply ?? []).SetEquals(state.Supply ?? []) && (read.Supply is null) == (state.Supply is null);
    });

    [Fact]
    public void Read_AnyText_GivesAListThatCanBeShown() => Gen.String.Sample(query =>
    {
        GlassListState state = GlassListAddress.Read(query).State;
        GlassListView.Of(GlassFigures.Of(ServedStock.Stock), state);
        return true;
    }, iter: 200);

    [Theory]
    [InlineData("?v=1&find=bk7&makers=hoya,ohara&supply=recommended&sort=-vd&map=partial&glass=schott/N-BK7")]
    [InlineData("?v=1&supply=on-request,discontinued")]
    [InlineData("")]
    public void Write_OfALinkOfFormat1_GivesThatLink(string link) =>
        Assert.Equal(link, GlassListAddress.Write(GlassListAddress.Read(link).State));

    [Theory]
    [InlineData("?sort=price;drop table", "no column to sort by")]
    [InlineData("?supply=soon", "no supply state")]
    [InlineData("?map=vega", "no choice for “map”")]
    [InlineData("?find=a&find=b", "2 times; the first counts")]
    [InlineData("?colour=red", "means nothing here")]
    [InlineData("?v=2", "written by a newer GlassPair")]
    [InlineData("?v=one", "not known")]
    public void Read_WhatMeansNothing_SaysSo(string link, string sentence) =>
        Assert.Contains(GlassListAddress.Read(link).Notices, n => n.Contains(sentence, StringComparison.Ordinal));
}
