using System.Buffers.Binary;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Text;
using Microsoft.Win32.SafeHandles;

namespace BladeLoads.Studies.Files;

/// <summary>What a name leads to, links not followed.</summary>
public enum EntryType
{
    Missing,
    File,
    Folder,

    /// <summary>A link, a pipe, a device, or something that may not be asked about.</summary>
    Other,
}

/// <summary>
/// How the system knows a file or folder. An edit changes it, but for one within the clock's own step after it was taken; it serves to
/// skip reading what was read before, never to say that something changed.
/// </summary>
/// <param name="Size">Bytes.</param>
/// <param name="Modified">Nanoseconds since 1970, UTC; anyone may set it.</param>
/// <param name="Changed">The same of the last change of bytes, name or times, which only the system sets.</param>
public readonly partial record struct FileStamp(EntryType Type, ulong Inode, ulong Device, long Size, long Modified, long Changed)
{
    /// <summary>Nanoseconds: a change closer than this to the look at it could be followed by another that does not show.</summary>
    private const long TooClose = 2_000_000_000;

    /// <summary>Whether stamps can be had here at all.</summary>
    public static bool IsSupported => OperatingSystem.IsLinux();

    /// <summary>Whether another change could have followed without changing the stamp, when it was taken at that time.</summary>
    /// <param name="taken">Nanoseconds since 1970, UTC.</param>
    public bool IsSettled(long taken) => Changed <= taken - TooClose;

    public static long Now(TimeProvider time) => (time.GetUtcNow().UtcTicks - DateTime.UnixEpoch.Ticks) * 100;

    public static FileStamp Of(string path) => Of(CurrentFolder, Encoding.UTF8.GetBytes(path + '\0'));

    /// <param name="path">Relative to the folder; UTF-8, ended by a NUL.</param>
    internal static FileStamp Of(SafeFileHandle folder, ReadOnlySpan<byte> path) => Of((int)folder.DangerousGetHandle(), path);

    [SkipLocalsInit]
    private static unsafe FileStamp Of(int folder, ReadOnlySpan<byte> path)
    {
        const int noFollow = 0x100, length = 256;
        const uint typeInodeSizeTimes = 0x1 | 0x100 | 0x200 | 0x40 | 0x80;
        var status = stackalloc byte[length];
        int result;
        fixed (byte* name = path)
            result = Statx(folder, name, noFollow, typeInodeSizeTimes, status);
        if (result != 0)
            return Marshal.GetLastPInvokeError() is NoEntry or NotFolder ? default : new FileStamp(EntryType.Other, 0, 0, 0, 0, 0);
        var s = new ReadOnlySpan<byte>(status, length);
        return new FileStamp(
            (BinaryPrimitives.ReadUInt16LittleEndian(s[28..]) & 0xF000) switch
            {
                0x8000 => EntryType.File,
                0x4000 => EntryType.Folder,
                _ => EntryType.Other,
            },
            BinaryPrimitives.ReadUInt64LittleEndian(s[32..]), BinaryPrimitives.ReadUInt64LittleEndian(s[136..]),
            BinaryPrimitives.ReadInt64LittleEndian(s[40..]), Nanoseconds(s[112..]), Nanoseconds(s[96..]));
    }

    private static long Nanoseconds(ReadOnlySpan<byte> time)
        => BinaryPrimitives.ReadInt64LittleEndian(time) * 1_000_000_000 + BinaryPrimitives.ReadUInt32LittleEndian(time[8..]);

    private const int CurrentFolder = -100;
    private const int NoEntry = 2;
    private const int NotFolder = 20;

    [LibraryImport("libc", EntryPoint = "statx", SetLastError = true)]
    private static unsafe partial int Statx(int folder, byte* path, int flags, uint mask, byte* status);
}
