namespace BladeLoads.Studies.Files;

/// <summary>The files of one study. Nothing outside the study folder is read, whatever a reference or a link says.</summary>
internal sealed class StudyFolder
{
    /// <summary>MiB. A table of a million rows is smaller.</summary>
    public const int LargestTable = 32;

    /// <summary>MiB. A case of ten thousand wind speeds and as many variants is smaller.</summary>
    public const int LargestCase = 1;

    private readonly IStudyFiles _files;
    private readonly string _realRoot;
    private readonly Dictionary<(string Folder, string Reference, EntryKind Wanted), (string? Path, string Problem)> _located
        = [];

    /// <param name="root">Absolute path of the study folder, which exists.</param>
    public StudyFolder(IStudyFiles files, string root)
        => (_files, Root, _realRoot) = (files, root, files.RealPath(root));

    public string Root { get; }

    public string FullPath(string file) => Path.Combine(Root, file);

    /// <summary>As findings name it: relative to the study folder, forward slashes.</summary>
    public string RelativePath(string fullPath) => Path.GetRelativePath(Root, fullPath).Replace('\\', '/');

    /// <summary>The full path that a reference leads to, or null and the sentence that says why there is none.</summary>
    /// <param name="fromFile">The file that makes the reference, relative to the study folder.</param>
    /// <param name="wanted">A file or a folder.</param>
    public string? Locate(string fromFile, string reference, EntryKind wanted, out string problem)
    {
        // A sweep of a thousand variants makes the same reference a thousand times.
        var fromFolder = Path.GetDirectoryName(fromFile) ?? "";
        if (!_located.TryGetValue((fromFolder, reference, wanted), out var located))
        {
            located = (Follow(fromFolder, reference, wanted, out var found), found);
            _located.Add((fromFolder, reference, wanted), located);
        }
        problem = located.Problem;
        return located.Path;
    }

    /// <summary>Reads a text file within the study; what keeps it from being read is reported at the file.</summary>
    /// <param name="largest">MiB; of a larger file no more than this is read.</param>
    public InputText? Read(string fullPath, int largest, Action<InputFinding> report)
    {
        var file = RelativePath(fullPath);
        if (LinkProblem(fullPath) is { } link)
        {
            report(new InputFinding(file, 0, 0, $"{link}; put the file itself inside the study folder"));
            return null;
        }
        return NamedFile.Read(_files, fullPath, file, largest, report) is { } bytes ? InputText.FromBytes(file, bytes, report) : null;
    }

    /// <summary>Names in a folder, ordinal; empty where there is no folder to read.</summary>
    public IReadOnlyList<string> Names(string folder)
    {
        try
        {
            return LinkProblem(folder) is null && _files.Kind(folder) == EntryKind.Folder
                ? [.. _files.Names(folder).Order(StringComparer.Ordinal)]
                : [];
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return [];
        }
    }

    public bool Exists(string fullPath) => _files.Kind(fullPath) != EntryKind.Missing;

    public bool IsFolder(string fullPath) => _files.Kind(fullPath) == EntryKind.Folder;

    private string? Follow(string fromFolder, string reference, EntryKind wanted, out string problem)
    {
        var noun = wanted == EntryKind.Folder ? "folder" : "file";
        var quoted = VisibleText.Quote(reference);
        problem = "";
        if (string.IsNullOrWhiteSpace(reference))
            problem = $"the name is empty; name a {noun}";
        else if (VisibleText.HasHidden(reference))
            problem = $"{quoted} holds a control character; name a {noun} without";
        else if (reference.Contains('\\'))
            problem = $"{quoted} has backslashes; write forward slashes: {reference.Replace('\\', '/')}";
        if (problem.Length > 0)
            return null;

        var fullPath = Path.GetFullPath(Path.Combine(Root, fromFolder, reference));
        if (fullPath.Length > Path.GetPathRoot(fullPath)!.Length)
            fullPath = Path.TrimEndingDirectorySeparator(fullPath);
        if (!IsWithin(Root, fullPath) && !IsWithin(_realRoot, fullPath))
            problem = $"{quoted} leaves the study folder; put the {noun} inside it";
        else if (LinkProblem(fullPath) is { } link)
            problem = $"{quoted} {link}; put the {noun} itself inside the study folder";
        else
            problem = _files.Kind(fullPath) switch
            {
                var kind when kind == wanted => "",
                EntryKind.Missing => $"no {noun} {quoted}; {WhatIsBeside(fullPath, wanted)}",
                EntryKind.Folder => $"{quoted} is a folder; name a file",
                EntryKind.File => $"{quoted} is a file; name a folder",
                _ => $"{quoted} is not a regular file; name a {noun}",
            };
        return problem.Length == 0 ? fullPath : null;
    }

    private string? LinkProblem(string fullPath)
    {
        try
        {
            return IsWithin(_realRoot, _files.RealPath(fullPath)) ? null : "is a link that leads out of the study folder";
        }
        catch (IOException)
        {
            return "is a link that leads round in a circle";
        }
        catch (UnauthorizedAccessException)
        {
            return "cannot be reached: no permission";
        }
    }

    private string WhatIsBeside(string missing, EntryKind wanted)
    {
        var folder = Path.GetDirectoryName(missing)!;
        if (!IsWithin(Root, folder) || !_files.Kind(folder).Equals(EntryKind.Folder))
            return $"there is no folder {VisibleText.Quote(RelativePath(folder))} in the study";
        var names = Names(folder).Where(name => name[0] != '.' && LinkProblem(Path.Combine(folder, name)) is null
            && _files.Kind(Path.Combine(folder, name)) == wanted);
        var place = folder == Root ? "the study folder" : RelativePath(folder) + "/";
        return $"{place} holds {VisibleText.Enumerate(names, wanted == EntryKind.Folder ? "no folder" : "no file")}";
    }

    // With the separator: "/data/inputs-evil" begins with "/data/inputs" too.
    private static bool IsWithin(string root, string path)
        => path == root || path.StartsWith(
            Path.EndsInDirectorySeparator(root) ? root : root + Path.DirectorySeparatorChar, StringComparison.Ordinal);
}
