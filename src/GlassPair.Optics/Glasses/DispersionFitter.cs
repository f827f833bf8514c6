using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Glasses;

/// <summary>Fits a dispersion formula to measured indices by least squares. Deterministic; user's data never make it throw.</summary>
public static class DispersionFitter
{
    /// <summary>The fewest measured indices that any formula can be fitted to.</summary>
    public const int MinPoints = 3;

    /// <summary>The most measured indices.</summary>
    public const int MaxPoints = 1000;

    /// <summary>A measured index must lie above this.</summary>
    public const double MinIndex = 1.0;

    /// <summary>The largest measured index.</summary>
    public const double MaxIndex = 5.0;

    /// <summary>The number of Sellmeier terms that makers use for glass; a choice without a number of terms goes no further.</summary>
    private const int UsualTerms = 3;

    /// <summary>Gets the most terms of a form, beside the constant of the power series.</summary>
    public static int MaxTerms(DispersionForm form) => form == DispersionForm.Sellmeier ? SellmeierFormula.MaxTerms : PowerSeriesFitter.MaxTerms;

    /// <summary>Fits the form and number of terms that describe the indices best, by residual with a penalty for each coefficient. Source: [schwarz].</summary>
    /// <param name="measured">3 to 1000 indices above 1 up to 5 at different wavelengths, in any order.</param>
    public static FitOutcome Fit(IReadOnlyList<MeasuredIndex> measured) =>
        FindFaults(measured) is { IsEmpty: false } faults
            ? new NoDispersionFit(faults)
            : Judge(Sorted(measured), [.. CandidatesOf(DispersionForm.Sellmeier, measured.Count), .. CandidatesOf(DispersionForm.PowerSeries, measured.Count)], []);

    /// <summary>Fits a formula of one form.</summary>
    /// <param name="measured">More indices than coefficients, 3 to 1000, above 1 up to 5, at different wavelengths, in any order.</param>
    /// <param name="form">The form.</param>
    /// <param name="terms">1 to <see cref="MaxTerms"/>; null for the number of terms that describes the indices best.</param>
    public static FitOutcome Fit(IReadOnlyList<MeasuredIndex> measured, DispersionForm form, int? terms = null)
    {
        ImmutableArray<FitFault> faults = FindFaults(measured);
        if (terms is < 1 || terms > MaxTerms(form))
        {
            faults = faults.Insert(0, new FitFault(FitFaultKind.TermCount, $"The {NameOf(form)} has 1 to {MaxTerms(form)} terms, not {terms}."));
        }
        else if (faults.IsEmpty && terms is { } count && measured.Count <= ParametersOf(form, count))
        {
            int parameters = ParametersOf(form, count);
            faults = [new FitFault(
                FitFaultKind.PointCount,
                $"A {NameOf(form)} of {CountOf(count, "term")} has {parameters} coefficients and needs at least {parameters + 1} measured indices; there are {measured.Count}.")];
        }

        return faults.IsEmpty
            ? Judge(Sorted(measured), terms is { } chosen ? [(form, chosen)] : CandidatesOf(form, measured.Count), [])
            : new NoDispersionFit(faults);
    }

    /// <summary>Fits a maker's table: leaves out, with the reason, each value so far from what the others let expect that it must be a misprint.</summary>
    /// <remarks>
    /// The form is the usual Sellmeier formula of three terms, too stiff to bend towards a misprint; misprints go one by one, the worst first, up to a tenth of the
    /// table. A table of fewer than eight indices is too short to tell and is fitted as by <see cref="Fit(IReadOnlyList{MeasuredIndex})"/>. Source: [studentized].
    /// </remarks>
    /// <param name="measured">3 to 1000 indices above 1 up to 5 at different wavelengths, in any order.</param>
    public static FitOutcome FitLeavingOutMisprints(IReadOnlyList<MeasuredIndex> measured)
    {
        const int fewest = 8;
        if (measured.Count < fewest || !FindFaults(measured).IsEmpty)
        {
            return Fit(measured);
        }

        MeasuredIndex[] kept = Sorted(measured);
        List<(MeasuredIndex Point, double Ratio)> misprints = [];
        while (misprints.Count < measured.Count / 10 && FindMisprint(kept) is { } misprint)
        {
            misprints.Add((kept[misprint.Position], misprint.Ratio));
            kept = Without(kept, misprint.Position);
        }

        return Judge(kept, [(DispersionForm.Sellmeier, UsualTerms)], misprints);
    }

