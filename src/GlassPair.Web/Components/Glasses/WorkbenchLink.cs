using GlassPair.Optics.Glasses;
using GlassPair.Web.Addresses;

namespace GlassPair.Web.Components.Glasses;

/// <summary>The way from a glass to the working page.</summary>
public static class WorkbenchLink
{
    /// <summary>Gets the address, relative to the site, of the working page that ranks the pairs which hold a glass.</summary>
    public static string With(Glass glass) =>
        WorkbenchAddress.Write(WorkbenchState.Empty with { Include = [glass.Id], ChosenGlass = glass.Id });
}
