using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Components.Glasses;

namespace GlassPair.Web.Tests.Glasses;

public sealed class GlassReportTests
{
    private static readonly WavelengthRange Visible = WavelengthRange.FromNanometers(400.0, 700.0);

    [Fact]
    public void Formula_WritesEachFormWithItsSymbolsAndUnits()
    {
        SellmeierFormula sellmeier = new([new SellmeierTerm(1.25, 0.0081), new SellmeierTerm(1.5e-3, 120.0)]);
        Assert.Equal("n² − 1 = B₁λ²/(λ² − C₁) + B₂λ²/(λ² − C₂)", GlassReport.Formula(sellmeier));
        Assert.Equal([("B₁", "1.25", ""), ("C₁", "0.0081", "µm²"), ("B₂", "0.0015", ""), ("C₂", "120", "µm²")], GlassReport.Coefficients(sellmeier).Select(c => (c.Symbol, c.Value, c.Unit)));
        PowerSeriesFormula series = new(2.25, [new PowerTerm(-10, 1e-6), new PowerTerm(2, -0.01)]);
        Assert.Equal("n² = a₀ + a₂λ² + a₋₁₀λ⁻¹⁰", GlassReport.Formula(series));
        Assert.Equal([("a₀", "2.25", ""), ("a₂", "-0.01", "µm⁻²"), ("a₋₁₀", "1E-06", "µm¹⁰")], GlassReport.Coefficients(series).Select(c => (c.Symbol, c.Value, c.Unit)));
    }

    [Fact]
    public void Stated_IsComparedWithWhatTheFormulaGives()
    {
        // One term without dispersion but its own: n² − 1 = 1.25 λ²/(λ² − 0.01), by hand 1.5121 at the d line.
        Glass glass = new("lab", "A", new SellmeierFormula([new SellmeierTerm(1.25, 0.01)]), Visible) { Stated = new StatedValues(1.52, 60.0, 0.001, "512560") };
        StatedFigure[] rows = [.. GlassReport.Stated(GlassFigures.Of(glass, ServedStock.Stock))];
        Assert.Equal(["nd", "vd", "code", "ΔPg,F"], rows.Select(r => r.Name));
        double index = Math.Sqrt(1.0 + (1.25 * 0.5875618 * 0.5875618 / ((0.5875618 * 0.5875618) - 0.01)));
        Assert.Equal(("1.52", index.ToString("0.000000", System.Globalization.CultureInfo.InvariantCulture)), (rows[0].Stated, rows[0].Computed));
        Assert.StartsWith(index < 1.52 ? "+" : "−", rows[0].Difference, StringComparison.Ordinal);
        Assert.StartsWith(rows[3].Computed.StartsWith('−') ? "+" : "−", rows[3].Difference, StringComparison.Ordinal);
    }

    [Fact]
    public void Partials_OutsideTheRange_AreNotExtrapolated()
    {
        Glass glass = new("lab", "A", new SellmeierFormula([new SellmeierTerm(1.25, 0.01)]), Visible);
        Assert.Equal(["C,s", "C,t", "i,g"], GlassReport.Partials(glass).Where(p => p.Value is null).Select(p => $"{p.X},{p.Y}"));
    }

    [Fact]
    public void Transmittances_FollowTheThickness()
    {
        Glass glass = ServedStock.Stock.TryFind("schott/N-BK7", out Glass? found) ? found : throw new InvalidOperationException();
        double[] thin = [.. GlassReport.Transmittances(glass, 10.0).Select(t => t.Value)], thick = [.. GlassReport.Transmittances(glass, 20.0).Select(t => t.Value)];
        Assert.Equal(thin.Select(t => t * t), thick, (a, b) => Math.Abs(a - b) < 1e-12);    // Bouguer's law: twice the path squares it
    }
}
