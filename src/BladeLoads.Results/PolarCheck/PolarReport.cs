using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using BladeLoads.Results.Publishing;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.PolarCheck;
using static BladeLoads.Results.Tables.FileUnits;

namespace BladeLoads.Results.PolarCheck;

/// <summary>What a check of polar tables found, as tables. The columns are a promise (docs/formats.md).</summary>
public sealed class PolarReport
{
    private const int Format = 1;

    private const string FiguresName = "polar-figures";
    private const string DoubtsName = "polar-doubts";
    private const string UseName = "polar-use";
    private const string HistogramsName = "polar-histograms";

    /// <param name="use">By the file of the table; empty where no cases were solved.</param>
    public PolarReport(CheckedTables tables, IReadOnlyDictionary<string, TableUse> use)
    {
        Figures = new ReportTable(FiguresName, FigureColumns, [.. tables.Tables.SelectMany(FigureRows)]);
        Doubts = new ReportTable(DoubtsName, DoubtColumns, [.. DoubtRows(tables, use)]);
        Use = new ReportTable(UseName, UseColumns, [.. UseRows(tables, use)]);
        Histograms = new ReportTable(HistogramsName, HistogramColumns, [.. tables.Tables.SelectMany(table => HistogramRows(table, use))]);
    }

    public static ImmutableArray<string> FigureColumns { get; } =
    [
        "table", "reynolds", "rows", "lowest_angle_deg", "highest_angle_deg", "zero_lift_angle_deg", "lift_slope_per_rad", "lift_slope_over_2_pi",
        "largest_lift", "largest_lift_angle_deg", "first_lift_peak_angle_deg", "lowest_lift", "lowest_lift_angle_deg", "best_lift_to_drag",
        "best_lift_to_drag_angle_deg", "least_drag", "least_drag_angle_deg", "laminar_plate_drag", "turbulent_plate_drag", "status",
    ];

    public static ImmutableArray<string> DoubtColumns { get; } =
        ["table", "line", "column", "reynolds", "kind", "from_angle_deg", "to_angle_deg", "table_share", "text"];

    public static ImmutableArray<string> UseColumns { get; } =
    [
        "table", "blade_share", "angle_of_attack_5_percent_deg", "angle_of_attack_95_percent_deg", "lowest_angle_deg", "highest_angle_deg",
        "outside_angles_share", "beyond_lift_peak_share", "reynolds_5_percent", "reynolds_95_percent", "lowest_reynolds", "highest_reynolds",
        "outside_reynolds_share", "several_balances_share",
    ];

    public static ImmutableArray<string> HistogramColumns { get; } = ["table", "quantity", "from", "to", "share", "tabulated"];

    /// <summary>Of all files that a report may have, use or not.</summary>
    public static ImmutableArray<string> FileNames { get; } = [.. NamesAndColumns.Select(table => table.Name + ReportTable.Ending)];

    /// <summary>Whether a file is a table of a report that was written here, and so may be written anew.</summary>
    /// <param name="fileName">One of <see cref="FileNames"/>.</param>
    /// <param name="beginning">At least the first line of it.</param>
    public static bool IsOwn(string fileName, ReadOnlySpan<byte> beginning)
        => beginning.StartsWith(Encoding.ASCII.GetBytes(
            string.Join(',', NamesAndColumns.Single(table => table.Name + ReportTable.Ending == fileName).Columns) + "\n"));

    public ReportTable Figures { get; }

    public ReportTable Doubts { get; }

    public ReportTable Use { get; }

    public ReportTable Histograms { get; }

    private static (string Name, ImmutableArray<string> Columns)[] NamesAndColumns =>
        [(FiguresName, FigureColumns), (DoubtsName, DoubtColumns), (UseName, UseColumns), (HistogramsName, HistogramColumns)];

    /// <summary>The files of the report; what is about use only where there was any.</summary>
    public ImmutableArray<ResultContent> Files()
        => [.. Told().Select(table => new ResultContent(table.FileName, table.ToCsv()))];

    /// <summary>The same for scripts.</summary>
    public string ToJson(string asked, string toolVersion)
    {
        using var stream = new MemoryStream();
        using (var json = new Utf8JsonWriter(stream, new JsonWriterOptions { Indented = true, NewLine = "\n", Encoder = JavaScriptEncoder.Default }))
        {
            json.WriteStartObject();
            json.WriteNumber("format", Format);
            json.WriteString("checked", asked);
            json.WriteString("tool_version", toolVersion);
            foreach (var table in Told())
                table.WriteTo(json);
            json.WriteEndObject();
        }
        return Encoding.UTF8.GetString(stream.GetBuffer().AsSpan(0, (int)stream.Length));
    }

