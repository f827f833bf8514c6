using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Web.Api;

/// <summary>Makes a requirement of its JSON: the rules that bind several fields together.</summary>
public static class RequirementReading
{
    /// <summary>The narrowest band, nm: below it the dispersion drowns in the rounding of the indices.</summary>
    public const double NarrowestBand = 1.0;

    /// <summary>Reads a requirement; null, with the reason in <paramref name="faults"/>, where it is faulty.</summary>
    /// <param name="json">The fields, each checked by itself.</param>
    /// <param name="path">Where the requirement stands in the body.</param>
    /// <param name="faults">What was found wrong so far; what binds fields is added.</param>
    public static Requirement? Read(RequirementJson? json, string path, FieldFaults faults)
    {
        if (json is null)
        {
            return null;
        }

        CheckSpacing(json, path, faults);
        CheckTemperature(json.Temperature, $"{path}.temperature", faults);
        Band? band = ReadBand(json.Band, $"{path}.band", faults);
        if (band is null || faults.Concern(path))
        {
            return null;
        }

        return new Requirement(json.FocalLengthMm, json.FNumber, band)
        {
            HalfFieldDegrees = json.HalfFieldDeg ?? 0.0,
            Balance = json.Balance ?? ColorBalance.BandBalanced,
            AirSpace = json.SpacingMm,
            ElementPowerLimit = json.Limits?.MaxElementPower,
            Temperature = json.Temperature is { } span ? new TemperatureSpan(span.FromC, span.ToC, span.HousingCtePerK) : null,
        };
    }

    private static void CheckSpacing(RequirementJson json, string path, FieldFaults faults)
    {
        if (faults.Concern($"{path}.construction") || faults.Concern($"{path}.spacingMm"))
        {
            return;
        }

        bool airSpaced = json.Construction == Construction.AirSpaced;
        if (airSpaced && json.SpacingMm is null)
        {
            faults.Add($"{path}.spacingMm", "Missing; construction is \"airSpaced\", so the air space is required.");
        }
        else if (!airSpaced && json.SpacingMm is not null)
        {
            faults.Add($"{path}.spacingMm", "Must be left out, or construction must be \"airSpaced\": cemented elements have no air between them.");
        }
        else if (json.SpacingMm >= json.FocalLengthMm && !faults.Concern($"{path}.focalLengthMm"))
        {
            faults.Add($"{path}.spacingMm", FormattableString.Invariant($"Must be less than the focal length, {json.FocalLengthMm} mm."));
        }
    }

    private static void CheckTemperature(TemperatureJson? json, string path, FieldFaults faults)
    {
        if (json is not null && json.ToC < json.FromC && !faults.Concern(path))
        {
            faults.Add($"{path}.toC", FormattableString.Invariant($"Must not be below fromC, {json.FromC}."));
        }
    }

    private static Band? ReadBand(BandJson? json, string path, FieldFaults faults)
    {
        if (json is null || faults.Concern(path))
        {
            return null;
        }

        return json.SamplesNm is { } samples ? ReadSampledBand(json, samples, path, faults) : ReadEvenBand(json, path, faults);
    }

    private static Band? ReadEvenBand(BandJson json, string path, FieldFaults faults)
    {
        if (json.Weights is not null)
        {
            faults.Add($"{path}.weights", "Needs samplesNm of equal length; samples spaced evenly have equal weights.");
        }

        double? shortNm = Required(json.ShortNm, $"{path}.shortNm", faults);
        double? designNm = Required(json.DesignNm, $"{path}.designNm", faults);
        double? longNm = Required(json.LongNm, $"{path}.longNm", faults);
        double? samples = Required(json.Samples, $"{path}.samples", faults);
        if (shortNm is { } s && designNm is { } m && longNm is { } l)
        {
            CheckOrder(s, m, l, path, faults);
        }

        return faults.Concern(path) ? null
            : Band.Even(Nanometers(shortNm!.Value), Nanometers(designNm!.Value), Nanometers(longNm!.Value), (int)samples!.Value);
    }

    private static Band? ReadSampledBand(BandJson json, double[] samples, string path, FieldFaults faults)
    {
        if (json.Samples is not null)
        {
            faults.Add($"{path}.samples", "Must be left out where samplesNm lists the samples.");
        }

        double shortNm = json.ShortNm ?? samples[0];
        double designNm = json.DesignNm ?? samples[(samples.Length - 1) / 2];
        double longNm = json.LongNm ?? samples[^1];
        for (int i = 0; i < samples.Length; i++)
        {
            string where = FormattableString.Invariant($"{path}.samplesNm[{i}]");
            if (i > 0 && !(samples[i] > samples[i - 1]))
            {
                faults.Add(where, FormattableString.Invariant($"Samples must rise; {samples[i]} nm follows {samples[i - 1]} nm."));
            }
            else if (samples[i] < shortNm || samples[i] > longNm)
            {
                faults.Add(where, FormattableString.Invariant($"Must lie in the band, {shortNm} nm to {longNm} nm."));
            }
        }

        double[] weights = json.Weights ?? [.. Enumerable.Repeat(1.0, samples.Length)];
        if (weights.Length != samples.Length)
        {
            faults.Add($"{path}.weights", FormattableString.Invariant($"Must hold one weight for each of samplesNm: {samples.Length}, not {weights.Length}."));
        }
        else if (!(weights.Max() >= 1e-6))
        {
            faults.Add($"{path}.weights", "At least one weight must be 0.000001 or more.");
        }

        if (!faults.Concern($"{path}.samplesNm"))
        {
            CheckOrder(shortNm, designNm, longNm, path, faults);
        }

        return faults.Concern(path) ? null
            : Band.FromSamples(Nanometers(shortNm), Nanometers(designNm), Nanometers(longNm), [.. samples.Select((nm, i) => new BandSample(Nanometers(nm), weights[i]))]);
    }

    private static void CheckOrder(double shortNm, double designNm, double longNm, string path, FieldFaults faults)
    {
        if (!(longNm - shortNm >= NarrowestBand))
        {
            faults.Add($"{path}.longNm", FormattableString.Invariant($"Must lie at least {NarrowestBand} nm above the short end, {shortNm} nm; it is {longNm} nm."));
        }
        else if (!(shortNm < designNm && designNm < longNm))
        {
            faults.Add($"{path}.designNm", FormattableString.Invariant($"Must lie between the short end, {shortNm} nm, and the long end, {longNm} nm; it is {designNm} nm."));
        }
    }

    private static double? Required(double? value, string path, FieldFaults faults)
    {
        if (value is null)
        {
            faults.Add(path, "Missing; required, or list the samples in samplesNm.");
        }

        return value;
    }

    private static Wavelength Nanometers(double value) => Wavelength.FromNanometers(value);
}
