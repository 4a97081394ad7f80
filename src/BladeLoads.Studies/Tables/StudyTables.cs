using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Tables;

/// <summary>The sections of a blade from one set of polars.</summary>
/// <param name="Sections">Null when a table is missing or has an error.</param>
/// <param name="Tables">In the order in which the blade names them.</param>
/// <param name="Set">What the set says of its tables, where the blade asks for it or the set says it.</param>
/// <param name="ExtensionRecord">What was done where polars were extended, a line each.</param>
/// <param name="NotExtended">Where polars begin that cannot be extended, though they were to be; one a table at most.</param>
internal sealed record BladeSections(
    SectionSet? Sections, ImmutableArray<PolarTable> Tables, SetFile? Set, ImmutableArray<string> ExtensionRecord,
    ImmutableArray<Place> NotExtended);

/// <summary>The tables of a study, each read, hashed and prepared once, however many cases share it.</summary>
internal sealed class StudyTables(StudyFolder folder, Findings findings)
{
    private readonly Dictionary<string, BladeTable?> _blades = new(StringComparer.Ordinal);
    private readonly Dictionary<string, PolarTable?> _polars = new(StringComparer.Ordinal);
    private readonly Dictionary<string, ScheduleTable?> _schedules = new(StringComparer.Ordinal);
    private readonly Dictionary<string, HistogramTable?> _histograms = new(StringComparer.Ordinal);
    private readonly Dictionary<string, SetFile?> _sets = new(StringComparer.Ordinal);
    private readonly Dictionary<(string Blade, string Set, SectionExtension? Extension), BladeSections> _sections = [];

    /// <summary>Null when the file cannot be read at all, which is reported.</summary>
    public BladeTable? Blade(string fullPath) => Once(_blades, fullPath, input => BladeTable.Parse(input, findings));

    public ScheduleTable? Schedule(string fullPath) => Once(_schedules, fullPath, input => ScheduleTable.Parse(input, findings));

    public HistogramTable? Histogram(string fullPath) => Once(_histograms, fullPath, input => HistogramTable.Parse(input, findings));

    /// <param name="blade">Names the sections, or gives their thickness; other tables of the set are not read.</param>
    /// <param name="setFolder">Full path of the folder of polar tables.</param>
    /// <param name="extension">How polars are carried on to +-180 degrees; null where they are not.</param>
    public BladeSections Sections(BladeTable blade, string setFolder, SectionExtension? extension)
    {
        if (_sections.TryGetValue((blade.Input.File, setFolder, extension), out var known))
            return known;
        var names = folder.Names(setFolder).ToHashSet(StringComparer.Ordinal);
        var set = names.Contains(SetFile.Name) && !blade.Thicknesses.IsEmpty
            ? Once(_sets, Path.Combine(setFolder, SetFile.Name), input => SetFile.Parse(input, findings))
            : null;
        var byThickness = blade.Blade is { IsByThickness: true };
        var wanted = byThickness ? set?.Thicknesses.Select(t => (t.Section, t.At)).ToImmutableArray() ?? [] : blade.Sections;
        var tables = ImmutableArray.CreateBuilder<PolarTable>();
        foreach (var (name, at) in wanted)
        {
            if (!names.Contains(name + ".csv"))
                findings.Error(at, $"no table for section {VisibleText.Quote(name)} in {folder.RelativePath(setFolder)}/; "
                    + $"it holds {VisibleText.Enumerate(names.Where(IsTable).Select(n => n[..^4]), "no table")}");
            else if (Polar(name, Path.Combine(setFolder, name + ".csv")) is { } table)
                tables.Add(table);
        }
        foreach (var doubt in tables.SelectMany(table => extension is null ? table.Doubts.Concat(table.Reach) : table.Doubts))
            findings.Doubt(doubt);
        // A blade that names nothing, because of its errors, keeps no table from telling its own.
        if (blade.Blade is null && blade.Sections.IsEmpty)
            ReadAll(setFolder);
        var (sound, record, obstacles) = Ready(tables, extension);
        var isSound = ThicknessCheck.IsSound(blade, set, names.Contains(SetFile.Name), sound, folder.RelativePath(setFolder), findings)
            && sound.Count == wanted.Length;
        var sections = new BladeSections(
            !isSound ? null : byThickness ? SectionSet.Of(Family(set!, sound)) : SectionSet.Of(sound), tables.ToImmutable(),
            byThickness ? set : null, record, obstacles);
        _sections.Add((blade.Input.File, setFolder, extension), sections);
        return sections;
    }

    private static SectionFamily Family(SetFile set, IReadOnlyList<Section> sections)
        => SectionFamily.Of(set.Thicknesses.Zip(sections, (thickness, section) => new FamilyMember(thickness.ThicknessRatio, section)));

    // The sections of the tables as they serve, extended where that is asked for, and where it cannot be done.
    private (IReadOnlyList<Section> Sections, ImmutableArray<string> Record, ImmutableArray<Place> Obstacles) Ready(
        IEnumerable<PolarTable> tables, SectionExtension? extension)
    {
        var sound = tables.Where(table => table.Section is not null);
        if (extension is null)
            return ([.. sound.Select(table => table.Section!)], [], []);
        foreach (var table in sound)
            if (table.Augmented is { } note)
                findings.Doubt(new Place(table.Input.File, note.Line, 1), ExtensionDoubts.AugmentedBefore);
        var extended = sound.Select(extension.Of).ToList();
        foreach (var section in extended)
            if (section.Doubt is { } doubt)
                findings.Doubt(doubt);
        return (
            [.. extended.Where(section => section.Obstacle is null).Select(section => section.Section!)],
            [ExtensionText.Method(extension.AspectRatio, "", extension.Join), .. extended.SelectMany(section => section.Record)],
            [.. extended.Where(section => section.Obstacle is not null).Select(section => section.Obstacle!.Value)]);
    }

    /// <summary>Reads every table of a set for its errors alone: the blade that would name some of them cannot be read.</summary>
    public void ReadAll(string setFolder)
    {
        foreach (var name in folder.Names(setFolder).Where(IsTable))
            Polar(name[..^4], Path.Combine(setFolder, name));
    }

    private PolarTable? Polar(string section, string fullPath)
        => Once(_polars, fullPath, input => PolarTable.Parse(section, input, findings));

    private static bool IsTable(string name) => name.EndsWith(".csv", StringComparison.Ordinal) && name[0] != '.';

    private T? Once<T>(Dictionary<string, T?> known, string fullPath, Func<InputText, T> parse)
        where T : class
    {
        if (known.TryGetValue(fullPath, out var table))
            return table;
        table = folder.Read(fullPath, StudyFolder.LargestTable, findings.Error) is { } input ? parse(input) : null;
        known.Add(fullPath, table);
        return table;
    }
}
