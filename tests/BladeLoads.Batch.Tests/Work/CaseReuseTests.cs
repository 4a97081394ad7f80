using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Sharing;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies;
using Serilog.Core;

namespace BladeLoads.Batch.Tests.Work;

public sealed class CaseReuseTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    private ResultsFolder Results => Runs.Results(_folder);

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void An_edit_taken_back_brings_its_result_back_without_solving()
    {
        Assert.Equal((1, 0), Run(Case("clean", 1)));
        var first = TemporaryFolder.Contents(Results.Case("clean"));
        Assert.Equal((1, 0), Run(Case("clean", 2)));
        var second = TemporaryFolder.Contents(Results.Case("clean"));
        Assert.Matches(@"^current again: its result of \d{4}-\d\d-\d\d \d\d:\d\d UTC is in replaced/$", Said(Case("clean", 1)));
        Assert.Equal((0, 1), Run(Case("clean", 1)));
        Assert.Equal(first, TemporaryFolder.Contents(Results.Case("clean")));
        Assert.Equal("current: ", Said(Case("clean", 1)));
        // And the other way again: the two keep changing places, each under its own name.
        Assert.Equal(second, TemporaryFolder.Contents(Assert.Single(ReplacedResult.Of(Results, "clean")).Folder));
        Assert.True(ReplacedResult.Of(Results, "clean")[0].MayBeOf(Case("clean", 2).Fingerprint));
        Assert.Equal((0, 1), Run(Case("clean", 2)));
        Assert.Equal(second, TemporaryFolder.Contents(Results.Case("clean")));
    }

    [Fact]
    public void A_replaced_result_comes_back_into_an_empty_place()
    {
        Run(Case("clean", 1));
        Run(Case("clean", 2));
        Directory.Delete(Results.Case("clean"), recursive: true);
        Assert.Equal((0, 1), Run(Case("clean", 1)));
        Assert.Equal("current: ", Said(Case("clean", 1)));
    }

    [Fact]
    public void A_replaced_result_with_another_byte_is_not_brought_back_but_solved_again()
    {
        Run(Case("clean", 1));
        Run(Case("clean", 2));
        var curve = Path.Join(ReplacedResult.Of(Results, "clean").Single().Folder, "power-curve.csv");
        var bytes = File.ReadAllBytes(curve);
        bytes[^3] ^= 1;
        File.WriteAllBytes(curve, bytes);
        Assert.StartsWith("current again", Said(Case("clean", 1)), StringComparison.Ordinal);   // a plan goes by sizes
        Assert.Equal((1, 0), Run(Case("clean", 1)));
        Assert.Equal("current: ", Said(Case("clean", 1)));
    }

    [Fact]
    public void A_replaced_result_without_all_its_files_is_none()
    {
        Run(Case("clean", 1));
        Run(Case("clean", 2));
        File.Delete(Path.Join(ReplacedResult.Of(Results, "clean").Single().Folder, "power-curve.csv"));
        Assert.Equal("out of date: air.density_kg_m3 2 -> 1", Said(Case("clean", 1)));
    }

    [Fact]
    public void One_of_another_solver_is_not_brought_back()
    {
        Run(Case("clean", 1));
        Run(Case("clean", 2));
        Assert.Equal("out of date: solver version 1 -> 2; air.density_kg_m3 2 -> 1", Said(Case("clean", 1), solverVersion: 2));
    }

    [Fact]
    public void A_renamed_case_takes_its_result_along()
    {
        Run(Case("clean", 1));
        var tables = Tables("clean");
        Assert.Matches(@"^re-usable: the result of 'clean' of \d{4}-\d\d-\d\d \d\d:\d\d UTC has these very values$", Said(Case("tidy", 1)));
        Assert.Equal((0, 1), Run(Case("tidy", 1)));
        Assert.Equal(tables, Tables("tidy"));
        var receipt = Assert.IsType<ReceiptReading.Readable>(ReceiptFile.Read(Results.Case("tidy"))).Receipt;
        Assert.Equal(("tidy", "the tidy one", "clean"), (receipt.Case, receipt.Title, receipt.ReusedFrom));
        Assert.Equal("cases/tidy.toml", receipt.Inputs.Single().File);
        Assert.True(ResultCheck.IsWhole(Results.Case("tidy"), receipt));
    }

    [Fact]
    public void Two_cases_that_exchange_their_values_exchange_their_results()
    {
        Run(Case("a", 1), Case("b", 2));
        var (a, b) = (Tables("a"), Tables("b"));
        Assert.Equal((0, 2), Run(Case("a", 2), Case("b", 1)));
        Assert.Equal(b, Tables("a"));
        Assert.Equal(a, Tables("b"));
        Assert.Equal(["current: ", "current: "], Plan(1, Case("a", 2), Case("b", 1)).Cases.Select(c => $"{c.State.Word}: {c.State.Reason}"));
    }

    [Fact]
    public void A_result_goes_on_to_another_case_though_its_own_is_solved_anew_in_the_same_job()
    {
        Run(Case("a", 1));
        var old = Tables("a");
        Assert.Equal((1, 1), Run(Case("a", 2), Case("b", 1)));
        Assert.Equal(old, Tables("b"));
    }

    [Fact]
    public void Another_title_alone_is_taken_over_without_solving()
    {
        Run(Case("clean", 1));
        var tables = Tables("clean");
        var renamed = Case("clean", 1) with { Title = "Clean, 2026" };
        Assert.Equal("current: title 'the clean one' -> 'Clean, 2026'", Said(renamed));
        Assert.Equal((0, 1), Run(renamed));
        Assert.Equal("current: ", Said(renamed));
        Assert.Equal(tables, Tables("clean"));
        Assert.Equal("Clean, 2026", Assert.IsType<ReceiptReading.Readable>(ReceiptFile.Read(Results.Case("clean"))).Receipt.Title);
        Assert.False(Directory.Exists(Results.ReplacedOf("clean")));
    }

    [Fact]
    public void A_damaged_result_is_replaced_by_a_whole_one_of_the_same_values()
    {
        Run(Case("a", 1));
        Run(Case("a", 1), Case("b", 1));
        File.Delete(Path.Join(Results.Case("a"), "power-curve.csv"));
        Assert.StartsWith("re-usable: the result of 'b'", Said(Case("a", 1)), StringComparison.Ordinal);
        Assert.Equal((0, 1), Run(Case("a", 1)));
        Assert.Equal(Tables("b"), Tables("a"));
    }

    [Fact]
    public void A_disk_that_fails_at_any_step_leaves_one_whole_result_in_place_and_both_to_be_found()
    {
        for (var step = 1; ; step++)
        {
            using var folder = new TemporaryFolder();
            var results = Runs.Results(folder);
            Runs.Solve(results, [Case("clean", 1)]);
            Runs.Solve(results, [Case("clean", 2)]);
            var disk = new FailingDisk(step);
            var replaced = ReplacedResult.Of(results, "clean").Single();
            try
            {
                ReturnedResult.Exchange(replaced, results, disk);
            }
            catch (IOException)
            {
                // refused, as told
            }
            var inPlace = Assert.IsType<ReceiptReading.Readable>(ReceiptFile.Read(results.Case("clean"))).Receipt;
            Assert.True(ResultCheck.IsWhole(results.Case("clean"), inPlace));
            var other = Case("clean", inPlace.Fingerprint == Case("clean", 1).Fingerprint ? 2 : 1);
            Assert.Equal("current again", StudyPlan.Make(FellRotor.Study(other), results, 1).Cases.Single().State.Word);
            if (!disk.HasRefused)
                break;
        }
    }

    private static StudyCase Case(string name, int value)
        => FellRotor.Case(name, FellRotor.Rotor(windSpeeds: 2 + value), $"the {name} one", ("air.density_kg_m3", $"{value}"));

    private StudyPlan Plan(int solverVersion, params StudyCase[] cases) => StudyPlan.Make(FellRotor.Study(cases), Results, solverVersion);

    private string Said(StudyCase studyCase, int solverVersion = 1)
    {
        var state = Plan(solverVersion, studyCase).Cases.Single().State;
        return $"{state.Word}: {state.Reason}";
    }

    private (int Solved, int Reused) Run(params StudyCase[] cases)
    {
        var plan = Plan(1, cases);
        var disk = new Disk();
        using var publisher = Publisher.Open(Results, disk);
        var identity = new RunIdentity(1, "0.0.0");
        var work = new CaseWork(
            (rotor, _) => FellRotor.Curve(rotor), publisher, Results, identity, Logger.None, TimeProvider.System, _ => { },
            new CaseReuse(plan, Results, publisher, disk, identity));
        var due = plan.Cases.Where(c => c.IsDue).Select(c => c.Case).ToList();
        using var claims = new Claims(Results, disk);
        var again = new Again([.. plan.Cases.Where(c => c.State is CaseState.Current or CaseState.Retitled).Select(c => c.Case.Name)], false);
        var result = StudyRun.Solve(
            due, again, work, claims, 2, new RunProgress(due.Count, 1, TimeProvider.System), Logger.None, default);
        Assert.Equal((0, 0), (result.Failed, result.NotRun));
        return (result.Solved, result.Reused);
    }

    private Dictionary<string, string> Tables(string name) => TemporaryFolder.Contents(Results.Case(name))
        .Where(f => f.Key != Receipt.FileName).ToDictionary(StringComparer.Ordinal);
}
