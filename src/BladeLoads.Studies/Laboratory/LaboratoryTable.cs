using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Laboratory;

/// <summary>
/// A polar table as a laboratory or a solver sends it, made into one of ours: text -> lines -> cells -> numbers -> checked rows. What can be
/// read in two ways is refused, never guessed.
/// </summary>
/// <param name="Polars">Reynolds numbers and angles rising; empty where there are errors.</param>
/// <param name="Record">What was done, a line each.</param>
/// <param name="Errors">All that is wrong, by line and column.</param>
/// <param name="Doubts">What may be wrong and cannot be known.</param>
/// <param name="Sha256">Of the bytes read, 64 lower-case hexadecimal digits; empty where there were none.</param>
public sealed record LaboratoryTable(
    ImmutableArray<PolarRows> Polars, ImmutableArray<string> Record, ImmutableArray<InputFinding> Errors, ImmutableArray<InputFinding> Doubts,
    string Sha256)
{
    /// <summary>Reads a file.</summary>
    /// <param name="path">As the user wrote it; findings name the file so.</param>
    public static LaboratoryTable Read(string path, IStudyFiles files, ReadingRequest request)
    {
        var findings = new Findings();
        var fullPath = Path.GetFullPath(path);
        if (files.Kind(fullPath) == EntryKind.Missing)
            findings.Error(new Place(path, 0, 0), "is not there, or a link that leads nowhere");
        else if (NamedFile.Read(files, fullPath, path, ForeignText.LargestFile, findings.Error) is { } bytes)
            return Of(path, bytes, request);
        return Refused(findings, "");
    }

    /// <summary>The table in the bytes of a file.</summary>
    public static LaboratoryTable Of(string path, byte[] bytes, ReadingRequest request)
    {
        var findings = new Findings();
        if (ForeignText.FromBytes(path, bytes, findings) is not { } text)
            return Refused(findings, "");
        if (Layouts.Choose(text, request, findings) is not { } scan
            || Blocks(scan, request, text, findings) is not var (reynolds, angles))
            return Refused(findings, text.Sha256);
        var record = new ReadingRecord(text, request, scan, reynolds, angles);
        var polars = Polar(scan, request, reynolds, angles, record, text.File, findings);
        if (findings.Errors.Length > 0)
            return Refused(findings, text.Sha256);
        if (text.EndsOpen && scan.Rows[^1].Line == text.Lines.Length)
            findings.Doubt(new Place(text.File, text.Lines.Length, 0),
                "the last row has no line end; if the file was cut off there, its last number may have lost digits");
        return new LaboratoryTable(polars, record.Lines(), [], findings.Doubts, text.Sha256);
    }

    private static LaboratoryTable Refused(Findings findings, string sha256) => new([], [], findings.Errors, [], sha256);

    private static (ReynoldsBlocks Reynolds, AngleReading Angles)? Blocks(TableScan scan, ReadingRequest request, ForeignText text, Findings findings)
        => (ReynoldsBlocks.Of(scan, request, text.File, findings), AngleReading.Of(scan, request, text.File, findings)) is ({ } reynolds, { } angles)
            ? (reynolds, angles)
            : null;

    private static ImmutableArray<PolarRows> Polar(
        TableScan scan, ReadingRequest request, ReynoldsBlocks reynolds, AngleReading angles, ReadingRecord record, string file, Findings findings)
    {
        var errors = new TableErrors(findings);
        var blocks = new SortedDictionary<double, List<LaboratoryRow>>();
        var forces = SectionForces.Asked(request);
        var converted = new List<(double Angle, double Lift, double Drag)>();
        for (var i = 0; i < scan.Rows.Count; i++)
        {
            var row = scan.Rows[i];
            if (angles.ToDegrees(row.Angle, out var problem) is not { } degrees)
            {
                errors.Add("alpha", new Place(file, row.Line, row.At.Angle), problem);
                continue;
            }
            var (lift, drag) = forces?.ToLiftAndDrag(row.Lift, row.Drag, double.DegreesToRadians(degrees)) ?? (row.Lift, row.Drag);
            converted.Add((degrees, lift, drag));
            if (drag < 0 && request.LeaveOutNegativeDrag)
                record.LeaveOut(row.Line, "drag below 0");
            else if (drag < 0)
                errors.Add("cd", new Place(file, row.Line, row.At.Drag),
                    $"cd is {CanonicalText.Of(drag)}; drag coefficients must be >= 0, leave such rows out with "
                    + "--leave-out negative-drag");
            // NaN is less than any number, and so a key as others.
            if (!blocks.TryGetValue(reynolds.OfRow(i), out var block))
                blocks.Add(reynolds.OfRow(i), block = []);
            if (!(drag < 0))
                block.Add(new LaboratoryRow(row.Line, row.At.Angle, new PolarRow(degrees, lift, drag, row.Moment)));
        }
        if (ExchangedColumns.AreLikely(converted))
            errors.Ask("cd", "are cl and cd exchanged?");
        var polars = errors.Any ? [] : Sorted(blocks, request, record, file, errors);
        if (!errors.Any)
            CheckRange(polars, file, blocks.Values.First()[0].Line, errors);
        errors.TellTheRest();
        return polars;
    }

    private static ImmutableArray<PolarRows> Sorted(
        SortedDictionary<double, List<LaboratoryRow>> blocks, ReadingRequest request, ReadingRecord record, string file, TableErrors errors)
    {
        var polars = ImmutableArray.CreateBuilder<PolarRows>();
        // Found by Reynolds number and angle, told by line: those told by their number alone are the last ones.
        var wrong = new List<(int Line, int Column, string Text)>();
        foreach (var (reynolds, rows) in blocks)
        {
            var order = new SweepOrder(request.Sweep, (line, column, text) => wrong.Add((line, column, text)), record.LeaveOut);
            var sorted = rows.Count == 0 ? [] : order.Sort(rows);
            if (sorted is null)
                continue;
            var at = double.IsNaN(reynolds) ? "" : $" at Reynolds number {CanonicalText.Of(reynolds)}";
            if (sorted.Count < PolarLimits.FewestRows)
                wrong.Add((sorted.Count == 0 ? 0 : sorted[0].Line, 0, string.Create(CultureInfo.InvariantCulture,
                    $"has {sorted.Count} row{(sorted.Count == 1 ? "" : "s")}{at}; a polar needs three or more")
                    + (blocks.Count > PolarLimits.FewestRows
                        ? "; where each row has a measured Reynolds number of its own, say --columns reynolds=none and --reynolds"
                        : "")));
            if (order.Done is { } done)
                record.Order(done + at);
            polars.Add(new PolarRows(reynolds, [.. sorted.Select(row => row.Values)]));
        }
        foreach (var (line, column, text) in wrong.OrderBy(one => one.Line).ThenBy(one => one.Column))
            errors.Add("", new Place(file, line, column), text);
        return polars.ToImmutable();
    }

    private static void CheckRange(ImmutableArray<PolarRows> polars, string file, int line, TableErrors errors)
    {
        var (lowest, highest) = (polars.Min(polar => polar.Rows[0].AngleDeg), polars.Max(polar => polar.Rows[^1].AngleDeg));
        if (lowest >= -PolarTable.LargestRadian && highest <= PolarTable.LargestRadian)
            errors.Add("", new Place(file, line, 0),
                $"angles run from {CanonicalText.Of(lowest)} to {CanonicalText.Of(highest)} degrees only; no case reads a table so narrow");
    }
}
