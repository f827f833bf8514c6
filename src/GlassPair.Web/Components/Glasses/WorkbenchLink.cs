using GlassPair.Optics.Glasses;
using GlassPair.Optics.Rankings;
using GlassPair.Web.Addresses;

namespace GlassPair.Web.Components.Glasses;

/// <summary>The way from a glass to the working page.</summary>
public static class WorkbenchLink
{
    /// <summary>Gets the address, relative to the site, of the working page that ranks the pairs which hold a glass, for the requirement last worked on.</summary>
    /// <param name="last">The requirement last worked on.</param>
    /// <param name="glass">The glass.</param>
    /// <param name="sign">The power that it takes; null for either.</param>
    public static string With(LastRequirement last, Glass glass, PowerSign? sign) => WorkbenchAddress.Write(last.State with
    {
        Include = [glass.Id],
        IncludeAs = sign,
        Exclude = last.State.Exclude.Remove(glass.Id),
        ChosenGlass = glass.Id,
        Chosen = null,
        Filter = "",
    });
}
