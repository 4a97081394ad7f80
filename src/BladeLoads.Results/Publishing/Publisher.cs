using System.Collections.Concurrent;

namespace BladeLoads.Results.Publishing;

/// <summary>A file of a result, by name.</summary>
public sealed record ResultContent(string Name, ReadOnlyMemory<byte> Bytes);

/// <summary>
/// Puts results into a study's folder so that each appears whole or not at all, and stays when the power goes right after. One
/// publisher serves a run; its members may be called from several threads, for different cases.
/// </summary>
public sealed class Publisher : IDisposable
{
    private readonly IDisk _disk;
    private readonly ResultsFolder _folder;
    private readonly RunMark _mark;
    private readonly Lock _settling = new();
    private readonly ConcurrentQueue<Placed> _placed = new();

    private Publisher(IDisk disk, ResultsFolder folder, RunMark mark) => (_disk, _folder, _mark) = (disk, folder, mark);

    /// <summary>Makes the study's results folder ready to be written to, and removes what killed runs left unfinished in it.</summary>
    /// <exception cref="NoRoomForResultsException">The folder cannot be written to.</exception>
    public static Publisher Open(ResultsFolder folder, IDisk disk)
    {
        try
        {
            disk.CreateFolder(folder.Study);
            var mark = RunMark.Take(disk, folder.Study);
            try
            {
                mark.TidyAfterTheDead(folder);
            }
            catch (Exception e) when (e is IOException or UnauthorizedAccessException)
            {
                // Leftovers cost room, never a result; the next run tries again.
            }
            return new Publisher(disk, folder, mark);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new NoRoomForResultsException(folder.Study, e);
        }
    }

    /// <summary>Removes what killed runs left unfinished, where there is any and the system lets us; otherwise touches nothing.</summary>
    public static void TidyIfPossible(ResultsFolder folder, IDisk disk)
    {
        try
        {
            if (RunMark.IsAnyIn(folder.Study))
                Open(folder, disk).Dispose();
        }
        catch (Exception e) when (e is NoRoomForResultsException or IOException or UnauthorizedAccessException)
        {
            // Looking at results needs no permission to write.
        }
    }

    /// <summary>Publishes the folder of a case, for good; one that was there before moves to the replaced results, whole.</summary>
    /// <exception cref="IOException">The system refused; what was there before is there still, or else the new result is, whole.</exception>
    /// <exception cref="UnauthorizedAccessException">As above.</exception>
    /// <exception cref="ArgumentException">The name cannot be that of a result folder.</exception>
    public void PublishCase(string caseName, IEnumerable<ResultContent> files)
    {
        Place(caseName, files);
        Settle();
    }

    /// <summary>
    /// Puts the folder of a case in its place, whole and with its files flushed. It would not survive a power cut there before
    /// <see cref="Settle"/>, which serves all that was placed before it at the price of one flush.
    /// </summary>
    /// <exception cref="IOException">As for <see cref="PublishCase"/>.</exception>
    public void Place(string caseName, IEnumerable<ResultContent> files)
    {
        if (ResultsFolder.Objection(caseName) is { } objection)
            throw new ArgumentException(objection, nameof(caseName));
        var hidden = _mark.HiddenPath(caseName, "new");
        try
        {
            _disk.CreateFolder(hidden);
            foreach (var file in files)
            {
                var path = Path.Join(hidden, file.Name);
                _disk.Write(path, file.Bytes.Span);
                _disk.Sync(path);
            }
            _disk.Sync(hidden);
        }
        catch
        {
            DeleteIfPossible(hidden);
            throw;
        }
        _placed.Enqueue(new Placed(caseName, PutInPlace(hidden, _folder.Case(caseName))));
    }

    /// <summary>
    /// Returns when all that this run placed before would survive a power cut. Only then may what it replaced leave its hidden name.
    /// </summary>
    /// <exception cref="IOException">The system refused: nothing that was placed since the last time is safe yet.</exception>
    public void Settle()
    {
        lock (_settling)   // who waits here finds, as a rule, that its results were flushed with the others'
        {
            var count = _placed.Count;
            if (count == 0)
                return;
            _disk.Sync(_folder.Study);
            for (; count > 0 && _placed.TryDequeue(out var placed); count--)
                if (placed.Replaced is not null)
                    SetAsideIfPossible(placed.Replaced, placed.Case);
        }
    }

    /// <summary>Publishes a single file, replacing one that was there.</summary>
    /// <exception cref="IOException">As for <see cref="PublishCase"/>.</exception>
    public void PublishFile(string path, ReadOnlySpan<byte> bytes)
    {
        var hidden = _mark.HiddenPath(Path.GetFileName(path), "new");
        var folder = Path.GetDirectoryName(path)!;
        try
        {
            _disk.CreateFolder(folder);
            _disk.Write(hidden, bytes);
            _disk.Sync(hidden);
            if (!_disk.TryRename(hidden, path))
                throw new IOException($"a folder stands where the file '{path}' belongs");
        }
        catch
        {
            DeleteIfPossible(hidden);
            throw;
        }
        _disk.Sync(folder);
    }

    /// <summary>Removes a file of ours that no longer holds, if the system lets us.</summary>
    public void Remove(string path)
    {
        if (File.Exists(path))
            DeleteIfPossible(path);
    }

    public void Dispose() => _mark.Dispose();

    /// <param name="Replaced">Where the result that was there before lies now; null for none.</param>
    private sealed record Placed(string Case, string? Replaced);

    /// <summary>Returns where the result that was there before has gone; null for none.</summary>
    private string? PutInPlace(string hidden, string target)
    {
        try
        {
            if (_disk.TryRename(hidden, target))
                return null;
            return _disk.TryExchange(hidden, target) ? hidden : ReplaceInTwoSteps(hidden, target);
        }
        catch
        {
            DeleteIfPossible(hidden);
            throw;
        }
    }

    // Where folders cannot be exchanged in one step. Killed between the two renames: the next run finds the old result under its hidden
    // name, and no living owner, and puts it back.
    private string ReplaceInTwoSteps(string hidden, string target)
    {
        var old = _mark.HiddenPath(Path.GetFileName(target), "old");
        if (!_disk.TryRename(target, old))
            throw new IOException($"'{target}' could not be moved aside");
        try
        {
            if (_disk.TryRename(hidden, target))
                return old;
        }
        catch
        {
            _disk.TryRename(old, target);
            throw;
        }
        // Another run has put its result there meanwhile: the same case gives the same bytes, so ours is not missed.
        DeleteIfPossible(hidden);
        return old;
    }

    private void SetAsideIfPossible(string replaced, string caseName)
    {
        try
        {
            ReplacedResult.SetAside(replaced, caseName, _folder, _disk);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            // The new result stands. The replaced one keeps its hidden name, under which the next run finds it and sets it aside.
        }
    }

    private void DeleteIfPossible(string path)
    {
        try
        {
            _disk.Delete(path);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            // Left behind: hidden names are removed by the next run, and a failure record yields to a current result.
        }
    }
}
