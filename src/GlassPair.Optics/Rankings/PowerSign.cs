namespace GlassPair.Optics.Rankings;

/// <summary>The sign of an element's power.</summary>
public enum PowerSign
{
    /// <summary>The element gathers light.</summary>
    Positive,

    /// <summary>The element spreads light.</summary>
    Negative,
}
