using System.Globalization;
using GlassPair.Optics.Color;

namespace GlassPair.Optics.Rankings;

/// <summary>The order of a shortlist: the key to 12 digits, then the sum of |powers| to 12 digits, then the names, ordinal.</summary>
internal static class RankingOrder
{
    /// <summary>Rounds to 12 significant digits.</summary>
    public static double TwelveDigits(double value) =>
        double.Parse(value.ToString("E11", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);

    /// <summary>Gets a key, at or above this one and above all that tie with it: one step of the 12th digit is at most 1e-11 of the value.</summary>
    public static double LargestTieOf(double key) => Math.BitIncrement(key * (1.0 + 1.1e-11));

    /// <summary>Tells whether two keys are equal to 12 digits.</summary>
    public static bool AreTied(double smaller, double larger) =>
        larger <= LargestTieOf(smaller) && TwelveDigits(smaller) == TwelveDigits(larger);

    /// <summary>Puts solutions whose keys tie into their order.</summary>
    public static IEnumerable<ThinSolution> OfTied(ThinSolution[] solutions) => solutions.Length <= 1 ? solutions : solutions
        .OrderBy(s => TwelveDigits(s.SumOfPowers))
        .ThenBy(s => string.Join(' ', s.Elements.Select(e => e.Glass.Id)), StringComparer.Ordinal);

    /// <summary>Gets the figure that a request ranks by.</summary>
    public static double KeyOf(ThinSolution solution, ShortlistRequest request) => request.RankBy switch
    {
        RankBy.ColorResidual => solution.RmsFocalShift,
        RankBy.ExpectedResidual => solution.ExpectedRmsFocalShift(request.Quality),
        _ => Math.Abs(solution.SecondarySpectrum),
    };
}
