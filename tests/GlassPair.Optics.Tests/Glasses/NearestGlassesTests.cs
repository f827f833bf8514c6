using System.Collections.Immutable;
using GlassPair.Optics.Color;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Glasses;

public sealed class NearestGlassesTests
{
    private static readonly Band s_band = Band.Even(SpectralLine.HydrogenF.Wavelength, SpectralLine.HeliumD.Wavelength, SpectralLine.HydrogenC.Wavelength, 9);

    private static readonly IndexTable s_table = IndexTable.Of(TestGlasses.All, s_band);

    [Fact]
    public void Of_AnyGlass_EqualsSortingTheWholeTableByVAndP()
    {
        foreach (GlassIndices glass in s_table.Rows.Where((_, i) => i % 97 == 0))
        {
            double Distance(GlassIndices other) => double.Hypot(
                (other.PartialDispersion / other.AbbeNumber) - (glass.PartialDispersion / glass.AbbeNumber),
                ((1.0 - other.PartialDispersion) / other.AbbeNumber) - ((1.0 - glass.PartialDispersion) / glass.AbbeNumber));
            double[] expected = [.. s_table.Rows.Where(r => r.Glass != glass.Glass).Select(Distance).Order().Take(8)];

            ImmutableArray<NearGlass> nearest = NearestGlasses.Of(glass, s_table, 8);

            Assert.All(expected.Zip(nearest), pair => Assert.Equal(pair.First, pair.Second.Distance, 1e-14));
            Assert.DoesNotContain(nearest, n => n.Glass.Glass.Id == glass.Glass.Id);
        }
    }

    [Fact]
    public void Of_GlassUnderTwoNames_FindsItsTwinFirst()
    {
        GlassIndices glass = s_table.Rows.First(r => s_table.Rows.Any(o => o.Glass.Id != r.Glass.Id && o.Glass.Formula.Equals(r.Glass.Formula)));

        NearGlass first = NearestGlasses.Of(glass, s_table, 1).Single();

        Assert.Equal(0.0, first.Distance);
        Assert.Equal(glass.Glass.Formula, first.Glass.Glass.Formula);
    }

    [Fact]
    public void Of_MoreThanThereAre_ReturnsAllOthers() =>
        Assert.Equal(s_table.Rows.Length - 1, NearestGlasses.Of(s_table.Rows[0], s_table, int.MaxValue).Length);
}
