using GlassPair.Web.Addresses;
using GlassPair.Web.Tests.Glasses;

namespace GlassPair.Web.Tests.Addresses;

public sealed class DemoRequirementTests
{
    [Fact]
    public void Read_ShippedFile_CanBeRankedAtOnce()
    {
        var demo = DemoRequirement.Read(Path.Combine(AppContext.BaseDirectory, "data", "demo", "requirement.json"));

        Assert.NotEmpty(demo.Title);
        Assert.NotNull(FormReading.Of(demo.State, ServedStock.Stock).Request);
    }

    [Theory]
    [InlineData("{}")]
    [InlineData("{ \"title\": \"x\" }")]
    [InlineData("not JSON")]
    public void Read_FileThatIsNone_SaysSo(string json)
    {
        string path = Path.GetTempFileName();
        File.WriteAllText(path, json);

        try
        {
            Assert.Contains(path, Assert.Throws<InvalidDataException>(() => DemoRequirement.Read(path)).Message, StringComparison.Ordinal);
        }
        finally
        {
            File.Delete(path);
        }
    }
}
