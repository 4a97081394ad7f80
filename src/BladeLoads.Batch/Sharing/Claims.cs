using System.Collections.Concurrent;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Sharing;

/// <summary>
/// The cases of a study that runs are solving just now: a file each in <c>.claims</c>, locked by the process that solves it. The kernel
/// frees the lock when the process dies, so that none ever needs a person; the file stays behind then and tells how often that happened.
/// </summary>
public sealed class Claims : IDisposable
{
    private readonly ResultsFolder _results;
    private readonly IDisk _disk;
    private readonly ConcurrentDictionary<Claim, bool> _held = new();

    public Claims(ResultsFolder results, IDisk disk)
    {
        (_results, _disk) = (results, disk);
        AppDomain.CurrentDomain.ProcessExit += GiveBackAll;
    }

    /// <summary>Removes what stays behind of runs that were killed after they had published a result and before they could say so.</summary>
    public static void TidyIfPossible(ResultsFolder results, IDisk disk)
    {
        try
        {
            if (!Directory.Exists(results.Claims))
                return;
            foreach (var path in Directory.EnumerateFiles(results.Claims))
                TidyFinished(path, results, disk);
            disk.TryDeleteEmptyFolder(results.Claims);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            // A claim that nobody holds keeps nobody from anything.
        }
    }

    /// <summary>The claim of a case, which is then this process's alone; null while another run has it. It is no attempt yet.</summary>
    /// <exception cref="IOException">The system refused.</exception>
    /// <exception cref="UnauthorizedAccessException">The system refused.</exception>
    public Claim? TryTake(StudyCase studyCase)
    {
        if (Lock(studyCase.Name) is not { } held)
            return null;
        var claim = new Claim(held, studyCase.Fingerprint, () => _disk.Delete(_results.Claim(studyCase.Name)), taken => _held.TryRemove(taken, out _));
        _held[claim] = true;
        return claim;
    }

    /// <summary>The process that has the claim of a case, by its number; null where that cannot be told.</summary>
    public int? HolderOf(string caseName)
    {
        try
        {
            return ClaimNote.Parse(_disk.ReadThoughLocked(_results.Claim(caseName))).Process;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    /// <summary>Gives back what is still held, and removes the folder where no run has anything in it.</summary>
    public void Dispose()
    {
        AppDomain.CurrentDomain.ProcessExit -= GiveBackAll;
        GiveBackAll(null, EventArgs.Empty);
        TidyIfPossible(_results, _disk);
    }

    private ILockedFile? Lock(string caseName)
    {
        const int TriesAtMost = 100;
        for (var tries = 1; ; tries++)
        {
            try
            {
                _disk.CreateFolder(_results.Claims);
                return _disk.TryLock(_results.Claim(caseName));
            }
            // Another run that ended has just removed the folder as an empty one, or a third has made it anew.
            catch (IOException e) when (tries < TriesAtMost && DiskTrouble.HasComeOrGone(e))
            {
            }
        }
    }

    // A process that ends because it was told to has lost no attempt.
    private void GiveBackAll(object? sender, EventArgs e)
    {
        foreach (var claim in _held.Keys)
            claim.GiveBack();
    }

    private static void TidyFinished(string path, ResultsFolder results, IDisk disk)
    {
        using var held = disk.TryLock(path);
        if (held is null)
            return;
        var name = Path.GetFileName(path);
        var fingerprint = ClaimNote.Parse(held.Read()).Fingerprint;
        if (fingerprint.Length == 0
            || ReceiptFile.Read(results.Case(name)) is ReceiptReading.Readable { Receipt: var receipt } && receipt.Fingerprint == fingerprint)
            disk.Delete(path);
    }
}
