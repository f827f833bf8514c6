namespace GlassPair.Web.Components.Controls;
internal static class Placeholder;
