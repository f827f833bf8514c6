using GlassPair.Catalogue;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Lenses;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Stocks;
using GlassPair.Web.Work;
using Microsoft.AspNetCore.Http.HttpResults;

namespace GlassPair.Web.Api;

/// <summary>Traces exact rays.</summary>
internal static class TraceEndpoint
{
    private const double Degree = Math.PI / 180.0;

    /// <summary>Traces exact rays through a prescription, object at infinity, stop at the first surface.</summary>
    /// <remarks>A ray that misses a surface or is totally reflected is part of the answer. 422 where a glass has no index at a wavelength, where surfaces cross inside the aperture, or where no image plane can be found.</remarks>
    public static async Task<Results<Ok<TraceJson>, ProblemHttpResult>> Trace(
        JsonBody<TraceRequestJson> body, StockLibrary library, WorkGate gate, CancellationToken cancellation)
    {
        (TraceRequestJson json, FieldFaults faults) = (body.Value, body.Faults);
        CheckTogether(json, faults);
        if (faults.Any)
        {
            return Problems.Faulty(faults);
        }

        string[] ids = [.. json.Surfaces.Select(s => s.Glass).OfType<string>().Distinct(StringComparer.OrdinalIgnoreCase)];
        if (!library.TryFindStock(json.Stock, out Stock? stock, out ProblemHttpResult? problem)
            || !stock.TryFindAll(ids, out Glass[] glasses, out problem))
        {
            return problem;
        }

        Dictionary<string, Glass> named = ids.Zip(glasses).ToDictionary(p => p.First, p => p.Second, StringComparer.OrdinalIgnoreCase);
        Wavelength[] light = [.. json.Nm.Select(Wavelength.FromNanometers)];
        (Glass, Wavelength)[] misses = [.. glasses.Distinct().SelectMany(g => light.Where(w => !g.Range.Contains(w)).Select(w => (g, w)))];
        if (misses.Length > 0)
        {
            return Problems.OutOfRange(misses);
        }

        var prescription = new Prescription(json.Surfaces.Select(s =>
            Surface.FromRadius(s.RadiusMm, s.ThicknessMm.GetValueOrDefault(), s.Glass is { } id ? named[id] : null) with { ConicConstant = s.ConicConstant ?? 0.0 }));
        if (prescription.FindCrossing(0.5 * json.ApertureDiameterMm) is { } crossing)
        {
            return Problems.NoLens(crossing.Message);
        }

        MonochromaticLens lens = prescription.At(light[0]);
        FirstOrder first = FirstOrder.Of(lens);
        double plane = json.ImagePlaneMm ?? first.ImageDistance;
        if (!double.IsFinite(plane))
        {
            return Problems.NoLens("The lens has no focus at the first wavelength: give the image plane in imagePlaneMm.");
        }

        return TypedResults.Ok(await gate.RunAsync(
            stop => new TraceJson
            {
                ImagePlaneMm = plane,
                EffectiveFocalLengthMm = Finite(first.FocalLength),
                BackFocalLengthMm = Finite(first.BackFocus),
                ThirdOrder = new ThirdOrderJson(SeidelSums.Of(
                    lens,
                    0.5 * json.ApertureDiameterMm,
                    Math.Tan(json.FieldDeg * Degree),
                    light.Length >= 3 ? prescription.At(light.Min()) : null,
                    light.Length >= 3 ? prescription.At(light.Max()) : null)),
                Rays = [.. TraceAll(json, prescription, light, first.ExitPupil, plane, stop)],
            },
            cancellation));
    }

    private static IEnumerable<TracedRayJson> TraceAll(
        TraceRequestJson json, Prescription prescription, Wavelength[] light, double exitPupil, double plane, CancellationToken stop)
    {
        ReferenceSphere? sphere = null;
        foreach (Wavelength wavelength in light)
        {
            stop.ThrowIfCancellationRequested();
            MonochromaticLens lens = prescription.At(wavelength);
            TracedRay chief = RayTrace.Through(lens, PupilRay.At(lens, 0.0, 0.5 * json.ApertureDiameterMm, json.FieldDeg, 0.0, 0.0));
            if (wavelength == light[0] && chief.Passed)
            {
                sphere = ReferenceSphere.About(RayTrace.ToPlane(chief.Ray, plane), exitPupil);
            }

            double? chiefPath = chief.Passed ? sphere?.PathOf(RayTrace.ToPlane(chief.Ray, plane)) : null;
            foreach (double[] point in json.Pupil)
            {
                TracedRay traced = RayTrace.Through(lens, PupilRay.At(lens, 0.0, 0.5 * json.ApertureDiameterMm, json.FieldDeg, point[0], point[1]));
                if (!traced.Passed)
                {
                    yield return new TracedRayJson(wavelength.Nanometers, point, Failed: traced.Failure, AtSurface: traced.AtSurface + 1);
                    continue;
                }

                Ray ray = RayTrace.ToPlane(traced.Ray, plane);
                yield return new TracedRayJson(
                    wavelength.Nanometers, point, [ray.X, ray.Y], [ray.L, ray.M, ray.N], ray.Path, (sphere?.PathOf(ray) - chiefPath) / wavelength.Millimeters);
            }
        }
    }

    private static void CheckTogether(TraceRequestJson json, FieldFaults faults)
    {
        if (!faults.Concern("surfaces"))
        {
            for (int i = 0; i < json.Surfaces.Length; i++)
            {
                SurfaceJson surface = json.Surfaces[i];
                if (surface.RadiusMm is { } radius && !(Math.Abs(radius) >= 1e-6))
                {
                    faults.Add(FormattableString.Invariant($"surfaces[{i}].radiusMm"), "Must not be 0 or closer to it than 0.000001 mm; null means a plane.");
                }

                if (surface.ThicknessMm is null && i < json.Surfaces.Length - 1)
                {
                    faults.Add(FormattableString.Invariant($"surfaces[{i}].thicknessMm"), "Missing; only the last surface goes without.");
                }
            }

            if (json.Surfaces[^1].Glass is not null)
            {
                faults.Add(FormattableString.Invariant($"surfaces[{json.Surfaces.Length - 1}].glass"), "Must be left out: the last surface stands in air.");
            }
        }

        if (!faults.Concern("pupil"))
        {
            for (int i = 0; i < json.Pupil.Length; i++)
            {
                if (json.Pupil[i].Length != 2)
                {
                    faults.Add(FormattableString.Invariant($"pupil[{i}]"), "Must be two numbers, [x, y].");
                }
            }

            if (!faults.Concern("nm") && (long)json.Nm.Length * json.Pupil.Length > TraceRequestJson.MaxRays)
            {
                faults.Add("pupil", FormattableString.Invariant($"Wavelengths times pupil points must be at most {TraceRequestJson.MaxRays}; they are {(long)json.Nm.Length * json.Pupil.Length}."));
            }
        }
    }

    private static double? Finite(double value) => double.IsFinite(value) ? value : null;
}
