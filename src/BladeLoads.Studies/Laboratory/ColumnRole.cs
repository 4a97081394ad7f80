namespace BladeLoads.Studies.Laboratory;

/// <summary>What a column of a foreign table can be to us.</summary>
public enum ColumnRole
{
    Angle,
    Lift,
    Drag,
    Moment,
    Reynolds,

    /// <summary>Force coefficient square to the chord, positive towards the upper side.</summary>
    Normal,

    /// <summary>Force coefficient along the chord, positive towards the leading edge.</summary>
    Tangential,

    /// <summary>Force coefficient along the chord, positive towards the trailing edge.</summary>
    Axial,

    /// <summary>Names of sections.</summary>
    Section,
}

/// <summary>The words by which users name roles.</summary>
public static class ColumnRoleWords
{
    private static readonly string[] Words = ["alpha", "cl", "cd", "cm", "reynolds", "normal", "tangential", "axial", "section"];

    /// <summary>All words, in the order of the roles.</summary>
    public static IReadOnlyList<string> All => Words;

    public static string Of(ColumnRole role) => Words[(int)role];

    /// <summary>Null for a word that names no role.</summary>
    public static ColumnRole? Find(string word)
        => Array.IndexOf(Words, word) is >= 0 and var at ? (ColumnRole)at : null;

    internal static string InWords(ColumnRole role) => role switch
    {
        ColumnRole.Angle => "angle of attack",
        ColumnRole.Lift => "lift coefficient",
        ColumnRole.Drag => "drag coefficient",
        ColumnRole.Moment => "moment coefficient",
        ColumnRole.Reynolds => "Reynolds number",
        ColumnRole.Normal => "normal force coefficient",
        ColumnRole.Tangential => "tangential force coefficient",
        ColumnRole.Axial => "axial force coefficient",
        _ => "name of the section",
    };
}
