using System.Globalization;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Tables;

/// <summary>Names that become files and folders, on every system that results are carried to.</summary>
internal static class SafeName
{
    private const int Longest = 100;

    private static readonly string[] Devices = ["con", "prn", "aux", "nul"];

    /// <summary>Why a name is not safe, or null.</summary>
    public static string? Problem(string name)
    {
        if (name.Length == 0)
            return "is empty";
        if (VisibleText.HasHidden(name))
            return "holds a control character";
        if (name[0] == '.')
            return "begins with a dot";
        if (name.IndexOfAny(['/', '\\', ':', '*', '?', '"', '<', '>', '|', '~']) is >= 0 and var at)
            return $"holds '{name[at]}'";
        if (name.Length > Longest)
            return string.Create(CultureInfo.InvariantCulture, $"is longer than {Longest} characters");
        if (name[^1] is '.' or ' ' || name[0] == ' ')
            return "begins or ends with a space or a dot";
        if (name.EnumerateRunes().Contains(System.Text.Rune.ReplacementChar))
            return "is not readable text";
        var stem = name.Split('.')[0].ToLowerInvariant();
        return Devices.Contains(stem) || stem is ['c', 'o', 'm', >= '0' and <= '9'] or ['l', 'p', 't', >= '0' and <= '9']
            ? "is the name of a device on some systems"
            : null;
    }
}
