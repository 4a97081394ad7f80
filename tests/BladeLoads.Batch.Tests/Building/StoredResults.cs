using System.Text;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Tables;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Batch.Tests.Building;

/// <summary>Result folders written by hand, a few columns wide.</summary>
internal static class StoredResults
{
    /// <summary>A point: its thrust is a tenth of its power, and its moments half of it, out of plane and flapwise alike.</summary>
    public sealed record Point(double WindSpeed, double Power, string Marks = "", double? Edgewise = 1, double Coefficient = 0.4);

    public static string Write(TemporaryFolder folder, string name, params Point[] points)
        => WriteReceipt(WriteCurve(folder, name, points), name, 10.5, new Dictionary<string, int>(StringComparer.Ordinal));

    /// <summary>The curve alone, as someone may have copied it.</summary>
    public static string WriteCurve(TemporaryFolder folder, string name, params Point[] points)
    {
        var path = Path.Join(folder.Path, name);
        Directory.CreateDirectory(path);
        var text = new StringBuilder(
            "wind_speed_m_s,power_coefficient,electrical_power_kW,thrust_kN,aero_root_out_of_plane_moment_kNm,"
            + "aero_root_in_plane_moment_kNm,aero_root_flapwise_moment_kNm,aero_root_edgewise_moment_kNm,region,status\n");
        foreach (var p in points)
            text.Append(FormattableString.Invariant(
                $"{p.WindSpeed},{p.Coefficient},{p.Power},{p.Power / 10},{p.Power / 2},7,{p.Power / 2},{p.Edgewise},fixed speed,{p.Marks}\n"));
        File.WriteAllText(Path.Join(path, CurveTable.FileName), text.ToString());
        return path;
    }

    public static string WriteReceipt(
        string folder, string name, double? rated, IReadOnlyDictionary<string, int> marks, string fingerprint = "f", int day = 1,
        IReadOnlyDictionary<string, string>? values = null)
    {
        var curve = File.ReadAllBytes(Path.Join(folder, CurveTable.FileName));
        var summary = CaseSummary.Of(new PowerCurve([], rated, null, [], PointMarks.None, 0)) with { Marks = marks };
        File.WriteAllBytes(Path.Join(folder, Receipt.FileName), ReceiptFile.Write(new Receipt(
            1, "fell", name, name, fingerprint, 1, "0.0.0", new DateTimeOffset(2026, 1, day, 0, 0, 0, TimeSpan.Zero), 0,
            values ?? new Dictionary<string, string>(), [], [ResultFile.Of(CurveTable.FileName, curve)], summary, "")));
        return folder;
    }
}
