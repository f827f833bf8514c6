using GlassPair.Optics.Lenses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Lenses;

public sealed class RayTraceTests
{
    private static readonly Wavelength s_light = SpectralLine.HeliumD.Wavelength;

    // W. J. Smith, Modern Optical Engineering, section 10.4, example B: printed with six decimals, the last ones of the second surface rounded on the way.
    [Fact]
    public void Through_SmithsSkewRay_MatchesPrintedIntersections()
    {
        var lens = new Prescription([Surface.FromRadius(50.0, 15.0, Media.OfIndex(1.5)), Surface.FromRadius(-50.0, 0.0, null)], objectDistance: 200.0);
        TracedRay traced = RayTrace.Through(lens.At(s_light), new Ray(0.0, 20.0, -200.0, 0.1, -0.1, Math.Sqrt(0.98), 0.0));
        Assert.True(traced.Passed);
        Assert.Equal(20.116291, traced.Ray.X, 4e-6);
        Assert.Equal(-1.046031, traced.Ray.Y, 2e-6);
        Assert.Equal(-4.237125, traced.Ray.Z, 4e-6);
        Assert.Equal(-0.3778396, traced.Ray.L, 1e-6);
        Assert.Equal(-0.0797745, traced.Ray.M, 1e-6);
        Assert.Equal(0.922428, traced.Ray.N, 1e-6);
    }

    // R. Kingslake and R. B. Johnson, Lens Design Fundamentals, chapter 2: a cemented doublet; prescription and values from memory.
    [Fact]
    public void Through_KingslakesDoublet_MatchesFocalLengthBackFocusAndMarginalIntercept()
    {
        MonochromaticLens lens = new Prescription(
            [Surface.FromRadius(7.3895, 1.05, Media.OfIndex(1.517)), Surface.FromRadius(-5.1784, 0.40, Media.OfIndex(1.649)), Surface.FromRadius(-16.2225, 0.0, null)]).At(s_light);
        FirstOrder first = FirstOrder.Of(lens);
        Assert.Equal(12.0, first.FocalLength, 1e-4);
        Assert.Equal(11.285857, first.BackFocus, 2e-4);
        TracedRay marginal = RayTrace.Through(lens, PupilRay.At(lens, 0.0, 2.0, 0.0, 0.0, 1.0));
        Assert.Equal(11.2939, marginal.Ray.Z - (marginal.Ray.Y * marginal.Ray.N / marginal.Ray.M), 1e-4);
        SeidelSums sums = SeidelSums.Of(lens, 0.05, 1e-3);
        double longitudinal = ExactCrossing(lens, 0.05) - first.BackFocus;
        double slope = 0.05 / 12.0;
        double thirdOrder = -sums.Total.Spherical / (2.0 * slope * slope);
        Assert.Equal(thirdOrder, longitudinal, 1e-3 * Math.Abs(thirdOrder)); // the fifth order is that small at f/120
    }

    private static double ExactCrossing(MonochromaticLens lens, double height)
    {
        TracedRay ray = RayTrace.Through(lens, PupilRay.At(lens, 0.0, height, 0.0, 0.0, 1.0));
        return ray.Ray.Z - (ray.Ray.Y * ray.Ray.N / ray.Ray.M);
    }
}
