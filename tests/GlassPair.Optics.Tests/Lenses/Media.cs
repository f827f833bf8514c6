using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Tests.Lenses;

/// <summary>Glasses of textbook exercises: one index at every wavelength.</summary>
internal static class Media
{
    public static Glass OfIndex(double index) => new(
        "textbook", FormattableString.Invariant($"n {index}"), new PowerSeriesFormula(index * index, []), WavelengthRange.FromNanometers(300.0, 2500.0));
}
