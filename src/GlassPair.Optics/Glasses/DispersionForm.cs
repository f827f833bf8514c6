namespace GlassPair.Optics.Glasses;

/// <summary>The form of a dispersion formula.</summary>
public enum DispersionForm
{
    /// <summary><see cref="SellmeierFormula"/>: 1 to 6 terms of two coefficients each.</summary>
    Sellmeier,

    /// <summary><see cref="PowerSeriesFormula"/>: a constant and 1 to 8 terms of one coefficient each.</summary>
    PowerSeries,
}
