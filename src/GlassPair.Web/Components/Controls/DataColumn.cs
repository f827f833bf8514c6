using Microsoft.AspNetCore.Components;

namespace GlassPair.Web.Components.Controls;

/// <summary>A column of a <see cref="DataTable{TItem}"/>.</summary>
/// <typeparam name="TItem">What a row shows.</typeparam>
/// <param name="Key">Its name, unique in the table.</param>
/// <param name="Title">Its heading.</param>
/// <param name="Unit">The unit, shown below the heading; empty where there is none.</param>
/// <param name="Meaning">What it tells, as a sentence; shown at the heading.</param>
/// <param name="Cell">What a cell shows.</param>
/// <param name="CanSort">Whether the heading sorts.</param>
/// <param name="IsNumber">Whether cells stand at the right.</param>
/// <param name="Class">Further classes of heading and cells.</param>
public sealed record DataColumn<TItem>(
    string Key, string Title, string Unit, string Meaning, RenderFragment<TItem> Cell, bool CanSort, bool IsNumber, string? Class = null);
