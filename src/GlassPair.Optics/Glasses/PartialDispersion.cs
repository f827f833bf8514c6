using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>P = (n_x − n_y)/(n_s − n_l): the share of the whole dispersion that falls between two lines. Source: [partial-dispersion].</summary>
public static class PartialDispersion
{
    /// <summary>The makers' common normal line through two old reference glasses, P_g,F = 0.6438 − 0.001682 v_d. Source: [normal-line].</summary>
    public static double NormalGF(double abbeD) => 0.6438 - (0.001682 * abbeD);

    /// <summary>Gets P_g,F = (n_g − n_F)/(n_F − n_C); null where the glass has no index at one of the lines.</summary>
    public static double? TryGF(Glass glass) =>
        TryOf(glass, SpectralLine.MercuryG.Wavelength, SpectralLine.HydrogenF.Wavelength);

    /// <summary>Gets ΔP_g,F, the distance of P_g,F above the normal line; null where either cannot be had.</summary>
    public static double? TryDeltaGF(Glass glass) =>
        TryGF(glass) is { } partial && AbbeNumber.TryD(glass) is { } abbe ? partial - NormalGF(abbe) : null;

    /// <summary>Gets P_x,y = (n_x − n_y)/(n_F − n_C); null where the glass has no index at one of the lines.</summary>
    public static double? TryOf(Glass glass, Wavelength x, Wavelength y)
    {
        (Wavelength f, Wavelength c) = (SpectralLine.HydrogenF.Wavelength, SpectralLine.HydrogenC.Wavelength);
        return glass.Range.Contains(x) && glass.Range.Contains(y) && glass.Range.Contains(f) && glass.Range.Contains(c)
            ? (glass.IndexAt(x) - glass.IndexAt(y)) / (glass.IndexAt(f) - glass.IndexAt(c))
            : null;
    }

    /// <summary>Gets the partial dispersion of a band, (n_s − n_m)/(n_s − n_l).</summary>
    /// <exception cref="WavelengthOutOfRangeException">The glass does not cover the band.</exception>
    public static double Of(Glass glass, Band band) =>
        From(glass.IndexAt(band.ShortEnd), glass.IndexAt(band.Design), glass.IndexAt(band.LongEnd));

    /// <summary>Gets the partial dispersion of three indices of a band.</summary>
    public static double From(double shortIndex, double middleIndex, double longIndex) =>
        (shortIndex - middleIndex) / (shortIndex - longIndex);
}
