using CsCheck;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Addresses;
using GlassPair.Web.Components.Charts;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Tests.Addresses;

public sealed class WorkbenchAddressTests
{
    private static readonly Gen<string> _anyText = Gen.OneOf(
        Gen.String[0, NumberField.MaxLength],
        Gen.String[Gen.Char["0123456789.,-+e&=%#?/'\" ±−"], 0, NumberField.MaxLength]).Where(t => !t.Any(char.IsSurrogate));

    private static readonly Gen<string> _glass = Gen.OneOf("schott/N-BK7", "hoya/FCD10A", "sumita/K-CaFK95(M)", "own shop/glass, special 100%", "ohara/S-FPL53");

    private static readonly Gen<WorkbenchState> _state =
        from texts in Gen.Select(Gen.OneOf([.. NumberField.All]), _anyText).List[0, 8]
        from switches in Gen.Bool.Array[5]
        from makers in Gen.OneOf("hoya", "ohara", "schott").List[0, 3]
        from supply in Gen.Enum<Supply>().List[0, 5]
        from glasses in _glass.List[0, 4]
        from rankBy in Gen.Enum<RankBy>()
        from each in Gen.Int[1, ShortlistRequest.MaxTake].Nullable()
        from take in Gen.Int[1, ShortlistRequest.MaxTake]
        from columns in Gen.OneOf([.. RankingColumn.All.Select(c => c.Key)]).List[0, 6]
        from filter in Gen.String[0, WorkbenchState.MaxFilterLength].Where(t => !t.Any(char.IsSurrogate))
        select texts.Aggregate(WorkbenchState.Empty, (state, text) => state.With(text.Item1, text.Item2)) with
        {
            Balance = switches[0] ? ColorBalance.EndsUnited : ColorBalance.BandBalanced,
            AirSpaced = switches[1],
            AllowLead = switches[2],
            AllowMolding = switches[3],
            Axes = switches[4] ? MapAxes.Index : MapAxes.PartialDispersion,
            Makers = makers.Count == 3 ? null : [.. makers],
            Supply = [.. supply],
            Include = WorkbenchState.NoGlasses.Union(glasses.Take(2)),
            Exclude = WorkbenchState.NoGlasses.Union(glasses.Skip(2)),
            RankBy = rankBy,
            PairsPerGlass = each,
            Take = take,
            SortBy = columns.FirstOrDefault(),
            SortDescending = columns.Count > 0 && switches[0],
            Columns = columns.Count == 0 ? null : [.. columns.Distinct()],
            Filter = filter,
            Chosen = glasses is [var first, var second, ..] ? new PairName(first, second) : null,
            Pinned = glasses is [_, var third, var fourth, ..] ? new PairName(third, fourth) : null,
            ChosenGlass = glasses.FirstOrDefault(),
            StockId = glasses.Count > 1 ? "4f1c09ab12cd" : null,
        };

    /// <summary>Links of every format ever written, with what they must still mean. Never change a row; add new ones.</summary>
    public static TheoryData<string, string> OldLinks => new()
    {
        { "?v=1&f=240&n=6", "?v=1&f=240&n=6" },
        { "?v=1&f=240&n=6&field=1.5&short=g&long=C&from=-20&to=45&stock=f6784b8d4b27", "?v=1&f=240&n=6&field=1.5&short=g&long=C&from=-20&to=45&stock=f6784b8d4b27" },
        {
            "?v=1&f=100&n=4&short=480&design=546.1&long=644&samples=5&air=0.6&power=&grade=0.1&precision=30&expansion=3&balance=ends&space=air&makers=hoya,ohara&supply=recommended,on-request&lead=no&molding=no",
            "?v=1&f=100&n=4&short=480&design=546.1&long=644&samples=5&air=0.6&power=&grade=0.1&precision=30&expansion=3&balance=ends&space=air&makers=hoya,ohara&supply=recommended,on-request&lead=no&molding=no"
        },
        {
            "?v=1&f=100&n=4&include=schott/N-BK7&exclude=schott/F2,schott/SF2&rank=secondary&each=any&take=2000&sort=-holds&columns=expected,n1,n2&filter=hoya+FCD&pair=hoya/FCD10A,hoya/LAC14&pin=schott/N-BK7,schott/F2&glass=hoya/FCD10A&map=index",
            "?v=1&f=100&n=4&include=schott/N-BK7&exclude=schott/F2,schott/SF2&rank=secondary&each=any&take=2000&sort=-holds&columns=expected,n1,n2&filter=hoya+FCD&pair=hoya/FCD10A,hoya/LAC14&pin=schott/N-BK7,schott/F2&glass=hoya/FCD10A&map=index"
        },
    };

