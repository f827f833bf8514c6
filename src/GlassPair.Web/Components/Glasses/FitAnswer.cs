using System.Collections.Immutable;
using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;

namespace GlassPair.Web.Components.Glasses;

/// <summary>A line of the table with what the fit makes of it.</summary>
/// <param name="Row">The line as read.</param>
/// <param name="IsUsed">Whether the fit used it.</param>
/// <param name="Residual">Measured minus fitted index; null where there is no fit, or none at that wavelength.</param>
/// <param name="Problem">Why it cannot be used, as a sentence; null where it can.</param>
public sealed record FitLine(MeasuredRow Row, bool IsUsed, double? Residual, string? Problem)
{
    /// <summary>Gets the fitted index; null where there is none.</summary>
    public double? Fitted => Row.Measured?.Index - Residual;
}

/// <summary>What the state of the fit page amounts to: the table as read, the fit, and how much the lines left out matter. Immutable.</summary>
public sealed class FitAnswer
{
    private FitAnswer(FitState state)
    {
        Table = MeasuredTable.Read(state.Text, state.Table);
        MeasuredRow[] usable = [.. Table.Usable];
        MeasuredRow[] used = [.. usable.Where(r => !state.LeftOut.Contains(r.Measured!.Value.Wavelength.Nanometers))];
        LeftOutCount = usable.Length - used.Length;
        if (used.Length > 0)
        {
            Outcome = Fit(state, used);
            WithAll = LeftOutCount > 0 ? Fit(state, usable) as DispersionFit : null;
        }

        Lines = [.. Table.Rows.Select(r => LineOf(r, Array.IndexOf(used, r)))];
        if (Outcome is DispersionFit made)
        {
            made = made with { LeftOut = [.. Lines.Where(l => l is { IsUsed: false, Residual: not null }).Select(l => new LeftOutIndex(l.Row.Measured!.Value, l.Residual!.Value, "Left out by you."))] };
            (string maker, string name) = NameOf(state.Name);
            (Made, Glass) = (made, new Glass(maker, name, made.Formula, made.Range));
        }
    }

    /// <summary>Gets the table as read.</summary>
    public MeasuredTable Table { get; }

    /// <summary>Gets each line of the table with what the fit makes of it.</summary>
    public ImmutableArray<FitLine> Lines { get; }

    /// <summary>Gets what fitting came to; null where there was nothing to fit.</summary>
    public FitOutcome? Outcome { get; }

    /// <summary>Gets the fit, with the lines left out that lie in its range; null where there is none.</summary>
    public DispersionFit? Made { get; }

    /// <summary>Gets the fitted glass; null where there is none.</summary>
    public Glass? Glass { get; }

    /// <summary>Gets how many lines that could be used are left out.</summary>
    public int LeftOutCount { get; }

    /// <summary>Gets the fit with no line left out, for comparison; null where none is, or where there is no such fit.</summary>
    public DispersionFit? WithAll { get; }

    /// <summary>Gets why there is no fit, as sentences that belong to no single line.</summary>
    public IEnumerable<string> Faults => Outcome is NoDispersionFit none ? none.Faults.Where(f => f.Position is null).Select(f => f.Sentence) : [];

    /// <summary>Reads the table and fits. Never throws.</summary>
    public static FitAnswer Of(FitState state) => new(state);

    /// <summary>Gets the fit as a catalogue's heading and row.</summary>
    public string CatalogueText() => Glass is null ? "" : StockWriter.ToText(Glass);

    private static FitOutcome Fit(FitState state, MeasuredRow[] rows)
    {
        MeasuredIndex[] measured = [.. rows.Select(r => r.Measured!.Value)];
        return state.Form is { } form ? DispersionFitter.Fit(measured, form, state.Terms) : DispersionFitter.Fit(measured);
    }

    /// <summary>What stands before the first slash is the maker; without one, the maker is left to the user.</summary>
    private static (string Maker, string Name) NameOf(string text)
    {
        string[] parts = string.Concat(text.Where(c => !char.IsControl(c))).Split('/', 2, StringSplitOptions.TrimEntries);
        (string maker, string name) = parts.Length == 2 ? (parts[0], parts[1]) : ("", parts[0]);
        return (maker.Length > 0 ? maker.ToLowerInvariant() : "measured", name.Length > 0 ? name : "fit");
    }

    private FitLine LineOf(MeasuredRow row, int position)
    {
        string? fault = position < 0 ? null : (Outcome as NoDispersionFit)?.Faults.FirstOrDefault(f => f.Position == position)?.Sentence;
        double? residual = row.Measured is { } measured ? (Outcome as DispersionFit)?.ResidualOf(measured) : null;
        return new FitLine(row, position >= 0, residual, row.Problem ?? fault);
    }
}
