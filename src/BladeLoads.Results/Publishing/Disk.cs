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
        using var handle = Open(path, ReadOnly | CloseOnExec);
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
        if (File.Exists(from))
            File.Move(from, to, overwrite: true);
        else
            Directory.Move(from, to);
        return true;
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

    public IDisposable? TryLock(string path)
    {
        if (OperatingSystem.IsWindows())
        {
            try
            {
                return new FileStream(path, FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.Delete);
            }
            catch (IOException taken) when (DiskTrouble.IsBusy(taken))
            {
                return null;
            }
        }
        var handle = File.OpenHandle(path, FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.ReadWrite | FileShare.Delete);
        if (Flock(handle, LockExclusive | LockWithoutWaiting) == 0)
            return handle;
        var error = Marshal.GetLastPInvokeError();
        handle.Dispose();
        return error == Errno.TryAgain ? null : throw Refused(path, error);
    }

    private static IOException Refused(string path) => Refused(path, Marshal.GetLastPInvokeError());

    private static IOException Refused(string path, int error)
        => new($"{Marshal.GetPInvokeErrorMessage(error)}: '{path}'", error);

    private const int ReadOnly = 0;
    private const int CloseOnExec = 0x80000;
    private const int CurrentFolder = -100;
    private const uint RenameExchange = 2;
    private const int LockExclusive = 2;
    private const int LockWithoutWaiting = 4;

    [LibraryImport("libc", EntryPoint = "open", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    private static partial SafeFileHandle Open(string path, int flags);

    [LibraryImport("libc", EntryPoint = "fsync", SetLastError = true)]
    private static partial int Fsync(SafeFileHandle file);

    [LibraryImport("libc", EntryPoint = "flock", SetLastError = true)]
    private static partial int Flock(SafeFileHandle file, int operation);

    [LibraryImport("libc", EntryPoint = "renameat2", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    private static partial int RenameAt2(int fromFolder, string from, int toFolder, string to, uint flags);
}
