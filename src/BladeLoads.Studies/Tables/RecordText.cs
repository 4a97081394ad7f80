using System.Globalization;

namespace BladeLoads.Studies.Tables;

/// <summary>Wording that all records of what was done to tables share.</summary>
public static class RecordText
{
    /// <summary>How a line of the record begins; empty where the table leaves its Reynolds number open.</summary>
    /// <param name="reynolds">NaN where it is open.</param>
    public static string At(double reynolds) => double.IsNaN(reynolds) ? "" : $"at Reynolds number {ReynoldsNumber.Text(reynolds)}: ";

    /// <summary>Which Reynolds numbers are meant, to be put behind a noun; empty where all are.</summary>
    public static string Where(IReadOnlyList<PolarRows> some, StoredPolars table) => some.Count == table.Polars.Length
        ? ""
        : $" at Reynolds number{(some.Count == 1 ? "" : "s")} {string.Join(", ", some.Select(rows => ReynoldsNumber.Text(rows.Reynolds)))}";

    /// <summary>An angle, rad, in degrees.</summary>
    public static string Degrees(double angle) => Brief(double.RadiansToDegrees(angle));

    public static string Brief(double value) => value.ToString("G6", CultureInfo.InvariantCulture);
}
