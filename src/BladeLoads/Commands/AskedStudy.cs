using BladeLoads.Batch.Plan;
using BladeLoads.Results.Publishing;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.Commands;

/// <summary>What a user pointed at.</summary>
/// <param name="Asked">The study, or the one case file of it.</param>
/// <param name="Whole">
/// The study itself: the summary has a row for each of its cases, and a comparison needs its baseline, whichever case was asked for.
/// </param>
internal sealed record AskedStudy(Study Asked, Study Whole)
{
    /// <exception cref="StudyNotFoundException">There is nothing at the path that could be a study, or it cannot be read.</exception>
    public static AskedStudy Read(string path, Surroundings surroundings)
    {
        try
        {
            var asked = ReservedNames.Rejected(surroundings.ReadStudy(path));
            return new AskedStudy(asked, File.Exists(path) ? WholeOf(asked, surroundings) : asked);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new StudyNotFoundException($"cannot read {path}: {e.Message}");
        }
    }

    /// <summary>The plan of the whole study, and what of it was asked for.</summary>
    public (StudyPlan Whole, StudyPlan Asked) Plan(ResultsFolder results, IEnumerable<string> patterns)
    {
        var whole = StudyPlan.Make(Whole, results, SolverVersion.Number);
        var names = Asked.Cases.Select(c => c.Name).ToHashSet(StringComparer.Ordinal);
        var asked = new StudyPlan([.. whole.Cases.Where(c => names.Contains(c.Case.Name))], Asked.Rejected);
        return (whole, asked.Only(new CaseChoice([.. patterns])));
    }

    private static Study WholeOf(Study asked, Surroundings surroundings)
    {
        try
        {
            var whole = ReservedNames.Rejected(surroundings.ReadStudy(asked.Folder));
            var names = whole.Cases.Select(c => c.Name).ToHashSet(StringComparer.Ordinal);
            return asked.Cases.All(c => names.Contains(c.Name)) ? whole : asked;
        }
        catch (StudyNotFoundException)
        {
            return asked;   // a case file on its own, beside its tables
        }
    }
}
