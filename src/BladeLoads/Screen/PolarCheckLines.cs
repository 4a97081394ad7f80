using System.Globalization;
using BladeLoads.Batch.PolarCheck;
using BladeLoads.Commands;
using BladeLoads.Results.PolarCheck;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies;
using BladeLoads.Studies.PolarCheck;

namespace BladeLoads.Screen;

/// <summary>A check of polar tables on the screen: what was found, the figures, where blades work, and what to look at first.</summary>
internal static class PolarCheckLines
{
    private const int DoubtsShown = 40;
    private const int LinesNamed = 4;
    private const int FigureRowsShown = 24;
    private const int PrioritiesShown = 5;

    /// <param name="study">Null where tables were checked by themselves.</param>
    /// <param name="folder">Where the report was written; null for nowhere.</param>
    public static void Write(
        CheckedTables tables, UseOfTables use, TableNames names, Study? study, string? folder, Surroundings surroundings)
    {
        var output = surroundings.Out;
        FindingLines.Write(tables.Errors, [], study?.Folder ?? "", output, withSource: surroundings.OutIsTerminal);
        var doubts = tables.Tables.SelectMany(table => KindOfDoubt.Of(table, use.ByFile.GetValueOrDefault(table.File)).Select(Finding)).ToList();
        FindingLines.Write([], [.. doubts.Take(DoubtsShown)], "", output, withSource: false);
        if (doubts.Count > DoubtsShown)
            output.WriteLine($"... and {Count.Of(doubts.Count - DoubtsShown, "more doubt")}"
                + (folder is null ? "; --out <folder> writes all" : " in polar-doubts.csv"));
        if (!tables.Tables.IsEmpty)
        {
            WriteFigures(tables, use, names, output);
            if (study is not null)
                WriteUse(tables, use, names, output);
            if (use.ByFile.Count > 0)
                WritePriorities(tables, use, names, output);
        }
        output.WriteLine();
        output.WriteLine(Closing(tables, study, use));
        if (folder is not null)
            output.WriteLine(Printable.Of($"report: {folder}"));
    }

    private static InputFinding Finding(KindOfDoubt kind)
    {
        var (finding, others) = (kind.First.Finding, kind.OtherLines);
        return others.IsEmpty ? finding : finding with
        {
            Text = $"{finding.Text}; likewise line{(others.Length == 1 ? "" : "s")} {string.Join(", ", others.Take(LinesNamed))}"
                + (others.Length > LinesNamed ? $" and {others.Length - LinesNamed} more" : ""),
        };
    }

    private static void WriteFigures(CheckedTables tables, UseOfTables use, TableNames names, TextWriter output)
    {
        var isShort = tables.Tables.Sum(table => table.Figures.Length) <= FigureRowsShown && use.ByFile.Count == 0;
        output.WriteLine();
        var text = new TextTable(
            "figures", "Reynolds", "slope/2pi", "no lift deg", "largest cl", "at deg", "best cl/cd", "at deg", "least cd", "at deg", "plate: laminar",
            "turbulent");
        foreach (var table in tables.Tables)
            foreach (var i in isShort ? Enumerable.Range(0, table.Figures.Length) : [MostUsed(table, use)])
            {
                var (polar, figures) = (table.Table.Section.Polars[i], table.Figures[i]);
                text.Add(
                    [
                        Printable.Of(names.Of(table.File)), Reynolds(polar.Reynolds), Text(figures.SlopeRatio, "0.00"),
                        Degrees(figures.Attached?.ZeroLiftAngle),
                        Text(figures.LargestLift?.Value, "0.000"), Degrees(figures.LargestLift?.Angle), Text(figures.BestLiftToDrag?.Value, "0.0"),
                        Degrees(figures.BestLiftToDrag?.Angle), Text(figures.LeastDrag?.Value, "0.0000"), Degrees(figures.LeastDrag?.Angle),
                        Text(Floor(PlateFriction.Laminar(polar.Reynolds)), "0.0000"), Text(Floor(PlateFriction.Turbulent(polar.Reynolds)), "0.0000"),
                    ],
                    FigureStatus.Of(polar, figures));
            }
        text.Write(output);
        if (!isShort && tables.Tables.Any(table => table.Figures.Length > 1))
            output.WriteLine(
                $"each table at the {(use.ByFile.Count > 0 ? "Reynolds number used most" : "middle one of its Reynolds numbers")}");
    }

