using GlassPair.Optics.Glasses;

namespace GlassPair.Web.Api;

/// <summary>A dispersion formula fitted to measured indices, and how well it fits.</summary>
public sealed record FitJson
{
    private readonly FormulaJson _formula;

    /// <summary>Writes a fit.</summary>
    public FitJson(DispersionFit fit)
    {
        _formula = new FormulaJson(fit.Formula);
        RangeNm = Problems.RangeNm(fit.Range);
        RmsResidual = fit.RmsResidual;
        WorstResidual = fit.WorstResidual;
        WorstNm = fit.Worst.Wavelength.Nanometers;
        Nm = [.. fit.Measured.Select(m => m.Wavelength.Nanometers)];
        Residuals = [.. fit.Residuals];
        LeftOut = [.. fit.LeftOut.Select(l => new LeftOutJson(l.Measured.Wavelength.Nanometers, l.Measured.Index, l.Residual, l.Reason))];
        Warnings = [.. fit.Warnings];
    }

    /// <summary>Gets the form of the formula.</summary>
    public DispersionForm Form => _formula.Form;

    /// <summary>Gets the coefficients, wavelengths in micrometers: B₁, C₁, B₂, C₂, … of the Sellmeier form; a₀, then one for each of <c>exponents</c> of the power series.</summary>
    public double[] Coefficients => _formula.Coefficients;

    /// <summary>Gets the exponents of the power series; null for the Sellmeier form.</summary>
    public int[]? Exponents => _formula.Exponents;

    /// <summary>Gets the shortest and longest measured wavelength, nm: the range for which the fit holds.</summary>
    public double[] RangeNm { get; }

    /// <summary>Gets the root mean square of the residuals.</summary>
    public double RmsResidual { get; }

    /// <summary>Gets the residual of largest size, with its sign.</summary>
    public double WorstResidual { get; }

    /// <summary>Gets the wavelength of the residual of largest size, nm.</summary>
    public double WorstNm { get; }

    /// <summary>Gets the wavelengths of the residuals, nm, rising.</summary>
    public double[] Nm { get; }

    /// <summary>Gets measured minus fitted index at each wavelength.</summary>
    public double[] Residuals { get; }

    /// <summary>Gets indices that were left out, with the reason.</summary>
    public LeftOutJson[] LeftOut { get; }

    /// <summary>Gets what a user should know before trusting the fit.</summary>
    public string[] Warnings { get; }
}

/// <summary>A measured index that a fit left out.</summary>
/// <param name="Nm">The wavelength, nm.</param>
/// <param name="Index">The index as given.</param>
/// <param name="Residual">The index as given minus that of the formula.</param>
/// <param name="Reason">Why it was left out.</param>
public sealed record LeftOutJson(double Nm, double Index, double Residual, string Reason);

/// <summary>A dispersion formula by its coefficients.</summary>
internal sealed record FormulaJson
{
    /// <summary>Writes a formula.</summary>
    public FormulaJson(DispersionFormula formula)
    {
        Form = formula is SellmeierFormula ? DispersionForm.Sellmeier : DispersionForm.PowerSeries;
        Coefficients = [.. formula.Coefficients];
        Exponents = (formula as PowerSeriesFormula)?.Terms.Select(t => t.Exponent).ToArray();
    }

    /// <summary>Gets the form.</summary>
    public DispersionForm Form { get; }

    /// <summary>Gets the coefficients.</summary>
    public double[] Coefficients { get; }

    /// <summary>Gets the exponents of the power series; null for the Sellmeier form.</summary>
    public int[]? Exponents { get; }
}
