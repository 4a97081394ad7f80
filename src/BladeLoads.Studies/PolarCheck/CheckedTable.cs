using System.Collections.Frozen;
using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>A polar table, what is doubtful in it, and its figures.</summary>
/// <param name="File">As findings name it.</param>
/// <param name="Figures">One a Reynolds number, in the order of the table.</param>
public sealed record CheckedTable(
    string File, StoredPolars Table, ImmutableArray<PolarDoubt> Doubts, ImmutableArray<PolarFigures> Figures)
{
    public static CheckedTable Of(StoredPolars table, string file)
    {
        var figures = table.Section.Polars.Select(PolarFigures.Of).ToImmutableArray();
        return new CheckedTable(file, table, PolarDoubts.Of(table, figures, file), figures);
    }
}

/// <summary>The tables of a check, and what kept others from being read.</summary>
/// <param name="Tables">In the order of their files (ordinal).</param>
/// <param name="Errors">In file order.</param>
public sealed record CheckedTables(ImmutableArray<CheckedTable> Tables, ImmutableArray<InputFinding> Errors)
{
    private const string SectionKey = "section.";

    /// <summary>One table by itself.</summary>
    /// <param name="path">As the user wrote it; findings name the file so.</param>
    public static CheckedTables OfTable(string path, Files.IStudyFiles files)
    {
        var table = StoredPolars.Read(path, files, out var errors);
        return new CheckedTables(table is null ? [] : [CheckedTable.Of(table, path)], errors);
    }

    /// <summary>Every table of a folder.</summary>
    /// <param name="path">As for <see cref="OfTable"/>.</param>
    public static CheckedTables OfSet(string path, Files.IStudyFiles files)
        => OfFolder(Path.GetFullPath(path), path, files, FrozenSet<string>.Empty);

    /// <summary>Every table of the sets that the cases of a study use, those that none of them uses among them.</summary>
    /// <remarks>Of a case with an error it is not known what it would use.</remarks>
    public static CheckedTables OfStudy(Study study, Files.IStudyFiles files)
    {
        var folders = study.Cases.SelectMany(SectionTables).Select(table => FolderOf(table.File)).Distinct().Order(StringComparer.Ordinal);
        // Beside its tables a case may have that of its blade, or a schedule.
        var others = study.Cases.SelectMany(c => c.Tables.Where(table => !IsOfSection(table))).Select(table => table.File).ToHashSet();
        var sets = folders.Select(folder => OfFolder(Path.Join(study.Folder, folder), folder, files, others)).ToList();
        // Reading the study has met some of them already, and says them in the same words.
        var errors = sets.SelectMany(set => set.Errors).Concat(study.Errors).Distinct().Order(FindingOrder.Instance);
        return new CheckedTables([.. sets.SelectMany(set => set.Tables)], [.. errors]);
    }

    /// <summary>The section tables of a case: the name by which the blade knows each, and its file.</summary>
    public static IEnumerable<(string Section, string File)> SectionTables(StudyCase studyCase)
    {
        return studyCase.Tables.Where(IsOfSection).Select(table => (table.Key[SectionKey.Length..], table.File));
    }

    /// <summary>Those of them whose section is asked for, with their errors, and what is wrong with all.</summary>
    public CheckedTables Of(Func<string, bool> isAskedFor) => new(
        [.. Tables.Where(table => isAskedFor(table.Table.SectionName))],
        [.. Errors.Where(error => SectionOf(error) is not { } section || isAskedFor(section))]);

    /// <summary>The names of the sections, those among them whose tables have errors (ordinal order).</summary>
    public ImmutableArray<string> Sections => [.. Tables.Select(table => table.Table.SectionName)
        .Concat(Errors.Select(SectionOf).OfType<string>()).Distinct().Order(StringComparer.Ordinal)];

    private static bool IsOfSection(CanonicalTable table) => table.Key.StartsWith(SectionKey, StringComparison.Ordinal);

    // Null for an error about the set itself.
    private static string? SectionOf(InputFinding error)
        => StoredSet.IsTable(Path.GetFileName(error.File)) ? Path.GetFileNameWithoutExtension(error.File) : null;

    private static CheckedTables OfFolder(string folder, string shown, Files.IStudyFiles files, IReadOnlySet<string> others)
    {
        var set = StoredSet.ReadSound(folder, shown, files, out var errors, name => others.Contains(FileIn(shown, name)));
        return new CheckedTables(
            [.. set.Tables.Select(table => CheckedTable.Of(table, FileIn(shown, table.SectionName + ".csv")))], errors);
    }

    private static string FileIn(string folder, string name) => Path.Join(folder, name).Replace('\\', '/');

    // Empty for that of the study.
    private static string FolderOf(string file) => file[..Math.Max(0, file.LastIndexOf('/'))];
}
