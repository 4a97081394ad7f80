using BladeLoads.Results.Publishing;

namespace BladeLoads.Batch.Tests.Building;

/// <summary>A disk that refuses from its n-th write, flush, rename or exchange on, as a full or a dead one does.</summary>
/// <param name="refuseFrom">Counts from 1; 0 for never.</param>
/// <param name="only">Refuse that one step alone.</param>
internal sealed class FailingDisk(int refuseFrom, Func<Exception>? trouble = null, bool canExchange = true, bool only = false) : IDisk
{
    private readonly Disk _disk = new();
    private int _steps;

    public bool HasRefused { get; private set; }

    public static IOException NoRoom() => new("No space left on device", 28);

    public static IOException InUse() => new("Text file busy", 26);

    public static IOException Odd() => new("Cannot allocate memory", 12);

    public void CreateFolder(string path) => _disk.CreateFolder(path);

    public void Write(string path, ReadOnlySpan<byte> bytes)
    {
        if (IsRefused())
        {
            _disk.Write(path, bytes[..(bytes.Length / 2)]);   // a full disk takes what it can
            throw Trouble();
        }
        _disk.Write(path, bytes);
    }

    public void Sync(string path)
    {
        Step();
        _disk.Sync(path);
    }

    public bool TryRename(string from, string to)
    {
        Step();
        return _disk.TryRename(from, to);
    }

    public bool TryPlace(string from, string to)
    {
        Step();
        return _disk.TryPlace(from, to);
    }

    public bool TryExchange(string one, string other)
    {
        if (!canExchange)
            return false;
        Step();
        return _disk.TryExchange(one, other);
    }

    public void Delete(string path) => _disk.Delete(path);

    public bool TryDeleteEmptyFolder(string path) => _disk.TryDeleteEmptyFolder(path);

    public ILockedFile? TryLock(string path) => _disk.TryLock(path);

    public byte[] ReadThoughLocked(string path) => _disk.ReadThoughLocked(path);

    private void Step()
    {
        if (IsRefused())
            throw Trouble();
    }

    private bool IsRefused()
    {
        var step = Interlocked.Increment(ref _steps);
        var refused = refuseFrom > 0 && (only ? step == refuseFrom : step >= refuseFrom);
        HasRefused |= refused;
        return refused;
    }

    private Exception Trouble() => (trouble ?? NoRoom)();
}
