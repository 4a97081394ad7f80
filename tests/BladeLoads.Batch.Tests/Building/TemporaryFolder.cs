namespace BladeLoads.Batch.Tests.Building;

/// <summary>A folder of its own for a test, gone with it.</summary>
internal sealed class TemporaryFolder : IDisposable
{
    public string Path { get; } = Directory.CreateTempSubdirectory("blade loads ").FullName;

    public void Dispose() => Directory.Delete(Path, recursive: true);

    /// <summary>Every file below a folder by its relative path, with its content.</summary>
    public static Dictionary<string, string> Contents(string folder) => Directory.Exists(folder)
        ? Directory.EnumerateFiles(folder, "*", SearchOption.AllDirectories)
            .ToDictionary(f => System.IO.Path.GetRelativePath(folder, f), File.ReadAllText, StringComparer.Ordinal)
        : [];
}
