using System.Collections.Immutable;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Web.Addresses;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Components.Pages;

/// <summary>One limit given up, and the state without it.</summary>
/// <param name="Sentence">What is given up, in words.</param>
/// <param name="State">The state without it.</param>
public sealed record WorkbenchRelaxation(string Sentence, WorkbenchState State)
{
    /// <summary>Gets what could be given up where no pair holds: each limit that is set, alone.</summary>
    public static ImmutableArray<WorkbenchRelaxation> Of(WorkbenchState state, WorkbenchAnswer answer)
    {
        GlassLimits limits = answer.Shortlist.Request.Limits;
        var all = ImmutableArray.CreateBuilder<WorkbenchRelaxation>();
        if (answer.Pairs.Length > 0)
        {
            double nearest = RoundUp(answer.Pairs.Min(p => p.ColorLimitedFNumber));
            Add(nearest <= NumberField.FNumber.Max, $"Stop down to f/{FigureText.Plain(nearest)}", state.With(NumberField.FNumber, TypedNumber.Write(nearest)));
        }

        Add(answer.Shortlist.Request.Requirement.ElementPowerLimit is not null, $"Element power without limit instead of {state.TextOf(NumberField.ElementPower)} Φ", state.With(NumberField.ElementPower, ""));
        Add(state.AirSpaced, "Cemented instead of air-spaced", state with { AirSpaced = false });
        Add(limits.ExpansionDifference is not null, "Any difference in expansion", state.With(NumberField.ExpansionDifference, ""));
        Add(limits.Makers is not null, "Buy from every maker of the stock", state with { Makers = null });
        Add(limits.Supply is not null, "Every supply state, discontinued too", state with { Supply = [.. Enum.GetValues<Supply>()] });
        Add(!limits.AllowLead, "Glasses with lead too", state with { AllowLead = true });
        Add(!limits.AllowMolding, "Molding grades too", state with { AllowMolding = true });
        Add(!limits.Include.IsEmpty, $"Without demanding {string.Join(", ", limits.Include)}", state with { Include = WorkbenchState.NoGlasses });
        Add(!limits.Exclude.IsEmpty, $"With the {limits.Exclude.Count} excluded {(limits.Exclude.Count == 1 ? "glass" : "glasses")}", state with { Exclude = WorkbenchState.NoGlasses });
        return all.ToImmutable();

        void Add(bool isSet, string sentence, WorkbenchState without)
        {
            if (isSet)
            {
                all.Add(new WorkbenchRelaxation(sentence, without));
            }
        }
    }

    /// <summary>The next f-number that a person would say.</summary>
    private static double RoundUp(double fNumber)
    {
        double step = fNumber < 10.0 ? 0.1 : 1.0;
        return Math.Round((Math.Floor(fNumber / step) + 1.0) * step, 1);
    }
}
