using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Tests.Plan;

public sealed class StaleReasonTests : IDisposable
{
    private static readonly string OneTable = FellRotor.Hash("one");
    private static readonly string OtherTable = FellRotor.Hash("other");

    private readonly TemporaryFolder _folder = new();
    private ResultsFolder Results => Runs.Results(_folder);

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_case_that_was_never_solved_is_missing() => Assert.Equal("missing: no result yet", Said(Case()));

    [Fact]
    public void A_case_just_solved_is_current()
    {
        Solve(Case());
        Assert.Equal("current: ", Said(Case()));
    }

    [Fact]
    public void Another_value_is_told_with_what_it_was()
    {
        Solve(Case(("air.density_kg_m3", "1.225")));
        Assert.Equal("out of date: air.density_kg_m3 1.225 -> 1.05", Said(Case(("air.density_kg_m3", "1.05"))));
    }

    [Fact]
    public void A_value_put_back_makes_the_result_current_again()
    {
        Solve(Case(("air.density_kg_m3", "1.225")));
        Assert.Equal("out of date", State(Case(("air.density_kg_m3", "1.05"))).Word);
        Assert.Equal("current", State(Case(("air.density_kg_m3", "1.225"))).Word);
    }

    [Fact]
    public void A_new_value_is_told_and_one_that_is_gone()
    {
        Solve(Case(("control.rated_power_kW", "2000")));
        Assert.Equal(
            "out of date: control.rated_power_kW is gone, was 2000; rotor.cone_deg is new: 2.5", Said(Case(("rotor.cone_deg", "2.5"))));
    }

    [Fact]
    public void What_is_done_to_tables_is_a_value_and_no_table()
    {
        Solve(Case(("sections.augment", "snel-1993")));
        Assert.Equal(
            "out of date: sections.aspect_ratio is new: 12; sections.augment snel-1993 -> du-selig-1998; sections.extend is new: viterna-1982",
            Said(Case(("sections.augment", "du-selig-1998"), ("sections.extend", "viterna-1982"), ("sections.aspect_ratio", "12"))));
    }

    [Fact]
    public void A_table_that_holds_other_numbers_is_named()
    {
        Solve(Case(("blade", OneTable), ("section.tarn-30", OneTable)));
        Assert.Equal("out of date: polar tarn-30.csv: table changed", Said(Case(("blade", OneTable), ("section.tarn-30", OtherTable))));
    }

    [Fact]
    public void A_table_that_is_new_or_gone_is_named()
    {
        Solve(Case(("section.tarn-30", OneTable)));
        Assert.Equal("out of date: polar tarn-24.csv: table is new; polar tarn-30.csv: table is gone", Said(Case(("section.tarn-24", OneTable))));
    }

    [Fact]
    public void Another_solver_is_told_once()
    {
        Solve(Case(("solver", "1")));
        Assert.Equal("out of date: solver version 1 -> 2", Said(Case(("solver", "2")), solverVersion: 2));
    }

    [Fact]
    public void Every_reason_is_told()
    {
        Solve(Case(("a", "1"), ("b", "1"), ("c", "1"), ("d", "1"), ("e", "1")));
        Assert.Equal(
            "out of date: a 1 -> 2; b 1 -> 2; c 1 -> 2; d 1 -> 2; e 1 -> 2", Said(Case(("a", "2"), ("b", "2"), ("c", "2"), ("d", "2"), ("e", "2"))));
    }

    [Fact]
    public void The_same_values_under_another_fingerprint_are_told()
    {
        Solve(Case(("a", "1")));
        Assert.Equal("out of date: the fingerprint is told in another form", Said(Case(("a", "1")) with { Fingerprint = "f" }));
    }

    [Theory]
    [InlineData("")]
    [InlineData("{")]
    [InlineData("null")]
    [InlineData("[]")]
    [InlineData("{\"format\": 1}")]
    public void A_damaged_receipt_means_solving_again(string text)
    {
        Solve(Case());
        File.WriteAllText(Path.Join(Results.Case("clean"), Receipt.FileName), text);
        Assert.Equal("damaged: the receipt is damaged", Said(Case()));
    }

    [Fact]
    public void A_receipt_cut_at_any_byte_means_solving_again()
    {
        Solve(Case());
        var path = Path.Join(Results.Case("clean"), Receipt.FileName);
        var whole = File.ReadAllBytes(path);
        for (var length = 0; length < whole.Length - 2; length++)   // the last two are the brace and the line end
        {
            File.WriteAllBytes(path, whole[..length]);
            Assert.Equal("damaged: the receipt is damaged", Said(Case()));
        }
    }

    [Fact]
    public void A_result_without_a_receipt_means_solving_again()
    {
        Solve(Case());
        File.Delete(Path.Join(Results.Case("clean"), Receipt.FileName));
        Assert.Equal("damaged: the receipt is not there", Said(Case()));
    }

    [Fact]
    public void A_file_that_is_gone_or_cut_is_told()
    {
        Solve(Case());
        var curve = new FileInfo(Path.Join(Results.Case("clean"), "power-curve.csv"));
        var size = curve.Length;
        using (var file = curve.OpenWrite())
            file.SetLength(10);
        File.Delete(Path.Join(Results.Case("clean"), "spanwise.csv"));
        Assert.Equal($"damaged: power-curve.csv has 10 bytes, was written with {size}; spanwise.csv is not there", Said(Case()));
    }

    [Fact]
    public void A_case_that_failed_is_told_with_its_reason_and_its_time()
    {
        Runs.Solve(Results, [Case()], (_, _) => throw new InvalidOperationException("loss factor 1.0003"));
        Assert.Matches(
            @"^failed: \d{4}-\d\d-\d\d \d\d:\d\d UTC: fault in BladeLoads, please report: loss factor 1\.0003$", Said(Case()));
    }

    [Fact]
    public void A_failure_speaks_no_more_once_the_values_are_others()
    {
        Runs.Solve(Results, [Case()], (_, _) => throw new InvalidOperationException("odd"));
        Assert.Equal("missing: no result yet", Said(Case(("a", "2"))));
    }

    [Fact]
    public void A_case_that_succeeds_leaves_no_failure_behind()
    {
        Runs.Solve(Results, [Case()], (_, _) => throw new InvalidOperationException("odd"));
        Assert.True(File.Exists(Results.Failure("clean")));
        Solve(Case());
        Assert.False(File.Exists(Results.Failure("clean")));
    }

    private void Solve(StudyCase studyCase)
        => Assert.Equal(1, Runs.Solve(Results, [studyCase], (rotor, _) => FellRotor.Curve(rotor, PointMarks.None)).Solved);

    private CaseState State(StudyCase studyCase, int solverVersion = 1)
        => Assert.Single(StudyPlan.Make(FellRotor.Study(studyCase), Results, solverVersion).Cases).State;

    private string Said(StudyCase studyCase, int solverVersion = 1)
    {
        var state = State(studyCase, solverVersion);
        return $"{state.Word}: {state.Reason}";
    }

    private static StudyCase Case(params (string, string)[] values) => FellRotor.Case("clean", values: values);
}
