using GlassPair.Optics.Requirements;

namespace GlassPair.Optics.Color;

/// <summary>Where, on the map of partial dispersion over Abbe number, the partners of one glass must lie.</summary>
/// <remarks>
/// The wedge opens as the depth of focus allows: with the ends of the band united, the focal shift from end to middle stays within
/// ±2 λ N² of one focus where the secondary spectrum is at most 4 λ N². Its near edge is set by the limit on element power. It is a guide
/// drawn before any pair is solved; the band balance shares the shift out better than united ends do. Sources: [thin-achromat],
/// [air-spaced-achromat], [depth-of-focus].
/// </remarks>
public sealed class PartnerWedge
{
    private readonly Requirement _requirement;
    private readonly double _space;
    private readonly double _powerLimit;

    private PartnerWedge(Requirement requirement, GlassIndices glass)
    {
        (_requirement, Glass) = (requirement, glass);
        _space = requirement.AirSpace.GetValueOrDefault() / requirement.FocalLength;
        _powerLimit = requirement.ElementPowerLimit ?? ThinSolution.LargestPower;
        double ratio = LargestAbbeRatio();
        NegativePartnersBelow = glass.AbbeNumber * ratio;
        PositivePartnersAbove = ratio > 0.0 ? glass.AbbeNumber / ratio : double.PositiveInfinity;
    }

    /// <summary>Gets the glass whose partners are sought.</summary>
    public GlassIndices Glass { get; }

    /// <summary>Gets the largest Abbe number of a negative partner; 0 where none can be.</summary>
    public double NegativePartnersBelow { get; }

    /// <summary>Gets the smallest Abbe number of a positive partner; infinite where none can be.</summary>
    public double PositivePartnersAbove { get; }

    /// <summary>Gets the steepest chord whose secondary spectrum the depth of focus allows, for elements in contact: 4 λ N²/f, without unit.</summary>
    public double SteepestSlope => 2.0 * _requirement.DepthOfFocus / _requirement.FocalLength;

    /// <summary>Makes the wedge of a glass.</summary>
    public static PartnerWedge Of(Requirement requirement, GlassIndices glass) => new(requirement, glass);

    /// <summary>Gets by how much a partner's partial dispersion may differ from the glass's, either way; null where no partner may stand.</summary>
    /// <param name="abbeNumber">The partner's Abbe number over the band.</param>
    /// <remarks>4 λ N²/f · V₁/p₁ with the positive glass as 1; in contact V₁/p₁ = V₁ − V₂, so the borders are straight.</remarks>
    public double? HalfWidthAt(double abbeNumber)
    {
        if (!(abbeNumber > 0.0 && (abbeNumber <= NegativePartnersBelow || abbeNumber >= PositivePartnersAbove)))
        {
            return null;
        }

        (double positive, double negative) = abbeNumber > Glass.AbbeNumber ? (abbeNumber, Glass.AbbeNumber) : (Glass.AbbeNumber, abbeNumber);
        return ThinPair.EndsUnited(positive, negative, _space) is { } power ? SteepestSlope * positive / power : null;
    }

    /// <summary>
    /// The largest V₂/V₁ that the power limit and the air space leave: (1 − 1/p)(1 − δ p) at the largest p₁ for which |p₂| = (p − 1)/(1 − δ p)
    /// is within the limit too, and never past p = 1/√δ, where the two solutions meet.
    /// </summary>
    private double LargestAbbeRatio()
    {
        double power = Math.Min(_powerLimit, (_powerLimit + 1.0) / (1.0 + (_space * _powerLimit)));
        if (_space > 0.0)
        {
            power = Math.Min(power, 1.0 / Math.Sqrt(_space));
        }

        return Math.Max(0.0, (1.0 - (1.0 / power)) * (1.0 - (_space * power)));
    }
}
