using GlassPair.Optics.Glasses;

namespace GlassPair.Web.Addresses;

/// <summary>The address of a glass's own page.</summary>
public static class GlassPageAddress
{
    /// <summary>Gets the address, relative to the site.</summary>
    public static string Of(Glass glass) => $"glasses/{Uri.EscapeDataString(glass.Maker)}/{Uri.EscapeDataString(glass.Name)}";
}
