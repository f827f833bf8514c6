using System.Collections.Immutable;
using Bunit;
using GlassPair.Optics.Color;
using GlassPair.Optics.Rankings;
using GlassPair.Optics.Requirements;
using GlassPair.Optics.Spectrum;
using GlassPair.Web.Components.Charts;
using GlassPair.Web.Tests.Glasses;

namespace GlassPair.Web.Tests.Charts;

/// <summary>A page whose charts think that the browser has drawn them; every call of our own script must have been set up.</summary>
public abstract class ChartTestBase : BunitContext
{
    protected ChartTestBase()
    {
        BunitJSModuleInterop library = JSInterop.SetupModule(i => i.Identifier == "import" && i.Arguments[0]!.ToString()!.Contains("plotly-interop", StringComparison.Ordinal));
        library.Mode = JSRuntimeMode.Loose;
        Script = JSInterop.SetupModule("./js/plot.js");
        Opened = Script.SetupVoid("open", _ => true);
        Opened.SetVoidResult();
        foreach (string name in new[] { "show", "close", "zoom", "download" })
        {
            Script.SetupVoid(name, _ => true).SetVoidResult();
        }
    }

    protected static Band Band { get; } =
        Band.Even(SpectralLine.MercuryG.Wavelength, SpectralLine.MercuryE.Wavelength, SpectralLine.HydrogenC.Wavelength, 9);

    protected static IndexTable Table { get; } = IndexTable.Of(ServedStock.Stock.Glasses.Where(g => g.Maker is "schott" or "ohara"), Band);

    protected BunitJSModuleInterop Script { get; }

    protected JSRuntimeInvocationHandler Opened { get; }

    /// <summary>Gets the figures sent to the browser, in order.</summary>
    private protected IReadOnlyList<PlotChart.FigureChange> Sent => [.. Script.Invocations["show"].Select(i => (PlotChart.FigureChange)i.Arguments[1]!)];

    protected static Requirement Asked(double focalLength = 240.0, double fNumber = 6.0) => new(focalLength, fNumber, Band) { ElementPowerLimit = 2.6 };

    protected static GlassIndices Glass(string id) => Table.Rows.Single(r => r.Glass.Id == id);

    protected static ThinSolution Solve(Requirement requirement, string positive, string negative) =>
        Assert.IsType<ThinSolution>(ThinPair.Solve(requirement, Glass(positive), Glass(negative)));

    protected static ImmutableArray<Candidate> Candidates(Requirement requirement, int count) =>
        PairRanking.Rank(Table, new ShortlistRequest(requirement, GlassLimits.None, DataQuality.UsualSupply, RankBy.ColorResidual, count)).Candidates;
}
