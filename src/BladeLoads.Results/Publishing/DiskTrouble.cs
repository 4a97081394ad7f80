namespace BladeLoads.Results.Publishing;

/// <summary>The numbers by which Linux says what went wrong.</summary>
internal static class Errno
{
    public const int NotPermitted = 1;
    public const int NoEntry = 2;
    public const int Interrupted = 4;
    public const int InputOutput = 5;
    public const int TryAgain = 11;
    public const int AccessDenied = 13;
    public const int Busy = 16;
    public const int Exists = 17;
    public const int Invalid = 22;
    public const int TextFileBusy = 26;
    public const int NoSpace = 28;
    public const int ReadOnlyFileSystem = 30;
    public const int Unknown = 38;
    public const int NotEmpty = 39;
    public const int NotSupported = 95;
    public const int QuotaExceeded = 122;
}

/// <summary>What a refusal of the file system means for a run.</summary>
public static class DiskTrouble
{
    private const int WindowsSharing = unchecked((int)0x80070020);
    private const int WindowsLock = unchecked((int)0x80070021);
    private const int WindowsDiskFull = unchecked((int)0x80070070);

    /// <summary>The file is in use just now: trying again can help.</summary>
    public static bool IsBusy(Exception trouble) => trouble is IOException
    {
        HResult: Errno.TryAgain or Errno.Busy or Errno.TextFileBusy or WindowsSharing or WindowsLock
    };

    /// <summary>What was asked for has just gone, or come, by another's hand: trying again at once can help.</summary>
    public static bool HasComeOrGone(IOException trouble)
        => trouble is FileNotFoundException or DirectoryNotFoundException || trouble.HResult is Errno.NoEntry or Errno.Exists;

    /// <summary>No case can be written any more: no room, no permission, or a device that fails. Other cases would fare no better.</summary>
    public static bool StopsTheRun(Exception trouble) => trouble is UnauthorizedAccessException or IOException
    {
        HResult: Errno.NotPermitted or Errno.InputOutput or Errno.AccessDenied or Errno.NoSpace or Errno.ReadOnlyFileSystem
            or Errno.QuotaExceeded or WindowsDiskFull
    };

    /// <summary>Why something could not be read, in a user's words, without the path.</summary>
    public static string ReadingReason(Exception trouble) => trouble switch
    {
        UnauthorizedAccessException or IOException { HResult: Errno.NotPermitted or Errno.AccessDenied } => "no permission to read",
        FileNotFoundException or DirectoryNotFoundException => "it is not there",
        _ => Reason(trouble),
    };

    /// <summary>The reason in a user's words, without the path.</summary>
    public static string Reason(Exception trouble) => trouble switch
    {
        IOException { HResult: Errno.NoSpace or WindowsDiskFull } => "no room left on the disk",
        IOException { HResult: Errno.QuotaExceeded } => "the disk quota is used up",
        IOException { HResult: Errno.ReadOnlyFileSystem } => "the file system is read-only",
        IOException { HResult: Errno.InputOutput } => "the disk reports an input/output error",
        UnauthorizedAccessException or IOException { HResult: Errno.NotPermitted or Errno.AccessDenied } => "no permission to write",
        IOException when IsBusy(trouble) => "a file in it is in use",
        PathTooLongException => "the name is too long for the file system",
        _ => Wording.Printable.Of(trouble.Message),
    };
}

/// <summary>Results cannot be written at all. The message names the folder and the reason in one line.</summary>
public sealed class NoRoomForResultsException(string folder, Exception trouble)
    : Exception($"cannot write results into {Wording.Printable.Of(folder)}: {DiskTrouble.Reason(trouble)}", trouble);
