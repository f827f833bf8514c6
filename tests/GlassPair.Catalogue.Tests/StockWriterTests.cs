using System.Text;
using CsCheck;
using GlassPair.Optics.Glasses;
using GlassPair.Optics.Spectrum;

namespace GlassPair.Catalogue.Tests;

/// <summary>What is written is read back as the same glasses.</summary>
public class StockWriterTests
{
    private const string FirstLetters = "ABCXYZabc019éß雪=+-@'#\"<{%(";
    private static readonly Gen<string> Word =
        Gen.Select(Gen.Char[FirstLetters], Gen.Char[" ABCdef0123456789-+=@'\"#,;.|()_éß雪"].Array[0, 20], (first, rest) => (first + new string(rest)).Trim());

    private static readonly Gen<double> Digits = Gen.Double[-1e-6, 1e-6];
    private static readonly Gen<DispersionFormula> Formula = Gen.OneOf(
        Gen.Select(Gen.Double[0.2, 1.2], Gen.Double[-0.01, 0.02], Gen.Int[1, 6], (b, c, terms) =>
            (DispersionFormula)new SellmeierFormula(Enumerable.Range(0, terms).Select(i => new SellmeierTerm(i == 0 ? b : b * 1e-3, i == 0 ? 0.008 : c)))),
        Gen.Select(Gen.Double[2.0, 3.0], Gen.Double[0.005, 0.02], Gen.Int[0, 6], (constant, a, terms) =>
            (DispersionFormula)new PowerSeriesFormula(constant, [new PowerTerm(-2, a), .. PowerSeriesFormula.Exponents.Where(e => e != -2).Take(terms).Select(e => new PowerTerm(e, a * 1e-6))])));

    private static readonly Gen<Glass> AnyGlass = Gen.Select(
        Word, Formula, Gen.Select(Gen.Double[300, 420], Gen.Double[700, 2500]), Gen.Select(Digits, Digits, Digits, Gen.Double[-1, 1]), Gen.Enum<Supply>(), Gen.Select(Word, Word, Gen.Bool, Gen.Bool),
        (name, formula, range, numbers, supply, other) => new Glass("maker", name, formula, WavelengthRange.FromNanometers(range.Item1, range.Item2))
        {
            Supply = supply,
            Process = other.Item3 ? other.Item1 : null,
            ReplacedBy = other.Item4 ? other.Item2 : null,
            ContainsLead = other.Item3,
            Thermal = other.Item4 ? new ThermalIndex(numbers.Item1, numbers.Item2, numbers.Item3 * 0.01, numbers.Item1, numbers.Item2, numbers.Item4) : null,
            ReferenceCelsius = 20 + numbers.Item1,
            ExpansionPerKelvin = numbers.Item1,
            DensityGramsPerCm3 = 2.0 + numbers.Item2,
            Stated = new StatedValues(1.5 + numbers.Item1, 60 + numbers.Item2, numbers.Item3, "517642.251"),
            Resistance = new ResistanceClasses(1, null, 52.3, null, 2.3),
            Extinction = [new ExtinctionSample(Wavelength.FromNanometers(400.125), Math.Abs(numbers.Item1)), new ExtinctionSample(Wavelength.FromNanometers(500), 0.0)],
            AnnealRateKelvinPerHour = 2.5 + numbers.Item4,
            Edition = "2017",
        });

    [Fact]
    public void Write_AnyGlass_IsReadBackTheSame() => AnyGlass.Sample(
        glass =>
        {
            StockReading reading = Read(StockWriter.ToText(glass));
            Glass back = Assert.Single(reading.Stock?.Glasses ?? throw new InvalidDataException(string.Join(Environment.NewLine, reading.Issues)));
            AssertSame(glass, back);
        },
        iter: 3000);

    [Fact]
    public void Write_ShippedCatalogue_IsReadBackTheSame()
    {
        StockReading reading = Read(StockWriter.ToText(Shipped.Stock.Glasses));
        Assert.Equal(Shipped.Stock.Glasses.Length, reading.Stock?.Glasses.Length);
        Assert.All(Shipped.Stock.Glasses.Zip(reading.Stock!.Glasses), pair => AssertSame(pair.First, pair.Second));
        Assert.Equal(StockWriter.ToText(Shipped.Stock.Glasses), StockWriter.ToText(reading.Stock.Glasses));
    }

    [Theory]
    [InlineData("=HYPERLINK(\"http:x\")")]
    [InlineData("@SUM(1)")]
    [InlineData("+1+cmd|x")]
    [InlineData("-1")]
    [InlineData("'=1")]
    [InlineData("''+1")]
    [InlineData("'quoted")]
    public void Write_TextThatASpreadsheetCouldRun_IsGuardedAndReadBack(string name)
    {
        var glass = new Glass("maker", name, new SellmeierFormula([new SellmeierTerm(1.25, 0.01)]), WavelengthRange.FromNanometers(400, 700));
        string text = StockWriter.ToText(glass);
        string cell = text.Split('\n')[1]["maker,".Length..].TrimStart('"');
        Assert.DoesNotContain(cell[0], "=+-@");
        Assert.Equal(name, Read(text).Stock?.Glasses[0].Name);
    }

    [Fact]
    public void ToText_OneGlass_HasTheHeaderOfTheShippedFiles()
    {
        string[] lines = StockWriter.ToText(Shipped.Glass("schott/N-BK7")).TrimEnd('\n').Split('\n');
        Assert.Equal(File.ReadLines(Path.Combine(Shipped.Folder, "schott.csv")).First(), lines[0]);
        Assert.Equal(2, lines.Length);
    }

    private static StockReading Read(string text) => StockReader.Read([CatalogueFile.FromBytes("written.csv", Encoding.UTF8.GetBytes(text))], "Written");

    private static void AssertSame(Glass expected, Glass actual)
    {
        Assert.Equal((expected.Id, expected.Formula, expected.Range), (actual.Id, actual.Formula, actual.Range));
        Assert.Equal((expected.Stated, expected.Thermal, expected.Resistance), (actual.Stated, actual.Thermal, actual.Resistance));
        Assert.Equal((expected.ReferenceCelsius, expected.ExpansionPerKelvin, expected.HighExpansionPerKelvin), (actual.ReferenceCelsius, actual.ExpansionPerKelvin, actual.HighExpansionPerKelvin));
        Assert.Equal((expected.DensityGramsPerCm3, expected.AnnealRateKelvinPerHour, expected.ContainsLead), (actual.DensityGramsPerCm3, actual.AnnealRateKelvinPerHour, actual.ContainsLead));
        Assert.Equal((expected.Supply, expected.ReplacedBy, expected.Process, expected.Edition), (actual.Supply, actual.ReplacedBy, actual.Process, actual.Edition));
        Assert.Equal(expected.Extinction.AsEnumerable(), actual.Extinction.AsEnumerable());
        Assert.Equal(expected.Fit?.LeftOut.Select(l => l.Measured), actual.Fit?.LeftOut.Select(l => l.Measured));
    }
}
