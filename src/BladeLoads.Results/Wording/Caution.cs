namespace BladeLoads.Results.Wording;

/// <summary>What every reader of a load must be told.</summary>
public static class Caution
{
    public const string Text =
        "Steady rotor aerodynamics, characteristic and unfactored, without weight; no design envelope. An input to, not a substitute "
        + "for, load calculations under IEC 61400-1 / IEC 61400-2 and local codes, reviewed and signed by licensed engineers.";
}
