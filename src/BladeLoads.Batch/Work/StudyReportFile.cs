using System.Collections.Immutable;
using System.Security.Cryptography;
using BladeLoads.Batch.Plan;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Report;
using BladeLoads.Results.Tables;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Work;

/// <summary>The report of a study, from the results that lie on the disk.</summary>
public static class StudyReportFile
{
    private const long LargestReport = 256 << 20;

    /// <summary>Writes <c>report.html</c> where results were just made, or where the one that is there is of another summary.</summary>
    /// <param name="rows">Of the whole study, as its summary has them.</param>
    /// <param name="summary">The bytes of <c>summary.csv</c>.</param>
    /// <exception cref="NoRoomForResultsException">It cannot be written.</exception>
    public static void Publish(
        ImmutableArray<SummaryRow> rows, byte[] summary, Study study, ResultsFolder results, string toolVersion, bool hasNewResults, Func<Publisher> publisher)
    {
        try
        {
            var stamp = StampOf(summary, results);
            if (!hasNewResults && ReadIfOf(results.Report, stamp) is not null)
                return;
            var report = new StudyReport(
                results.StudyName, toolVersion, study.Baseline, Cases(rows, study, results),
                File.Exists(results.Changes) ? StoredChanges.Parse(File.ReadAllBytes(results.Changes)) : []);
            publisher().PublishFile(results.Report, ReportPage.Write(report, stamp));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new NoRoomForResultsException(results.Study, e);
        }
    }

    /// <summary>The report that lies there; null where there is none of this summary, or it was changed, or cannot be read.</summary>
    public static byte[]? Find(byte[] summary, ResultsFolder results)
    {
        try
        {
            return ReadIfOf(results.Report, StampOf(summary, results));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    private static string StampOf(byte[] summary, ResultsFolder results)
    {
        var changes = File.Exists(results.Changes) ? File.ReadAllBytes(results.Changes) : [];
        return $"of summary {Hash(summary)} and changes {Hash(changes)}";
    }

    private static byte[]? ReadIfOf(string path, string stamp)
        => File.Exists(path) && new FileInfo(path).Length <= LargestReport && File.ReadAllBytes(path) is var bytes && ReportPage.IsOf(bytes, stamp)
            ? bytes : null;

    private static ImmutableArray<ReportedCase> Cases(ImmutableArray<SummaryRow> rows, Study study, ResultsFolder results)
    {
        var files = study.Cases.ToDictionary(c => c.Name, c => c.File, StringComparer.Ordinal);
        var curves = 0;
        return [.. rows.Select(row =>
        {
            var file = files.GetValueOrDefault(row.Case, "");
            return row.Summary is not null && ReceiptFile.Read(results.Case(row.Case)) is ReceiptReading.Readable { Receipt: var receipt }
                ? new ReportedCase(row, file, receipt, curves++ < StudyReport.MostCurves ? CurveOf(results.Case(row.Case)) : null)
                : new ReportedCase(row, file, null, null, ReasonOf(row, study, results));
        })];
    }

    private static string ReasonOf(SummaryRow row, Study study, ResultsFolder results) => row.State switch
    {
        "failed" => ReceiptFile.ReadFailure(results.Failure(row.Case))?.Reason ?? "",
        "blocked" => study.Blocking.GetValueOrDefault(row.Case) is { } finding ? new CaseState.Blocked(finding).Reason : "",
        _ => "",
    };

    private static StoredCurve? CurveOf(string folder)
    {
        try
        {
            return StoredCurve.Read(folder);
        }
        catch (UnreadableCurveException)
        {
            return null;   // 'verify' tells of it
        }
    }

    private static string Hash(byte[] bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));
}
