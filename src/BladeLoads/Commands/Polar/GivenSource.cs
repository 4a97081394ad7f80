using System.CommandLine;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;
using static System.IO.Path;

namespace BladeLoads.Commands.Polar;

/// <summary>What a user names where a study, a set or a table can be meant.</summary>
internal abstract record GivenSource
{
    private GivenSource(string path) => Path = path;

    /// <summary>As the user wrote it.</summary>
    public string Path { get; }

    /// <summary>A folder with cases in it, or one case file.</summary>
    public sealed record Study(string Given) : GivenSource(Given);

    /// <summary>A folder of tables.</summary>
    public sealed record Set(string Given) : GivenSource(Given);

    /// <summary>A file that is a table by its name.</summary>
    public sealed record Table(string Given) : GivenSource(Given);

    /// <exception cref="WrongUseException">There is none of the three; the message says what is there.</exception>
    public static GivenSource Of(string path)
    {
        if (string.IsNullOrWhiteSpace(path) || path.Contains('\0', StringComparison.Ordinal))
            throw new WrongUseException("nothing named; name a study or a case file, the folder of a set, or a table");
        var (full, files) = (GetFullPath(path), new DiskFiles());
        if (Directory.Exists(path))
            return IsStudyFolder(path) ? new Study(path)
                : HoldsTables(path) ? new Set(path)
                : throw new WrongUseException(
                    $"'{path}' is no study, which has a folder 'cases', and no set, which holds tables <section>.csv; it holds "
                    + FolderNames.In(full, files));
        if (NamedFile.LeadsNowhere(files, full) && new FileInfo(full).LinkTarget is not null)
            throw new WrongUseException($"'{path}' is a link that leads nowhere; name a study or a case file, the folder of a set, or a table");
        if (!File.Exists(path))
            throw new WrongUseException($"no study, set or table '{path}'; {FolderNames.Beside(full, files)}");
        if (HasNameOfTable(path))
            return new Table(path);
        return path.EndsWith(StudyReader.CaseEnding, StringComparison.Ordinal)
            ? new Study(path)
            : throw new WrongUseException(
                $"'{path}' is no case file, which ends in .toml, and no polar table, which ends in .csv; 'bladeloads polar read' makes one");
    }

    /// <summary>Refuses an option that only a study gives a meaning.</summary>
    /// <param name="instead">What would do.</param>
    /// <exception cref="WrongUseException">It was given, and this is no study.</exception>
    public void RefuseWithoutStudy(ParseResult parsed, Option option, string instead)
    {
        if (this is not Study && parsed.GetResult(option) is { Implicit: false })
            throw new WrongUseException($"{option.Name} is of a study, and '{Path}' is a {(this is Set ? "set" : "table")}; {instead}");
    }

    public static bool IsStudyFolder(string path) => Directory.Exists(Join(path, StudyReader.CasesFolder));

    /// <summary>The name of the folder that is the set, or that the table or the case stands in, where the path does not name it too.</summary>
    public string FolderName()
    {
        var full = TrimEndingDirectorySeparator(GetFullPath(Path));
        return GetFileName(this is Set ? full : GetDirectoryName(full)) is { Length: > 0 } name ? name : "polars";
    }

    private static bool HoldsTables(string folder)
    {
        try
        {
            return Directory.EnumerateFiles(folder).Any(HasNameOfTable);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new WrongUseException($"'{folder}' cannot be read: {DiskTrouble.ReadingReason(e)}");
        }
    }

    private static bool HasNameOfTable(string path) => GetFileName(path) is { Length: > 0 } name && StoredSet.IsTable(name);
}
