using System.Collections.Immutable;
using System.Globalization;
using GlassPair.Optics.Color;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using Microsoft.AspNetCore.Components;
using GlassPair.Web.Figures;

namespace GlassPair.Web.Components.Charts;

/// <summary>All glasses as dots, candidates as chords between a positive and a negative glass: a flat chord leaves little color.</summary>
public sealed partial class GlassMap : ComponentBase
{
    /// <summary>The most candidates drawn as chords.</summary>
    public const int MostChords = 60;

    private const int MostPartnersListed = 100;
    private static readonly (MapAxes Axes, string Name)[] AxesNames = [(MapAxes.PartialDispersion, "P over V"), (MapAxes.Index, "n over V")];
    private readonly GlassMapFigure _drawing = new();
    private (IndexTable, Requirement, GlassLimits, ThinSolution?, ThinSolution?, Glass?, Candidate?, MapAxes) _shown;
    private ImmutableArray<Candidate> _drawn = [];
    private PlotFigure _figure = null!;
    private string _label = "";
    private GlassIndices? _pointedGlass;
    private Candidate? _pointedCandidate;

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

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        // A page renders for many reasons; the map is drawn again only for one of its own.
        var shown = (Table, Requirement, Limits, Chosen, Pinned, ChosenGlass, Highlighted, Axes);
        ImmutableArray<Candidate> drawn = [.. Candidates.Take(MostChords)];
        if (shown != _shown || !drawn.AsEnumerable().SequenceEqual(_drawn, ReferenceEqualityComparer.Instance))
        {
            (_shown, _drawn) = (shown, drawn);
            _figure = _drawing.Draw(this, _drawn);
            _label = Description();
        }
    }

    private static string PairName(ThinSolution solution) => string.Join(" + ", solution.Elements.Select(e => e.Glass.Name));

    private static string SlopeText(ThinSolution solution) =>
        solution.Elements.Length == 2 && Chord.SlopeOf(solution.Elements[0], solution.Elements[1]) is { } slope ? FigureText.PowerOfTen(slope, 2) : "";

    private static string Facts(ThinSolution solution) =>
        $"secondary spectrum {FigureText.ShortLength(solution.SecondarySpectrum)}, color residual {FigureText.ShortLength(solution.RmsFocalShift)} RMS, "
        + $"{(solution.Holds ? "holds" : "would hold")} down to f/{FigureText.Fixed(solution.ColorLimitedFNumber, 1)}";

    private static string SupplyText(Glass glass) =>
        FigureText.Of(glass.Supply) + (glass.Edition is { } edition ? $", maker’s list of {edition}" : "");

    private string? SpectrumWith(GlassIndices other) =>
        _drawing.Glass is { } glass && glass.Glass.Id != other.Glass.Id && Chord.SecondarySpectrum(Requirement, glass, other) is { } spectrum
            ? FigureText.ShortLength(spectrum)
            : null;

    private string Description()
    {
        string axis = Axes == MapAxes.Index ? "index" : "partial dispersion";
        string text = $"Glass map: {axis} over the Abbe number of the band, {Table.Rows.Length} glasses, {_drawn.Length} candidates as lines";
        text += Chosen is { } chosen ? $". Chosen: {PairName(chosen)}, {Facts(chosen)}" : "";
        text += Pinned is { } pinned ? $". Pinned: {PairName(pinned)}, {Facts(pinned)}" : "";
        return text + (_drawing.Glass is { } glass ? $". {_drawing.Partners.Length} glasses hold together with {glass.Glass.Name}" : "") + ".";
    }

    private string PartnersCaption(GlassIndices glass) => _drawing.Partners.Length > MostPartnersListed
        ? $"Glasses that hold together with {glass.Glass.Name}: the {MostPartnersListed} of least secondary spectrum out of {_drawing.Partners.Length}"
        : $"Glasses that hold together with {glass.Glass.Name}: {_drawing.Partners.Length}";

    private IEnumerable<GlassIndices> ListedPartners(GlassIndices glass) => _drawing.Partners
        .OrderBy(p => Math.Abs(Chord.SecondarySpectrum(Requirement, glass, p) ?? double.MaxValue))
        .Take(MostPartnersListed);

    private IEnumerable<(ThinSolution Solution, string Rank, Candidate? Candidate)> Listed()
    {
        if (Pinned is { } pinned)
        {
            yield return (pinned, "pinned", null);
        }

        if (Chosen is { } chosen && _drawn.All(c => !ReferenceEquals(c.Solution, chosen)))
        {
            yield return (chosen, "chosen", null);
        }

        foreach (Candidate candidate in _drawn)
        {
            yield return (candidate.Solution, candidate.Rank.ToString(CultureInfo.InvariantCulture), candidate);
        }
    }

    private Task PickAsync(PlotPick pick) => pick.Kind switch
    {
        PlotPickKind.Point when pick.Index < Table.Rows.Length => GlassPicked.InvokeAsync(Table.Rows[pick.Index].Glass),
        PlotPickKind.Line when pick.Index < _drawn.Length => CandidatePicked.InvokeAsync(_drawn[pick.Index]),
        _ => Task.CompletedTask,
    };

    private async Task HoverAsync(PlotPick? pick)
    {
        Candidate? before = _pointedCandidate;
        _pointedGlass = pick is { Kind: PlotPickKind.Point } point && point.Index < Table.Rows.Length ? Table.Rows[point.Index] : null;
        _pointedCandidate = pick is { Kind: PlotPickKind.Line } line && line.Index < _drawn.Length ? _drawn[line.Index] : null;
        if (!ReferenceEquals(before, _pointedCandidate))
        {
            await CandidateHovered.InvokeAsync(_pointedCandidate);
        }
    }
}
