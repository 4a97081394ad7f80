using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>
/// What the formats know and the solver does not do yet. A line is removed here when its work is done; a value that changes
/// nothing (0, "hold") is accepted already.
/// </summary>
internal static class NotYet
{
    private static readonly (string Path, Func<TomlValue, bool> Asks, string Sentence)[] Lines =
    [
        ("rotor.tilt_deg", IsNotZero, "a tilted rotor is not solved yet; give 0 or leave it out"),
        ("wind.shear_exponent", IsNotZero, "wind shear is not solved yet; give 0 or leave it out"),
        ("wind.yaw_deg", IsNotZero, "yawed wind is not solved yet; give 0 or leave it out"),
    ];

    /// <summary>The sentence for a value that asks for what is not there yet, or null.</summary>
    public static string? Sentence(string path, TomlValue value)
    {
        foreach (var line in Lines)
            if (line.Path == path && line.Asks(value))
                return line.Sentence;
        return null;
    }

    private static bool IsNotZero(TomlValue value) => value is TomlValue.Number { Value: not 0 };
}
