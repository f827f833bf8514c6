using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Web.Figures;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>What to show where no pair stays inside the depth of focus.</summary>
public sealed partial class NoPairHolds : ComponentBase
{
    /// <summary>Gets or sets the answer in which none holds.</summary>
    [Parameter, EditorRequired] public required Shortlist Shortlist { get; set; }

    /// <summary>Gets or sets the ranked pairs.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<RankedPair> Pairs { get; set; }

    /// <summary>Gets or sets each limit given up, with how many pairs then hold; null where that is not known yet.</summary>
    [Parameter, EditorRequired] public required IReadOnlyList<(string Sentence, long? Holding)> Costs { get; set; }

    /// <summary>Called with the sentence of the limit to give up.</summary>
    [Parameter] public EventCallback<string> Applied { get; set; }

    private string Sentence
    {
        get
        {
            if (Pairs.MinBy(p => p.ColorLimitedFNumber) is not { } nearest)
            {
                return "No pair is within the limits.";
            }

            Requirement requirement = Shortlist.Request.Requirement;
            string depth = FigureText.Fixed(requirement.DepthOfFocus * 1e3, FigureText.MicrometerDecimals(requirement));
            return $"At f/{FigureText.Plain(requirement.FNumber)} no pair of {FigureText.Count(Shortlist.CombinationsFeasible)} stays inside the depth of focus, ±{depth} µm. "
                + $"The nearest, {nearest.Positive.Glass.Name} + {nearest.Negative.Glass.Name}, holds from {FigureText.FNumber(nearest.ColorLimitedFNumber)} on.";
        }
    }
}
