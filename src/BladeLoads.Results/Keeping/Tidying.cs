using System.Collections.Immutable;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;

namespace BladeLoads.Results.Keeping;

/// <summary>A replaced result that would go.</summary>
/// <param name="ReplacedAt">When another took its place, UTC.</param>
public sealed record TidiedResult(ReplacedResult Result, DateTime ReplacedAt, long Bytes);

/// <summary>What tidying removes: results that reruns replaced, and tables that no receipt names any more.</summary>
/// <param name="Staying">How many replaced results stay.</param>
public sealed record Tidying(ImmutableArray<TidiedResult> Results, ImmutableArray<(string File, long Bytes)> Tables, int Staying)
{
    private const int HashDigits = 64;

    public bool IsEmpty => Results.IsEmpty && Tables.IsEmpty;

    /// <summary>Room that it frees, bytes.</summary>
    public long Bytes => Results.Sum(r => r.Bytes) + Tables.Sum(t => t.Bytes);

    /// <summary>Looks what would go; removes nothing.</summary>
    /// <param name="olderThan">A result goes only when it was replaced longer ago than this; null for whenever it was.</param>
    /// <param name="keepLast">So many replaced results of each case stay, those solved last; 0 for none.</param>
    public static Tidying Plan(ResultsFolder results, TimeSpan? olderThan, int keepLast, DateTimeOffset now)
    {
        var all = ReplacedResult.All(results);
        var going = all.GroupBy(r => r.Case, StringComparer.Ordinal)
            .SelectMany(ofCase => WithTimes(results, [.. ofCase]).Skip(keepLast))
            .Where(r => olderThan is not { } age || now.UtcDateTime - r.ReplacedAt > age)
            .Select(r => new TidiedResult(r.Result, r.ReplacedAt, BytesIn(r.Result.Folder)))
            .ToImmutableArray();
        var gone = going.Select(r => r.Result.Folder).ToHashSet(StringComparer.Ordinal);
        return new Tidying(going, TablesWithout(results, gone), all.Length - going.Length);
    }

    /// <summary>Removes it, each result in one step. False, with nothing removed, while a run writes into these results.</summary>
    /// <exception cref="NoRoomForResultsException">The system refuses; what is left can be tidied later.</exception>
    public bool Remove(ResultsFolder results, IDisk disk)
    {
        try
        {
            using var mark = RunMark.Take(disk, results.Study);
            if (mark.IsAnotherAlive())
                return false;
            foreach (var (result, _, _) in Results)
            {
                // Under a hidden name first, and the receipt first: half of a result is never taken for one.
                var hidden = mark.HiddenPath(result.Case, "new");
                if (!Directory.Exists(result.Folder) || !disk.TryRename(result.Folder, hidden))
                    continue;
                disk.Delete(Path.Join(hidden, Receipt.FileName));
                disk.Delete(hidden);
            }
            foreach (var folder in Results.Select(r => results.ReplacedOf(r.Result.Case)).Distinct(StringComparer.Ordinal))
                if (Directory.Exists(folder) && !Directory.EnumerateFileSystemEntries(folder).Any())
                    disk.Delete(folder);
            foreach (var (file, _) in Tables)
                disk.Delete(file);
            return true;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new NoRoomForResultsException(results.Study, e);
        }
    }

    // A result was replaced when the next newer one was solved. Where none is newer (an older one was brought back), the folder's own
    // time says when something moved into it last.
    private static IEnumerable<(ReplacedResult Result, DateTime ReplacedAt)> WithTimes(ResultsFolder results, ImmutableArray<ReplacedResult> newestFirst)
    {
        var current = ReceiptFile.Read(results.Case(newestFirst[0].Case)) is ReceiptReading.Readable { Receipt.SolvedAt: var solved }
            ? solved.UtcDateTime : DateTime.MinValue;
        var next = current > newestFirst[0].SolvedAt ? current : Directory.GetLastWriteTimeUtc(results.ReplacedOf(newestFirst[0].Case));
        foreach (var result in newestFirst)
        {
            yield return (result, next);
            next = result.SolvedAt;
        }
    }

    private static ImmutableArray<(string File, long Bytes)> TablesWithout(ResultsFolder results, HashSet<string> gone)
    {
        if (!Directory.Exists(results.Tables))
            return [];
        var named = ResultFolders(results).Where(f => !gone.Contains(f))
            .Select(ReceiptFile.Read).OfType<ReceiptReading.Readable>()
            .SelectMany(r => r.Receipt.Values.Values).Where(v => v.Length == HashDigits).ToHashSet(StringComparer.Ordinal);
        return
        [
            .. Directory.EnumerateFiles(results.Tables, "*.csv").Order(StringComparer.Ordinal)
                .Where(f => Path.GetFileNameWithoutExtension(f) is { Length: HashDigits } hash && !named.Contains(hash))
                .Select(f => (f, new FileInfo(f).Length)),
        ];
    }

    /// <summary>Every folder that may hold a receipt: of cases, replaced ones, kept ones, and what is being written.</summary>
    private static IEnumerable<string> ResultFolders(ResultsFolder results)
        => Directory.EnumerateDirectories(results.Study)
            .Concat(Below(results.Replaced)).Concat(Below(results.Kept))
            .Concat(ReplacedResult.All(results).Select(r => r.Folder)).Distinct(StringComparer.Ordinal);

    private static IEnumerable<string> Below(string folder)
        => Directory.Exists(folder) ? Directory.EnumerateDirectories(folder).SelectMany(Directory.EnumerateDirectories) : [];

    private static long BytesIn(string folder)
        => new DirectoryInfo(folder).EnumerateFiles("*", SearchOption.AllDirectories).Sum(f => f.Length);
}
