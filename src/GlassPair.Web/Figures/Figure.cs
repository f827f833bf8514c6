namespace GlassPair.Web.Figures;

/// <summary>A number with all that it takes to check it.</summary>
/// <param name="Name">What it is.</param>
/// <param name="Value">The number as shown.</param>
/// <param name="Unit">Its unit.</param>
/// <param name="Formula">How it is computed.</param>
/// <param name="Inputs">The formula with the numbers put in.</param>
/// <param name="Source">Where the formula comes from.</param>
public sealed record Figure(string Name, string Value, string Unit, string Formula, string Inputs, string Source);

/// <summary>What a figure means for the lens, as a sentence.</summary>
/// <param name="Verdict">How it stands to its limit.</param>
/// <param name="Title">The judgement in a few words.</param>
/// <param name="Sentence">The number, the limit and the consequence.</param>
public sealed record Finding(Verdict Verdict, string Title, string Sentence);
