using System.Collections.Immutable;
using System.Text.Json;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Catalogue.Tests;

/// <summary>The shipped files. Counts of flaws were made by a separate program over the dataset that the files were converted from.</summary>
public class ShippedCatalogueTests
{
    [Fact]
    public void ReadFolder_ShippedFiles_HasEveryGlassAndNoIssue()
    {
        Assert.Empty(Shipped.Reading.Issues);
        Assert.Equal(1636, Shipped.Stock.Glasses.Length);
        Dictionary<string, int> counts = Shipped.Stock.Glasses.CountBy(g => g.Maker).ToDictionary();
        Assert.Equal(
            new() { ["cdgm"] = 314, ["hikari"] = 363, ["hoya"] = 190, ["lzos"] = 26, ["ohara"] = 410, ["schott"] = 157, ["sumita"] = 176 },
            counts);
    }

    [Fact]
    public void Supply_ShippedFiles_CountsOfTheDataset()
    {
        Dictionary<Supply, int> counts = Shipped.Stock.Glasses.CountBy(g => g.Supply).ToDictionary();
        Assert.Equal(
            new() { [Supply.Listed] = 886, [Supply.Unconfirmed] = 465 + 26, [Supply.Recommended] = 182, [Supply.Discontinued] = 53, [Supply.OnRequest] = 24 },
            counts);
        Assert.Equal(19, Shipped.Stock.Glasses.Count(g => g.ContainsLead));
        Assert.Equal(160, Shipped.Stock.Glasses.Count(g => g.Process is not null));
        Assert.Equal("N-FK51A", Shipped.Glass("schott/N-FK51").ReplacedBy);
    }

    /// <summary>Source: the maker's data sheet of N-BK7, edition 2017, as in doi:10.1038/s41597-023-02898-2 (CC0).</summary>
    [Fact]
    public void ReadFolder_NBk7_EveryFieldOfTheDataSheet()
    {
        Glass glass = Shipped.Glass("schott/N-BK7");
        Assert.Equal(
            [new SellmeierTerm(1.03961212, 0.00600069867), new(0.231792344, 0.0200179144), new(1.01046945, 103.560653)],
            Assert.IsType<SellmeierFormula>(glass.Formula).Terms.AsEnumerable());
        Assert.Equal(WavelengthRange.FromNanometers(300, 2500), glass.Range);
        Assert.Equal(new StatedValues(1.5168, 64.17, -0.0009, "517642.251"), glass.Stated);
        Assert.Equal(new ThermalIndex(1.86e-6, 1.31e-8, -1.37e-11, 4.34e-7, 6.27e-10, 0.17), glass.Thermal);
        Assert.Equal((20.0, 7.1e-6, 8.3e-6, 2.51), (glass.ReferenceCelsius, glass.ExpansionPerKelvin, glass.HighExpansionPerKelvin, glass.DensityGramsPerCm3));
        Assert.Equal(new ResistanceClasses(1, 0, 1, 2.3, 2.3), glass.Resistance);
        Assert.Equal((Supply.Listed, "2017", false, null, null), (glass.Supply, glass.Edition, glass.ContainsLead, glass.Process, glass.AnnealRateKelvinPerHour));
        Assert.Equal(25, glass.Extinction.Length);
        Assert.Equal(new ExtinctionSample(Wavelength.FromNanometers(546), 6.9658e-9), glass.Extinction[15]);
        Assert.Empty(Shipped.Stock.RemarksOn(glass));
    }

    [Fact]
    public void ReadFolder_Twins_AreThoseOfTheDataset()
    {
        DispersionFormula[][] twins = [.. Shipped.Stock.Glasses.Where(g => g.Fit is null).GroupBy(g => g.Formula).Where(g => g.Count() > 1).Select(g => g.Select(x => x.Formula).ToArray())];
        Assert.Equal((99, 213), (twins.Length, twins.Sum(t => t.Length)));
    }

