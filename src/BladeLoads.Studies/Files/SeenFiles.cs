using System.Collections.Immutable;
using System.Security.Cryptography;

namespace BladeLoads.Studies.Files;

/// <summary>The file system of this machine, which remembers what was asked of it.</summary>
internal sealed class SeenFiles(IStudyFiles files, TimeProvider time) : IStudyFiles
{
    private readonly Dictionary<string, SeenEntry> _seen = new(StringComparer.Ordinal);

    public EntryKind Kind(string path)
    {
        Stamp(path);
        return files.Kind(path);
    }

    public string RealPath(string path)
    {
        Stamp(path);
        return files.RealPath(path);
    }

    public ImmutableArray<string> Names(string folder)
    {
        var entry = Stamp(folder);
        var names = files.Names(folder);
        _seen[folder] = entry with { Contents = StudySight.HashOfNames(names) };
        return names;
    }

    public byte[] Read(string path, int limit)
    {
        var entry = Stamp(path);
        var bytes = files.Read(path, limit);
        _seen[path] = entry with { Contents = [.. SHA256.HashData(bytes)] };
        return bytes;
    }

    /// <summary>Null where a link or something outside the folder was looked at: following those is not worth the trouble.</summary>
    /// <param name="root">Absolute path of the study folder.</param>
    public StudySight? Sight(string root)
    {
        if (!FileStamp.IsSupported)
            return null;
        var prefix = root.EndsWith('/') ? root : root + '/';
        foreach (var path in _seen.Keys.ToList())
            for (var folder = Path.GetDirectoryName(path); folder?.Length > root.Length; folder = Path.GetDirectoryName(folder))
                if (_seen.ContainsKey(folder))
                    break;
                else
                    Stamp(folder);
        var entries = ImmutableArray.CreateBuilder<SeenEntry>(_seen.Count);
        foreach (var (path, entry) in _seen)
            if (path == root)
                entries.Add(entry with { Path = "" });
            else if (entry.Stamp.Type != EntryType.Other && path.StartsWith(prefix, StringComparison.Ordinal))
                entries.Add(entry with { Path = path[prefix.Length..] });
            else
                return null;
        return new StudySight(root, files.RealPath(root), entries.DrainToImmutable());
    }

    // The first look counts: it came before everything that was read.
    private SeenEntry Stamp(string path)
    {
        if (_seen.TryGetValue(path, out var entry))
            return entry;
        var taken = FileStamp.Now(time);
        var stamp = FileStamp.IsSupported ? FileStamp.Of(path) : default;
        return _seen[path] = new SeenEntry(path, stamp, stamp.IsSettled(taken), []);
    }
}
