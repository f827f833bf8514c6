using GlassPair.Web.Components.Charts;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Tests.Charts;

public sealed class ChartNumberTests
{
    [Theory]
    [InlineData(-1.2432e-4, 2, "−1.24·10⁻⁴")]
    [InlineData(1.2432e-4, 1, "1.2·10⁻⁴")]
    [InlineData(9.996e-4, 2, "1.00·10⁻³")]
    [InlineData(9.996, 2, "1.00·10¹")]
    [InlineData(3.5, 1, "3.5")]
    [InlineData(1e-12, 0, "1·10⁻¹²")]
    [InlineData(-6.02e23, 2, "−6.02·10²³")]
    [InlineData(0.0, 2, "0.00")]
    public void PowerOfTen_AnyNumber_HasTrueMinusAndRaisedExponent(double value, int decimals, string expected) =>
        Assert.Equal(expected, FigureText.PowerOfTen(value, decimals));

    [Theory]
    [InlineData(-0.0304, "−30\u00A0µm")]
    [InlineData(0.00124, "1.2\u00A0µm")]
    [InlineData(0.0099949, "10.0\u00A0µm")]
    [InlineData(0.0099951, "10\u00A0µm")]
    [InlineData(0.38, "380\u00A0µm")]
    [InlineData(0.9996, "1.00\u00A0mm")]
    [InlineData(-12.34, "−12.3\u00A0mm")]
    [InlineData(0.00004, "0.04\u00A0µm")]
    [InlineData(-0.000001, "0.00\u00A0µm")]
    [InlineData(0.0, "0.00\u00A0µm")]
    public void ShortLength_AnyLength_IsInTheUnitThatSuitsIt(double millimeters, string expected) =>
        Assert.Equal(expected, FigureText.ShortLength(millimeters));

    [Fact]
    public void Window_PointsInsideAndLargeEnough_StaysWhereItIs()
    {
        MapWindow window = MapWindow.Around([(60.0, 0.64), (30.0, 0.66)])!;
        Assert.Same(window, window.MovedTo(MapWindow.Around([(55.0, 0.642), (32.0, 0.658)])!));
    }

    [Fact]
    public void Window_PointOutside_Moves()
    {
        MapWindow window = MapWindow.Around([(60.0, 0.64), (30.0, 0.66)])!;
        MapWindow next = MapWindow.Around([(60.0, 0.64), (20.0, 0.66)])!;
        Assert.Same(next, window.MovedTo(next));
    }

    [Fact]
    public void Window_PointsCloseTogether_MovesInButNotOntoThem()
    {
        MapWindow window = MapWindow.Around([(90.0, 0.5), (20.0, 0.7)])!;
        MapWindow near = MapWindow.Around([(50.0, 0.6), (50.0, 0.6)])!;
        Assert.Same(near, window.MovedTo(near));
        Assert.True(near.Left - near.Right >= 4.0);
    }

    [Fact]
    public void Window_NoPoints_IsNone() => Assert.Null(MapWindow.Around([]));
}