    private IEnumerable<ReportTable> Told() => Use.Rows.IsEmpty ? [Figures, Doubts] : [Figures, Doubts, Use, Histograms];

    private static IEnumerable<ImmutableArray<object?>> FigureRows(CheckedTable table)
    {
        foreach (var (polar, figures) in table.Table.Section.Polars.Zip(table.Figures))
            yield return
            [
                table.File, polar.Reynolds, polar.Angles.Length, Deg(polar.Angles[0]), Deg(polar.Angles[^1]),
                figures.Attached is { } lift ? Deg(lift.ZeroLiftAngle) : null, figures.Attached?.LiftSlope, figures.SlopeRatio,
                figures.LargestLift?.Value, Angle(figures.LargestLift), Deg(figures.FirstPeakAngle),
                figures.LowestLift?.Value, Angle(figures.LowestLift), figures.BestLiftToDrag?.Value, Angle(figures.BestLiftToDrag),
                figures.LeastDrag?.Value, Angle(figures.LeastDrag), Floor(PlateFriction.Laminar(polar.Reynolds)),
                Floor(PlateFriction.Turbulent(polar.Reynolds)), FigureStatus.Of(polar, figures),
            ];
    }

    private static double? Angle(PolarExtreme? extreme) => extreme is { } e ? Deg(e.Angle) : null;

    private static double? Floor(double drag) => drag > 0 ? drag : null;

    private static IEnumerable<ImmutableArray<object?>> DoubtRows(CheckedTables tables, IReadOnlyDictionary<string, TableUse> use)
    {
        foreach (var error in tables.Errors)
            yield return [error.File, Blank(error.Line), Blank(error.Column), null, "error", null, null, null, error.Text];
        foreach (var table in tables.Tables)
            foreach (var doubt in table.Doubts)
                yield return
                [
                    table.File, Blank(doubt.Finding.Line), Blank(doubt.Finding.Column),
                    doubt.Polar < 0 ? null : table.Table.Section.Polars[doubt.Polar].Reynolds, doubt.Kind, doubt.FromDeg, doubt.ToDeg,
                    use.TryGetValue(table.File, out var u) ? FirstToLookAt.ShareOf(doubt, u) : null, doubt.Finding.Text,
                ];
    }

    private static int? Blank(int number) => number > 0 ? number : null;

    private static IEnumerable<ImmutableArray<object?>> UseRows(CheckedTables tables, IReadOnlyDictionary<string, TableUse> use)
    {
        var whole = use.Values.Sum(u => u.Blades);
        foreach (var table in tables.Tables)
        {
            if (use.Count == 0)
                continue;
            var polars = table.Table.Section.Polars;
            var (lowest, highest) = (Deg(polars.Max(p => p.Angles[0])), Deg(polars.Min(p => p.Angles[^1])));
            yield return use.TryGetValue(table.File, out var u)
                ?
                [
                    table.File, u.Blades / whole, Tenths(u.AngleDegBelow(0.05)), Tenths(u.AngleDegBelow(0.95)), lowest, highest,
                    u.OutsideAngles, u.BeyondPeak, ThreeDigits(u.ReynoldsBelow(0.05)), ThreeDigits(u.ReynoldsBelow(0.95)),
                    polars[0].Reynolds, polars[^1].Reynolds, u.OutsideReynolds, u.SeveralBalances,
                ]
                : [table.File, 0.0, null, null, lowest, highest, null, null, null, null, polars[0].Reynolds, polars[^1].Reynolds, null, null];
        }
    }

    // No finer than they were counted.
    private static double Tenths(double angleDeg) => Math.Round(angleDeg, 1);

    private static double ThreeDigits(double reynolds)
        => double.Parse(reynolds.ToString("G3", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);

    private static IEnumerable<ImmutableArray<object?>> HistogramRows(CheckedTable table, IReadOnlyDictionary<string, TableUse> use)
    {
        if (!use.TryGetValue(table.File, out var u))
            yield break;
        var polars = table.Table.Section.Polars;
        var (lowest, highest) = (Deg(polars.Max(p => p.Angles[0])), Deg(polars.Min(p => p.Angles[^1])));
        foreach (var bin in u.ByAngleDeg())
            yield return [table.File, "angle_of_attack_deg", bin.From, bin.To, bin.Share, bin.From >= lowest && bin.To <= highest ? "yes" : "no"];
        foreach (var bin in u.ByReynolds())
            yield return [table.File, "reynolds", bin.From, bin.To, bin.Share, IsTabulated(bin, polars[0], polars[^1]) ? "yes" : "no"];
    }

    // A table that names no Reynolds number serves at all of them.
    private static bool IsTabulated(UseBin bin, Polar first, Polar last)
        => double.IsNaN(first.Reynolds) || (bin.From >= first.Reynolds && bin.To <= last.Reynolds);
}
