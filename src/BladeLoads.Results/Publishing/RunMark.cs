using System.Globalization;
using System.Security.Cryptography;
using System.Text.RegularExpressions;

namespace BladeLoads.Results.Publishing;

/// <summary>
/// A run's own mark in a study's results folder: a lock file, held while the process lives, and the ending of every hidden name the
/// run writes under. Whoever finds a hidden name can ask the lock whether its writer still lives.
/// </summary>
internal sealed partial class RunMark : IDisposable
{
    private readonly IDisk _disk;
    private readonly string _folder;
    private readonly string _run;
    private readonly IDisposable _lock;
    private int _names;

    private RunMark(IDisk disk, string folder, string run, IDisposable held) => (_disk, _folder, _run, _lock) = (disk, folder, run, held);

    public static RunMark Take(IDisk disk, string folder)
    {
        while (true)
        {
            var run = Convert.ToHexStringLower(RandomNumberGenerator.GetBytes(6));
            var path = LockFile(folder, run);
            // Another run that tidies up may hold it for a moment, between its creation and its lock, taking it for a dead one's.
            if (disk.TryLock(path) is { } held)
                return new RunMark(disk, folder, run, held);
        }
    }

    /// <summary>A hidden path in the study's folder that no other write uses.</summary>
    /// <param name="ending"><c>new</c> for what is being written, <c>old</c> for what it replaces.</param>
    public string HiddenPath(string name, string ending)
        => Path.Join(_folder, string.Create(CultureInfo.InvariantCulture, $".{Shortened(name)}.{_run}-{Interlocked.Increment(ref _names)}.{ending}"));

    /// <summary>Whether a run, living or dead, has something hidden in the folder.</summary>
    public static bool IsAnyIn(string folder)
        => Directory.Exists(folder) && Directory.EnumerateFileSystemEntries(folder, ".*").Any(path => OwnedName().IsMatch(Path.GetFileName(path)));

    /// <summary>Whether another run, alive just now, writes into the folder.</summary>
    public bool IsAnotherAlive()
    {
        foreach (var path in Directory.EnumerateFiles(_folder, ".run-*.lock"))
            if (OwnedName().Match(Path.GetFileName(path)) is { Success: true } name && name.Groups["run"].Value != _run)
            {
                using var held = _disk.TryLock(path);
                if (held is null)
                    return true;
                _disk.Delete(path);   // a dead one's, or made by asking, if its run has just ended
            }
        return false;
    }

    /// <summary>
    /// Removes what runs left that were killed: their unfinished writes, and their locks. A replaced result whose successor never came
    /// into its place is put back, other whole results go to the replaced ones. What belongs to a living run is left alone.
    /// </summary>
    public void TidyAfterTheDead(ResultsFolder results)
    {
        var byRun = Directory.EnumerateFileSystemEntries(_folder, ".*")
            .Select(path => (Path: path, Name: OwnedName().Match(Path.GetFileName(path))))
            .Where(entry => entry.Name.Success && entry.Name.Groups["run"].Value != _run)
            .GroupBy(entry => entry.Name.Groups["run"].Value, StringComparer.Ordinal);
        foreach (var left in byRun)
        {
            var lockFile = LockFile(_folder, left.Key);
            using var held = _disk.TryLock(lockFile);
            if (held is null)
                continue;
            foreach (var (path, _) in left.Where(entry => entry.Path != lockFile))
                Tidy(path, results);
            _disk.Delete(lockFile);
        }
    }

    public void Dispose()
    {
        try
        {
            _disk.Delete(LockFile(_folder, _run));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            // It stays behind unlocked; the next run takes it for a dead one's and removes it.
        }
        _lock.Dispose();
    }

    // A hidden folder with a whole result holds one that was replaced, or a new one that never came into its place: neither is thrown away.
    private void Tidy(string path, ResultsFolder results)
    {
        if (Receipts.ReceiptFile.Read(path) is Receipts.ReceiptReading.Readable { Receipt: var receipt }
            && ResultsFolder.Objection(receipt.Case) is null && Receipts.ResultCheck.IsWhole(path, receipt))
        {
            // Killed before it was flushed: nothing goes where it is taken for a result before it would survive a power cut.
            foreach (var file in receipt.Files)
                _disk.Sync(Path.Join(path, file.Name));
            _disk.Sync(Path.Join(path, Receipts.Receipt.FileName));
            _disk.Sync(path);
            if (_disk.TryRename(path, results.Case(receipt.Case)))
                return;
            ReplacedResult.SetAside(path, receipt.Case, results, _disk);
            return;
        }
        _disk.Delete(path);
    }

    private static string LockFile(string folder, string run) => Path.Join(folder, $".run-{run}.lock");

    // A file name may have 255 bytes, and the case's own name may have used them all.
    private static string Shortened(string name) => name.Length <= 40 ? name : name[..(char.IsHighSurrogate(name[39]) ? 39 : 40)];

    [GeneratedRegex(@"^\.(run-(?<run>[0-9a-f]{12})\.lock|.+\.(?<run>[0-9a-f]{12})-[0-9]+\.(new|old))$", RegexOptions.Singleline)]
    private static partial Regex OwnedName();
}
