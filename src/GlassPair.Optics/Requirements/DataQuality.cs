namespace GlassPair.Optics.Requirements;

/// <summary>How well the glass that will be delivered is known before it is measured.</summary>
/// <param name="AbbeTolerance">σ_V/V: the relative Abbe tolerance of the grade ordered, such as 0.005; 0 after a melt re-solve.</param>
/// <param name="IndexPrecision">σ_n: what an index computed from the catalogue can be off from line to line.</param>
public sealed record DataQuality(double AbbeTolerance, double IndexPrecision)
{
    /// <summary>Usual supply, ±0.5 % of the Abbe number, and a catalogue formula good to 1e-5. Source: [tolerance-grades].</summary>
    public static DataQuality UsualSupply { get; } = new(0.005, 1e-5);
}
