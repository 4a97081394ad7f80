using System.Collections.Immutable;

namespace BladeLoads.EndToEnd.Documentation;

/// <summary>The examples of the documents as files in a folder of their own, which goes with the object.</summary>
internal sealed class ExtractedStudies : IDisposable
{
    private static readonly string[] Documents = ["docs/formats.md", "README.md"];

    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory("bladeloads-documentation-");

    public ExtractedStudies()
    {
        var blocks = Documents.SelectMany(document => CodeBlock.AllOf(document)).Where(block => block.Attributes.ContainsKey("file"));
        foreach (var block in blocks)
            Write(block.Attributes["file"], block.Text);
    }

    /// <summary>Names of the studies: the first folder of the examples' files.</summary>
    public ImmutableArray<string> Names => [.. _folder.GetDirectories().Select(folder => folder.Name).Order(StringComparer.Ordinal)];

    public string PathOf(string studyOrFile) => Path.Combine(_folder.FullName, studyOrFile);

    /// <summary>Files of a study, relative to it, with forward slashes.</summary>
    public ImmutableArray<string> FilesOf(string study)
        => [.. Directory.EnumerateFiles(PathOf(study), "*", SearchOption.AllDirectories)
            .Select(file => Path.GetRelativePath(PathOf(study), file).Replace('\\', '/')).Order(StringComparer.Ordinal)];

    /// <exception cref="FormatException">Two examples claim one file.</exception>
    public void Write(string file, string text)
    {
        var path = PathOf(file);
        if (File.Exists(path))
            throw new FormatException($"two examples of {file}");
        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        File.WriteAllText(path, text);
    }

    public void Dispose() => _folder.Delete(recursive: true);
}
