using System.Collections.Immutable;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Report;
using BladeLoads.Results.Tables;
using BladeLoads.Results.Wording;

namespace BladeLoads.Results.Keeping;

/// <summary>What is to be kept.</summary>
/// <param name="Cases">Every case of the study, and how its result stands in the plan's words.</param>
/// <param name="Summary">The bytes of <c>summary.csv</c>.</param>
/// <param name="Report">The bytes of <c>report.html</c>; null where there is none of this summary.</param>
/// <param name="Replace">A set of that name gives way.</param>
/// <param name="AsItIs">Results that are not what was written are kept too, and said to be damaged.</param>
public sealed record KeepRequest(
    string Name, IReadOnlyList<(string Case, string State)> Cases, byte[] Summary, byte[]? Report, bool Replace, bool AsItIs, DateTimeOffset At,
    string ToolVersion);

/// <summary>Why a set is not kept: one line, and lines about single cases.</summary>
public sealed class NotKeptException(string message, ImmutableArray<string> cases) : Exception(message)
{
    public ImmutableArray<string> Cases { get; } = cases;
}

/// <summary>Sets of results set aside under a name: copies of their own, which no run and no tidying touches.</summary>
public static class KeptSet
{
    private const string Damaged = "damaged";
    private const int LongestName = 100;

    /// <summary>Why a set cannot have this name; null where it can.</summary>
    public static string? Objection(string name)
    {
        if (name.Length > LongestName || name.Any(char.IsControl))
            return FormattableString.Invariant($"a name has up to {LongestName} characters, and no control characters");
        return ResultsFolder.Objection(name) is null ? null
            : "a name may not be empty, begin with a point, hold a slash, or be one that the results folder needs itself";
    }

    /// <summary>Copies the results of the cases, each checked against its receipt, so that the set appears whole or not at all.</summary>
    /// <returns>The folder of the set and what it holds.</returns>
    /// <exception cref="NotKeptException">The name is taken, a result is not what was written, or there is none.</exception>
    /// <exception cref="NoRoomForResultsException">It cannot be written.</exception>
    public static (string Folder, KeptRecord Record) Keep(ResultsFolder results, KeepRequest request, IDisk disk)
    {
        var target = results.KeptAs(request.Name);
        if (!request.Replace && Path.Exists(target))
            throw NameTaken(request.Name);
        try
        {
            using var mark = RunMark.Take(disk, results.Study);
            var hidden = mark.HiddenPath(request.Name, "new");
            try
            {
                var record = Copy(results, request, hidden, disk);
                disk.CreateFolder(results.Kept);
                disk.Sync(results.Study);
                if (!disk.TryRename(hidden, target))
                    Exchange(hidden, target, request, disk);
                disk.Sync(results.Kept);
                return (target, record);
            }
            finally
            {
                DeleteIfPossible(hidden, disk);   // an unfinished copy, or the set that gave way
            }
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new NoRoomForResultsException(results.Kept, e);
        }
    }

    private static KeptRecord Copy(ResultsFolder results, KeepRequest request, string hidden, IDisk disk)
    {
        disk.CreateFolder(hidden);
        var kept = new List<KeptCase>();
        var flaws = new List<string>();
        foreach (var (name, state) in request.Cases)
        {
            var copy = ResultsFolder.Objection(name) is null ? ResultCopy.Of(results.Case(name)) : null;
            if (copy is { Flaws.IsEmpty: false } && !request.AsItIs)
                flaws.AddRange(copy.Flaws.Select(f => $"{name}: {f.Sentence}"));
            kept.Add(new KeptCase(
                name, copy is { Flaws.IsEmpty: false } ? Damaged : state, copy?.Receipt?.Fingerprint, copy?.Receipt?.SolverVersion,
                copy?.Receipt?.SolvedAt));
            if (copy is not null && flaws.Count == 0)
                WriteFolder(Path.Join(hidden, name), copy.Files, disk);
        }
        if (flaws.Count > 0)
            throw new NotKeptException("not kept: results are not what was written; solve them again, or keep them with --as-it-is", [.. flaws]);
        if (kept.All(k => k.Fingerprint is null))
            throw new NotKeptException("not kept: there is no result", []);
        var report = kept.Exists(k => k.State == Damaged) ? null : request.Report;
        ResultContent[] files =
            [new(SummaryTable.FileName, request.Summary), .. report is null ? (ResultContent[])[] : [new(StudyReport.FileName, report)]];
        var record = new KeptRecord(
            KeptRecord.CurrentFormat, request.Name, results.StudyName, request.At, request.ToolVersion, kept, Caution.Text,
            [.. files.Select(file => ResultFile.Of(file.Name, file.Bytes.Span))]);
        WriteFolder(hidden, [.. files, new ResultContent(KeptRecord.FileName, record.ToBytes())], disk);
        return record;
    }

    private static void WriteFolder(string folder, IEnumerable<ResultContent> files, IDisk disk)
    {
        disk.CreateFolder(folder);
        foreach (var file in files)
        {
            var path = Path.Join(folder, file.Name);
            disk.Write(path, file.Bytes.Span);
            disk.Sync(path);
        }
        disk.Sync(folder);
    }

    private static void Exchange(string hidden, string target, KeepRequest request, IDisk disk)
    {
        if (!request.Replace)
            throw NameTaken(request.Name);   // meanwhile
        if (!disk.TryExchange(hidden, target))
            throw new NotKeptException(
                $"not kept: this file system cannot exchange two folders in one step, and '{request.Name}' is not given up for less; "
                + "keep under another name", []);
    }

    private static NotKeptException NameTaken(string name)
        => new($"not kept: there is a set '{name}' already; keep under another name, or put this one in its place with --replace", []);

    private static void DeleteIfPossible(string path, IDisk disk)
    {
        try
        {
            if (Directory.Exists(path))
                disk.Delete(path);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            // Its hidden name says whose it is; the next run removes it.
        }
    }
}
