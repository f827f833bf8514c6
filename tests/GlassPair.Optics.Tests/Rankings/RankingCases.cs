using System.Globalization;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Rankings;

/// <summary>Requests that between them reach every branch of the ranking, and subsets of the shipped catalogue to rank.</summary>
internal static class RankingCases
{
    public static Band Visible { get; } = Band.Even(
        SpectralLine.HydrogenF.Wavelength, SpectralLine.HeliumD.Wavelength, SpectralLine.HydrogenC.Wavelength, 9);

    /// <summary>Samples that miss the ends of the band, with unequal weights.</summary>
    public static Band Weighted { get; } = Band.FromSamples(
        SpectralLine.MercuryG.Wavelength,
        SpectralLine.MercuryE.Wavelength,
        SpectralLine.HydrogenC.Wavelength,
        [
            new BandSample(Wavelength.FromNanometers(450.0), 0.5),
            new BandSample(Wavelength.FromNanometers(500.0), 2.0),
            new BandSample(SpectralLine.MercuryE.Wavelength, 3.0),
            new BandSample(Wavelength.FromNanometers(610.0), 0.0),
            new BandSample(Wavelength.FromNanometers(640.0), 1.0),
        ]);

    public static Requirement Objective { get; } = new(320.0, 8.0, Visible);

    /// <summary>Gets requests by a name for the test's report.</summary>
    public static IReadOnlyDictionary<string, ShortlistRequest> All { get; } = Make();

    public static TheoryData<string> Names => [.. All.Keys];

    public static ShortlistRequest By(this Requirement requirement, RankBy rankBy, int take = 40) =>
        new(requirement, GlassLimits.None, DataQuality.UsualSupply, rankBy, take);

    /// <summary>Takes every n-th glass of the shipped catalogue.</summary>
    public static IndexTable Every(int n, Band band) => IndexTable.Of(TestGlasses.All.Where((_, i) => i % n == 0), band);

    private static Dictionary<string, ShortlistRequest> Make()
    {
        Dictionary<string, ShortlistRequest> cases = [];
        foreach (RankBy rankBy in Enum.GetValues<RankBy>())
        {
            foreach (ColorBalance balance in Enum.GetValues<ColorBalance>())
            {
                Requirement contact = new(320.0, 8.0, Visible) { Balance = balance };
                Add("contact", contact.By(rankBy));
                Add("power limit", new Requirement(320.0, 8.0, Weighted) { Balance = balance, ElementPowerLimit = 2.5 }.By(rankBy));
                Add("narrow air space", new Requirement(320.0, 8.0, Weighted) { Balance = balance, AirSpace = 1.0 }.By(rankBy));
                Add("wide air space", new Requirement(320.0, 8.0, Visible) { Balance = balance, AirSpace = 20.0, ElementPowerLimit = 3.0 }.By(rankBy));
                Add("twice a glass", contact.By(rankBy) with { PairsPerGlass = 2 });
                Add("expansion and a glass to include", contact.By(rankBy) with
                {
                    Limits = new GlassLimits
                    {
                        ExpansionDifference = 1e-6,
                        Include = GlassLimits.None.Include.Union(TestGlasses.All.Where((_, i) => i % 105 == 0).Select(g => g.Id)),
                    },
                });

                foreach (PowerSign sign in Enum.GetValues<PowerSign>())
                {
                    Add($"glasses to include as {sign}", contact.By(rankBy) with
                    {
                        Limits = new GlassLimits { Include = GlassLimits.None.Include.Union(TestGlasses.All.Where((_, i) => i % 105 == 0).Select(g => g.Id)), IncludeAs = sign },
                    });
                }

                void Add(string name, ShortlistRequest request) =>
                    cases.Add(string.Create(CultureInfo.InvariantCulture, $"{name}, {balance}, {rankBy}"), request);
            }
        }

        return cases;
    }
}
