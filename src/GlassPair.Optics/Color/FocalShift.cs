namespace GlassPair.Optics.Color;

/// <summary>How far the focus moves when the powers of thin elements change with wavelength.</summary>
internal static class FocalShift
{
    /// <summary>Gets the shift of the focus in units of the focal length.</summary>
    /// <param name="powers">pᵢ = φᵢ/Φ.</param>
    /// <param name="changes">tᵢ, the relative change of each power.</param>
    /// <param name="space">δ, the air space of a pair in units of the focal length; 0 in contact.</param>
    /// <remarks>
    /// In contact, with s = Σ pᵢ tᵢ: 1/(1 + s) − 1 = −s/(1 + s), without the cancellation of the left-hand side.
    /// With an air space, h = 1 − δ p₁ and s = p₁ t₁ + h p₂ t₂ − δ p₁ t₁ p₂ (1 + t₂): −(δ p₁ t₁ + h s)/(1 + s).
    /// </remarks>
    public static double Of(ReadOnlySpan<double> powers, ReadOnlySpan<double> changes, double space)
    {
        if (space == 0.0)
        {
            double sum = 0.0;
            for (int i = 0; i < powers.Length; i++)
            {
                sum += powers[i] * changes[i];
            }

            return -sum / (1.0 + sum);
        }

        double front = powers[0] * changes[0];
        double height = 1.0 - (space * powers[0]);
        double s = front + (height * powers[1] * changes[1]) - (space * front * powers[1] * (1.0 + changes[1]));
        return -((space * front) + (height * s)) / (1.0 + s);
    }
}