    [Fact]
    public void Read_WhatWasWritten_IsTheSameState() => _state.Sample(state =>
    {
        string query = WorkbenchAddress.Write(state);
        AddressReading read = WorkbenchAddress.Read(query);
        return read.Notices.IsEmpty && WorkbenchAddress.Write(read.State) == query && NumberField.All.All(f => read.State.TextOf(f) == state.TextOf(f))
            && read.State.Chosen == state.Chosen && read.State.Include.SetEquals(state.Include) && read.State.Filter == state.Filter;
    });

    [Fact]
    public void Read_AnyText_NeverThrows() => Gen.String.Sample(text =>
    {
        string query = WorkbenchAddress.Write(WorkbenchAddress.Read(text).State);
        Assert.Equal(query, WorkbenchAddress.Write(WorkbenchAddress.Read(query).State));
    });

    [Fact]
    public void Read_AnyValueOfAnyKey_NeverThrowsAndSettles() =>
        Gen.Select(Gen.OneOf("f", "makers", "supply", "include", "rank", "each", "take", "sort", "columns", "pair", "pin", "map", "stock", "v"), Gen.String).Sample((key, value) =>
        {
            string query = WorkbenchAddress.Write(WorkbenchAddress.Read($"?{key}={Uri.EscapeDataString(value)}").State);
            Assert.Equal(query, WorkbenchAddress.Write(WorkbenchAddress.Read(query).State));
        });

    [Theory, MemberData(nameof(OldLinks))]
    public void Read_OldLink_StillMeansTheSame(string link, string canonical)
    {
        AddressReading read = WorkbenchAddress.Read(link);

        Assert.Empty(read.Notices);
        Assert.False(read.IsBlank);
        Assert.Equal(canonical, WorkbenchAddress.Write(read.State));
    }

    [Fact]
    public void Write_EmptyState_IsShort() => Assert.Equal("?v=1", WorkbenchAddress.Write(WorkbenchState.Empty));

    [Theory]
    [InlineData("")]
    [InlineData("?")]
    [InlineData("?utm_source=mail")]
    public void Read_NothingOfOurs_IsBlank(string query) => Assert.True(WorkbenchAddress.Read(query).IsBlank);

    [Theory]
    [InlineData("?f=abc", "abc")]
    [InlineData("?f=", "")]
    [InlineData("?f=%00", "\0")]
    [InlineData("?f=%F0%9F%94%AD", "🔭")]
    [InlineData("?f=1,5", "1,5")]
    [InlineData("?f=NaN", "NaN")]
    [InlineData("?f=1&f=2", "1")]
    public void Read_NumberOfAnyKind_KeepsTheTextAsTyped(string query, string text) =>
        Assert.Equal(text, WorkbenchAddress.Read(query).State.TextOf(NumberField.FocalLength));

    [Theory]
    [InlineData("?f=1&f=2", "“f” 2 times; the first counts")]
    [InlineData("?price=3", "“price”, which means nothing here")]
    [InlineData("?f=240&sort=price;drop table", "“price;drop table” is no column")]
    [InlineData("?f=240&columns=expected,shoe", "“shoe” is no column")]
    [InlineData("?f=240&take=1000000", "5000 is used instead of 1000000")]
    [InlineData("?f=240&take=-1", "1 is used instead of -1")]
    [InlineData("?f=240&take=many", "“many” is no number")]
    [InlineData("?f=240&each=0", "1 is used instead of 0")]
    [InlineData("?f=240&rank=beauty", "“beauty” is no choice for “rank”")]
    [InlineData("?f=240&supply=stolen", "“stolen” is no supply state")]
    [InlineData("?f=240&pair=schott/N-BK7", "must name two glasses")]
    [InlineData("?v=2&f=240", "written by a newer GlassPair (format 2; this one reads 1)")]
    [InlineData("?v=one&f=240", "format “one” is not known")]
    public void Read_WhatIsNotUnderstood_IsSaid(string query, string words) =>
        Assert.Contains(words, Assert.Single(WorkbenchAddress.Read(query).Notices), StringComparison.Ordinal);

    [Fact]
    public void Read_VeryLongValue_IsCutAndSaid()
    {
        AddressReading read = WorkbenchAddress.Read("?f=" + new string('9', 7_000));

        Assert.Equal(NumberField.MaxLength, read.State.TextOf(NumberField.FocalLength).Length);
        Assert.Contains("cut to 40 characters", Assert.Single(read.Notices), StringComparison.Ordinal);
    }

    [Fact]
    public void Read_GlassWithCommaAndPercent_ComesBackWhole()
    {
        WorkbenchState state = WorkbenchState.Empty with { Include = WorkbenchState.NoGlasses.Add("own shop/glass, special 100%2C") };

        Assert.Equal(state.Include, WorkbenchAddress.Read(WorkbenchAddress.Write(state)).State.Include);
    }
}
