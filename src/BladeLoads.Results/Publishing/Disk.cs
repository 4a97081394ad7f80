using System.Runtime.InteropServices;
using Microsoft.Win32.SafeHandles;

namespace BladeLoads.Results.Publishing;

/// <summary>The file system of this machine.</summary>
/// <remarks>
/// Flushing goes to the system's own <c>fsync</c>: .NET ignores its failure, so a full or failing disk would count as success, and it
/// offers none for folders, without which a rename is lost in a power cut. Beside Unix, where that call does not exist, files are
/// flushed by .NET and folders are not.
/// </remarks>
public sealed partial class Disk : IDisk
{
    public void CreateFolder(string path) => Directory.CreateDirectory(path);

    public void Write(string path, ReadOnlySpan<byte> bytes)
    {
        using var file = File.OpenHandle(path, FileMode.CreateNew, FileAccess.Write, FileShare.Read);
        RandomAccess.Write(file, bytes, 0);
    }

    public void Sync(string path)
    {
        if (OperatingSystem.IsWindows())
        {
            if (File.Exists(path))
                using (var file = File.OpenHandle(path, FileMode.Open, FileAccess.ReadWrite))
                    RandomAccess.FlushToDisk(file);
            return;
        }
        using var handle = Open(path, ReadOnly | CloseOnExec, 0);
        if (handle.IsInvalid)
            throw Refused(path);
        while (Fsync(handle) != 0)
            if (Marshal.GetLastPInvokeError() != Errno.Interrupted)
                throw Refused(path);
    }

    public bool TryRename(string from, string to)
    {
        if (Directory.Exists(to))
            return false;
        try
        {
            if (File.Exists(from))
                File.Move(from, to, overwrite: true);
            else
                Directory.Move(from, to);
            return true;
        }
        catch (IOException) when (Directory.Exists(to))
        {
            return false;   // another run was faster by a moment
        }
    }

    public bool TryPlace(string from, string to)
    {
        try
        {
            // By a hard link where there are any, which in one step refuses a name that is taken.
            File.Move(from, to, overwrite: false);
            return true;
        }
        catch (IOException) when (Path.Exists(to) || new FileInfo(to).LinkTarget is not null)
        {
            return false;
        }
    }

    public bool TryExchange(string one, string other)
    {
        if (!OperatingSystem.IsLinux())
            return false;
        try
        {
            if (RenameAt2(CurrentFolder, one, CurrentFolder, other, RenameExchange) == 0)
                return true;
        }
        catch (EntryPointNotFoundException)
        {
            return false;   // a C library from before 2018
        }
        return Marshal.GetLastPInvokeError() is Errno.Unknown or Errno.Invalid or Errno.NotSupported ? false : throw Refused(other);
    }

    public void Delete(string path)
    {
        if (Directory.Exists(path))
            Directory.Delete(path, recursive: true);
        else
            File.Delete(path);
    }

    public bool TryDeleteEmptyFolder(string path)
    {
        try
        {
            Directory.Delete(path);
            return true;
        }
        catch (DirectoryNotFoundException)
        {
            return true;
        }
        catch (IOException e) when (e.HResult == Errno.NotEmpty || Directory.Exists(path) && Directory.EnumerateFileSystemEntries(path).Any())
        {
            return false;
        }
    }

    public ILockedFile? TryLock(string path)
    {
        if (!OperatingSystem.IsLinux())
            return TryLockByDotNet(path);
        while (true)
        {
            // Not through .NET: it takes a shared lock of its own with every file it opens, so that two who ask at once refuse each other.
            var handle = Open(path, ReadWrite | Create | CloseOnExec, EveryonesFile);
            if (handle.IsInvalid)
                throw Refused(path);
            if (Flock(handle, LockExclusive | LockWithoutWaiting) != 0)
            {
                var error = Marshal.GetLastPInvokeError();
                handle.Dispose();
                return error == Errno.TryAgain ? null : throw Refused(path, error);
            }
            // Who held the lock before may have deleted the file: then this lock is on a file that nobody else will ever find.
            if (IsStillAt(path, handle))
                return new LockedFile(handle);
            handle.Dispose();
        }
    }

