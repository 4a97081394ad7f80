using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>Where the tables before an update are: one for all, a folder of them by section, or an earlier copy of the study.</summary>
internal sealed class EarlierPolars
{
    private const int NamesShown = 4;

    private readonly Func<PolarPageAsked, string?> _pathOf;

    private EarlierPolars(string path, Func<PolarPageAsked, string?> pathOf) => (Path, _pathOf) = (path, pathOf);

    /// <summary>As the user wrote it.</summary>
    public string Path { get; }

    /// <exception cref="WrongUseException">There is no table and no folder.</exception>
    public static EarlierPolars At(string path)
    {
        if (File.Exists(path))
            return StoredSet.IsTable(System.IO.Path.GetFileName(path))
                ? new EarlierPolars(path, _ => path)
                : throw new WrongUseException($"--before '{path}' is no polar table and no folder; a polar table ends in .csv");
        if (!Directory.Exists(path))
            throw new WrongUseException($"--before '{path}' is not there; give a table, the folder of a set, or an earlier copy of the study");
        return GivenSource.IsStudyFolder(path)
            ? new EarlierPolars(path, page => page.File is { } file
                ? System.IO.Path.Join(path, file)
                : throw new WrongUseException($"--before '{path}' is a study, and what is drawn is none; give a table or the folder of a set"))
            : new EarlierPolars(path, page => System.IO.Path.Join(path, page.Section + ".csv"));
    }

    /// <summary>A table stands for one section: that of its name, or whichever is drawn alone.</summary>
    /// <param name="isTable">A single table is drawn.</param>
    /// <exception cref="WrongUseException">It is a table, and others are drawn.</exception>
    public void Check(ImmutableArray<PolarPageAsked> pages, bool isTable)
    {
        var sections = pages.Select(page => page.Section).Distinct().ToList();
        if (isTable || !File.Exists(Path) || sections.TrueForAll(section => section == SectionOfTable))
            return;
        throw new WrongUseException(
            $"--before '{Path}' is the table of section '{SectionOfTable}' alone, and drawn are {string.Join(", ", sections.Take(NamesShown))}"
            + (sections.Count > NamesShown ? $" and {sections.Count - NamesShown} more" : "")
            + "; give the folder of a set or an earlier copy of the study"
            + (sections.Contains(SectionOfTable) ? $", or draw --only {SectionOfTable}" : ", or draw one table by itself"));
    }

    private string SectionOfTable => System.IO.Path.GetFileNameWithoutExtension(Path);

    /// <summary>The earlier section, and where it was; null where there was none, or it cannot be read, which is reported.</summary>
    public (Section Section, string Name)? Of(PolarPageAsked page, List<InputFinding> errors)
    {
        if (_pathOf(page) is not { } path || !File.Exists(path))
            return null;
        var table = StoredPolars.Read(path, new DiskFiles(), out var wrong);
        errors.AddRange(wrong);
        return table is null ? null : (table.Section, path);
    }
}
