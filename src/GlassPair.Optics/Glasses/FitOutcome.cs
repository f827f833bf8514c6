using System.Collections.Immutable;

namespace GlassPair.Optics.Glasses;

/// <summary>What fitting measured indices came to: a <see cref="DispersionFit"/>, or <see cref="NoDispersionFit"/> with the faults.</summary>
public abstract record FitOutcome;

/// <summary>Measured indices that no formula was fitted to.</summary>
/// <param name="Faults">What stopped it, at least one.</param>
public sealed record NoDispersionFit(ImmutableArray<FitFault> Faults) : FitOutcome;

/// <summary>Why measured indices cannot be fitted.</summary>
public enum FitFaultKind
{
    /// <summary>Fewer indices than the fit needs, or more than <see cref="DispersionFitter.MaxPoints"/>.</summary>
    PointCount,

    /// <summary>A number of terms that the form does not have.</summary>
    TermCount,

    /// <summary>A wavelength that was never set, or is given twice.</summary>
    Wavelength,

    /// <summary>An index outside 1 to 5, or not a number.</summary>
    Index,

    /// <summary>The best formula has a pole, or an index not above 1, between the measured wavelengths.</summary>
    UnsoundFormula,
}

/// <summary>A reason why measured indices cannot be fitted.</summary>
/// <param name="Kind">The reason.</param>
/// <param name="Sentence">The reason in words: what was found and what is allowed.</param>
/// <param name="Position">The place, from 0, of the measured index that is meant; null where it is none by itself.</param>
public sealed record FitFault(FitFaultKind Kind, string Sentence, int? Position = null);