    private static int ParametersOf(DispersionForm form, int terms) => form == DispersionForm.Sellmeier ? 2 * terms : 1 + terms;

    private static string NameOf(DispersionForm form) => form == DispersionForm.Sellmeier ? "Sellmeier formula" : "power series";

    private static string CountOf(int count, string noun) => count == 1 ? $"1 {noun}" : $"{count} {noun}s";

    private static MeasuredIndex[] Sorted(IReadOnlyList<MeasuredIndex> measured) => [.. measured.OrderBy(m => m.Wavelength)];

    private static IEnumerable<(DispersionForm Form, int Terms)> CandidatesOf(DispersionForm form, int points) =>
        Enumerable.Range(1, form == DispersionForm.Sellmeier ? UsualTerms : PowerSeriesFitter.MaxTerms)
            .Where(terms => ParametersOf(form, terms) < points)
            .Select(terms => (form, terms));

    private static MeasuredIndex[] Without(MeasuredIndex[] points, int position) => [.. points[..position], .. points[(position + 1)..]];

    /// <summary>Leaves out each suspect in turn and takes the one without which the others agree best, if that makes it stand out.</summary>
    private static (int Position, double Ratio)? FindMisprint(MeasuredIndex[] points)
    {
        LeastSquaresFit all = SellmeierFitter.Fit(points, UsualTerms);
        if (all.FindOutlier() is null)
        {
            return null;
        }

        (int Position, double Ratio) worst = all.FindSuspects()
            .Select(i => (i, all.RatioTo(SellmeierFitter.Fit(Without(points, i), UsualTerms))))
            .MaxBy(s => s.Item2);
        return all.StandsOut(worst.Ratio) ? worst : null;
    }

    private static ImmutableArray<FitFault> FindFaults(IReadOnlyList<MeasuredIndex> measured)
    {
        if (measured.Count is < MinPoints or > MaxPoints)
        {
            return [new FitFault(FitFaultKind.PointCount, $"A fit takes {MinPoints} to {MaxPoints} measured indices; there are {measured.Count}.")];
        }

        var faults = ImmutableArray.CreateBuilder<FitFault>();
        Dictionary<Wavelength, int> firsts = [];
        for (int i = 0; i < measured.Count; i++)
        {
            (Wavelength wavelength, double index) = (measured[i].Wavelength, measured[i].Index);
            if (wavelength == default)
            {
                faults.Add(new FitFault(FitFaultKind.Wavelength, $"Row {i + 1} has no wavelength.", i));
            }
            else if (!firsts.TryAdd(wavelength, i))
            {
                faults.Add(new FitFault(FitFaultKind.Wavelength, $"{wavelength} stands in rows {firsts[wavelength] + 1} and {i + 1}: keep one.", i));
            }

            if (!(index > MinIndex && index <= MaxIndex))
            {
                faults.Add(new FitFault(
                    FitFaultKind.Index,
                    FormattableString.Invariant($"The index at {wavelength} is {index}; it must lie above {MinIndex} and not above {MaxIndex}."),
                    i));
            }
        }

        return faults.ToImmutable();
    }

