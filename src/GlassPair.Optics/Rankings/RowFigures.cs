namespace GlassPair.Optics.Rankings;

/// <summary>Combinations that differ in their last glass only.</summary>
/// <param name="First">The first glass, by its place in <see cref="GlassColumns"/>.</param>
/// <param name="Second">The second of three, behind the first; −1 where the last glass is the second.</param>
internal readonly record struct Row(int First, int Second = -1)
{
    /// <summary>Gets the first place at which the last glass may stand: behind the others.</summary>
    public int Start => Math.Max(First, Second) + 1;

    /// <summary>Gets the whole combination.</summary>
    public Combination With(int last) => Second < 0 ? new Combination(First, last) : new Combination(First, Second, last);
}

/// <summary>The figures of a row of combinations; entry j belongs to the one whose last glass is j.</summary>
/// <param name="glasses">The glasses.</param>
/// <param name="elements">How many glasses a combination has.</param>
internal sealed class RowFigures(GlassColumns glasses, int elements)
{
    /// <summary>Gets the relative power of each element, in the order of the columns; NaN where no powers balance the glasses.</summary>
    public double[][] Powers { get; } = [.. Enumerable.Range(0, elements).Select(_ => new double[glasses.Abbe.Length])];

    /// <summary>Gets the RMS focal shift, mm.</summary>
    public double[] Rms { get; } = new double[glasses.Abbe.Length];

    /// <summary>Gets the peak-to-valley focal shift, mm.</summary>
    public double[] PeakToValley { get; } = new double[glasses.Abbe.Length];

    /// <summary>Gets the secondary spectrum, mm, with its sign.</summary>
    public double[] SecondarySpectrum { get; } = new double[glasses.Abbe.Length];

    /// <summary>Gets the RMS focal shift to be expected with the data floor, mm.</summary>
    public double[] ExpectedRms { get; } = new double[glasses.Abbe.Length];
}
