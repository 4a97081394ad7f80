using System.Collections.Immutable;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Tables;

namespace BladeLoads.Results.Report;

/// <summary>All that the report of a study shows; <see cref="ReportPage"/> makes a page of it.</summary>
/// <param name="Baseline">The case that others are compared with, by name; null for none.</param>
/// <param name="Cases">In the order of the summary.</param>
/// <param name="Moved">What the last run that solved anything moved, the largest first; empty for nothing.</param>
public sealed record StudyReport(
    string Study, string ToolVersion, string? Baseline, ImmutableArray<ReportedCase> Cases, ImmutableArray<ReportedChange> Moved)
{
    /// <summary>Name of the file.</summary>
    public const string FileName = "report.html";
}

/// <summary>A case of the report.</summary>
/// <param name="File">The case file, relative to the study folder; empty where it is not known. Cases of one file are drawn together.</param>
/// <param name="Receipt">Null, like <paramref name="Curve"/>, where there is no current result, or it cannot be read.</param>
public sealed record ReportedCase(SummaryRow Row, string File, Receipt? Receipt, StoredCurve? Curve);

/// <summary>A figure that moved, as <c>changes.csv</c> has it.</summary>
/// <param name="Old">In its unit; null where there was none.</param>
/// <param name="Percent">Of the old value.</param>
public sealed record ReportedChange(string Case, string Figure, string Unit, double? Old, double? New, double Percent);
