using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Plan.Index;
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
        var asked = ReadAlone(path, surroundings);
        return new AskedStudy(asked, File.Exists(path) ? WholeOf(asked, surroundings) : asked);
    }

    /// <summary>What a user pointed at, without the study around it.</summary>
    /// <exception cref="StudyNotFoundException">As for <see cref="Read"/>.</exception>
    public static Study ReadAlone(string path, Surroundings surroundings)
    {
        try
        {
            return ReservedNames.Rejected(surroundings.ReadStudy(path));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new StudyNotFoundException($"cannot read {path}: {e.Message}");
        }
    }

    /// <summary>The plan of the whole study, and what of it was asked for.</summary>
    public (StudyPlan Whole, StudyPlan Asked) Plan(StudyLook look, IEnumerable<string> patterns)
    {
        var whole = look.Plan(Whole);
        var names = Asked.Cases.Select(c => c.Name).ToHashSet(StringComparer.Ordinal);
        var asked = new StudyPlan([.. whole.Cases.Where(c => names.Contains(c.Case.Name))], Asked.Rejected) { Blocking = Asked.Blocking };
        return (whole, asked.Only(new CaseChoice([.. patterns])));
    }

    private static Study WholeOf(Study asked, Surroundings surroundings)
    {
        try
        {
            var whole = ReadAlone(asked.Folder, surroundings);
            var names = whole.Cases.Select(c => c.Name).ToHashSet(StringComparer.Ordinal);
            return asked.Cases.All(c => names.Contains(c.Name)) ? whole : asked;
        }
        catch (StudyNotFoundException)
        {
            return asked;   // a case file on its own, beside its tables
        }
    }
}
