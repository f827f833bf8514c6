using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Work;
using Microsoft.AspNetCore.Http.HttpResults;

namespace GlassPair.Web.Api;

/// <summary>Fits dispersion formulas.</summary>
internal static class FitEndpoint
{
    /// <summary>Fits a dispersion formula to measured indices by least squares.</summary>
    /// <remarks>422 where the best formula has a pole, or an index not above 1, between the measured wavelengths.</remarks>
    public static async Task<Results<Ok<FitJson>, ProblemHttpResult>> Fit(JsonBody<FitRequestJson> body, WorkGate gate, CancellationToken cancellation)
    {
        (FitRequestJson json, FieldFaults faults) = (body.Value, body.Faults);
        if (!faults.Concern("nm") && !faults.Concern("index") && json.Nm.Length != json.Index.Length)
        {
            faults.Add("index", FormattableString.Invariant($"Must hold one index for each of nm: {json.Nm.Length}, not {json.Index.Length}."));
        }

        if (faults.Any)
        {
            return Problems.Faulty(faults);
        }

        MeasuredIndex[] measured = [.. json.Nm.Zip(json.Index, (nm, index) => new MeasuredIndex(Wavelength.FromNanometers(nm), index))];
        switch (await gate.RunAsync(_ => DispersionFitter.Fit(measured, json.Form, json.Terms), cancellation))
        {
            case DispersionFit fit:
                return TypedResults.Ok(new FitJson(fit));
            case NoDispersionFit { Faults: [{ Kind: FitFaultKind.UnsoundFormula }] unsound }:
                return Problems.NoFit(unsound[0].Sentence);
            case NoDispersionFit none:
                foreach (FitFault fault in none.Faults)
                {
                    faults.Add(PathOf(fault), fault.Sentence);
                }

                return Problems.Faulty(faults);
            default:
                throw new InvalidOperationException("An outcome is a fit or none.");
        }
    }

    private static string PathOf(FitFault fault)
    {
        string field = fault.Kind switch
        {
            FitFaultKind.TermCount => "terms",
            FitFaultKind.Index => "index",
            _ => "nm",
        };
        return fault.Position is { } position ? FormattableString.Invariant($"{field}[{position}]") : field;
    }
}