    private static void WriteUse(CheckedTables tables, UseOfTables use, TableNames names, TextWriter output)
    {
        output.WriteLine();
        output.WriteLine($"where the blades work, from 5 to 95 % of their length ({Count.Of(use.Solved, "case")}, every operating point alike):");
        var text = new TextTable(
            "table", "blade %", "angle of attack deg", "tabulated", "outside %", "past peak %", "Reynolds number", "tabulated", "outside %");
        var whole = use.ByFile.Values.Sum(u => u.Blades);
        foreach (var table in tables.Tables)
        {
            var polars = table.Table.Section.Polars;
            var angles = $"{Degrees(polars.Max(p => p.Angles[0]), "0")} to {Degrees(polars.Min(p => p.Angles[^1]), "0")}";
            var reynolds = polars.Length == 1 ? Reynolds(polars[0].Reynolds) : $"{Reynolds(polars[0].Reynolds)} to {Reynolds(polars[^1].Reynolds)}";
            if (use.ByFile.TryGetValue(table.File, out var u))
                text.Add(
                [
                    Printable.Of(names.Of(table.File)), Percent(u.Blades / whole),
                    $"{Text(u.AngleDegBelow(0.05), "0.0")} to {Text(u.AngleDegBelow(0.95), "0.0")}", angles, Percent(u.OutsideAngles),
                    Percent(u.BeyondPeak), $"{Reynolds(u.ReynoldsBelow(0.05), "0.0e0")} to {Reynolds(u.ReynoldsBelow(0.95), "0.0e0")}", reynolds,
                    Percent(u.OutsideReynolds),
                ]);
            else
                text.Add([Printable.Of(names.Of(table.File)), "-", "-", angles, "-", "-", "-", reynolds, "-"], "not used");
        }
        text.Write(output);
    }

    private static void WritePriorities(CheckedTables tables, UseOfTables use, TableNames names, TextWriter output)
    {
        var all = FirstToLookAt.Of(tables.Tables, use.ByFile);
        output.WriteLine();
        if (all.IsEmpty)
        {
            output.WriteLine("nothing is doubtful where these blades work");
            return;
        }
        output.WriteLine("look first at, with the share of all blades at work there:");
        foreach (var first in all.Take(PrioritiesShown))
            output.WriteLine(Printable.Of($"  {Percent(first.Share),5} %  {names.Of(first.File)}: {first.Kind}{Where(first)}"));
        if (all.Length > PrioritiesShown)
            output.WriteLine($"  and {Count.Of(all.Length - PrioritiesShown, "other")} of less");
    }

    private static string Where(Priority priority)
    {
        if (priority.Most is not { } doubt)
            return "";
        var others = priority.Doubts > 1 ? $" and {priority.Doubts - 1} more" : "";
        return string.Create(CultureInfo.InvariantCulture, $" in line {doubt.Finding.Line}, {doubt.FromDeg:0.##} to {doubt.ToDeg:0.##} deg{others}");
    }

    private static string Closing(CheckedTables tables, Study? study, UseOfTables use)
    {
        var doubts = $"{Count.Of(tables.Tables.Sum(table => table.Doubts.Length), "doubt")} in {Count.Of(tables.Tables.Length, "table")}";
        var closing = tables.Errors.IsEmpty ? $"no errors, {doubts}"
            : $"{Count.Of(tables.Errors, "error")} in {Count.Of(tables.Errors.Select(e => e.File).Distinct().Count(), "file")}; "
                + (tables.Tables.IsEmpty ? "nothing checked" : $"{doubts} without errors");
        var left = new List<string>();
        if (study is { Rejected: { IsEmpty: false } rejected })
            left.Add($"{Count.Of(rejected.Length, "case")} with errors");
        if (!use.Failed.IsEmpty)
            left.Add($"{Count.Of(use.Failed.Length, "case")} that failed in solving");
        return left.Count == 0 ? closing : $"{closing}; left out: {string.Join(", ", left)}";
    }

    private static int MostUsed(CheckedTable table, UseOfTables use)
        => use.ByFile.TryGetValue(table.File, out var u)
            ? Enumerable.Range(0, table.Figures.Length).MaxBy(u.At)
            : table.Figures.Length / 2;

    private static double? Floor(double drag) => drag > 0 ? drag : null;

    private static string Degrees(double? angle, string format = "0.0") => Text(angle is { } a ? double.RadiansToDegrees(a) : null, format);

    private static string Percent(double share) => Text(100 * share, "0.0");

    private static string Reynolds(double reynolds, string format = "0.###e0") => Text(reynolds, format);

    // -0.0 reads as a slip.
    private static string Text(double? value, string format)
    {
        if (value is not { } number || !double.IsFinite(number))
            return "-";
        var text = number.ToString(format, CultureInfo.InvariantCulture);
        return text.Trim('-', '0', '.').Length == 0 ? text.TrimStart('-') : text;
    }
}
