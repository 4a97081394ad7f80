using System.Collections.Immutable;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Pictures;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>The pages of a study: one for each table that its cases use, and for each way in which they extend and augment it.</summary>
internal static class StudyPages
{
    private const string TableKey = "section.";
    private const string Treatment = "sections.";

    /// <param name="solve">Asked for cases that augment their tables alone: the correction depends on where the rotor works.</param>
    public static ImmutableArray<PolarPageAsked> Of(Study study, SolveCase solve)
    {
        var pages = ImmutableArray.CreateBuilder<PolarPageAsked>();
        var corrections = new Dictionary<string, CorrectedLines>(StringComparer.Ordinal);
        var used = study.Cases.SelectMany(c => c.Tables.Where(t => t.Key.StartsWith(TableKey, StringComparison.Ordinal)), (c, t) => (Case: c, Table: t));
        foreach (var use in used.DistinctBy(use => (use.Table.File, TreatmentOf(use.Case))).OrderBy(use => use.Table.File, StringComparer.Ordinal))
            pages.Add(Page(study, use.Case, use.Table, Corrections));
        return pages.ToImmutable();

        CorrectedLines Corrections(StudyCase studyCase)
        {
            if (!corrections.TryGetValue(studyCase.Name, out var lines))
                corrections.Add(studyCase.Name, lines = CorrectedLines.Of(studyCase, solve));
            return lines;
        }
    }

    private static PolarPageAsked Page(Study study, StudyCase studyCase, CanonicalTable table, Func<StudyCase, CorrectedLines> corrections)
    {
        var section = table.Key[TableKey.Length..];
        var set = Path.GetFileName(Path.GetDirectoryName(table.File)) is { Length: > 0 } folder ? folder : study.Name;
        var prepared = studyCase.Rotor.Sections[section];
        if (TreatmentOf(studyCase).Length == 0)
            return new PolarPageAsked(set, section, section, table.File, PolarPicture.Of(prepared, set, $"study {study.Name}, {table.File}"));

        var tabulated = StoredPolars.Read(Path.Join(study.Folder, table.File), new DiskFiles(), out _)?.Section ?? prepared;
        var picture = PolarPicture.Of(tabulated, set, $"study {study.Name}, {table.File}; treated as in case {studyCase.Name}")
            .With(ExtendedLines.Of(tabulated, prepared));
        if (studyCase.Rotor.Augmentation != Augmentation.None)
        {
            var corrected = corrections(studyCase);
            picture = picture.With(corrected.Of(section)) with { Notes = picture.Notes.Add(corrected.Note(section)) };
        }
        return new PolarPageAsked(set, section, $"{section}~{studyCase.Name}", table.File, picture);
    }

    private static string TreatmentOf(StudyCase studyCase)
    {
        var asked = studyCase.Values.Where(v => v.Key.StartsWith(Treatment, StringComparison.Ordinal)).Select(v => $"{v.Key}={v.Value}").ToList();
        return asked.Count == 0 ? "" : string.Join(' ', asked.Append(studyCase.Values.GetValueOrDefault("blade", "")));
    }
}
