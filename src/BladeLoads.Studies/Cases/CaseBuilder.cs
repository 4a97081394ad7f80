using System.Collections.Immutable;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>Makes a validated rotor case from the values of a case file, or reports everything that stands against it.</summary>
internal sealed class CaseBuilder(StudyFolder folder, StudyTables tables, Findings findings)
{
    private const int MostBlades = 20;

    private readonly Dictionary<TomlValue, (ImmutableArray<double> Speeds, string Text)> _windSpeeds = [];

    /// <summary>Null when an error keeps the case from running; every error is reported.</summary>
    /// <param name="entries">The case's values, those of a variant in their place.</param>
    /// <param name="inputs">The case file and the starting values.</param>
    /// <param name="used">The files that the case was read from as far as it came, its own first.</param>
    public StudyCase? Build(
        string name, string variantTitle, CaseFile file, ImmutableDictionary<string, CaseEntry> entries,
        ImmutableArray<InputFile> inputs, out IReadOnlyList<string> used)
    {
        var values = new CaseValues(file, entries, findings);
        used = values.Used;
        var title = ReadTitle(values, name);
        var (blade, sections, augmentation) = ReadBlade(values);
        var bladeCount = values.WholeNumber("rotor.blade_count", null, 1, MostBlades);
        var coneDeg = values.Number("rotor.cone_deg", CaseDefaults.ConeDeg, Bounds.Within(80));
        var air = AirReader.Read(values);
        var windSpeeds = ReadWindSpeeds(values);
        var control = ControlReader.Read(values, windSpeeds, folder, tables);
        if (control.Strategy is { } strategy && blade?.Blade is { } shape)
            UsualRanges.CheckTipSpeed(values, strategy, shape, double.DegreesToRadians(coneDeg));
        var model = ModelReader.Read(values);
        var spanwise = SpanwiseReader.Read(values, windSpeeds);
        var site = SiteReader.Read(values, folder, tables);
        if (site.Site is not null)
            UsualRanges.CheckYear(values, windSpeeds, control.CutIn, control.CutOut);
        var further = new FurtherResults(
            FurtherReader.ReadSurface(values, findings), site.Site, FurtherReader.ReadTurbulence(values), FurtherReader.ReadReferenceDensity(values));
        CheckTheRest(values);
        values.Note("solver", CanonicalText.Of(SolverVersion.Number));
        if (!values.IsSound || blade?.Blade is null || sections?.Sections is null || control.Strategy is null
            || control.Drivetrain is null || air is null)
            return null;

        var rotor = new RotorCase(
            blade.Blade, sections.Sections, augmentation, bladeCount, double.DegreesToRadians(coneDeg), air, windSpeeds, control.Strategy,
            control.CutIn, control.CutOut, control.Drivetrain, model);
        var determining = values.Determining;
        inputs = [.. inputs, blade.Input, .. sections.Tables.Select(table => table.Input)];
        if (sections.Set is { } set)
            inputs = inputs.Add(set.Input);
        ImmutableArray<CanonicalTable> canonical = [blade.Canonical, .. sections.Tables.Select(table => table.Canonical)];
        if (control.Schedule is { } schedule)
        {
            inputs = inputs.Add(schedule.Input);
            canonical = canonical.Add(schedule.Canonical);
        }
        if (site.Histogram is { } histogram)
        {
            inputs = inputs.Add(histogram.Input);
            canonical = canonical.Add(histogram.Canonical);
        }
        return new StudyCase(
            name, title + variantTitle, file.File, rotor, spanwise, Fingerprint.Of(determining), inputs, determining)
        {
            Tables = canonical,
            Preparation = augmentation == Augmentation.None
                ? sections.ExtensionRecord
                : sections.ExtensionRecord.Add($"augmented by {SectionMethod.NameOf(augmentation)}, at each element and operating point"),
            Further = further,
        };
    }

    private static string ReadTitle(CaseValues values, string name)
    {
        var title = values.Text("title");
        if (title is not null && VisibleText.HasHidden(title))
            values.RefuseValue("title", $"is {VisibleText.Quote(title)}; write it in one line, without control characters");
        return string.IsNullOrWhiteSpace(title) ? name.Split('~')[0] : title;
    }

    private (BladeTable? Blade, BladeSections? Sections, Augmentation Augmentation) ReadBlade(CaseValues values)
    {
        var blade = Reference(values, "blade", EntryKind.File) is { } bladePath ? tables.Blade(bladePath) : null;
        var set = Reference(values, "polars", EntryKind.Folder);
        var extension = SectionsReader.ReadExtension(values, blade?.Blade);
        var augmentation = SectionsReader.ReadAugmentation(values);
        if (blade is null || set is null)
        {
            // Which tables the blade would name is not known; what is wrong in any of them is told with the rest.
            if (set is not null)
                tables.ReadAll(set);
            values.Spoil();
            return (blade, null, augmentation);
        }
        foreach (var (section, _) in blade.Sections)
            values.Uses(folder.RelativePath(Path.Combine(set, section + ".csv")));
        var sections = tables.Sections(blade, set, extension);
        if (blade.Blade is null || sections.Sections is null)
            values.Spoil();
        values.Note("blade", blade.Canonical.Hash);
        foreach (var table in sections.Tables)
            if (table.Section is { } section)
                values.Note($"section.{section.Name}", table.Canonical.Hash);
        if (sections.Set is { } setFile)
        {
            values.Uses(setFile.Input.File);
            foreach (var thickness in setFile.Thicknesses)
                values.Note($"thickness_ratio.{thickness.Section}", CanonicalText.Of(thickness.ThicknessRatio));
        }
        SectionsReader.CheckTables(values, sections, augmentation, findings);
        return (blade, sections, augmentation);
    }

    private string? Reference(CaseValues values, string path, EntryKind wanted)
    {
        if (!values.Has(path))
            values.Missing(path, null);
        if (values.Text(path) is not { } reference)
            return null;
        // Relative to the file that makes it: the case's own, or study.toml.
        var at = values.Find(path)!.Value.At;
        if (folder.Locate(at.File, reference, wanted, out var problem) is { } fullPath)
        {
            values.Uses(folder.RelativePath(fullPath));
            return fullPath;
        }
        values.Refuse(at, problem);
        return null;
    }

    private ImmutableArray<double> ReadWindSpeeds(CaseValues values)
    {
        const string path = "wind.speeds_m_s";
        if (values.Find(path) is not { } entry)
        {
            values.Missing(path, null);
            return [];
        }
        if (!_windSpeeds.TryGetValue(entry.Value, out var known))
        {
            var speeds = WindSpeeds.Read(entry.Value, findings);
            known = (speeds, CanonicalText.Of(speeds));
            _windSpeeds.Add(entry.Value, known);
        }
        if (known.Speeds.IsEmpty)
            values.Spoil();
        values.Note(path, known.Text);
        return known.Speeds;
    }

    // Keys that change no number yet are still keys: their values are checked like all others.
    private static void CheckTheRest(CaseValues values)
    {
        values.Check("rotor.tilt_deg", Bounds.Within(90));
        values.Check("rotor.hub_height_m", Bounds.AboveZero);
        values.Check("wind.shear_exponent", Bounds.Within(2));
        values.Check("wind.yaw_deg", Bounds.Within(180));
    }
}
