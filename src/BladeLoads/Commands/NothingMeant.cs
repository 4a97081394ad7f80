using BladeLoads.Batch.Plan;
using BladeLoads.Results.Wording;
using BladeLoads.Studies;

namespace BladeLoads.Commands;

/// <summary>A choice of cases that keeps none is a slip, not a wish.</summary>
internal static class NothingMeant
{
    private const int Shown = 12;

    /// <summary>Whether the patterns keep nothing; then it is told, with the names there are.</summary>
    public static bool Tell(StudyPlan plan, Study study, string[] only, Surroundings surroundings)
    {
        if (only.Length == 0 || !plan.Cases.IsEmpty || !plan.Rejected.IsEmpty)
            return false;
        var names = study.Cases.Select(c => c.Name).ToList();
        surroundings.Error.WriteLine(Printable.Of(
            $"no case matches {string.Join(", ", only.Select(p => $"'{p}'"))}; the cases are {string.Join(", ", names.Take(Shown))}"
            + (names.Count > Shown ? $" and {names.Count - Shown} more" : "")));
        return true;
    }
}
