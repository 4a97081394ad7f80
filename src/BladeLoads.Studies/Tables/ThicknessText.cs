using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Tables;

/// <summary>What is said of a thickness over chord that is none.</summary>
internal static class ThicknessText
{
    // A section thinner than this is a plate: the number is no percentage then, but a slip.
    private const double ThinnestInPercent = 5;

    /// <summary>Above 0 to 1, and a percentage as what it would be.</summary>
    public static string WhatWouldDo(double thickness) => "it is thickness over chord, above 0 to 1"
        + (thickness is >= ThinnestInPercent and <= 100 ? $": {CanonicalText.Of(thickness / 100)}" : "");
}
