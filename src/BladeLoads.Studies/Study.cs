using System.Collections.Immutable;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies;

/// <summary>A study as read: the cases that can be solved, those that cannot, and everything found on the way.</summary>
/// <param name="Name">The name of the study's folder; results lie under it.</param>
/// <param name="Folder">Absolute path.</param>
/// <param name="Baseline">The case that others are compared with, by name; null for none.</param>
/// <param name="Cases">In the order of their names (ordinal).</param>
/// <param name="Rejected">Cases that an error keeps from running, by name or by file where the name is not known.</param>
/// <param name="Errors">In file order: by file, line, column.</param>
/// <param name="Doubts">In file order; nothing is kept from running by a doubt.</param>
public sealed record Study(
    string Name, string Folder, string? Baseline, ImmutableArray<StudyCase> Cases, ImmutableArray<string> Rejected,
    ImmutableArray<InputFinding> Errors, ImmutableArray<InputFinding> Doubts)
{
    /// <summary>For each rejected case the first error that keeps it from running; none for a case that was rejected otherwise.</summary>
    public ImmutableDictionary<string, InputFinding> Blocking { get; init; } = ImmutableDictionary<string, InputFinding>.Empty;

    /// <summary>
    /// What was looked at to read it; null where that is not known. While all of it stays as it was, reading again gives the same study.
    /// </summary>
    public StudySight? Sight { get; init; }
}

/// <summary>An error or a doubt about an input, at its place. Lines and columns count from 1; 0 means the whole file.</summary>
/// <param name="File">Relative to the study folder, with forward slashes.</param>
/// <param name="Text">What was found and what would do, without the place.</param>
public sealed record InputFinding(string File, int Line, int Column, string Text)
{
    /// <summary>How many it stands for: more than one where others like it are not told one by one.</summary>
    public int Times { get; init; } = 1;
}

/// <summary>A validated rotor case or variant of a sweep.</summary>
/// <param name="Name">The case's file name without its ending; variants add <c>~key-value</c>. Safe as a folder name.</param>
/// <param name="File">The case file, relative to the study folder.</param>
/// <param name="Spanwise">The wind speeds whose elements are written; null for all, empty for none.</param>
/// <param name="Fingerprint">SHA-256, 64 lower-case hexadecimal digits, over every value that determines the result.</param>
/// <param name="Inputs">Every file that was read for it, the case file first.</param>
/// <param name="Values">
/// Every value that determines the result, defaults filled in: key as in a case file, value as canonical text (ordinal order).
/// Tables stand as the SHA-256 of their parsed values: <c>blade</c>, <c>section.NAME</c>, <c>control.schedule</c>, <c>site.histogram</c>. The
/// fingerprint is over these and nothing else.
/// </param>
public sealed record StudyCase(
    string Name, string Title, string File, RotorCase Rotor, ImmutableArray<double>? Spanwise, string Fingerprint,
    ImmutableArray<InputFile> Inputs, ImmutableSortedDictionary<string, string> Values)
{
    /// <summary>The tables whose hashes stand in the values; empty where they are not at hand.</summary>
    public ImmutableArray<CanonicalTable> Tables { get; init; } = [];

    /// <summary>What its polar tables went through after they were read: extended, augmented; a line each, for its log.</summary>
    public ImmutableArray<string> Preparation { get; init; } = [];

    /// <summary>What it asks for beside its curve.</summary>
    public FurtherResults Further { get; init; } = FurtherResults.None;
}

/// <summary>A file that a case was read from.</summary>
/// <param name="File">Relative to the study folder, with forward slashes.</param>
/// <param name="Sha256">Of the very bytes that were parsed, 64 lower-case hexadecimal digits.</param>
/// <param name="Contents">One phrase: <c>3 Reynolds numbers from 1e6 to 9e6, 330 rows, -180 to 180 deg</c>.</param>
public sealed record InputFile(string File, string Sha256, string Contents);
