using System.Buffers.Binary;
using System.Collections.Immutable;
using System.Runtime.InteropServices;
using System.Text;

namespace BladeLoads.Studies.Files;

/// <summary>The file system of this machine.</summary>
public sealed class DiskFiles : IStudyFiles
{
    private const int MostLinks = 40;

    public EntryKind Kind(string path)
    {
        if (Directory.Exists(path))
            return EntryKind.Folder;
        if (!File.Exists(path))
            return EntryKind.Missing;
        return IsRegular(path) ? EntryKind.File : EntryKind.Other;
    }

    public string RealPath(string path)
    {
        var links = 0;
        var pending = new Stack<string>(Parts(path).Reverse());
        var real = Path.GetPathRoot(path)!;
        while (pending.TryPop(out var part))
        {
            if (part == "..")
            {
                real = Path.GetDirectoryName(real) ?? real;
                continue;
            }
            var next = Path.Combine(real, part);
            if (new FileInfo(next).LinkTarget is not { } target)
            {
                real = next;
                continue;
            }
            if (++links > MostLinks)
                throw new IOException("links lead round in a circle");
            if (Path.IsPathRooted(target))
                real = Path.GetPathRoot(target)!;
            foreach (var targetPart in Parts(target).Reverse())
                pending.Push(targetPart);
        }
        return real;
    }

    public ImmutableArray<string> Names(string folder)
        => [.. Directory.EnumerateFileSystemEntries(folder).Select(path => Path.GetFileName(path))];

    public byte[] Read(string path, int limit)
    {
        using var handle = File.OpenHandle(path);
        var bytes = new byte[Math.Min(limit, RandomAccess.GetLength(handle))];
        var count = 0;
        while (count < bytes.Length)
        {
            var read = RandomAccess.Read(handle, bytes.AsSpan(count), count);
            if (read == 0)
                break;
            count += read;
        }
        return count == bytes.Length ? bytes : bytes[..count];
    }

    private static IEnumerable<string> Parts(string path)
        => path[Path.GetPathRoot(path)!.Length..]
            .Split(Path.DirectorySeparatorChar, Path.AltDirectorySeparatorChar)
            .Where(part => part is not ("" or "."));

    // Opening a pipe waits for a writer, for ever if none comes, and .NET does not say what is a pipe before it is opened.
    // statx, unlike stat, has one layout on every processor. Elsewhere than on Linux pipes are not told apart.
    private static bool IsRegular(string path)
    {
        if (!OperatingSystem.IsLinux())
            return true;
        const int currentFolder = -100, typeWanted = 1, modeOffset = 28, typeBits = 0xF000, regular = 0x8000;
        var status = new byte[256];
        if (Statx(currentFolder, Encoding.UTF8.GetBytes(path + '\0'), 0, typeWanted, status) != 0)
            return false;
        return (BinaryPrimitives.ReadUInt16LittleEndian(status.AsSpan(modeOffset)) & typeBits) == regular;
    }

    [DllImport("libc", EntryPoint = "statx")]
    [DefaultDllImportSearchPaths(DllImportSearchPath.SafeDirectories)]
    private static extern int Statx(int folder, byte[] path, int flags, uint mask, byte[] status);
}
