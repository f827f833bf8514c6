namespace GlassPair.Web.Api;

/// <summary>Request bodies that show how to call, for the OpenAPI document; an invented objective.</summary>
internal static class Examples
{
    private const string Requirement =
        """{ "focalLengthMm": 320, "fNumber": 8, "halfFieldDeg": 0.6, "band": { "shortNm": 486.1327, "designNm": 587.5618, "longNm": 656.2725, "samples": 9 }, "balance": "bandBalanced" }""";

    /// <summary>A cemented pair.</summary>
    public const string Pair = $$"""{ "requirement": {{Requirement}}, "glasses": ["schott/N-BK7", "schott/F2"] }""";

    /// <summary>A cemented triplet.</summary>
    public const string Triplet = $$"""{ "requirement": {{Requirement}}, "glasses": ["schott/N-FK58", "schott/N-KZFS4", "schott/N-SF6"] }""";

    /// <summary>The best pairs of two makers.</summary>
    public const string Shortlist =
        $$"""{ "requirement": {{Requirement}}, "makers": ["schott", "ohara"], "supply": ["recommended", "listed"], "rankBy": "expectedResidual", "take": 10 }""";

    /// <summary>Five indices of a borosilicate crown.</summary>
    public const string Fit =
        """{ "form": "powerSeries", "terms": 3, "nm": [435.8343, 486.1327, 546.074, 587.5618, 656.2725], "index": [1.52668, 1.52238, 1.51872, 1.5168, 1.51432] }""";

    /// <summary>Three rays through a cemented doublet.</summary>
    public const string Trace =
        """{ "surfaces": [{ "radiusMm": 187.5, "thicknessMm": 8, "glass": "schott/N-BK7" }, { "radiusMm": -141.2, "thicknessMm": 4, "glass": "schott/F2" }, { "radiusMm": -612.4 }], "nm": [587.5618, 486.1327, 656.2725], "apertureDiameterMm": 40, "fieldDeg": 0.5, "pupil": [[0, 0], [0, 1], [0.7, 0.7]] }""";
}
