using System.Runtime.InteropServices;
using System.Text.Unicode;
using Microsoft.Win32.SafeHandles;

namespace BladeLoads.Studies.Files;

/// <summary>Stamps of what lies in a folder, one after the other: the folder is opened once, and no path is put together for them.</summary>
public sealed partial class FolderStamps : IDisposable
{
    private readonly SafeFileHandle _folder;
    private byte[] _name = new byte[512];

    private FolderStamps(SafeFileHandle folder) => _folder = folder;

    /// <summary>Null where there is no such folder, or where stamps cannot be had.</summary>
    public static FolderStamps? Open(string path)
    {
        if (!FileStamp.IsSupported)
            return null;
        var folder = OpenPath(path, PathOnly | CloseOnExec);
        if (!folder.IsInvalid)
            return new FolderStamps(folder);
        folder.Dispose();
        return null;
    }

    /// <param name="name">Relative to the folder; empty for the folder itself.</param>
    /// <param name="file">A file in it; empty for none.</param>
    public FileStamp Of(ReadOnlySpan<char> name, ReadOnlySpan<char> file = default)
    {
        while (true)
        {
            var into = _name.AsSpan();
            if (TryAppend(ref into, name.IsEmpty ? "." : name) && (file.IsEmpty || TryAppend(ref into, "/") && TryAppend(ref into, file))
                && TryAppend(ref into, "\0"))
                return FileStamp.Of(_folder, _name);
            _name = new byte[2 * _name.Length];
        }
    }

    public void Dispose() => _folder.Dispose();

    private static bool TryAppend(ref Span<byte> into, ReadOnlySpan<char> text)
    {
        var fits = Utf8.FromUtf16(text, into, out _, out var written) == System.Buffers.OperationStatus.Done;
        into = into[written..];
        return fits;
    }

    private const int PathOnly = 0x200000;
    private const int CloseOnExec = 0x80000;

    [LibraryImport("libc", EntryPoint = "open", StringMarshalling = StringMarshalling.Utf8)]
    private static partial SafeFileHandle OpenPath(string path, int flags);
}
