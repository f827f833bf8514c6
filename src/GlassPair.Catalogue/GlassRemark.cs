namespace GlassPair.Catalogue;

/// <summary>Something that the reader noticed about a glass: the catalogue is used all the same.</summary>
/// <param name="GlassId">The glass, <c>maker/name</c>.</param>
/// <param name="Message">What, as a sentence, with both values where two disagree.</param>
public sealed record GlassRemark(string GlassId, string Message);
