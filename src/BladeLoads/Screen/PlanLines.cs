using BladeLoads.Batch.Plan;
using BladeLoads.Results.Wording;

namespace BladeLoads.Screen;

/// <summary>A plan in words.</summary>
internal static class PlanLines
{
    private const int WidestName = 48;

    private static readonly string[] Words =
        ["current", "current again", "re-usable", "out of date", "damaged", "missing", "failed", "blocked"];

    /// <summary>A line a case: <c>clean-1.05  out of date: air.density_kg_m3 1.225 -> 1.05</c>.</summary>
    public static IEnumerable<string> Of(IReadOnlyCollection<CaseStanding> cases)
    {
        var width = Math.Min(WidestName, cases.Count == 0 ? 0 : cases.Max(c => Printable.Of(c.Name).Length));
        foreach (var standing in cases)
        {
            var reason = standing.State.Reason;
            yield return $"{Printable.Of(standing.Name).PadRight(width)}  {standing.State.Word}{(reason.Length == 0 ? "" : ": ")}{reason}";
        }
    }

    /// <summary><c>12 cases: 3 current, 1 re-usable, 8 missing; run solves 8, re-uses 1</c>.</summary>
    public static string Closing(IReadOnlyCollection<CaseStanding> cases)
    {
        var solved = cases.Count(c => c.NeedsSolving);
        var reused = cases.Count(c => c.IsThereAlready);
        return (solved, reused) switch
        {
            (0, 0) => $"{Counts(cases)}; nothing to run",
            (_, 0) => $"{Counts(cases)}; run solves {solved}",
            (0, _) => $"{Counts(cases)}; run re-uses {reused}, nothing to solve",
            _ => $"{Counts(cases)}; run solves {solved}, re-uses {reused}",
        };
    }

    /// <summary>What lies there though the study has no such case: renamed, taken out, another value of a sweep.</summary>
    public static IEnumerable<string> OfNoCase(IReadOnlyList<string> names)
    {
        const int Shown = 5;
        if (names.Count == 0)
            yield break;
        var more = names.Count > Shown ? $" and {names.Count - Shown} more" : "";
        yield return Printable.Of(
            $"{Count.Of(names.Count, "result")} of no case of the study: {string.Join(", ", names.Take(Shown))}{more}; left alone, delete what is not wanted");
    }

    /// <summary><c>12 cases: 3 current, 9 missing; solving 9</c>.</summary>
    /// <param name="all">Current cases are solved too, and none is re-used.</param>
    public static string Summary(StudyPlan plan, bool all)
    {
        var cases = plan.Standings;
        var solved = all ? plan.Cases.Length : cases.Count(c => c.NeedsSolving);
        var reused = all ? 0 : cases.Count(c => c.IsThereAlready);
        return $"{Counts(cases)}; {(solved == 0 ? "" : $"solving {solved}")}{(solved > 0 && reused > 0 ? ", " : "")}{(reused == 0 ? "" : $"re-using {reused}")}";
    }

    public static string AllCurrent(StudyPlan plan)
        => plan.Rejected.IsEmpty && plan.Cases.Length == 1 ? "the case is current; nothing to solve"
        : plan.Rejected.IsEmpty ? $"all {Count.Of(plan.Cases.Length, "case")} are current; nothing to solve"
        : $"{Counts(plan.Standings)}; nothing to solve";

    private static string Counts(IReadOnlyCollection<CaseStanding> cases)
    {
        var counts = Words
            .Select(word => (Word: word, Number: cases.Count(c => c.State.Word == word)))
            .Where(c => c.Number > 0)
            .Select(c => $"{c.Number} {c.Word}");
        return $"{Count.Of(cases.Count, "case")}: {string.Join(", ", counts)}";
    }
}
