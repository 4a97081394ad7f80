using System.Collections.Immutable;
using BladeLoads.Studies.Cases;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies;

/// <summary>Where a study lies and which of its cases are asked for.</summary>
/// <param name="Folder">Absolute path of the study folder.</param>
/// <param name="CaseFiles">Absolute paths, in the order of their names (ordinal).</param>
/// <param name="IsWhole">All the cases of the study, not one alone.</param>
internal sealed record StudyPlace(string Folder, ImmutableArray<string> CaseFiles, bool IsWhole)
{
    /// <exception cref="StudyNotFoundException">There is no study and no case file.</exception>
    public static StudyPlace Find(string path, IStudyFiles files)
    {
        if (string.IsNullOrWhiteSpace(path) || path.Contains('\0'))
            throw new StudyNotFoundException("no study named; name a study folder or a case file");
        var fullPath = Path.TrimEndingDirectorySeparator(Path.GetFullPath(path));
        var shown = VisibleText.Escape(VisibleText.Quote(path));
        return files.Kind(fullPath) switch
        {
            EntryKind.Folder => WholeStudy(fullPath, shown, files),
            EntryKind.File => OneCase(fullPath, shown),
            EntryKind.Missing => throw new StudyNotFoundException(
                $"no study folder or case file {shown}; {FolderNames.Beside(fullPath, files, folder => NamesIn(folder, files))}"),
            _ => throw new StudyNotFoundException($"{shown} is not a regular file; name a study folder or a case file (.toml)"),
        };
    }

    private static StudyPlace WholeStudy(string folder, string shown, IStudyFiles files)
    {
        var casesFolder = Path.Combine(folder, StudyReader.CasesFolder);
        if (!IsStudy(folder, files))
        {
            var studies = NamesIn(folder, files).Where(name => IsStudy(Path.Combine(folder, name), files)).ToList();
            var hint = studies.Count == 0
                ? "a study keeps its cases in cases/<case>.toml"
                : $"studies in it: {VisibleText.Escape(VisibleText.Enumerate(studies, ""))}";
            throw new StudyNotFoundException($"{shown} has no folder 'cases' and so is no study; {hint}");
        }
        var cases = NamesIn(casesFolder, files).Where(IsCaseFile).Order(StringComparer.Ordinal).ToImmutableArray();
        return cases.IsEmpty
            ? throw new StudyNotFoundException($"the folder 'cases' of {shown} holds no case; a case is a file cases/<case>.toml")
            : new StudyPlace(folder, [.. cases.Select(name => Path.Combine(casesFolder, name))], true);
    }

    private static bool IsStudy(string folder, IStudyFiles files)
        => files.Kind(Path.Combine(folder, StudyReader.CasesFolder)) == EntryKind.Folder;

    private static StudyPlace OneCase(string file, string shown)
    {
        var name = Path.GetFileName(file);
        if (name == StudyReader.StartingValuesFile)
            throw new StudyNotFoundException(
                $"{shown} holds the starting values of a study and is no case; name its folder or a case file");
        if (!IsCaseFile(name))
            throw new StudyNotFoundException($"{shown} is no case file; a case file ends in .toml");
        var folder = Path.GetDirectoryName(file)!;
        var study = Path.GetFileName(folder) == StudyReader.CasesFolder ? Path.GetDirectoryName(folder) ?? folder : folder;
        return new StudyPlace(study, [file], false);
    }

    // Hidden files are an editor's, not a user's; "..toml" is told, since someone meant it.
    internal static bool IsCaseFile(string name)
        => name.EndsWith(CaseName.Ending, StringComparison.Ordinal)
            && (name[0] != '.' || name.StartsWith("..", StringComparison.Ordinal) || name == CaseName.Ending);

    private static ImmutableArray<string> NamesIn(string folder, IStudyFiles files)
    {
        try
        {
            return files.Names(folder);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new StudyNotFoundException(VisibleText.Escape($"the folder '{folder}' cannot be read: {e.Message}"));
        }
    }
}
