using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Color;

/// <summary>A glass's indices over one band, in the form that the color of thin lenses needs.</summary>
/// <remarks>
/// With m the design wavelength, tᵢ = (n(λᵢ) − n_m)/(n_m − 1) is the relative change of an element's power at sample i:
/// its power there is φ (1 + tᵢ). Working with t, not with n, loses nothing to cancellation.
/// </remarks>
public sealed class GlassIndices
{
    private GlassIndices(Glass glass, double designIndex, double shortIndex, double longIndex, ImmutableArray<double> changes)
    {
        (Glass, DesignIndex, Changes) = (glass, designIndex, changes);
        AbbeNumber = Glasses.AbbeNumber.From(shortIndex, designIndex, longIndex);
        PartialDispersion = Glasses.PartialDispersion.From(shortIndex, designIndex, longIndex);
        ShortChange = (shortIndex - designIndex) / (designIndex - 1.0);
        LongChange = (longIndex - designIndex) / (designIndex - 1.0);
    }

    /// <summary>Gets the glass.</summary>
    public Glass Glass { get; }

    /// <summary>Gets the index at the design wavelength.</summary>
    public double DesignIndex { get; }

    /// <summary>Gets the Abbe number of the band.</summary>
    public double AbbeNumber { get; }

    /// <summary>Gets the partial dispersion of the band.</summary>
    public double PartialDispersion { get; }

    /// <summary>Gets t at the short end.</summary>
    public double ShortChange { get; }

    /// <summary>Gets t at the long end.</summary>
    public double LongChange { get; }

    /// <summary>Gets t at each sample of the band.</summary>
    public ImmutableArray<double> Changes { get; }

    /// <summary>Evaluates a glass over a band.</summary>
    /// <exception cref="WavelengthOutOfRangeException">The glass does not cover the band.</exception>
    public static GlassIndices Of(Glass glass, Band band)
    {
        double design = glass.IndexAt(band.Design);
        return new GlassIndices(
            glass,
            design,
            glass.IndexAt(band.ShortEnd),
            glass.IndexAt(band.LongEnd),
            [.. band.Samples.Select(s => (glass.IndexAt(s.Wavelength) - design) / (design - 1.0))]);
    }

    /// <summary>Gets t at any wavelength.</summary>
    /// <exception cref="WavelengthOutOfRangeException">The glass has no index there.</exception>
    public double ChangeAt(Wavelength wavelength) => (Glass.IndexAt(wavelength) - DesignIndex) / (DesignIndex - 1.0);
}
