using System.Text;
using BladeLoads.Batch.Logs;
using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Tests.Work;

public sealed class StudyRunTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    private ResultsFolder Results => Runs.Results(_folder);

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_poison_case_fails_alone_with_its_reason()
    {
        var poison = FellRotor.Case("b", FellRotor.Rotor(elements: 7));
        StudyCase[] cases = [FellRotor.Case("a"), poison, FellRotor.Case("c")];
        var result = Runs.Solve(
            Results, cases, (rotor, _) => rotor.Model.Elements == 7 ? throw new InvalidOperationException("odd") : FellRotor.Curve(rotor));
        Assert.Equal((2, 1, 0), (result.Solved, result.Failed, result.NotRun));
        Assert.Equal("fault in BladeLoads, please report: odd", Assert.IsType<CaseOutcome.Failed>(result.Outcomes["b"]).Reason);
        Assert.False(Directory.Exists(Results.Case("b")));
        var failure = ReceiptFile.ReadFailure(Results.Failure("b"))!;
        Assert.Equal(("b", "fault in BladeLoads, please report: odd"), (failure.Case, failure.Reason));
        Assert.Contains(failure.Log, line => line.EndsWith("ERR Case b failed: fault in BladeLoads, please report: odd", StringComparison.Ordinal));
        Assert.DoesNotContain("   at ", File.ReadAllText(Results.Failure("b")), StringComparison.Ordinal);
    }

    [Fact]
    public void One_worker_and_several_give_the_same_bytes()
    {
        StudyCase[] cases = [.. Enumerable.Range(0, 40).Select(i => FellRotor.Case($"case {i}", FellRotor.Rotor(elements: 1 + i % 5)))];
        var one = new ResultsFolder(Path.Join(_folder.Path, "one"), "fell");
        var four = new ResultsFolder(Path.Join(_folder.Path, "four"), "fell");
        Runs.Solve(one, cases, workers: 1);
        Runs.Solve(four, [.. cases.Reverse()], workers: 4);
        var tables = Tables(one);
        Assert.Equal(120, tables.Count);
        Assert.Equal(tables, Tables(four));
    }

    [Fact]
    public void A_run_that_is_stopped_leaves_whole_results_and_says_what_was_not_run()
    {
        StudyCase[] cases = [.. Enumerable.Range(0, 30).Select(i => FellRotor.Case($"case {i:00}"))];
        using var stopping = new CancellationTokenSource();
        var calls = 0;
        var result = Runs.Solve(
            Results, cases,
            (rotor, cancellation) =>
            {
                if (Interlocked.Increment(ref calls) == 10)
                    stopping.Cancel();
                cancellation.ThrowIfCancellationRequested();
                return FellRotor.Curve(rotor);
            },
            stopping: stopping.Token);
        Assert.Equal(30, result.Solved + result.NotRun);
        Assert.InRange(result.NotRun, 20, 29);
        Assert.Equal(result.Solved, Directory.EnumerateDirectories(Results.Study).Count());
        Assert.False(Directory.Exists(Results.Failures));
        var plan = StudyPlan.Make(FellRotor.Study(cases), Results, 1);
        Assert.Equal(result.Solved, plan.Cases.Count(c => c.State is CaseState.Current));
        Assert.Equal(result.NotRun, plan.Cases.Count(c => c.State is CaseState.Missing));
    }

    [Fact]
    public void A_full_disk_stops_the_run_with_one_line_and_burns_no_attempt()
    {
        StudyCase[] cases = [.. Enumerable.Range(0, 20).Select(i => FellRotor.Case($"case {i:00}"))];
        var result = Runs.Solve(Results, cases, disk: new FailingDisk(80), workers: 1);
        Assert.Equal($"cannot write results into {Results.Study}: no room left on the disk", result.NoRoom);
        Assert.Equal(0, result.Failed);
        Assert.InRange(result.Solved, 1, 19);
        Assert.Equal(20, result.Solved + result.NotRun);
        Assert.False(Directory.Exists(Results.Failures));
        StudyCase[] due = [.. Due(cases)];   // what was in its place and could not be flushed counts as not run, and is current
        Assert.InRange(due.Length, 1, result.NotRun);
        Assert.Equal(due.Length, Runs.Solve(Results, due).Solved);
        Assert.Empty(Due(cases));
    }

    [Fact]
    public void Trouble_with_one_result_alone_fails_its_case_alone()
    {
        StudyCase[] cases = [FellRotor.Case("a"), FellRotor.Case("b")];
        var result = Runs.Solve(Results, cases, disk: new FailingDisk(1, FailingDisk.Odd, only: true), workers: 1);
        Assert.Equal((1, 1), (result.Solved, result.Failed));
        Assert.Equal(
            "its result cannot be written: Cannot allocate memory",
            result.Outcomes.Values.OfType<CaseOutcome.Failed>().Single().Reason);
    }

    [Fact]
    public void A_file_in_use_is_tried_again_and_nothing_else_is()
    {
        var waits = new List<int>();
        var busy = Runs.Solve(
            Results, [FellRotor.Case("a")], disk: new FailingDisk(1, FailingDisk.InUse, only: true), waitForFile: waits.Add);
        Assert.Equal(1, busy.Solved);
        Assert.Equal([1], waits);

        var calls = 0;
        var bad = Runs.Solve(
            Results, [FellRotor.Case("b")], (_, _) => throw new InvalidOperationException($"bad table {++calls}"), waitForFile: waits.Add);
        Assert.Equal((1, 1), (bad.Failed, calls));
        Assert.Equal([1], waits);
    }

    [Fact]
    public void A_file_that_stays_in_use_fails_the_case_in_the_end()
    {
        var waits = new List<int>();
        var result = Runs.Solve(Results, [FellRotor.Case("a")], disk: new FailingDisk(1, FailingDisk.InUse), waitForFile: waits.Add);
        Assert.Equal("its result cannot be written: a file in it is in use", Assert.IsType<CaseOutcome.Failed>(result.Outcomes["a"]).Reason);
        Assert.Equal([1, 2, 3, 1, 2, 3], waits);   // for the result, and for the record of its failure
    }

    [Fact]
    public void A_receipt_says_what_the_result_was_made_from_and_what_it_consists_of()
    {
        var studyCase = FellRotor.Case("clean", title: "Clean \"blades\" =1+1 æ\u202E", values: ("air.density_kg_m3", "1.225"));
        Runs.Solve(Results, [studyCase]);
        var receipt = Assert.IsType<ReceiptReading.Readable>(ReceiptFile.Read(Results.Case("clean"))).Receipt;
        Assert.Equal(
            (studyCase.Title, studyCase.Fingerprint, 1, "0.0.0"), (receipt.Title, receipt.Fingerprint, receipt.SolverVersion, receipt.ToolVersion));
        Assert.Equal("1.225", receipt.Values["air.density_kg_m3"]);
        Assert.Equal(studyCase.Inputs, receipt.Inputs);
        Assert.Contains("IEC 61400-1", receipt.Caution, StringComparison.Ordinal);
        Assert.Equal(["power-curve.csv", "spanwise.csv", "design-points.csv", "case.log"], receipt.Files.Select(f => f.Name));
        Assert.All(receipt.Files, f => Assert.Equal(f, ResultFile.Of(f.Name, File.ReadAllBytes(Path.Join(Results.Case("clean"), f.Name)))));
    }

    [Fact]
    public void A_summary_from_receipts_is_the_same_as_the_one_just_solved()
    {
        StudyCase[] cases = [FellRotor.Case("a"), FellRotor.Case("b", FellRotor.Rotor(windSpeeds: 7))];
        var study = FellRotor.Study(cases);
        var before = StudyPlan.Make(study, Results, 1);
        var outcomes = Runs.Solve(Results, cases).Outcomes;
        var solved = BladeLoads.Results.Tables.SummaryTable.Write(StudySummary.Rows(before, outcomes), "a");
        var read = BladeLoads.Results.Tables.SummaryTable.Write(StudySummary.Rows(StudyPlan.Make(study, Results, 1), outcomes.Clear()), "a");
        Assert.Equal(Encoding.UTF8.GetString(solved), Encoding.UTF8.GetString(read));
    }

    [Fact]
    public void The_log_of_a_case_is_published_with_it_and_names_it_in_every_line()
    {
        Runs.Solve(Results, [FellRotor.Case("clean", title: "a\e[2Jb\nc")]);
        var lines = File.ReadAllLines(Path.Join(Results.Case("clean"), CaseLog.FileName));
        Assert.All(lines, line => Assert.Contains("Case clean", line, StringComparison.Ordinal));
        string[] told =
        [
            @"a\u001b[2Jb\u000ac; fingerprint", "read cases/clean.toml: case file", "balanced 6 elements: worst residual 1.0e-13 at 1 m/s, r = 2.5 m",
            "most evaluations 10, mean 9.5; 3 rotor solves", "0 at several balances", "rated power at 2.5 m/s", "solved: 3 points, 0 unbalanced",
        ];
        Assert.All(told, words => Assert.Contains(lines, line => line.Contains(words, StringComparison.Ordinal)));
    }

    private IEnumerable<StudyCase> Due(StudyCase[] cases)
        => StudyPlan.Make(FellRotor.Study(cases), Results, 1).Cases.Where(c => c.IsDue).Select(c => c.Case);

    private static Dictionary<string, string> Tables(ResultsFolder results) => TemporaryFolder.Contents(results.Study)
        .Where(f => f.Key.EndsWith(".csv", StringComparison.Ordinal)).ToDictionary(StringComparer.Ordinal);
}
