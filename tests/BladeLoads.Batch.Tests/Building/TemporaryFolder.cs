namespace BladeLoads.Batch.Tests.Building;

/// <summary>A folder of its own for a test, gone with it.</summary>
internal sealed class TemporaryFolder : IDisposable
{
    private const string Memory = "/dev/shm";

    /// <param name="inMemory">For tests that write much and cut no power: in memory, where the system has a folder for that.</param>
    public TemporaryFolder(bool inMemory = false)
        => Path = inMemory && Directory.Exists(Memory)
            ? Directory.CreateDirectory(System.IO.Path.Join(Memory, $"blade loads {Guid.NewGuid():N}")).FullName
            : Directory.CreateTempSubdirectory("blade loads ").FullName;

    public string Path { get; }

    public void Dispose() => Directory.Delete(Path, recursive: true);

    public void CopyTo(TemporaryFolder other)
    {
        foreach (var folder in Directory.EnumerateDirectories(Path, "*", SearchOption.AllDirectories))
            Directory.CreateDirectory(System.IO.Path.Join(other.Path, System.IO.Path.GetRelativePath(Path, folder)));
        foreach (var file in Directory.EnumerateFiles(Path, "*", SearchOption.AllDirectories))
            File.Copy(file, System.IO.Path.Join(other.Path, System.IO.Path.GetRelativePath(Path, file)));
    }

    /// <summary>Every file below a folder by its relative path, with its content.</summary>
    public static Dictionary<string, string> Contents(string folder) => Directory.Exists(folder)
        ? Directory.EnumerateFiles(folder, "*", SearchOption.AllDirectories)
            .ToDictionary(f => System.IO.Path.GetRelativePath(folder, f), File.ReadAllText, StringComparer.Ordinal)
        : [];
}
