using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Addresses;

namespace GlassPair.Web.Components.Glasses;

/// <summary>A line of a pasted table: the index it gives, or what is wrong with it.</summary>
/// <param name="Line">The line of the text, from 1.</param>
/// <param name="Text">The line as pasted, cut to what fits into a table.</param>
/// <param name="Measured">The index read; null where the line cannot be used.</param>
/// <param name="Problem">What is wrong, as a sentence that says what is allowed; null where nothing is.</param>
public sealed record MeasuredRow(int Line, string Text, MeasuredIndex? Measured, string? Problem);

/// <summary>A pasted table of measured indices, read as far as it can be.</summary>
/// <param name="Rows">Each line that should hold a wavelength and an index, in the order of the text.</param>
/// <param name="Form">How the text was read; what the user left open stands in it as found.</param>
/// <param name="Notes">What was found and what was passed over, as sentences: nothing is guessed without being said.</param>
/// <param name="Problem">Why nothing was read at all, as a sentence; null where rows were.</param>
public sealed record MeasuredTable(ImmutableArray<MeasuredRow> Rows, TableForm Form, ImmutableArray<string> Notes, string? Problem)
{
    /// <summary>The most characters read.</summary>
    public const int MaxLength = 10_000;

    private const char ByteOrderMark = '\uFEFF';

    /// <summary>Gets the rows that can be used.</summary>
    public IEnumerable<MeasuredRow> Usable => Rows.Where(r => r.Measured is not null);

    /// <summary>Gets how many rows cannot be used.</summary>
    public int FaultyRows => Rows.Count(r => r.Problem is not null);

    /// <summary>Reads a table: a wavelength and an index on each line. Never throws.</summary>
    /// <param name="text">The text as pasted.</param>
    /// <param name="asked">What the user says about its form; what is left open is found out.</param>
    public static MeasuredTable Read(string text, TableForm asked)
    {
        if (text.Length > MaxLength)
        {
            return Nothing(asked, Text($"The text holds {text.Length:#,0} characters; up to {MaxLength:#,0} are read. Send a longer table to the API at /api/v1/fit."));
        }

        var lines = new TableLines(text.TrimStart(ByteOrderMark), asked);
        if (lines.Data.IsEmpty)
        {
            return Nothing(asked, lines.Skipped > 0 || lines.Header is not null ? "There is no line with numbers." : null);
        }

        if (lines.Data.Length > DispersionFitter.MaxPoints)
        {
            return Nothing(asked, Text($"The text holds {lines.Data.Length:#,0} rows; a fit takes up to {DispersionFitter.MaxPoints:#,0}."));
        }

        (int Line, string Text, NumberPair Pair)[] read = [.. lines.Data.Select(l => (l.Number, l.Text, NumberPair.Read(l.Text, lines.Form)))];
        WavelengthUnit? unit = asked.Unit ?? UnitNamedIn(lines.Header?.Text) ?? UnitOf(read.Select(r => r.Pair));
        TableForm form = lines.Form with { Unit = unit };
        var rows = ImmutableArray.CreateBuilder<MeasuredRow>(read.Length);
        Dictionary<double, int> seen = [];
        foreach ((int line, string raw, NumberPair pair) in read)
        {
            rows.Add(RowOf(line, TypedNumber.Shorten(raw), pair, unit, seen));
        }

        return new MeasuredTable(rows.MoveToImmutable(), form, NotesOn(lines, form, asked), null);
    }

    private static MeasuredTable Nothing(TableForm asked, string? problem) => new([], asked, [], problem);

    private static MeasuredRow RowOf(int line, string text, NumberPair pair, WavelengthUnit? unit, Dictionary<double, int> seen)
    {
        if (pair.Problem is not null)
        {
            return new MeasuredRow(line, text, null, pair.Problem);
        }

        if (FindProblem(pair.First, pair.Second, unit) is { } problem)
        {
            return new MeasuredRow(line, text, null, problem);
        }

        double nanometers = unit == WavelengthUnit.Micrometers ? RoundedNanometers(pair.First) : pair.First;
        return seen.TryAdd(nanometers, line)
            ? new MeasuredRow(line, text, new MeasuredIndex(Wavelength.FromNanometers(nanometers), pair.Second), null)
            : new MeasuredRow(line, text, null, Text($"{nanometers:0.######} nm stands in line {seen[nanometers]} already: keep one of the two."));
    }

    /// <summary>1000 times micrometers, without the digits that binary arithmetic adds: 0.58756 µm is 587.56 nm.</summary>
    private static double RoundedNanometers(double micrometers) =>
        Math.Clamp((double)((decimal)micrometers * 1000m), Wavelength.MinNanometers, Wavelength.MaxNanometers);

