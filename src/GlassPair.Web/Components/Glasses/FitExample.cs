namespace GlassPair.Web.Components.Glasses;

/// <summary>A table to try the fit with. Its indices are invented: no glass has them.</summary>
public static class FitExample
{
    /// <summary>The state with the table; the index at 852.11 nm is off, as if misprinted.</summary>
    public static FitState State { get; } = FitState.Empty with
    {
        Text = """
            # invented indices, of no glass that exists
            nm        n
            365.01    1.627313
            404.66    1.614226
            435.83    1.606905
            479.99    1.599261
            486.13    1.598382
            546.07    1.591459
            587.56    1.587932
            589.29    1.587803
            632.80    1.584861
            643.85    1.584208
            656.27    1.583517
            706.52    1.581048
            768.20    1.578606
            852.11    1.575676
            1013.98   1.572215
            1128.60   1.570114
            """.ReplaceLineEndings("\n"),
        Name = "invented/example",
    };
}
