using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Lenses;

/// <summary>A prescription in light of one wavelength: what paraxial and exact rays need.</summary>
public sealed class MonochromaticLens
{
    internal MonochromaticLens(Prescription prescription, Wavelength wavelength)
    {
        (Prescription, Wavelength) = (prescription, wavelength);
        Indices = [1.0, .. prescription.Surfaces.Select(s => s.Then?.IndexAt(wavelength) ?? 1.0)];
    }

    /// <summary>Gets the prescription.</summary>
    public Prescription Prescription { get; }

    /// <summary>Gets the wavelength.</summary>
    public Wavelength Wavelength { get; }

    /// <summary>Gets the indices: before the first surface, then behind each surface.</summary>
    public ImmutableArray<double> Indices { get; }
}