    private static string? FindProblem(double wavelength, double index, WavelengthUnit? unit)
    {
        if (!(wavelength > 0.0))
        {
            return Text($"The wavelength must be above zero. Given: {wavelength:G10}.");
        }

        bool likeNanometers = IsNanometers(wavelength), likeMicrometers = IsMicrometers(wavelength);
        if (wavelength > DispersionFitter.MinIndex && wavelength <= DispersionFitter.MaxIndex && IsNanometers(index))
        {
            return Text($"The index stands first here. Write the wavelength first: {index:G10}, {wavelength:G10}.");
        }

        switch (unit)
        {
            case null when likeNanometers || likeMicrometers:
                return "Some wavelengths look like nm, as many like µm. Choose the unit above.";
            case WavelengthUnit.Nanometers when likeMicrometers:
                return Text($"{wavelength:G10} looks like µm, the table is in nm. Did you mean {wavelength * 1000.0:G10} nm?");
            case WavelengthUnit.Micrometers when likeNanometers:
                return Text($"{wavelength:G10} looks like nm, the table is in µm. Did you mean {wavelength / 1000.0:G10} µm?");
            case WavelengthUnit.Micrometers when !likeMicrometers:
                return Text($"The wavelength must lie from 0.1 to 20 µm. Given: {wavelength:G10}.");
            case not WavelengthUnit.Micrometers when !likeNanometers:
                return Text($"The wavelength must lie from 100 to 20,000 nm (0.1 to 20 µm). Given: {wavelength:G10}.");
        }

        return index > DispersionFitter.MinIndex && index <= DispersionFitter.MaxIndex
            ? null
            : Text($"The index must lie above {DispersionFitter.MinIndex} and not above {DispersionFitter.MaxIndex}. Given: {index:G10}.");
    }

    private static bool IsNanometers(double value) => value is >= Wavelength.MinNanometers and <= Wavelength.MaxNanometers;

    private static bool IsMicrometers(double value) => value is >= Wavelength.MinNanometers / 1000.0 and <= Wavelength.MaxNanometers / 1000.0;

    private static WavelengthUnit? UnitNamedIn(string? header)
    {
        if (header is null)
        {
            return null;
        }

        bool Names(params ReadOnlySpan<string> words)
        {
            foreach (string word in words)
            {
                if (header.Contains(word, StringComparison.OrdinalIgnoreCase))
                {
                    return true;
                }
            }

            return false;
        }

        return (Names("nm", "nanomet"), Names("um", "µm", "μm", "micromet", "micron")) switch
        {
            (true, false) => WavelengthUnit.Nanometers,
            (false, true) => WavelengthUnit.Micrometers,
            _ => null,
        };
    }

    /// <summary>The unit that most wavelengths can only have: no wavelength in nanometers is small enough to be one in micrometers.</summary>
    private static WavelengthUnit? UnitOf(IEnumerable<NumberPair> pairs)
    {
        int nanometers = 0, micrometers = 0;
        foreach (NumberPair pair in pairs.Where(p => p.Problem is null))
        {
            nanometers += IsNanometers(pair.First) ? 1 : 0;
            micrometers += IsMicrometers(pair.First) ? 1 : 0;
        }

        return nanometers > micrometers ? WavelengthUnit.Nanometers : micrometers > nanometers ? WavelengthUnit.Micrometers : null;
    }

    private static ImmutableArray<string> NotesOn(TableLines lines, TableForm form, TableForm asked)
    {
        var notes = ImmutableArray.CreateBuilder<string>();
        string how = (form.Unit switch
        {
            WavelengthUnit.Nanometers => "wavelengths in nm",
            WavelengthUnit.Micrometers => "wavelengths in µm",
            _ => "unit of the wavelengths unclear",
        }) + $", {TableForm.NameOf(form.Separator)} between the numbers, {TableForm.NameOf(form.Mark)}";
        notes.Add($"Read as: {how}{(asked.IsOpen ? "" : " (as far as chosen by you)")}.");
        if (lines.Header is { } header)
        {
            notes.Add($"Line {header.Number.ToString(CultureInfo.InvariantCulture)} was taken for the heading: “{TypedNumber.Shorten(header.Text)}”.");
        }

        if (lines.Skipped > 0)
        {
            notes.Add(lines.Skipped == 1 ? "1 blank or comment line was passed over." : Text($"{lines.Skipped} blank or comment lines were passed over."));
        }

        return notes.ToImmutable();
    }

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
