namespace BladeLoads.Rotor.Operation;

/// <summary>What governs an operating point.</summary>
public enum Region { Idle, MinimumSpeed, BestTipSpeedRatio, MaximumSpeed, ThrustLimit, RatedPower, FixedSpeed, Schedule }

/// <summary>What a reader of an operating point must know besides its numbers; written as words in the status column.</summary>
[Flags]
public enum PointMarks
{
    None = 0,

    /// <summary>An element has no balanced inflow angle: the numbers of the point are blank.</summary>
    Unbalanced = 1,

    /// <summary>An element has several balanced inflow angles; the smallest was taken.</summary>
    SeveralBalances = 2,

    /// <summary>An element works at an angle of attack outside its table; the end value served.</summary>
    OutsideAngles = 4,

    /// <summary>An element works at a Reynolds number outside its tables; the nearest table served.</summary>
    OutsideReynolds = 8,

    /// <summary>Electrical power exceeds rated power and nothing holds it.</summary>
    ExceedsRated = 16,

    /// <summary>Power jumps across rated as the pitch moves; the side at or above rated was taken.</summary>
    PowerJump = 32,

    /// <summary>At the rated wind speed power rises with pitch, so the feather branch starts with a jump of pitch.</summary>
    PitchJump = 64,

    /// <summary>No pitch that the control may take makes rated power here.</summary>
    RatedNotReached = 128,

    /// <summary>Thrust exceeds its limit even with the blades feathered.</summary>
    ThrustNotHeld = 1024,

    /// <summary>Below the first wind speed of operation: the rotor is at rest.</summary>
    BelowCutIn = 256,

    /// <summary>Above the last wind speed of operation: the rotor is at rest.</summary>
    AboveCutOut = 512,
}
