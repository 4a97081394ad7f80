using System.Collections.Immutable;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Pictures;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Tables;

namespace BladeLoads.Results.Report;

/// <summary>All that the report of a study shows; <see cref="ReportPage"/> makes a page of it.</summary>
/// <param name="Baseline">The case that others are compared with, by name; null for none.</param>
/// <param name="Cases">In the order of the summary.</param>
/// <param name="Moved">What the last run that solved anything moved, case by case; empty for nothing.</param>
public sealed record StudyReport(
    string Study, string ToolVersion, string? Baseline, ImmutableArray<ReportedCase> Cases, ImmutableArray<MovedCase> Moved)
{
    /// <summary>More curves need not be given: they would not be drawn.</summary>
    public const int MostCurves = CurveSection.MostPictures * CurvePicture.MostLines;

    /// <summary>Name of the file.</summary>
    public const string FileName = "report.html";
}

/// <summary>A case of the report.</summary>
/// <param name="File">The case file, relative to the study folder; empty where it is not known. Cases of one file are drawn together.</param>
/// <param name="Receipt">Null, like <paramref name="Curve"/>, where there is no current result, or it cannot be read.</param>
/// <param name="Reason">Why there is no current result; empty where that is not known, or there is one.</param>
public sealed record ReportedCase(SummaryRow Row, string File, Receipt? Receipt, StoredCurve? Curve, string Reason = "");

/// <summary>What moved of a case, as <c>changes.csv</c> has it.</summary>
/// <param name="Why">What was changed; empty where that is not known.</param>
/// <param name="Note">Why nothing was compared; empty where something was.</param>
public sealed record MovedCase(string Case, string Why, string Note, ImmutableArray<MovedFigure> Figures);

/// <summary>A figure that moved, in its unit, with the wind speeds (m/s) where it was and is.</summary>
/// <param name="Old">Null where there was none; likewise <paramref name="New"/>.</param>
/// <param name="Percent">Of the old value; null where that tells nothing.</param>
public sealed record MovedFigure(string Figure, string Unit, double? Old, double? OldAt, double? New, double? NewAt, double? Percent, string Note);
