using System.Text;
using CsCheck;

namespace GlassPair.Catalogue.Tests;

/// <summary>Whatever the bytes, reading gives a stock or says why not; it never throws.</summary>
public class RobustnessTests
{
    private static readonly byte[] Good = Encoding.UTF8.GetBytes(
        "maker,name,form,range_from_nm,range_to_nm,b1,c1_um2,index_at_nm,nd,supply\r\nschott,A,sellmeier,400,700,1.25,0.01,,1.5,listed\n\"x\",B,measured,,,,,400 1.53; 500 1.52; 600 1.515; 700 1.512,,listed\n");

    [Fact]
    public void Read_AnyBytes_EndsInAStockOrAnError() => Gen.Byte.Array[0, 400].Sample(Check, iter: 5000);

    [Fact]
    public void Read_GoodFileWithBytesChanged_EndsInAStockOrAnError() =>
        Gen.Select(Gen.Int[0, Good.Length - 1], Gen.Char["\",;\n\r\t#'|=e.-+09aZ \u00c3\u00ff\u0000"].Select(c => (byte)c), Gen.Int[0, 2]).Array[1, 6].Sample(
            edits =>
            {
                List<byte> bytes = [.. Good];
                foreach ((int at, byte value, int kind) in edits)
                {
                    int place = Math.Min(at, bytes.Count - 1);
                    switch (kind)
                    {
                        case 0: bytes[place] = value; break;
                        case 1: bytes.Insert(place, value); break;
                        default: bytes.RemoveAt(place); break;
                    }
                }

                Check([.. bytes]);
            },
            iter: 20_000);

    private static void Check(byte[] bytes)
    {
        StockReading reading = StockReader.Read([CatalogueFile.FromBytes("any.csv", bytes)], "Any");
        bool hasError = reading.Issues.Any(i => i.Severity == IssueSeverity.Error);
        Assert.True((reading.Stock is null) == hasError);
        Assert.All(reading.Issues, i => Assert.True(i.Message.Length > 0 && i.Value.Length <= 40 && i.Line >= 0));
    }
}