    public byte[] ReadThoughLocked(string path)
    {
        using var handle = OperatingSystem.IsLinux()
            ? Open(path, ReadOnly | CloseOnExec, 0)
            : File.OpenHandle(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite | FileShare.Delete);
        return handle.IsInvalid ? throw Refused(path) : Beginning(handle);
    }

    private static byte[] Beginning(SafeFileHandle handle)
    {
        var bytes = new byte[Math.Min(RandomAccess.GetLength(handle), ILockedFile.MostBytes)];
        return bytes[..RandomAccess.Read(handle, bytes, 0)];
    }

    private static LockedFile? TryLockByDotNet(string path)
    {
        try
        {
            var handle = File.OpenHandle(path, FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.Delete);
            return new LockedFile(handle);
        }
        catch (IOException taken) when (DiskTrouble.IsBusy(taken))
        {
            return null;
        }
    }

    private static bool IsStillAt(string path, SafeFileHandle handle)
    {
        try
        {
            Span<byte> held = stackalloc byte[StatxSize];
            Span<byte> found = stackalloc byte[StatxSize];
            // Where the system does not answer at all, asking again for ever would not help.
            if (Statx(handle, "", EmptyPath, StatxInode, held) != 0)
                throw Refused(path);
            return StatxAt(CurrentFolder, path, 0, StatxInode, found) == 0
                && held[StatxInodeNumber].SequenceEqual(found[StatxInodeNumber]) && held[StatxDevice].SequenceEqual(found[StatxDevice]);
        }
        catch (EntryPointNotFoundException)
        {
            return File.Exists(path);   // a C library from before 2018
        }
    }

    private sealed class LockedFile(SafeFileHandle handle) : ILockedFile
    {
        public byte[] Read() => Beginning(handle);

        public void Write(ReadOnlySpan<byte> bytes)
        {
            RandomAccess.Write(handle, bytes, 0);
            RandomAccess.SetLength(handle, bytes.Length);
        }

        public void Dispose() => handle.Dispose();
    }

    private static IOException Refused(string path) => Refused(path, Marshal.GetLastPInvokeError());

    private static IOException Refused(string path, int error)
        => new($"{Marshal.GetPInvokeErrorMessage(error)}: '{path}'", error);

    private const int ReadOnly = 0;
    private const int ReadWrite = 2;
    private const int Create = 0x40;
    private const int EveryonesFile = 0x1B6;   // rw-rw-rw-, less what the user's mask takes away
    private const int CloseOnExec = 0x80000;
    private const int CurrentFolder = -100;
    private const uint RenameExchange = 2;
    private const int LockExclusive = 2;
    private const int LockWithoutWaiting = 4;

    // struct statx has one layout on every processor.
    private const int StatxSize = 256;
    private const int EmptyPath = 0x1000;
    private const uint StatxInode = 0x100;
    private static readonly Range StatxInodeNumber = 32..40;
    private static readonly Range StatxDevice = 136..144;

    [LibraryImport("libc", EntryPoint = "open", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    private static partial SafeFileHandle Open(string path, int flags, int mode);

    [LibraryImport("libc", EntryPoint = "fsync", SetLastError = true)]
    private static partial int Fsync(SafeFileHandle file);

    [LibraryImport("libc", EntryPoint = "flock", SetLastError = true)]
    private static partial int Flock(SafeFileHandle file, int operation);

    [LibraryImport("libc", EntryPoint = "renameat2", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    private static partial int RenameAt2(int fromFolder, string from, int toFolder, string to, uint flags);

    [LibraryImport("libc", EntryPoint = "statx", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    private static partial int Statx(SafeFileHandle file, string path, int flags, uint mask, Span<byte> found);

    [LibraryImport("libc", EntryPoint = "statx", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    private static partial int StatxAt(int folder, string path, int flags, uint mask, Span<byte> found);
}
