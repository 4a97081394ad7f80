using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Laboratory;

/// <summary>Which Reynolds number the rows of a foreign table have: by column, by lines that name one, as the user says, or none.</summary>
internal sealed class ReynoldsBlocks
{
    private const int MostLinesShown = 12;

    private readonly double[] _ofRow;

    private ReynoldsBlocks(double[] ofRow, ImmutableArray<string> why) => (_ofRow, Why) = (ofRow, why);

    /// <summary>From where the numbers are known, for the record.</summary>
    public ImmutableArray<string> Why { get; }

    /// <summary>NaN where the table has none.</summary>
    public double OfRow(int index) => _ofRow[index];

    /// <summary>Null, with the reasons reported, where they cannot be told.</summary>
    public static ReynoldsBlocks? Of(TableScan scan, ReadingRequest request, string file, Findings findings)
    {
        if (request.ReynoldsUnit is { } unit && UnitProblem(scan, request, unit) is { } problem)
        {
            findings.Error(new Place(file, 0, 0), $"--reynolds says {InWords(unit)}, and {problem}");
            return null;
        }
        if (scan.Columns![ColumnRole.Reynolds] is not null)
            return OfColumn(scan, request, file, findings);
        if (request.LeavesOut(ColumnRole.Reynolds))
            return All(scan, request.Reynolds ?? double.NaN, request.Reynolds is { } said
                ? $"Reynolds number {CanonicalText.Of(said)}, as --reynolds says"
                : "no Reynolds number, as --columns says");
        if (request.Reynolds is { } asked)
            return AsSaid(scan, asked, file, findings);
        return scan.ReynoldsLines.Count == 0
            ? All(scan, double.NaN, "no Reynolds number is named; the table serves at every one")
            : OfLines(scan, file, findings);
    }

    public static string InWords(ReynoldsUnit unit) => unit == ReynoldsUnit.Millions ? "millions" : "thousands";

    private static string? UnitProblem(TableScan scan, ReadingRequest request, ReynoldsUnit unit)
        => request.LeavesOut(ColumnRole.Reynolds) ? "--columns reynolds=none that none is taken; leave one of the two out"
            : scan.Columns!.NameOf(ColumnRole.Reynolds)?.Power is > 0 and var power && power != (int)unit
                ? $"{scan.Columns.Shown(ColumnRole.Reynolds)} names another unit; leave --reynolds out, or correct the name"
            : scan.Columns[ColumnRole.Reynolds] is null && scan.ReynoldsLines.Count == 0
                ? "the table names no Reynolds number; give it as a number: --reynolds 1.5e6"
            : null;

    private static ReynoldsBlocks All(TableScan scan, double value, string why) => new([.. scan.Rows.Select(_ => value)], [why]);

    private static ReynoldsBlocks? OfColumn(TableScan scan, ReadingRequest request, string file, Findings findings)
    {
        if (request.Reynolds is { } said && scan.Rows.Find(row => row.Reynolds != said) is { Line: > 0 } other)
        {
            findings.Error(new Place(file, other.Line, 1),
                $"the Reynolds number here is {CanonicalText.Of(other.Reynolds)} and --reynolds says {CanonicalText.Of(said)}; "
                + "leave the column out with --columns reynolds=none, or --reynolds");
            return null;
        }
        var others = scan.ReynoldsLines.Count == 0
            ? ""
            : $"; what {Lines(scan.ReynoldsLines)} {(scan.ReynoldsLines.Count == 1 ? "says" : "say")} of them is not taken";
        return new ReynoldsBlocks(
            [.. scan.Rows.Select(row => row.Reynolds)], [$"Reynolds numbers of column {scan.Columns!.Shown(ColumnRole.Reynolds)}{others}"]);
    }

    private static ReynoldsBlocks? AsSaid(TableScan scan, double asked, string file, Findings findings)
    {
        foreach (var line in scan.ReynoldsLines.Where(line => line.IsUnderstood && line.Value != asked))
        {
            findings.Error(new Place(file, line.Line, 1),
                $"names a Reynolds number of {CanonicalText.Of(line.Value)} and --reynolds says {CanonicalText.Of(asked)}; "
                + "leave --reynolds out, or say --columns reynolds=none besides if the line is not meant so");
            return null;
        }
        return All(scan, asked, $"Reynolds number {CanonicalText.Of(asked)}, as --reynolds says");
    }

    private static ReynoldsBlocks? OfLines(TableScan scan, string file, Findings findings)
    {
        var unclear = scan.ReynoldsLines.FindAll(line => !line.IsUnderstood);
        foreach (var line in unclear)
            findings.Error(new Place(file, line.Line, 1),
                $"{VisibleText.Quote(line.Text)} {line.Problem}; write it as Re = 1.5e6, say it with --reynolds, "
                + "or say --columns reynolds=none for a table without");
        if (unclear.Count > 0)
            return null;
        var ofRow = new double[scan.Rows.Count];
        var lines = scan.ReynoldsLines.OrderBy(line => line.Line).ToList();
        var next = 0;
        ReynoldsLine? current = null;
        for (var i = 0; i < ofRow.Length; i++)
        {
            ReynoldsLine? before = null;
            for (; next < lines.Count && lines[next].Line < scan.Rows[i].Line; next++)
            {
                if (before is { } one && one.Value != lines[next].Value)
                    return Refuse(lines[next].Line, string.Create(CultureInfo.InvariantCulture,
                        $"names a Reynolds number of {CanonicalText.Of(lines[next].Value)} and line {one.Line} one of {CanonicalText.Of(one.Value)}, "
                            + $"with no row between; say it with --reynolds"));
                before = current = lines[next];
            }
            if (current is null)
                return Refuse(lines[0].Line, string.Create(CultureInfo.InvariantCulture,
                    $"names a Reynolds number of {CanonicalText.Of(lines[0].Value)} below rows that have none (line {scan.Rows[i].Line}); "
                        + $"say it with --reynolds, or choose rows with --lines"));
            ofRow[i] = current.Value.Value;
        }
        // Below the last row: it may be meant for those above.
        if (next < lines.Count && lines[next].Value != current!.Value.Value)
            return Refuse(lines[next].Line, string.Create(CultureInfo.InvariantCulture,
                $"names a Reynolds number of {CanonicalText.Of(lines[next].Value)} and no row stands below; choose rows with --lines"));
        return new ReynoldsBlocks(ofRow, [
            .. lines.Take(MostLinesShown).Select(line => string.Create(
                CultureInfo.InvariantCulture, $"Reynolds number {CanonicalText.Of(line.Value)} of line {line.Line}: {VisibleText.Quote(line.Text)}")),
            .. lines.Count <= MostLinesShown ? [] : (string[])[$"Reynolds numbers of {Lines([.. lines.Skip(MostLinesShown)])} besides"],
        ]);

        ReynoldsBlocks? Refuse(int line, string why)
        {
            findings.Error(new Place(file, line, 1), why);
            return null;
        }
    }

    private static string Lines(List<ReynoldsLine> lines) => LineNumbers.InWords([.. lines.Select(line => line.Line)]);
}
