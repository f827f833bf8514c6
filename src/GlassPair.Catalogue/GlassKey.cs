using System.Globalization;
using System.Text;

namespace GlassPair.Catalogue;

/// <summary>What is left of a glass's id when upper and lower case, spaces and the kind of dash do not count.</summary>
internal static class GlassKey
{
    /// <summary>Gets the key of <c>maker/name</c>.</summary>
    public static string Of(string id)
    {
        var key = new StringBuilder(id.Length);
        foreach (char letter in id)
        {
            if (letter == '\u2212' || (letter > 127 && char.GetUnicodeCategory(letter) == UnicodeCategory.DashPunctuation))
            {
                key.Append('-');
            }
            else if (!char.IsWhiteSpace(letter))
            {
                key.Append(char.ToUpperInvariant(letter));
            }
        }

        return key.ToString();
    }
}
