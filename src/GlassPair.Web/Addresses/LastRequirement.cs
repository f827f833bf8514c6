namespace GlassPair.Web.Addresses;

/// <summary>The state of the working page that a browser tab showed last, so that the way back from another page keeps the requirement. One for each circuit.</summary>
public sealed class LastRequirement
{
    /// <summary>Gets or sets the state; empty until the working page has been seen.</summary>
    public WorkbenchState State { get; set; } = WorkbenchState.Empty;
}
