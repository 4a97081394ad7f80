using System.Collections.Immutable;

namespace BladeLoads.Studies.Files;

/// <summary>What a path leads to, links followed.</summary>
public enum EntryKind
{
    Missing,
    File,
    Folder,

    /// <summary>A pipe, a device, a socket: nothing that can be read to its end.</summary>
    Other,
}

/// <summary>All that reading a study asks of a file system. Paths are absolute.</summary>
public interface IStudyFiles
{
    EntryKind Kind(string path);

    /// <summary>The path with every link in it followed; what does not exist is kept as it is.</summary>
    /// <exception cref="IOException">Links lead round in a circle.</exception>
    string RealPath(string path);

    /// <summary>The names in a folder, in any order.</summary>
    /// <exception cref="IOException">The folder cannot be read.</exception>
    /// <exception cref="UnauthorizedAccessException">The folder may not be read.</exception>
    ImmutableArray<string> Names(string folder);

    /// <summary>The bytes of a file, no more than <paramref name="limit"/> of them.</summary>
    /// <exception cref="IOException">The file cannot be read.</exception>
    /// <exception cref="UnauthorizedAccessException">The file may not be read.</exception>
    byte[] Read(string path, int limit);
}
