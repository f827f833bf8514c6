using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>V = (n_m − 1)/(n_s − n_l): how little a glass disperses between a short and a long end. Source: [abbe-number].</summary>
public static class AbbeNumber
{
    /// <summary>Gets v_d, of the lines d, F and C; null where the glass has no index at one of them.</summary>
    public static double? TryD(Glass glass) =>
        TryOf(glass, SpectralLine.HydrogenF.Wavelength, SpectralLine.HeliumD.Wavelength, SpectralLine.HydrogenC.Wavelength);

    /// <summary>Gets v_e, of the lines e, F' and C'; null where the glass has no index at one of them.</summary>
    public static double? TryE(Glass glass) =>
        TryOf(glass, SpectralLine.CadmiumFPrime.Wavelength, SpectralLine.MercuryE.Wavelength, SpectralLine.CadmiumCPrime.Wavelength);

    /// <summary>Gets the Abbe number of a band.</summary>
    /// <exception cref="WavelengthOutOfRangeException">The glass does not cover the band.</exception>
    public static double Of(Glass glass, Band band) =>
        From(glass.IndexAt(band.ShortEnd), glass.IndexAt(band.Design), glass.IndexAt(band.LongEnd));

    /// <summary>Gets the Abbe number of three indices.</summary>
    public static double From(double shortIndex, double middleIndex, double longIndex) => (middleIndex - 1.0) / (shortIndex - longIndex);

    private static double? TryOf(Glass glass, Wavelength shortEnd, Wavelength middle, Wavelength longEnd) =>
        glass.Range.Contains(shortEnd) && glass.Range.Contains(middle) && glass.Range.Contains(longEnd)
            ? From(glass.IndexAt(shortEnd), glass.IndexAt(middle), glass.IndexAt(longEnd))
            : null;
}