    [Theory]
    [InlineData("states nd", 17)]
    [InlineData("states vd", 41)]
    [InlineData("states the code", 50)]
    [InlineData("only D0", 242)]
    [InlineData("No coefficients of the index's change", 312 + 26)]
    [InlineData("No expansion", 76 + 26)]
    [InlineData("λ_TK is stated as -", 2)]
    [InlineData("density of exactly 1", 2)]
    [InlineData("negative extinction", 2)]
    [InlineData("Two extinction coefficients", 1)]
    [InlineData("extinction coefficients are stated; transmittance", 19)]
    [InlineData("which cannot be checked", 1)]
    public void Remarks_KnownFlaws_AreFoundAsOftenAsInTheDataset(string part, int count) =>
        Assert.Equal(count, Shipped.Stock.Remarks.Count(r => r.Message.Contains(part, StringComparison.Ordinal)));

    [Fact]
    public void Remarks_StatedDeltaPgF_MisprintsOfTheDatasetAndNoOther() => Assert.Equal(
        ["hikari/J-LAK10", "hikari/Q-LASFH58S", "hikari/Q-LASFH59S", "ohara/L-BAL43"],
        Shipped.Stock.Remarks.Where(r => r.Message.Contains("from the normal line", StringComparison.Ordinal)).Select(r => r.GlassId).Order(StringComparer.Ordinal));

    [Fact]
    public void Remarks_StatedNd_NameBothValues() => Assert.Contains(
        new GlassRemark("sumita/K-BaSF4", "The maker states nd 1.65128; the formula gives 1.651293."), Shipped.Stock.Remarks);

    [Fact]
    public void ReadFolder_MeasuredGlasses_AreFittedOverTheirTableWithoutMisprints()
    {
        Glass[] measured = [.. Shipped.Stock.Glasses.Where(g => g.Fit is not null)];
        Assert.Equal(26, measured.Length);
        Assert.All(measured, g => Assert.Equal("lzos", g.Maker));
        (string Id, double Nanometers)[] misprints = [.. measured.SelectMany(g => g.Fit!.LeftOut.Select(l => (g.Id, l.Measured.Wavelength.Nanometers)))];
        Assert.Equal([("lzos/BK10", 1128.6), ("lzos/CTK12", 365.0), ("lzos/TK9", 852.1)], misprints);
        Assert.All(misprints, m => Assert.Contains(Shipped.Stock.RemarksOn(Shipped.Glass(m.Id)), r => r.Message.StartsWith("A measured index was left out", StringComparison.Ordinal)));
        Assert.Equal(WavelengthRange.FromNanometers(365, 2325.4), Shipped.Glass("lzos/TK9").Range);
    }

    [Fact]
    public void Metadata_EveryFileAndColumn_IsWhatTheReaderTakes()
    {
        using JsonDocument group = JsonDocument.Parse(File.ReadAllBytes(Path.Combine(Shipped.Folder, "csv-metadata.json")));
        string[] described = [.. group.RootElement.GetProperty("tables").EnumerateArray().Select(t => t.GetProperty("url").GetString()!)];
        Assert.Equal(Directory.GetFiles(Shipped.Folder, "*.csv").Select(Path.GetFileName).Order(StringComparer.Ordinal), described);
        Assert.All(group.RootElement.GetProperty("tables").EnumerateArray(), t => Assert.Equal("glass-schema.json", t.GetProperty("tableSchema").GetString()));

        using JsonDocument schema = JsonDocument.Parse(File.ReadAllBytes(Path.Combine(Shipped.Folder, "glass-schema.json")));
        JsonElement[] columns = [.. schema.RootElement.GetProperty("columns").EnumerateArray()];
        string header = string.Join(',', CatalogueFormat.Columns.Select(c => c.Name));
        Assert.All(described, file => Assert.Equal(header, File.ReadLines(Path.Combine(Shipped.Folder, file)).First()));
        Assert.Equal(CatalogueFormat.Columns.Length, columns.Length);
        foreach ((CatalogueColumn column, JsonElement element) in CatalogueFormat.Columns.Zip(columns))
        {
            JsonElement type = element.GetProperty("datatype");
            Assert.Equal((column.Name, column.Meaning), (element.GetProperty("name").GetString(), element.GetProperty("dc:description").GetString()));
            Assert.Equal(column.Kind == CellKind.Samples, element.TryGetProperty("separator", out _));
            Assert.Equal(CatalogueFormat.Required.Contains(column.Name), element.TryGetProperty("required", out _));
            Assert.Equal(column.Quantity?.Unit ?? "", element.TryGetProperty("schema:unitText", out JsonElement unit) ? unit.GetString() : "");
            switch (column.Kind)
            {
                case CellKind.Number:
                    Assert.Equal((column.Quantity!.Min, column.Quantity.Max), (type.GetProperty("minimum").GetDouble(), type.GetProperty("maximum").GetDouble()));
                    break;
                case CellKind.Choice:
                    Assert.Equal(string.Join('|', column.Choices), type.GetProperty("format").GetString());
                    break;
                case CellKind.Text:
                    Assert.Equal(column.MaxLength, type.GetProperty("maxLength").GetInt32());
                    break;
            }
        }
    }

