using System.Collections.Concurrent;
using BladeLoads.Results.Publishing;

namespace BladeLoads.Batch.Tests.Building;

/// <summary>What befalls a run at its n-th effect on the disk.</summary>
internal enum Misfortune
{
    /// <summary>That one effect is refused.</summary>
    Refused,

    /// <summary>That effect and all that follow are refused, as by a disk that has become read-only.</summary>
    RefusedFromThenOn,

    /// <summary>The process is gone: that effect is half done where it can be, and none follows.</summary>
    Killed,
}

/// <summary>The end of a process, as far as one can have it within a process.</summary>
internal sealed class KilledException : Exception;

/// <summary>
/// A disk with a misfortune at the n-th effect, counted over everything that changes anything: folders, writes, flushes, renames,
/// exchanges, deletions, locks and what is written into locked files.
/// </summary>
/// <param name="at">Counts from 1; 0 for never.</param>
internal sealed class MisfortuneDisk(int at, Misfortune misfortune, bool canExchange = true, int errno = 5) : IDisk
{
    private readonly Disk _disk = new();
    private readonly ConcurrentBag<ILockedFile> _locks = [];
    private int _effects;

    public bool HasStruck => at > 0 && _effects >= at;

    public void CreateFolder(string path)
    {
        Count();
        _disk.CreateFolder(path);
    }

    public void Write(string path, ReadOnlySpan<byte> bytes)
    {
        if (Strikes(out var trouble))
        {
            if (_effects == at)
                _disk.Write(path, bytes[..(bytes.Length / 2)]);
            throw trouble;
        }
        _disk.Write(path, bytes);
    }

    public void Sync(string path)
    {
        Count();
        _disk.Sync(path);
    }

    public bool TryRename(string from, string to)
    {
        Count();
        return _disk.TryRename(from, to);
    }

    public bool TryPlace(string from, string to)
    {
        Count();
        return _disk.TryPlace(from, to);
    }

    public bool TryExchange(string one, string other)
    {
        if (!canExchange)
            return false;
        Count();
        return _disk.TryExchange(one, other);
    }

    public void Delete(string path)
    {
        Count();
        _disk.Delete(path);
    }

    public bool TryDeleteEmptyFolder(string path)
    {
        Count();
        return _disk.TryDeleteEmptyFolder(path);
    }

    public ILockedFile? TryLock(string path)
    {
        Count();
        if (_disk.TryLock(path) is not { } held)
            return null;
        _locks.Add(held);
        return new Held(held, this);
    }

    public byte[] ReadThoughLocked(string path) => _disk.ReadThoughLocked(path);

    private void Count()
    {
        if (Strikes(out var trouble))
            throw trouble;
    }

    private bool Strikes(out Exception trouble)
    {
        var effect = Interlocked.Increment(ref _effects);
        trouble = misfortune == Misfortune.Killed ? new KilledException() : new IOException($"refused at {effect}", errno);
        var strikes = at > 0 && (misfortune == Misfortune.Refused ? effect == at : effect >= at);
        if (strikes && misfortune == Misfortune.Killed)
            foreach (var held in _locks)
                held.Dispose();   // the kernel frees the locks of a process that is gone
        return strikes;
    }

    private sealed class Held(ILockedFile inner, MisfortuneDisk disk) : ILockedFile
    {
        public byte[] Read() => inner.Read();

        public void Write(ReadOnlySpan<byte> bytes)
        {
            disk.Count();
            inner.Write(bytes);
        }

        public void Dispose() => inner.Dispose();
    }
}
