using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Charts;

/// <summary>All glasses as dots, candidates as chords between a positive and a negative glass: a flat chord leaves little color.</summary>
public sealed partial class GlassMap : ComponentBase
{
    /// <summary>Gets or sets the glasses over the requirement's band.</summary>
    [Parameter, EditorRequired] public required IndexTable Table { get; set; }

    /// <summary>Gets or sets what the lens must do.</summary>
    [Parameter, EditorRequired] public required Requirement Requirement { get; set; }

    /// <summary>Gets or sets which glasses may be used.</summary>
    [Parameter] public GlassLimits Limits { get; set; } = GlassLimits.None;

    /// <summary>Gets or sets the ranked candidates; the first 60 are drawn as chords.</summary>
    [Parameter] public IReadOnlyList<Candidate> Candidates { get; set; } = [];

    /// <summary>Gets or sets the chosen combination, drawn thick and labelled; it need not be among <see cref="Candidates"/>.</summary>
    [Parameter] public ThinSolution? Chosen { get; set; }

    /// <summary>Gets or sets the combination pinned for comparison, drawn dashed.</summary>
    [Parameter] public ThinSolution? Pinned { get; set; }

    /// <summary>Gets or sets the glass whose partners are shown; null shows those of the positive glass of <see cref="Chosen"/>.</summary>
    [Parameter] public Glass? ChosenGlass { get; set; }

    /// <summary>Gets or sets the candidate pointed at elsewhere, such as in the ranking; its chord is thickened.</summary>
    [Parameter] public Candidate? Highlighted { get; set; }

    /// <summary>Gets or sets what stands on the vertical axis.</summary>
    [Parameter] public MapAxes Axes { get; set; }

    /// <summary>Called when the user asks for the other axes.</summary>
    [Parameter] public EventCallback<MapAxes> AxesChanged { get; set; }

    /// <summary>Called with the glass whose dot was clicked or tapped.</summary>
    [Parameter] public EventCallback<Glass> GlassPicked { get; set; }

    /// <summary>Called with the candidate whose chord was clicked or tapped.</summary>
    [Parameter] public EventCallback<Candidate> CandidatePicked { get; set; }

    /// <summary>Called with the candidate whose chord is pointed at; null when none is any more.</summary>
    [Parameter] public EventCallback<Candidate?> CandidateHovered { get; set; }

    /// <summary>Gets or sets whether a newer answer is being computed: the picture is dimmed.</summary>
    [Parameter] public bool Stale { get; set; }
}
