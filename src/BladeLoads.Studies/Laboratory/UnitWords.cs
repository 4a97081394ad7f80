namespace BladeLoads.Studies.Laboratory;

/// <summary>What a unit beside or below the name of a column says.</summary>
internal enum UnitMeaning
{
    Degrees,
    Radians,

    /// <summary>A ratio.</summary>
    None,
    Unknown,
}

/// <summary>Units as headers write them.</summary>
internal static class UnitWords
{
    /// <param name="text">With or without brackets.</param>
    public static UnitMeaning Meaning(string text)
    {
        var unit = text.Trim().Trim('[', ']', '(', ')', '{', '}', '<', '>').Trim().TrimEnd('.').ToLowerInvariant();
        return unit switch
        {
            "deg" or "degs" or "degree" or "degrees" or "\u00B0" or "\u00BA" => UnitMeaning.Degrees,
            "rad" or "rads" or "radian" or "radians" => UnitMeaning.Radians,
            "" or "-" or "--" or "1" or "none" or "ratio" or "\u2013" or "\u2212" or "/" => UnitMeaning.None,
            _ => UnitMeaning.Unknown,
        };
    }
}