    [Fact]
    public void Remarks_EveryOne_IsOnAGlassOfTheStock() =>
        Assert.All(Shipped.Stock.Remarks, r => Assert.True(Shipped.Stock.TryFind(r.GlassId, out _)));

    [Fact]
    public void TryFind_CaseSpacesAndDashes_DoNotCount()
    {
        Assert.Equal("schott/N-BK7", Shipped.Glass(" SCHOTT/n\u2013bk 7").Id);
        Assert.False(Shipped.Stock.TryFind("schott/NBK7", out _));
    }

    /// <summary>Source: the wavelengths of the named lines in the code, which the optics tests check.</summary>
    [Fact]
    public void SpectralLines_ShippedTable_HoldsTheNamedLinesInRisingWavelength()
    {
        ImmutableArray<SpectralLine> lines = SpectralLineReader.ReadFile(Path.Combine(AppContext.BaseDirectory, "data", "spectral-lines.csv"));
        Assert.Equal(
            ["i", "h", "g", "F'", "F", "e", "d", "D", "632.8", "C'", "C", "r", "A'", "s", "t", "1060", "1529.6", "1970.1", "2325.4"],
            lines.Select(l => l.Symbol));
        Assert.Equal(lines.OrderBy(l => l.Wavelength), lines);
        foreach (SpectralLine named in new[]
            {
                SpectralLine.MercuryG, SpectralLine.CadmiumFPrime, SpectralLine.HydrogenF, SpectralLine.MercuryE,
                SpectralLine.HeliumD, SpectralLine.CadmiumCPrime, SpectralLine.HydrogenC,
            })
        {
            Assert.Contains(named, lines);
        }
    }

    [Fact]
    public void DemoRequirement_IsOfTheApisShapeAndSaysThatItIsInvented()
    {
        using JsonDocument demo = JsonDocument.Parse(File.ReadAllBytes(Path.Combine(AppContext.BaseDirectory, "data", "demo", "requirement.json")));
        Assert.Contains("invented", demo.RootElement.GetProperty("note").GetString(), StringComparison.Ordinal);
        JsonElement band = demo.RootElement.GetProperty("band");
        var made = Band.Even(
            Wavelength.FromNanometers(band.GetProperty("shortNm").GetDouble()),
            Wavelength.FromNanometers(band.GetProperty("designNm").GetDouble()),
            Wavelength.FromNanometers(band.GetProperty("longNm").GetDouble()),
            band.GetProperty("samples").GetInt32());
        Assert.Equal((SpectralLine.MercuryG.Wavelength, SpectralLine.MercuryE.Wavelength, SpectralLine.HydrogenC.Wavelength), (made.ShortEnd, made.Design, made.LongEnd));
        Assert.Equal((240.0, 6.0), (demo.RootElement.GetProperty("focalLengthMm").GetDouble(), demo.RootElement.GetProperty("fNumber").GetDouble()));
    }
}
