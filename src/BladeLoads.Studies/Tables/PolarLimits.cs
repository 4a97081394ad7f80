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

    /// <summary>False for NaN.</summary>
    public static bool IsReynoldsOfABlade(double number) => number is >= LowestReynolds and <= HighestReynolds;
}
