using System.Collections.Immutable;
using GlassPair.Optics.Color;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;
using static GlassPair.Web.Figures.FigureText;

namespace GlassPair.Web.Figures;

/// <summary>The numbers of a pair, each with its formula and the inputs used.</summary>
public static class PairFigures
{
    /// <summary>Gets the numbers in the order in which they matter.</summary>
    public static ImmutableArray<Figure> Of(RankedPair pair, DataQuality quality)
    {
        ThinSolution solution = pair.Solution;
        Requirement requirement = solution.Requirement;
        Band band = requirement.Band;
        int digits = MicrometerDecimals(requirement);
        string n = "f/" + Plain(requirement.FNumber);
        (string p, string m) = (pair.Positive.Glass.Name, pair.Negative.Glass.Name);
        string samples = $"{band.Samples.Length} samples from {band.ShortEnd} to {band.LongEnd}, λₘ = {band.Design}";
        string both = $"{p}, {m}";
        return
        [
            Make(FigureExplanation.Residual, Um(solution.RmsFocalShift), "µm RMS", $"{samples}; f = {Plain(requirement.FocalLength)} mm"),
            Make(FigureExplanation.Floor, Um(pair.DataFloor), "µm RMS", $"σV/V = {Plain(quality.AbbeTolerance * 100)} %, σn = {Plain(quality.IndexPrecision * 1e6)}·10⁻⁶; φ/Φ = {WithSign(solution.RelativePowers[0], 3)}, {WithSign(solution.RelativePowers[1], 3)}"),
            Make(FigureExplanation.Expected, Um(pair.Expected), "µm RMS", $"r = {Um(solution.RmsFocalShift)} µm, F = {Um(pair.DataFloor)} µm"),
            Make(FigureExplanation.Range, Um(pair.PeakToValley), "µm", samples),
            Make(FigureExplanation.HoldsTo, FNumber(pair.ColorLimitedFNumber), "", $"peak to valley {Um(pair.PeakToValley)} µm, λₘ = {band.Design}; required {n}"),
            Make(FigureExplanation.Waves, Fixed(solution.ColorWavefrontWaves, 3), $"λ at {band.Design}", $"r = {Um(solution.RmsFocalShift)} µm, N = {Plain(requirement.FNumber)}, λₘ = {band.Design}"),
            Make(FigureExplanation.Secondary, SignedUm(solution.SecondarySpectrum), "µm", $"shift of the ends {SignedUm(solution.ShortShift)} and {SignedUm(solution.LongShift)} µm; P = {Fixed(pair.Positive.PartialDispersion, 5)}, {Fixed(pair.Negative.PartialDispersion, 5)}; V = {Fixed(pair.Positive.AbbeNumber, 3)}, {Fixed(pair.Negative.AbbeNumber, 3)}"),
            Make(FigureExplanation.AxialColor, SignedUm(solution.PrimaryAxialColor), "µm", $"shift of the ends {SignedUm(solution.ShortShift)} and {SignedUm(solution.LongShift)} µm"),
            Make(FigureExplanation.Power, $"{WithSign(solution.RelativePowers[0], 3)}, {WithSign(solution.RelativePowers[1], 3)}", "of Φ", $"{both}; Φ = 1/{Plain(requirement.FocalLength)} mm"),
            Make(FigureExplanation.FocalLengths, $"{ThreeDigits(solution.FocalLengths[0])}, {ThreeDigits(solution.FocalLengths[1])}", "mm", $"f = {Plain(requirement.FocalLength)} mm; φ/Φ = {WithSign(solution.RelativePowers[0], 4)}, {WithSign(solution.RelativePowers[1], 4)}"),
            Make(FigureExplanation.Petzval, ThreeDigits(solution.PetzvalRadius), "mm", $"n = {Fixed(pair.Positive.DesignIndex, 5)}, {Fixed(pair.Negative.DesignIndex, 5)}; φ/Φ = {WithSign(solution.RelativePowers[0], 3)}, {WithSign(solution.RelativePowers[1], 3)}"),
            Make(FigureExplanation.Index, $"{Fixed(pair.Positive.DesignIndex, 5)}, {Fixed(pair.Negative.DesignIndex, 5)}", $"at {band.Design}", both),
            Make(FigureExplanation.Abbe, $"{Fixed(pair.Positive.AbbeNumber, 2)}, {Fixed(pair.Negative.AbbeNumber, 2)}", "of band", $"{both}; {band.ShortEnd}, {band.Design}, {band.LongEnd}"),
            Make(FigureExplanation.Partial, $"{Fixed(pair.Positive.PartialDispersion, 4)}, {Fixed(pair.Negative.PartialDispersion, 4)}", "of band", $"{both}; {band.ShortEnd}, {band.Design}, {band.LongEnd}"),
        ];

        string Um(double millimeters) => Fixed(millimeters * 1e3, digits);

        string SignedUm(double millimeters) => WithSign(millimeters * 1e3, digits);

        static Figure Make(FigureExplanation of, string value, string unit, string inputs) => new(of.Name, value, unit, of.Formula, inputs, of.Source);
    }
}
