using CsCheck;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Addresses;
using GlassPair.Web.Components.Glasses;

namespace GlassPair.Web.Tests.Glasses;

public sealed class GlassPageAddressTests
{
    private static readonly Glass Crown = ServedStock.Stock.TryFind("schott/N-BK7", out Glass? glass) ? glass : throw new InvalidOperationException();

    [Fact]
    public void Read_WhatWasWritten_GivesTheSameState()
    {
        Gen<string> typed = Gen.String[0, NumberField.MaxLength];
        Gen.Select(typed, typed, typed, typed, Gen.String[1, NumberField.MaxLength].Null()).Sample((thickness, shortEnd, design, longEnd, stock) =>
        {
            GlassPageState state = new(thickness, shortEnd, design, longEnd, stock);
            string address = GlassPageAddress.Of(Crown, state);
            (GlassPageState read, var notices) = GlassPageAddress.Read(address.Contains('?', StringComparison.Ordinal) ? address[address.IndexOf('?', StringComparison.Ordinal)..] : "");
            return notices.IsEmpty && read == state;
        });
    }

    [Fact]
    public void Of_AnyState_ReadsOrSaysWhyNot()
    {
        Gen<string> typed = Gen.OneOf(Gen.String, Gen.Double.Select(d => d.ToString(System.Globalization.CultureInfo.InvariantCulture)), Gen.Double[100.0, 2500.0].Select(d => d.ToString("0.0", System.Globalization.CultureInfo.InvariantCulture)));
        Gen.Select(typed, typed, typed, typed).Sample((thickness, shortEnd, design, longEnd) =>
        {
            GlassPageReading reading = GlassPageReading.Of(new GlassPageState(thickness, shortEnd, design, longEnd, null));
            return (reading.Thickness is null) == reading.Problems.ContainsKey("thickness") && (reading.Band is not null || !reading.Problems.IsEmpty);
        });
    }

    [Theory]
    [InlineData("glasses/schott/N-BK7?v=1&thickness=25&short=g&design=e&long=C%27&stock=4f1c09ab12cd")]
    [InlineData("glasses/schott/N-BK7")]
    public void Of_ALinkOfFormat1_GivesThatLink(string link) =>
        Assert.Equal(link, GlassPageAddress.Of(Crown, GlassPageAddress.Read(link.Contains('?', StringComparison.Ordinal) ? link.Split('?')[1] : "").State));
}
