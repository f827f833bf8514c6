using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Addresses;

namespace GlassPair.Web.Components.Glasses;

/// <summary>Writes the address of a glass's own page, and reads its query back.</summary>
/// <remarks>Format 1: <c>glasses/schott/N-BK7?v=1&amp;thickness=25&amp;short=g&amp;design=e&amp;long=C&amp;stock=4f1c09ab12cd</c>. Defaults are left out.</remarks>
public static class GlassPageAddress
{
    /// <summary>The format written.</summary>
    public const int Format = 1;

    /// <summary>Gets the address, relative to the site.</summary>
    /// <param name="glass">The glass.</param>
    /// <param name="stockId">The id of the stock that is asked for; null stands for today's.</param>
    public static string Of(Glass glass, string? stockId = null) => Of(glass, GlassPageState.Empty with { StockId = stockId });

    /// <summary>Gets the address with what the page is asked for.</summary>
    public static string Of(Glass glass, GlassPageState state)
    {
        string query = new QueryWriter()
            .Add("v", Format.ToString(CultureInfo.InvariantCulture))
            .Add(GlassPageState.ThicknessField.Key, state.Thickness, GlassPageState.ThicknessField.Default)
            .Add(GlassPageState.ShortField.Key, state.ShortEnd, GlassPageState.ShortField.Default)
            .Add(GlassPageState.DesignField.Key, state.Design, GlassPageState.DesignField.Default)
            .Add(GlassPageState.LongField.Key, state.LongEnd, GlassPageState.LongField.Default)
            .Add("stock", state.StockId)
            .ToString();
        return $"glasses/{Uri.EscapeDataString(glass.Maker)}/{Uri.EscapeDataString(glass.Name)}" + (query.Contains('&', StringComparison.Ordinal) ? query : "");
    }

    /// <summary>Reads a query, with or without the question mark. Never throws.</summary>
    /// <returns>The state, with what could not be understood left at its default, and what was not understood, as sentences.</returns>
    public static (GlassPageState State, ImmutableArray<string> Notices) Read(string query)
    {
        var reader = new QueryReader(query, "v", GlassPageState.ThicknessField.Key, GlassPageState.ShortField.Key, GlassPageState.DesignField.Key, GlassPageState.LongField.Key, "stock");
        reader.CheckFormat(Format);
        string Typed(NumberField field) => reader.Text(field.Key, NumberField.MaxLength) ?? field.Default;
        var state = new GlassPageState(
            Typed(GlassPageState.ThicknessField), Typed(GlassPageState.ShortField), Typed(GlassPageState.DesignField), Typed(GlassPageState.LongField),
            reader.Text("stock", NumberField.MaxLength) is { Length: > 0 } stock ? stock : null);
        return (state, reader.Notices);
    }
}
