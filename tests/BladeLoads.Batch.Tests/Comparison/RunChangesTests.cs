using System.Collections.Immutable;
using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;

namespace BladeLoads.Batch.Tests.Comparison;

public sealed class RunChangesTests : IDisposable
{
    private static readonly ImmutableSortedDictionary<string, CaseOutcome> NoOutcomes
        = ImmutableSortedDictionary.Create<string, CaseOutcome>(StringComparer.Ordinal);

    private readonly TemporaryFolder _folder = new();

    private ResultsFolder Results => Runs.Results(_folder);

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Each_case_that_was_solved_again_stands_beside_its_result_before()
    {
        Run(["a", "b"]);
        Assert.Equal([("a", "compared", 50.0), ("c", "no earlier result", 0)], Run(["a", "c"], factor: 1.5));
        Assert.Contains("a,a,compared,largest thrust,kN,6,3,9,3,3,50,,", File.ReadAllText(Results.Changes), StringComparison.Ordinal);
        Assert.Contains("c,,no earlier result,", File.ReadAllText(Results.Changes), StringComparison.Ordinal);
    }

    [Fact]
    public void Cases_that_failed_or_were_not_run_say_so()
    {
        Run(["a", "b"]);
        var changes = RunChanges.Before(Plan("a", "b"), ["a", "b"], Results);
        var outcomes = NoOutcomes.Add("a", new CaseOutcome.Failed("odd"));
        Assert.Equal([("a", "failed"), ("b", "not run")], changes.Compare(outcomes).Select(c => (c.Case, c.Word)));
    }

    [Fact]
    public void A_run_that_carries_on_a_killed_one_tells_what_moved_over_both()
    {
        Run(["a", "b", "c"]);
        // Killed when a was solved and b was not.
        using (var publisher = Publisher.Open(Results, new Disk()))
            RunChanges.Before(Plan("a", "b", "c"), ["a", "b"], Results).Remember(publisher);
        Solve(["a"], factor: 2);

        Assert.Equal([("a", "compared", 100.0), ("b", "compared", 50)], Run(["b"], factor: 1.5));
        Assert.Equal([("c", "compared", 0.0)], Run(["c"]));
    }

    [Fact]
    public void A_killed_run_whose_cases_were_all_solved_is_told_by_the_next_though_it_solves_nothing()
    {
        Run(["a"]);
        using (var publisher = Publisher.Open(Results, new Disk()))
            RunChanges.Before(Plan("a"), ["a"], Results).Remember(publisher);
        Solve(["a"], factor: 2);
        Assert.Equal([("a", "compared", 100.0)], Run([]));
        Assert.Empty(Run([]));
    }

    [Fact]
    public void A_case_of_an_unfinished_run_that_nobody_asked_for_since_is_neither_told_nor_forgotten()
    {
        Run(["a", "b"]);
        using (var publisher = Publisher.Open(Results, new Disk()))
            RunChanges.Before(Plan("a", "b"), ["a", "b"], Results).Remember(publisher);
        Assert.Equal([("a", "compared", 100.0)], Run(["a"], factor: 2));
        Assert.Equal([("a", "compared", 100.0), ("b", "compared", 50)], Run(["b"], factor: 1.5));
    }

    [Fact]
    public void A_record_of_an_unfinished_run_cut_at_any_byte_costs_the_comparison_and_nothing_else()
    {
        Run(["a"]);
        using (var publisher = Publisher.Open(Results, new Disk()))
            RunChanges.Before(Plan("a"), ["a"], Results).Remember(publisher);
        var file = Assert.Single(Directory.EnumerateFiles(Results.Replaced));
        var whole = File.ReadAllBytes(file);
        for (var length = 0; length < whole.Length; length++)
        {
            File.WriteAllBytes(file, whole[..length]);
            Assert.Empty(UnfinishedRun.Read(Results));
        }
    }

    [Fact]
    public void The_same_result_under_another_title_is_no_change()
    {
        Run(["a"]);
        Assert.Empty(RunChanges.Before(Plan("a"), ["a"], Results).Compare(NoOutcomes.Add("a", new CaseOutcome.Solved(FellSummary, 1))));
    }

    private static CaseSummary FellSummary => CaseSummary.Of(FellRotor.Curve(FellRotor.Rotor()));

    private (string Case, string Word, double Percent)[] Run(string[] due, double factor = 1)
    {
        var changes = RunChanges.Before(Plan("a", "b", "c"), due, Results);
        using (var publisher = Publisher.Open(Results, new Disk()))
            changes.Remember(publisher);
        var outcomes = Solve(due, factor);
        using var closing = Publisher.Open(Results, new Disk());
        var comparisons = changes.Compare(outcomes);
        changes.Publish(comparisons, outcomes, closing);
        return [.. comparisons.Select(c => (c.Case, c.Word, c is CaseComparison.Compared compared
            ? Math.Round(compared.Figures.Single(f => f.Name == "largest thrust").Percent!.Value, 9) : 0))];
    }

    private ImmutableSortedDictionary<string, CaseOutcome> Solve(string[] due, double factor = 1) => due.Length == 0 ? NoOutcomes : Runs.Solve(
        Results, [.. due.Select(n => FellRotor.Case(n))], (rotor, _) => FellRotor.Scaled(FellRotor.Curve(rotor), factor)).Outcomes;

    private StudyPlan Plan(params string[] names)
        => StudyPlan.Make(FellRotor.Study([.. names.Select(n => FellRotor.Case(n))]), Results, 1);
}
