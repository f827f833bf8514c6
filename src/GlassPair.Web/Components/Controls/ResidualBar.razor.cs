using System.Globalization;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>The color residual as a dark bar, with what the data floor adds to it in pale. The table says the same in numbers.</summary>
public sealed partial class ResidualBar : ComponentBase
{
    private const double Pixels = 40.0;

    /// <summary>Gets or sets the color residual, mm.</summary>
    [Parameter] public double Residual { get; set; }

    /// <summary>Gets or sets the residual to be expected, mm.</summary>
    [Parameter] public double Expected { get; set; }

    /// <summary>Gets or sets what fills the bar, mm.</summary>
    [Parameter] public double Full { get; set; }

    private string Width(double value) =>
        (Full > 0.0 ? Math.Clamp(Pixels * value / Math.Max(Full, Expected), 0.0, Pixels) : 0.0).ToString("0.#", CultureInfo.InvariantCulture) + "px";
}
