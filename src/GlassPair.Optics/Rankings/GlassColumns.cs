using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Rankings;

/// <summary>Glasses as columns of numbers, by falling Abbe number, for the kernels that solve one or two glasses with all that follow.</summary>
/// <remarks>
/// By this order the first glass of a pair is always the front one. Behind the last glass its numbers are repeated, so that a vector
/// may read past the end.
/// </remarks>
internal sealed class GlassColumns
{
    private const int Padding = 8;

    public GlassColumns(Requirement requirement, DataQuality quality, IEnumerable<GlassIndices> glasses)
    {
        Requirement = requirement;
        Glasses = [.. glasses.OrderByDescending(g => g.AbbeNumber)];
        PowerLimit = requirement.ElementPowerLimit ?? double.PositiveInfinity;
        Space = requirement.AirSpace.GetValueOrDefault() / requirement.FocalLength;
        EndsAreSamples = requirement.Band.Samples[0].Wavelength == requirement.Band.ShortEnd && requirement.Band.Samples[^1].Wavelength == requirement.Band.LongEnd;
        Weights = [.. requirement.Band.Samples.Select(s => s.Weight)];
        Abbe = Column(g => g.AbbeNumber);
        ShortChange = Column(g => g.ShortChange);
        LongChange = Column(g => g.LongChange);
        Floor = Column(g => ThinFloor.Of(g, requirement.Band, quality));
        Expansion = Column(g => g.Glass.ExpansionPerKelvin ?? double.NaN);
        double[][] deviations = [.. Glasses.Select(g => requirement.Band.DeviationsOf(g.Changes.AsSpan()))];
        (Changes, Deviations) = (new double[Weights.Length][], new double[Weights.Length][]);
        Variance = new double[Abbe.Length];
        for (int k = 0; k < Weights.Length; k++)
        {
            Changes[k] = Column(j => Glasses[j].Changes[k]);
            Deviations[k] = Column(j => deviations[j][k]);
            for (int j = 0; j < Variance.Length; j++)
            {
                Variance[j] += Deviations[k][j] * Deviations[k][j];
            }
        }
    }

    /// <summary>Gets what is to be solved.</summary>
    public Requirement Requirement { get; }

    /// <summary>Gets the glasses by falling Abbe number; equal ones stay in the order they came.</summary>
    public GlassIndices[] Glasses { get; }

    /// <summary>Gets how many glasses there are.</summary>
    public int Count => Glasses.Length;

    /// <summary>Gets the largest |φᵢ|/Φ allowed; infinite where any may be.</summary>
    public double PowerLimit { get; }

    /// <summary>Gets δ, the air space in units of the focal length; 0 in contact.</summary>
    public double Space { get; }

    /// <summary>Gets whether the first and the last sample stand at the ends of the band, whose figures are then theirs.</summary>
    public bool EndsAreSamples { get; }

    /// <summary>Gets the weight of each sample.</summary>
    public double[] Weights { get; }

    /// <summary>Gets the Abbe numbers.</summary>
    public double[] Abbe { get; }

    /// <summary>Gets t at the short end.</summary>
    public double[] ShortChange { get; }

    /// <summary>Gets t at the long end.</summary>
    public double[] LongChange { get; }

    /// <summary>Gets t by sample, then glass.</summary>
    public double[][] Changes { get; }

    /// <summary>Gets √w (t − t̄) by sample, then glass, see <see cref="Spectrum.Band.DeviationsOf"/>.</summary>
    public double[][] Deviations { get; }

    /// <summary>Gets the weighted variance of t over the samples.</summary>
    public double[] Variance { get; }

    /// <summary>Gets what an element of unit power adds to the variance of the focus, see <see cref="ThinFloor"/>.</summary>
    public double[] Floor { get; }

    /// <summary>Gets the linear expansion per kelvin; NaN where unknown.</summary>
    public double[] Expansion { get; }

    private double[] Column(Func<GlassIndices, double> value) => Column(j => value(Glasses[j]));

    private double[] Column(Func<int, double> value)
    {
        double[] column = new double[Count + Padding];
        for (int j = 0; j < Count; j++)
        {
            column[j] = value(j);
        }

        if (Count > 0)
        {
            Array.Fill(column, column[Count - 1], Count, Padding);
        }

        return column;
    }
}
