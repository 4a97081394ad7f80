using BladeLoads.Rotor.Sections;

namespace BladeLoads.Results.PolarCheck;

/// <summary>What a reader of a polar's figures must know besides, in words.</summary>
public static class FigureStatus
{
    public const string Bluff = "bluff";

    public const string EndsBeforeStall = "ends-before-stall";

    public const string BelowTurbulentPlate = "below-turbulent-plate";

    /// <summary>Separated by spaces; empty where there is nothing to say.</summary>
    public static string Of(Polar polar, PolarFigures figures)
    {
        var words = new List<string>();
        if (figures.IsBluff)
            words.Add(Bluff);
        else if (figures.LargestLift is { AtEnd: true })
            words.Add(EndsBeforeStall);
        if (figures.LeastDrag is { } drag && drag.Value < PlateFriction.Turbulent(polar.Reynolds))
            words.Add(BelowTurbulentPlate);
        return string.Join(' ', words);
    }
}
