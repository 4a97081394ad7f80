using System.Globalization;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>Wording that the records of all commands that change tables share.</summary>
internal static class RecordText
{
    /// <summary>How a line of the record begins; empty where the table leaves its Reynolds number open.</summary>
    public static string At(PolarRows rows) => double.IsNaN(rows.Reynolds) ? "" : $"at Reynolds number {Reynolds(rows)}: ";

    /// <summary>Which Reynolds numbers are meant, to be put behind a noun; empty where all are.</summary>
    public static string Where(IReadOnlyList<PolarRows> some, StoredPolars table) => some.Count == table.Polars.Length
        ? ""
        : $" at Reynolds number{(some.Count == 1 ? "" : "s")} {string.Join(", ", some.Select(Reynolds))}";

    /// <summary>An angle, rad, in degrees.</summary>
    public static string Degrees(double angle) => Short(double.RadiansToDegrees(angle));

    public static string Short(double value) => value.ToString("G6", CultureInfo.InvariantCulture);

    private static string Reynolds(PolarRows rows) => rows.Reynolds.ToString("0.######e0", CultureInfo.InvariantCulture);
}
