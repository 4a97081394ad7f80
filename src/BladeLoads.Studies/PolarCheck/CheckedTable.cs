using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>A polar table, what is doubtful in it, and its figures.</summary>
/// <param name="File">As findings name it.</param>
/// <param name="Figures">One a Reynolds number, in the order of the table.</param>
public sealed record CheckedTable(
    string File, StoredPolars Table, ImmutableArray<PolarDoubt> Doubts, ImmutableArray<PolarFigures> Figures)
{
    public static CheckedTable Of(StoredPolars table, string file)
        => new(file, table, PolarDoubts.Of(table, file), [.. table.Section.Polars.Select(PolarFigures.Of)]);
}

/// <summary>The tables of a check, and what kept others from being read.</summary>
/// <param name="Tables">In the order of their files (ordinal).</param>
/// <param name="Errors">In file order.</param>
public sealed record CheckedTables(ImmutableArray<CheckedTable> Tables, ImmutableArray<InputFinding> Errors)
{
    /// <summary>One table by itself.</summary>
    /// <param name="path">As the user wrote it; findings name the file so.</param>
    public static CheckedTables OfTable(string path, Files.IStudyFiles files)
    {
        var table = StoredPolars.Read(path, files, out var errors);
        return new CheckedTables(table is null ? [] : [CheckedTable.Of(table, path)], errors);
    }

    /// <summary>Every table of a folder.</summary>
    /// <param name="path">As for <see cref="OfTable"/>.</param>
    public static CheckedTables OfSet(string path, Files.IStudyFiles files) => OfFolder(Path.GetFullPath(path), path, files);

    /// <summary>Every table of the sets that the cases of a study use, those that none of them uses among them.</summary>
    /// <remarks>Of a case with an error it is not known what it would use.</remarks>
    public static CheckedTables OfStudy(Study study, Files.IStudyFiles files)
    {
        var folders = study.Cases.SelectMany(SectionTables).Select(table => FolderOf(table.File)).Distinct().Order(StringComparer.Ordinal);
        var sets = folders.Select(folder => OfFolder(Path.Join(study.Folder, folder), folder, files)).ToList();
        // Reading the study has met some of them already, and says them in the same words.
        var errors = sets.SelectMany(set => set.Errors).Concat(study.Errors).Distinct().Order(FindingOrder.Instance);
        return new CheckedTables([.. sets.SelectMany(set => set.Tables)], [.. errors]);
    }

    /// <summary>The section tables of a case: the name by which the blade knows each, and its file.</summary>
    public static IEnumerable<(string Section, string File)> SectionTables(StudyCase studyCase)
    {
        const string key = "section.";
        return studyCase.Tables.Where(table => table.Key.StartsWith(key, StringComparison.Ordinal))
            .Select(table => (table.Key[key.Length..], table.File));
    }

    private static CheckedTables OfFolder(string folder, string shown, Files.IStudyFiles files)
    {
        var set = StoredSet.ReadSound(folder, shown, files, out var errors);
        return new CheckedTables(
            [.. set.Tables.Select(table => CheckedTable.Of(table, Path.Join(shown, table.SectionName + ".csv").Replace('\\', '/')))], errors);
    }

    private static string FolderOf(string file) => file[..file.LastIndexOf('/')];
}
