using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Addresses;

namespace GlassPair.Web.Components.Glasses;

/// <summary>What an address of the fit page says.</summary>
/// <param name="State">The state, with what could not be understood left at its default.</param>
/// <param name="Notices">What was not understood, as sentences.</param>
public sealed record FitAddressReading(FitState State, ImmutableArray<string> Notices);

/// <summary>Writes the fit page's state as the query of its address, and reads it back.</summary>
/// <remarks>Format 1: <c>?v=1&amp;rows=404.66;1.54111%0A435.83;1.536704&amp;form=sellmeier&amp;terms=3&amp;out=852.1&amp;name=lab/melt+7</c>. Defaults are left out.</remarks>
public static class FitAddress
{
    /// <summary>The format written.</summary>
    public const int Format = 1;

    /// <summary>The longest query written; past it the table stays out, and the page says so.</summary>
    public const int MaxLength = 4_000;

    private const int MostLeftOut = 200;

    private static readonly (string, FieldSeparator?)[] _separators =
        [("tab", FieldSeparator.Tab), ("semicolon", FieldSeparator.Semicolon), ("bar", FieldSeparator.Bar), ("comma", FieldSeparator.Comma), ("blank", FieldSeparator.Space)];

    private static readonly (string, DecimalMark?)[] _marks = [("point", DecimalMark.Point), ("comma", DecimalMark.Comma)];

    private static readonly (string, WavelengthUnit?)[] _units = [("nm", WavelengthUnit.Nanometers), ("um", WavelengthUnit.Micrometers)];

    private static readonly (string, DispersionForm?)[] _forms = [("sellmeier", DispersionForm.Sellmeier), ("series", DispersionForm.PowerSeries)];

    /// <summary>Writes a state as a query; without its table where that makes the address too long.</summary>
    public static string Write(FitState state) =>
        Write(state, state.Text) is { Length: <= MaxLength } whole ? whole : Write(state, "");

    /// <summary>Tells whether the address holds the table.</summary>
    public static bool HoldsTable(FitState state) => Write(state, state.Text).Length <= MaxLength;

    /// <summary>Reads a query, with or without the question mark. Never throws.</summary>
    public static FitAddressReading Read(string query)
    {
        var reader = new QueryReader(query, "v", "rows", "separator", "decimal", "unit", "form", "terms", "out", "name");
        reader.CheckFormat(Format);
        FitState state = new()
        {
            Text = reader.Text("rows", MeasuredTable.MaxLength) ?? "",
            Table = new TableForm(reader.Word("separator", null, _separators), reader.Word("decimal", null, _marks), reader.Word("unit", null, _units)),
            Form = reader.Word("form", null, _forms),
            LeftOut = [.. (reader.List("out", MostLeftOut) ?? []).Select(NanometersOf).OfType<double>()],
            Name = reader.Text("name", FitState.MaxNameLength) ?? "",
        };
        return new FitAddressReading(state with { Terms = Terms(state.Form) }, reader.Notices);

        double? NanometersOf(string text)
        {
            if (TypedNumber.TryRead(text, out double value, out _) && value > 0.0)
            {
                return value;
            }

            reader.Notice($"“{TypedNumber.Shorten(text)}” is no wavelength to leave out.");
            return null;
        }

        int? Terms(DispersionForm? form)
        {
            if (form is not { } chosen || reader.Text("terms", NumberField.MaxLength) is not { Length: > 0 } text)
            {
                return null;
            }

            int most = DispersionFitter.MaxTerms(chosen);
            if (int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out int terms) && terms >= 1 && terms <= most)
            {
                return terms;
            }

            reader.Notice(string.Create(CultureInfo.InvariantCulture, $"“terms” takes 1 to {most}, not “{TypedNumber.Shorten(text)}”; the best number is found."));
            return null;
        }
    }

    /// <summary>Writes the table that a fit was made from, lines left out among them, as one would type it.</summary>
    public static string TextOf(DispersionFit fit) => string.Join('\n', fit.Measured.Concat(fit.LeftOut.Select(l => l.Measured))
        .OrderBy(m => m.Wavelength)
        .Select(m => $"{TypedNumber.Write(m.Wavelength.Nanometers)} {TypedNumber.Write(m.Index)}"));

    private static string Write(FitState state, string table)
    {
        string query = QueryOf(state, table);
        return query.Contains('&', StringComparison.Ordinal) ? query : "";
    }

    private static string QueryOf(FitState state, string table) => new QueryWriter()
        .Add("v", Format.ToString(CultureInfo.InvariantCulture))
        .Add("rows", table.ReplaceLineEndings("\n"))
        .Add("separator", WordOf(_separators, state.Table.Separator))
        .Add("decimal", WordOf(_marks, state.Table.Mark))
        .Add("unit", WordOf(_units, state.Table.Unit))
        .Add("form", WordOf(_forms, state.Form))
        .Add("terms", state.Form is null ? null : state.Terms?.ToString(CultureInfo.InvariantCulture))
        .AddList("out", state.LeftOut.IsEmpty ? null : state.LeftOut.Select(TypedNumber.Write))
        .Add("name", state.Name)
        .ToString();

    private static string? WordOf<T>((string Word, T? Value)[] words, T? value)
        where T : struct => words.FirstOrDefault(w => Nullable.Equals(w.Value, value)).Word;
}
