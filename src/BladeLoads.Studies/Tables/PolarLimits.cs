using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Tables;

/// <summary>What a polar table must keep to, whether it is one of ours or a foreign one. Common practice, no source.</summary>
public static class PolarLimits
{
    /// <summary>Rows of one Reynolds number, and angles that tables have in common where one is made between them.</summary>
    public const int FewestRows = 3;

    /// <summary>Reynolds numbers of blades lie above; below, one is in millions or of another column.</summary>
    public const double LowestReynolds = 1e4;

    /// <summary>Reynolds numbers of foreign tables lie below: their texts are read in the one way that gives such a number.</summary>
    public const double HighestReynolds = 1e9;

    /// <summary>Both, as messages say them.</summary>
    public const string ReynoldsInWords = "1e4 to 1e9";

    /// <summary>No section has a coefficient beyond: there a decimal sign, a unit or a column is wrong.</summary>
    public const double LargestCoefficient = 20;

    /// <summary>What is said of such a coefficient.</summary>
    internal static string BeyondLargest(string name, double value) => $"{name} is {CanonicalText.Of(value)}, and no section has a coefficient beyond "
        + $"{CanonicalText.Of(LargestCoefficient)}; a decimal sign, a unit or a column is wrong";

    /// <summary>False for NaN.</summary>
    public static bool IsReynoldsOfABlade(double number) => number is >= LowestReynolds and <= HighestReynolds;
}
