namespace BladeLoads.Rotor.Operation;

/// <summary>The words of the trade for what governs an operating point.</summary>
public static class RegionWords
{
    public static string Of(Region region) => region switch
    {
        Region.Idle => "idle",
        Region.MinimumSpeed => "minimum speed",
        Region.BestTipSpeedRatio => "best tip-speed ratio",
        Region.MaximumSpeed => "maximum speed",
        Region.ThrustLimit => "thrust limit",
        Region.RatedPower => "rated power",
        Region.FixedSpeed => "fixed speed",
        Region.Schedule => "schedule",
        _ => throw new ArgumentOutOfRangeException(nameof(region), region, "no words for it"),
    };
}
