using System.Globalization;

namespace BladeLoads.Screen;

/// <summary>Room on a disk, for people.</summary>
internal static class Room
{
    private static readonly string[] Units = ["B", "kB", "MB", "GB", "TB"];

    /// <summary><c>512 B</c>, <c>1.2 MB</c>; a kB is 1,000 bytes.</summary>
    public static string Of(long bytes)
    {
        var size = (double)bytes;
        var unit = 0;
        for (; size >= 999.95 && unit < Units.Length - 1; unit++)
            size /= 1000;
        return size.ToString(unit == 0 ? "0" : "0.0", CultureInfo.InvariantCulture) + " " + Units[unit];
    }
}
