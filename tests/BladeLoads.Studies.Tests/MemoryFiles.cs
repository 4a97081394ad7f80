using System.Collections.Immutable;
using System.Text;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Tests;

/// <summary>A file system in memory: files, links, and things that are neither file nor folder.</summary>
internal sealed class MemoryFiles : IStudyFiles
{
    private readonly Dictionary<string, byte[]> _files = new(StringComparer.Ordinal);
    private readonly Dictionary<string, string> _links = new(StringComparer.Ordinal);
    private readonly HashSet<string> _folders = new(StringComparer.Ordinal) { "/" };
    private readonly HashSet<string> _others = new(StringComparer.Ordinal);

    /// <summary>Every reading of a file, in order.</summary>
    public List<string> Reads { get; } = [];

    /// <summary>The most bytes that were asked for at once.</summary>
    public int LargestRead { get; private set; }

    /// <summary>Files that may not be read.</summary>
    public HashSet<string> Forbidden { get; } = new(StringComparer.Ordinal);

    public MemoryFiles Write(string path, string text) => Write(path, Encoding.UTF8.GetBytes(text));

    public MemoryFiles Write(string path, byte[] bytes)
    {
        AddFolder(Path.GetDirectoryName(path)!);
        _files[path] = bytes;
        return this;
    }

    public MemoryFiles AddFolder(string path)
    {
        for (var folder = path; folder is not null; folder = Path.GetDirectoryName(folder))
            _folders.Add(folder);
        return this;
    }

    public MemoryFiles Link(string path, string target)
    {
        AddFolder(Path.GetDirectoryName(path)!);
        _links[path] = target;
        return this;
    }

    public MemoryFiles AddPipe(string path)
    {
        _others.Add(path);
        return this;
    }

    public MemoryFiles Remove(string path)
    {
        _files.Remove(path);
        return this;
    }

    public string TextOf(string path) => Encoding.UTF8.GetString(_files[path]);

    public EntryKind Kind(string path)
    {
        string real;
        try
        {
            real = RealPath(path);
        }
        catch (IOException)
        {
            return EntryKind.Missing;
        }
        return _files.ContainsKey(real) ? EntryKind.File
            : _folders.Contains(real) ? EntryKind.Folder
            : _others.Contains(real) ? EntryKind.Other : EntryKind.Missing;
    }

    public string RealPath(string path)
    {
        for (var links = 0; links < 10; links++)
        {
            var link = _links.Keys.FirstOrDefault(l => path == l || path.StartsWith(l + "/", StringComparison.Ordinal));
            if (link is null)
                return path;
            path = Path.GetFullPath(Path.Combine(Path.GetDirectoryName(link)!, _links[link])) + path[link.Length..];
        }
        throw new IOException("links lead round in a circle");
    }

    public ImmutableArray<string> Names(string folder)
    {
        var real = RealPath(folder);
        return [.. _files.Keys.Concat(_links.Keys).Concat(_others).Concat(_folders)
            .Where(path => Path.GetDirectoryName(path) == real).Select(path => Path.GetFileName(path)).Distinct()];
    }

    public byte[] Read(string path, int limit)
    {
        Reads.Add(path);
        LargestRead = Math.Max(LargestRead, limit);
        var real = RealPath(path);
        if (Forbidden.Contains(real))
            throw new UnauthorizedAccessException();
        var bytes = _files[real];
        return bytes.Length <= limit ? bytes : bytes[..limit];
    }
}
