namespace GlassPair.Web.Figures;

/// <summary>How a figure stands to its limit.</summary>
public enum Verdict
{
    /// <summary>Inside the limit, with more than a tenth to spare.</summary>
    Holds,

    /// <summary>Inside the limit by a tenth or less.</summary>
    Tight,

    /// <summary>Past the limit.</summary>
    Exceeds,
}

/// <summary>Judges figures against limits, and names the judgement by sign and word.</summary>
public static class Verdicts
{
    /// <summary>Judges a figure of which less is better; NaN exceeds.</summary>
    public static Verdict Of(double figure, double limit) =>
        figure <= 0.9 * limit ? Verdict.Holds : figure <= limit ? Verdict.Tight : Verdict.Exceeds;

    /// <summary>Gets the sign.</summary>
    public static char Sign(this Verdict verdict) => verdict switch { Verdict.Holds => '✓', Verdict.Tight => '≈', _ => '✕' };

    /// <summary>Gets the word.</summary>
    public static string Word(this Verdict verdict) => verdict switch { Verdict.Holds => "holds", Verdict.Tight => "tight", _ => "exceeds" };
}
