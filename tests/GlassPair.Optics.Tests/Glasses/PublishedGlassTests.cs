using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Glasses;

public sealed class PublishedGlassTests
{
    public static TheoryData<PublishedRow> Indices => Published.Theory("indices.csv");

    public static TheoryData<PublishedRow> AbbeNumbers => Published.Theory("abbe-numbers.csv");

    public static TheoryData<PublishedRow> PartialDispersions => Published.Theory("partial-dispersions.csv");

    public static TheoryData<PublishedRow> Deviations => Published.Theory("normal-line-deviations.csv");

    [Theory, MemberData(nameof(Indices))]
    public void IndexAt_PublishedIndex_Agrees(PublishedRow row) =>
        row.AssertPrints("index", TestGlasses.Named(row["glass"]).IndexAt(Wavelength.FromNanometers(row.Number("nanometers"))));

    [Theory, MemberData(nameof(AbbeNumbers))]
    public void AbbeNumber_PublishedValue_Agrees(PublishedRow row)
    {
        Glass glass = TestGlasses.Named(row["glass"]);
        row.AssertPrints("abbe", (row["line"] == "d" ? AbbeNumber.TryD(glass) : AbbeNumber.TryE(glass))!.Value);
    }

    [Theory, MemberData(nameof(PartialDispersions))]
    public void PartialDispersion_PublishedRatio_Agrees(PublishedRow row) =>
        row.AssertPrints("ratio", RatioOf(TestGlasses.Named(row["glass"]), row["from"], row["to"]));

    [Theory, MemberData(nameof(Deviations))]
    public void PartialDispersion_PublishedDeviationFromTheNormalLine_Agrees(PublishedRow row)
    {
        Glass glass = TestGlasses.Named(row["glass"]);
        PublishedRow line = NormalLine(row["from"], row["to"]);
        row.AssertPrints(
            "deviation",
            RatioOf(glass, row["from"], row["to"]) - line.Number("constant") - (line.Number("slope") * AbbeNumber.TryD(glass)!.Value));
    }

    [Fact]
    public void NormalGF_PublishedLine_Agrees()
    {
        PublishedRow line = NormalLine("g", "F");

        line.AssertPrints("constant", PartialDispersion.NormalGF(0.0));
        line.AssertPrints("slope", PartialDispersion.NormalGF(1.0) - PartialDispersion.NormalGF(0.0));
    }

    [Fact]
    public void TryGF_BorosilicateCrown_IsTheRatioOfTheLines()
    {
        Glass glass = TestGlasses.Named("schott/N-BK7");

        Assert.Equal(RatioOf(glass, "g", "F"), PartialDispersion.TryGF(glass)!.Value, 1e-15);
        Assert.Equal(
            PartialDispersion.TryGF(glass)!.Value - PartialDispersion.NormalGF(AbbeNumber.TryD(glass)!.Value),
            PartialDispersion.TryDeltaGF(glass)!.Value,
            1e-15);
    }

    private static PublishedRow NormalLine(string from, string to) =>
        Published.Rows("normal-lines.csv").Single(r => r["from"] == from && r["to"] == to);

    private static double RatioOf(Glass glass, string from, string to) =>
        (glass.IndexAt(from) - glass.IndexAt(to)) / (glass.IndexAt("F") - glass.IndexAt("C"));
}
