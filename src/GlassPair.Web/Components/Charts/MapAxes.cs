namespace GlassPair.Web.Components.Charts;

/// <summary>What the glass map draws against the Abbe number of the band.</summary>
public enum MapAxes
{
    /// <summary>The partial dispersion of the band: the slope of a chord is its secondary spectrum.</summary>
    PartialDispersion,

    /// <summary>The index at the design wavelength.</summary>
    Index,
}
