using System.Collections.Immutable;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Pictures;
using BladeLoads.Results.PolarCheck;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.PolarCheck;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>The pages of a study: one for each table that its cases use, and for each way in which they extend and augment it.</summary>
/// <param name="Errors">Of tables that could be read with the study and cannot be read again; they have no page.</param>
internal sealed record StudyPages(ImmutableArray<PolarPageAsked> Pages, ImmutableArray<InputFinding> Errors)
{
    private const string Treatment = "sections.";

    /// <param name="solve">
    /// Asked for cases that augment a table which is drawn, and for no other: what rotation does depends on where the rotor works.
    /// </param>
    /// <exception cref="WrongUseException">No section is chosen.</exception>
    public static StudyPages Of(Study study, NameChoice only, SolveCase solve)
    {
        var used = study.Cases.SelectMany(CheckedTables.SectionTables, (c, table) => (Case: c, table.Section, table.File))
            .DistinctBy(use => (use.File, TreatmentOf(use.Case))).OrderBy(use => use.File, StringComparer.Ordinal).ToList();
        if (used.Count == 0)
            return new StudyPages([], []);
        only.Check(used.Select(use => use.Section));
        var reading = new Reading(study, new TableNames(used.Select(use => use.File), study.Name), solve);
        var pages = used.Where(use => only.Includes(use.Section)).Select(use => reading.Page(use.Case, use.Section, use.File));
        return new StudyPages([.. pages.OfType<PolarPageAsked>()], [.. reading.Errors.Distinct()]);
    }

    private static string TreatmentOf(StudyCase studyCase)
    {
        var asked = studyCase.Values.Where(v => v.Key.StartsWith(Treatment, StringComparison.Ordinal)).Select(v => $"{v.Key}={v.Value}").ToList();
        return asked.Count == 0 ? "" : string.Join(' ', asked.Append(studyCase.Values.GetValueOrDefault("blade", "")));
    }

    private sealed class Reading(Study study, TableNames names, SolveCase solve)
    {
        private readonly Dictionary<string, AugmentedLines> _augmentations = new(StringComparer.Ordinal);

        public List<InputFinding> Errors { get; } = [];

        public PolarPageAsked? Page(StudyCase studyCase, string section, string file)
        {
            var set = names.SetOf(file);
            var prepared = studyCase.Rotor.Sections[section];
            if (TreatmentOf(studyCase).Length == 0)
                return Of(section, PolarPicture.Of(prepared, set, $"study {study.Name}, {file}"));

            // As read with the study it is extended already.
            var tabulated = StoredPolars.Read(Path.Join(study.Folder, file), file, new DiskFiles(), out var wrong);
            Errors.AddRange(wrong);
            if (tabulated is null)
                return null;
            var picture = PolarPicture.Of(tabulated.Section, set, $"study {study.Name}, {file}; treated as in case {studyCase.Name}")
                .With(ExtendedLines.Of(tabulated.Section, prepared));
            if (studyCase.Rotor.Augmentation != Augmentation.None)
            {
                var (lines, note) = Augmented(studyCase).On(section);
                picture = picture.With(lines) with { Notes = picture.Notes.Add(note) };
            }
            return Of($"{section}~{studyCase.Name}", picture);

            PolarPageAsked Of(string fileName, PolarPicture shown)
                => new(names.SetFolderOf(file), set, section, fileName, file, shown);
        }

        private AugmentedLines Augmented(StudyCase studyCase)
        {
            if (!_augmentations.TryGetValue(studyCase.Name, out var lines))
                _augmentations.Add(studyCase.Name, lines = AugmentedLines.Of(studyCase, solve));
            return lines;
        }
    }
}
