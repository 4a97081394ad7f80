namespace BladeLoads.Results.Publishing;

/// <summary>
/// What publishing asks of the file system. Every member throws <see cref="IOException"/> or <see cref="UnauthorizedAccessException"/>
/// where the system refuses; nothing fails silently.
/// </summary>
public interface IDisk
{
    /// <summary>Creates the folder and those above it; one that is there already is no error.</summary>
    void CreateFolder(string path);

    /// <summary>Writes a file that is not there yet.</summary>
    void Write(string path, ReadOnlySpan<byte> bytes);

    /// <summary>Returns when the file's bytes, or the folder's entries, would survive a power cut.</summary>
    void Sync(string path);

    /// <summary>Renames; a file replaces a file. False where a folder stands at the new place.</summary>
    bool TryRename(string from, string to);

    /// <summary>Renames a file to a path where nothing stands. False where something does, even if it came a moment ago.</summary>
    bool TryPlace(string from, string to);

    /// <summary>Exchanges two folders in one step. False where the file system cannot.</summary>
    bool TryExchange(string one, string other);

    /// <summary>Deletes a file, or a folder with all that is in it; what is not there is no error.</summary>
    void Delete(string path);

    /// <summary>Deletes a folder with nothing in it; true where it is gone then, or was not there. False where something is in it.</summary>
    bool TryDeleteEmptyFolder(string path);

    /// <summary>
    /// Takes the lock of a file, created if need be, until the returned value is disposed or the process dies: no lock outlives its
    /// owner. Null while another holds it. While the lock is held the file stands at its path, unless its holder deletes it.
    /// </summary>
    ILockedFile? TryLock(string path);

    /// <summary>What stands in a small file, even while another process has its lock.</summary>
    byte[] ReadThoughLocked(string path);
}

/// <summary>A file that no other process can lock until this is disposed.</summary>
public interface ILockedFile : IDisposable
{
    /// <summary>No more than this is ever read.</summary>
    const int MostBytes = 4096;

    byte[] Read();

    /// <summary>Replaces what the file held. It would survive the end of the process, not a power cut.</summary>
    void Write(ReadOnlySpan<byte> bytes);
}
