using CsCheck;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Color;

/// <summary>Glasses of the catalogue, a band that they cover, and a focal length: what the laws of thin lenses are tried on.</summary>
internal sealed record ThinCase(Glass A, Glass B, Glass C, Band Band, double FocalLength, double Share)
{
    private static readonly Band[] s_bands =
    [
        Band.Even(SpectralLine.HydrogenF.Wavelength, SpectralLine.HeliumD.Wavelength, SpectralLine.HydrogenC.Wavelength, 9),
        Band.Even(SpectralLine.CadmiumFPrime.Wavelength, SpectralLine.MercuryE.Wavelength, SpectralLine.CadmiumCPrime.Wavelength, 3),
        Band.Even(SpectralLine.MercuryG.Wavelength, SpectralLine.MercuryE.Wavelength, SpectralLine.HydrogenC.Wavelength, 41),
        Band.FromSamples(
            SpectralLine.HydrogenC.Wavelength, SpectralLine.CesiumS.Wavelength, SpectralLine.MercuryT.Wavelength,
            [new(SpectralLine.HydrogenC.Wavelength, 1), new(SpectralLine.CesiumS.Wavelength, 5), new(Wavelength.FromNanometers(900), 0), new(SpectralLine.MercuryT.Wavelength, 2)]),
    ];

    private static readonly Glass[] s_glasses = [.. TestGlasses.All.Where(g => s_bands.All(g.Covers))];

    /// <summary>Three glasses whose Abbe numbers over the band differ by a tenth at least, A's the largest.</summary>
    public static Gen<ThinCase> Any { get; } = Gen.Select(
            Gen.Int[0, s_glasses.Length - 1], Gen.Int[0, s_glasses.Length - 1], Gen.Int[0, s_glasses.Length - 1],
            Gen.Int[0, s_bands.Length - 1], Gen.Double[5.0, 5000.0], Gen.Double[0.01, 0.99])
        .Select(t =>
        {
            Band band = s_bands[t.Item4];
            Glass[] ordered = [.. new[] { t.Item1, t.Item2, t.Item3 }.Select(i => s_glasses[i]).OrderByDescending(g => AbbeNumber.Of(g, band))];
            return new ThinCase(ordered[0], ordered[1], ordered[2], band, t.Item5, t.Item6);
        })
        .Where(c => AbbeNumber.Of(c.A, c.Band) > 1.1 * AbbeNumber.Of(c.B, c.Band) && AbbeNumber.Of(c.B, c.Band) > 1.1 * AbbeNumber.Of(c.C, c.Band));

    public GlassIndices Crown => GlassIndices.Of(A, Band);

    public GlassIndices Middle => GlassIndices.Of(B, Band);

    public GlassIndices Flint => GlassIndices.Of(C, Band);

    public Requirement Requirement(ColorBalance balance = ColorBalance.BandBalanced, double? airSpace = null) =>
        new(FocalLength, 8.0, Band) { Balance = balance, AirSpace = airSpace };

    /// <summary>An air space at which crown and flint can be balanced: a share of the largest.</summary>
    public double AirSpace => Share * 0.99 * ThinPair.LargestAirSpace(FocalLength, Crown.AbbeNumber, Flint.AbbeNumber);

    public override string ToString() => FormattableString.Invariant($"{A.Id}, {B.Id}, {C.Id}, {Band.Range}, f {FocalLength}, share {Share}");

    /// <summary>Weighted variance over the samples of Σ wᵢ tᵢ, the relative change of the power that focuses.</summary>
    public double VarianceOf(params (double Weight, GlassIndices Glass)[] elements)
    {
        double[] changes = [.. Band.Samples.Select((_, i) => elements.Sum(e => e.Weight * e.Glass.Changes[i]))];
        double mean = Band.Samples.Select((s, i) => s.Weight * changes[i]).Sum();
        return Band.Samples.Select((s, i) => s.Weight * (changes[i] - mean) * (changes[i] - mean)).Sum();
    }
}
