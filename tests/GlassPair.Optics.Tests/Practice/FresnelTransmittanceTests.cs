using CsCheck;
using GlassPair.Optics.Practice;

namespace GlassPair.Optics.Tests.Practice;

public sealed class FresnelTransmittanceTests
{
    [Fact]
    public void OfSurface_AirToGlass_LosesFourPercent() =>
        Assert.Equal(0.04, 1.0 - FresnelTransmittance.OfSurface(1.0, 1.5), 1e-15); // n = 1.5: any textbook, such as Hecht, Optics

    [Fact]
    public void OfPlate_AnyIndex_IsTheSumOfAllReflectionsToAndFro() => Law.Holds(Gen.Double[1.0, 4.0], index =>
    {
        // T² (1 + R² + R⁴ + …), summed until nothing is added
        double surface = FresnelTransmittance.OfSurface(1.0, index);
        double sum = 0.0;
        for (double part = surface * surface; sum + part > sum; part *= (1.0 - surface) * (1.0 - surface))
        {
            sum += part;
        }

        Assert.Equal(sum, FresnelTransmittance.OfPlate(index), 1e-12);
        Assert.Equal(surface, FresnelTransmittance.OfSurface(index, 1.0), 1e-15);
    });

    [Fact]
    public void OfSurface_EqualIndices_LosesNothing() => Assert.Equal(1.0, FresnelTransmittance.OfSurface(1.62, 1.62));
}
