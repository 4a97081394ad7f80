using BladeLoads.Batch.Plan;
using BladeLoads.Results.Wording;

namespace BladeLoads.Screen;

/// <summary>A plan in words.</summary>
internal static class PlanLines
{
    private const int WidestName = 48;

    private static readonly string[] Words = ["current", "out of date", "missing", "failed", "rejected"];

    /// <summary>A line a case: <c>clean-1.05  out of date: section tarn-30: table changed</c>.</summary>
    public static IEnumerable<string> Of(StudyPlan plan)
    {
        var names = plan.Cases.Select(c => Printable.Of(c.Case.Name)).Concat(plan.Rejected.Select(Printable.Of)).ToList();
        var width = Math.Min(WidestName, names.Count == 0 ? 0 : names.Max(n => n.Length));
        foreach (var planned in plan.Cases)
        {
            var state = planned.State;
            var reason = state.Reason.Length == 0 ? "" : $": {state.Reason}";
            yield return $"{Printable.Of(planned.Case.Name).PadRight(width)}  {state.Word}{reason}";
        }
        foreach (var name in plan.Rejected)
            yield return $"{Printable.Of(name).PadRight(width)}  rejected: its input has errors";
    }

    /// <summary><c>12 cases: 3 current, 2 out of date, 7 missing; run solves 9</c>.</summary>
    public static string Closing(StudyPlan plan)
        => $"{Counts(plan)}; {(plan.Cases.Any(c => c.IsDue) ? $"run solves {plan.Cases.Count(c => c.IsDue)}" : "nothing to run")}";

    /// <summary><c>12 cases: 3 current, 9 missing; solving 9</c>.</summary>
    public static string Summary(StudyPlan plan, int due) => $"{Counts(plan)}; solving {due}";

    public static string AllCurrent(StudyPlan plan)
        => plan.Rejected.IsEmpty && plan.Cases.Length == 1 ? "the case is current; nothing to solve"
        : plan.Rejected.IsEmpty ? $"all {Count.Of(plan.Cases.Length, "case")} are current; nothing to solve"
        : $"{Counts(plan)}; nothing to solve";

    private static string Counts(StudyPlan plan)
    {
        var words = plan.Cases.Select(c => c.State.Word).Concat(plan.Rejected.Select(_ => "rejected")).ToList();
        var counts = Words
            .Select(word => (Word: word, Number: words.Count(w => w == word)))
            .Where(c => c.Number > 0)
            .Select(c => $"{c.Number} {c.Word}");
        return $"{Count.Of(words.Count, "case")}: {string.Join(", ", counts)}";
    }
}
