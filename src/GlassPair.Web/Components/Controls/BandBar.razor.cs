using System.Globalization;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>A small picture of the band.</summary>
public sealed partial class BandBar : ComponentBase
{
    private const double Left = 14.0;
    private const double Span = 192.0;

    /// <summary>Gets or sets the short end, nm.</summary>
    [Parameter] public double? ShortEnd { get; set; }

    /// <summary>Gets or sets the design wavelength, nm.</summary>
    [Parameter] public double? Design { get; set; }

    /// <summary>Gets or sets the long end, nm.</summary>
    [Parameter] public double? LongEnd { get; set; }

    /// <summary>Gets or sets the number of samples.</summary>
    [Parameter] public int Samples { get; set; }

    private bool IsDrawn => ShortEnd < Design && Design < LongEnd && Samples > 1;

    private string Width => (Coordinate(LongEnd!.Value) - Coordinate(ShortEnd!.Value)).ToString("0.##", CultureInfo.InvariantCulture);

    /// <summary>Visible bands stand on a fixed axis, so that they can be compared; others fill it.</summary>
    private (double From, double To) Axis => ShortEnd >= 380.0 && LongEnd <= 720.0 ? (380.0, 720.0)
        : (ShortEnd!.Value - (0.1 * (LongEnd!.Value - ShortEnd.Value)), LongEnd.Value + (0.1 * (LongEnd.Value - ShortEnd.Value)));

    private string X(double nanometers) => Coordinate(nanometers).ToString("0.##", CultureInfo.InvariantCulture);

    private double Coordinate(double nanometers) => Left + (Span * (nanometers - Axis.From) / (Axis.To - Axis.From));
}
