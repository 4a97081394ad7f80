using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Results.Wording;
using BladeLoads.Studies;

namespace BladeLoads.Screen;

/// <summary>Errors and doubts of a study: the one place that gives them their shape.</summary>
internal static class FindingLines
{
    private const int NamesShown = 3;

    /// <summary>All of them in file order, each beginning with its place; the source line and a caret below it where asked for.</summary>
    public static void Write(Study study, TextWriter output, bool withSource)
        => Write(study.Errors, study.Doubts, study.Folder, output, withSource);

    /// <summary>The same for findings outside a study.</summary>
    /// <param name="folder">What the files of the findings are relative to.</param>
    public static void Write(
        ImmutableArray<InputFinding> errors, ImmutableArray<InputFinding> doubts, string folder, TextWriter output, bool withSource)
    {
        var all = errors.Select(e => (Finding: e, Word: ""))
            .Concat(doubts.Select(d => (Finding: d, Word: "doubt: ")))
            .OrderBy(f => f.Finding, FindingOrder.Instance);
        foreach (var (finding, word) in all)
        {
            output.WriteLine(Printable.Of($"{Place(finding)}: {word}{finding.Text}"));
            if (withSource)
                foreach (var line in SourceExcerpt.Of(folder, finding))
                    output.WriteLine(line);
        }
    }

    /// <summary><c>3 errors in 2 files; clean-sea-level not run, 7 others can run</c>.</summary>
    public static string Closing(Study study)
    {
        var errors = study.Errors.IsEmpty
            ? "no errors"
            : $"{Count.Of(study.Errors, "error")} in {Count.Of(study.Errors.Select(e => e.File).Distinct().Count(), "file")}";
        var doubts = study.Doubts.IsEmpty ? "" : $", {Count.Of(study.Doubts, "doubt")}";
        return Printable.Of($"{errors}{doubts}; {WhatRuns(study)}");
    }

    private static string Place(InputFinding finding) => finding switch
    {
        { Line: 0 } => finding.File,
        { Column: 0 } => string.Create(CultureInfo.InvariantCulture, $"{finding.File}:{finding.Line}"),
        _ => string.Create(CultureInfo.InvariantCulture, $"{finding.File}:{finding.Line}:{finding.Column}"),
    };

    private static string WhatRuns(Study study)
    {
        if (study.Rejected.IsEmpty)
            return study.Cases.IsEmpty ? "nothing can run" : $"{Count.Of(study.Cases.Length, "case")} can run";
        var more = study.Rejected.Length - NamesShown;
        var names = string.Join(", ", study.Rejected.Take(NamesShown)) + (more > 0 ? $" and {more} more" : "");
        return study.Cases.IsEmpty ? $"{names} not run, nothing can run" : $"{names} not run, {Count.Of(study.Cases.Length, "other")} can run";
    }
}
