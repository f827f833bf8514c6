using System.Collections.Immutable;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Optics.Lenses;

/// <summary>A lens as it is looked at: its prescription in the light of a band, its entrance pupil, its fields and the plane of the image.</summary>
/// <remarks>The one input of every view of the rays. Light comes from an object at infinity unless the prescription says otherwise.</remarks>
public sealed class LensView
{
    /// <summary>Looks at a lens.</summary>
    /// <param name="prescription">The lens.</param>
    /// <param name="band">The wavelengths and their weights; first-order values are those of its design wavelength.</param>
    /// <param name="apertureDiameter">Diameter of the entrance pupil, mm, above 0.</param>
    /// <param name="fieldsDegrees">Field angles, degrees, from the axis outwards; at least one.</param>
    /// <param name="imagePlane">The image plane, mm from the last vertex; null for the paraxial image of the design wavelength.</param>
    /// <exception cref="Glasses.WavelengthOutOfRangeException">A glass does not cover the band.</exception>
    public LensView(Prescription prescription, Band band, double apertureDiameter, ImmutableArray<double> fieldsDegrees, double? imagePlane = null)
    {
        (Prescription, Band) = (prescription, band);
        ApertureDiameter = Guard.InRange(apertureDiameter, double.Epsilon, double.MaxValue);
        FieldsDegrees = fieldsDegrees;
        Design = prescription.At(band.Design);
        ShortEnd = prescription.At(band.ShortEnd);
        LongEnd = prescription.At(band.LongEnd);
        Samples = [.. band.Samples.Select(s => prescription.At(s.Wavelength))];
        FirstOrder = FirstOrder.Of(Design);
        ImagePlane = imagePlane ?? FirstOrder.ImageDistance;
    }

    /// <summary>Gets the lens.</summary>
    public Prescription Prescription { get; }

    /// <summary>Gets the wavelengths and their weights.</summary>
    public Band Band { get; }

    /// <summary>Gets the diameter of the entrance pupil, mm.</summary>
    public double ApertureDiameter { get; }

    /// <summary>Gets the field angles, degrees.</summary>
    public ImmutableArray<double> FieldsDegrees { get; }

    /// <summary>Gets the lens at the design wavelength.</summary>
    public MonochromaticLens Design { get; }

    /// <summary>Gets the lens at the short end.</summary>
    public MonochromaticLens ShortEnd { get; }

    /// <summary>Gets the lens at the long end.</summary>
    public MonochromaticLens LongEnd { get; }

    /// <summary>Gets the lens at each sample of the band.</summary>
    public ImmutableArray<MonochromaticLens> Samples { get; }

    /// <summary>Gets the first-order values at the design wavelength.</summary>
    public FirstOrder FirstOrder { get; }

    /// <summary>Gets the image plane, mm from the last vertex.</summary>
    public double ImagePlane { get; }

    /// <summary>The same lens with the image plane elsewhere.</summary>
    public LensView WithImagePlane(double imagePlane) => new(Prescription, Band, ApertureDiameter, FieldsDegrees, imagePlane);
}