    private static FitOutcome Judge(MeasuredIndex[] points, IEnumerable<(DispersionForm Form, int Terms)> candidates, List<(MeasuredIndex Point, double Ratio)> misprints)
    {
        var range = new WavelengthRange(points[0].Wavelength, points[^1].Wavelength);
        LeastSquaresFit[] fits = [.. candidates.Select(c => c.Form == DispersionForm.Sellmeier ? SellmeierFitter.Fit(points, c.Terms) : PowerSeriesFitter.Fit(points, c.Terms))];
        LeastSquaresFit[] sound = [.. fits.Where(f => f.Formula.FindFault(range) is null)];
        if (sound.Length == 0)
        {
            return new NoDispersionFit([new FitFault(
                FitFaultKind.UnsoundFormula,
                $"The best formula has no index above 1 at {fits[^1].Formula.FindFault(range)}, inside the measured range, {range}: use fewer terms or check the values.")]);
        }

        LeastSquaresFit best = sound.MinBy(f => f.Criterion)!;
        return new DispersionFit(
            best.Formula,
            [.. points],
            [.. best.Residuals],
            [.. misprints.OrderBy(m => m.Point.Wavelength).Select(m => LeaveOut(m.Point, m.Ratio, best.Formula))],
            WarningsOf(best, points, range));
    }

    private static LeftOutIndex LeaveOut(MeasuredIndex point, double ratio, DispersionFormula formula)
    {
        double residual = point.Index - Math.Sqrt(formula.IndexSquaredAt(point.Wavelength.Micrometers));
        return new LeftOutIndex(
            point,
            residual,
            FormattableString.Invariant($"{point.Index} at {point.Wavelength} is {Math.Abs(residual):0.0e-0} too {(residual > 0.0 ? "high" : "low")}, {ratio:0} times the error to be expected there: taken for a misprint."));
    }

    private static ImmutableArray<string> WarningsOf(LeastSquaresFit fit, MeasuredIndex[] points, WavelengthRange range)
    {
        const int fewSpare = 3;
        var warnings = ImmutableArray.CreateBuilder<string>();
        if (points.Length - fit.Parameters < fewSpare)
        {
            warnings.Add($"Only {points.Length} measured indices for {fit.Parameters} coefficients: the residuals say little about the error between them.");
        }

        if (FindNearPole(fit.Formula, range) is { } pole)
        {
            warnings.Add(FormattableString.Invariant($"A pole stands at {pole:0} nm, close to the measured range, {range}: the formula bends steeply towards it."));
        }

        if (FindRise(fit.Formula, range) is { } rise)
        {
            warnings.Add($"The fitted index rises with wavelength at {rise}, as no glass does inside its transparent range: check the values or use fewer terms.");
        }

        if (fit.FindOutlier() is { } outlier)
        {
            MeasuredIndex point = points[outlier.Position];
            warnings.Add(FormattableString.Invariant($"The index at {point.Wavelength}, {point.Index}, stands out: {outlier.Ratio:0} times the error to be expected there."));
        }

        return warnings.ToImmutable();
    }

    /// <summary>A pole outside the range by less than a tenth of its end, nm; null where there is none.</summary>
    private static double? FindNearPole(DispersionFormula formula, WavelengthRange range)
    {
        const double near = 1.1;
        return (formula as SellmeierFormula)?.Terms
            .Select(t => 1000.0 * Math.Sqrt(Math.Max(t.ResonanceSquared, 0.0)))
            .Where(pole => pole > range.Shortest.Nanometers / near && pole < range.Longest.Nanometers * near)
            .Select(pole => (double?)pole)
            .FirstOrDefault();
    }

    private static Wavelength? FindRise(DispersionFormula formula, WavelengthRange range)
    {
        const int steps = 100;
        for (int i = 0; i <= steps; i++)
        {
            double nanometers = range.Shortest.Nanometers + ((range.Longest.Nanometers - range.Shortest.Nanometers) * i / steps);
            if (formula.SlopeOfIndexSquaredAt(nanometers / 1000.0) > 0.0)
            {
                return Wavelength.FromNanometers(Math.Min(nanometers, range.Longest.Nanometers));
            }
        }

        return null;
    }
}
