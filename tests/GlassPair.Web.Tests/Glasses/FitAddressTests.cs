using CsCheck;
using GlassPair.Optics.Glasses;
using GlassPair.Web.Components.Glasses;

namespace GlassPair.Web.Tests.Glasses;

public sealed class FitAddressTests
{
    internal static readonly Gen<FitState> States =
        from text in Gen.OneOf(Gen.String[0, 300], Gen.Select(Gen.Double[0.2, 2.4], Gen.Double[1.3, 2.0]).Array[0, 30].Select(rows => string.Join('\n', rows.Select(r => FormattableString.Invariant($"{r.Item1} {r.Item2}")))))
        from separator in Gen.Enum<FieldSeparator>().Nullable()
        from mark in Gen.Enum<DecimalMark>().Nullable()
        from unit in Gen.Enum<WavelengthUnit>().Nullable()
        from form in Gen.Enum<DispersionForm>().Nullable()
        from terms in Gen.Int[1, 6]
        from leftOut in Gen.Double[100.0, 2000.0].Array[0, 5]
        from name in Gen.String[0, FitState.MaxNameLength]
        select new FitState
        {
            Text = text.ReplaceLineEndings("\n"),
            Table = new TableForm(separator, mark, unit),
            Form = form,
            Terms = form is null ? null : terms,
            LeftOut = [.. leftOut],
            Name = name,
        };

    [Fact]
    public void Read_WhatWasWritten_GivesTheSameState() => States.Sample(state =>
    {
        (FitState read, var notices) = FitAddress.Read(FitAddress.Write(state));
        return notices.IsEmpty && read with { LeftOut = [] } == state with { LeftOut = [] } && read.LeftOut.SetEquals(state.LeftOut);
    });

    [Fact]
    public void Read_AnyText_NeverThrows() => Gen.String.Sample(query => FitAnswer.Of(FitAddress.Read(query).State) is not null);

    [Fact]
    public void Write_FortyRows_HoldsTheTable()
    {
        FitState state = FitState.Empty with { Text = string.Join("\r\n", Enumerable.Range(0, 40).Select(i => FormattableString.Invariant($"{400 + (10 * i)}.1234\t1.{530000 - (i * 400)}"))) };
        Assert.True(FitAddress.HoldsTable(state));
        Assert.Equal(40, FitAnswer.Of(FitAddress.Read(FitAddress.Write(state)).State).Table.Rows.Length);
    }

    [Fact]
    public void Write_TableTooLong_LeavesItOutAndKeepsTheRest()
    {
        FitState state = FitExample.State with { Text = new string('1', 5000), Form = DispersionForm.Sellmeier };
        Assert.False(FitAddress.HoldsTable(state));
        Assert.True(FitAddress.Write(state).Length < FitAddress.MaxLength);
        FitState read = FitAddress.Read(FitAddress.Write(state)).State;
        Assert.Equal(("", DispersionForm.Sellmeier), (read.Text, read.Form));
    }

    [Theory]
    [InlineData("?v=1&rows=404.66;1.54111%0A435.83;1.536704&unit=nm&form=sellmeier&terms=3&out=852.1&name=lab/melt+7")]
    [InlineData("")]
    public void Write_OfALinkOfFormat1_GivesThatLink(string link) => Assert.Equal(link, FitAddress.Write(FitAddress.Read(link).State));

    [Theory]
    [InlineData("?form=sellmeier&terms=9", "takes 1 to 6")]
    [InlineData("?form=cubic", "no choice for “form”")]
    [InlineData("?out=blue", "no wavelength")]
    public void Read_WhatMeansNothing_SaysSo(string link, string sentence) =>
        Assert.Contains(FitAddress.Read(link).Notices, n => n.Contains(sentence, StringComparison.Ordinal));
}
