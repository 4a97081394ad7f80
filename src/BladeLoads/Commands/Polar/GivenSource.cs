using BladeLoads.Studies;
using BladeLoads.Studies.Tables;
using static System.IO.Path;

namespace BladeLoads.Commands.Polar;

/// <summary>What a user names where a study, a set or a table can be meant.</summary>
internal abstract record GivenSource
{
    private GivenSource(string path) => Path = path;

    /// <summary>As the user wrote it.</summary>
    public string Path { get; }

    /// <summary>A folder with cases in it, or one case file; and whatever is neither of the others: reading it tells what is missing.</summary>
    public sealed record Study(string Given) : GivenSource(Given);

    /// <summary>A folder of tables.</summary>
    public sealed record Set(string Given) : GivenSource(Given);

    /// <summary>A file that is a table by its name, whether it is there or not.</summary>
    public sealed record Table(string Given) : GivenSource(Given);

    public static GivenSource Of(string path)
    {
        if (Directory.Exists(path))
            return !IsStudyFolder(path) && Directory.EnumerateFiles(path).Any(HasNameOfTable) ? new Set(path) : new Study(path);
        return HasNameOfTable(path) ? new Table(path) : new Study(path);
    }

    public static bool IsStudyFolder(string path) => Directory.Exists(Join(path, StudyReader.CasesFolder));

    /// <summary>The name of the folder that is the set, or that the table or the case stands in, where the path does not name it too.</summary>
    public string FolderName()
    {
        var full = TrimEndingDirectorySeparator(GetFullPath(Path));
        return GetFileName(this is Set ? full : GetDirectoryName(full)) is { Length: > 0 } name ? name : "polars";
    }

    private static bool HasNameOfTable(string path) => GetFileName(path) is { Length: > 0 } name && StoredSet.IsTable(name);
}
