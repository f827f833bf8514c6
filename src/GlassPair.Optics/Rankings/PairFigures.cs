namespace GlassPair.Optics.Rankings;

/// <summary>The figures of one glass with each that follows it in <see cref="PairColumns"/>; entry j belongs to the pair with glass j.</summary>
internal sealed class PairFigures(PairColumns columns)
{
    /// <summary>Gets the relative power of the glass of the row; NaN where no powers balance the pair.</summary>
    public double[] FrontPower { get; } = new double[columns.Abbe.Length];

    /// <summary>Gets the relative power of the partner; NaN where no powers balance the pair.</summary>
    public double[] RearPower { get; } = new double[columns.Abbe.Length];

    /// <summary>Gets the RMS focal shift, mm.</summary>
    public double[] Rms { get; } = new double[columns.Abbe.Length];

    /// <summary>Gets the peak-to-valley focal shift, mm.</summary>
    public double[] PeakToValley { get; } = new double[columns.Abbe.Length];

    /// <summary>Gets the secondary spectrum, mm, with its sign.</summary>
    public double[] SecondarySpectrum { get; } = new double[columns.Abbe.Length];

    /// <summary>Gets the RMS focal shift to be expected with the data floor, mm.</summary>
    public double[] ExpectedRms { get; } = new double[columns.Abbe.Length];
}
