using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Keeping;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;

namespace BladeLoads.Batch.Tests.Keeping;

public sealed class VerificationTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();
    private readonly ResultsFolder _results;

    public VerificationTests()
    {
        _results = Runs.Results(_folder);
        for (var i = 0; i < 2; i++)
            Runs.Solve(_results, [FellRotor.Case("a"), FellRotor.Case("b")]);
        KeptSet.Keep(_results, new KeepRequest("signed", [("a", "current")], [], null, false, false, DateTimeOffset.UnixEpoch, "0.0.0"), new Disk());
    }

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Current_kept_and_replaced_results_are_as_written()
    {
        var found = Verification.OfStudy(_results);
        Assert.Equal(["a", "b", "kept/signed/a", "replaced/a", "replaced/b"], found.Select(v => v.Name.Split("/2")[0]));
        Assert.All(found, v => Assert.Empty(v.Flaws));
    }

    [Fact]
    public void A_bit_that_flipped_is_found_in_any_file()
    {
        foreach (var file in Directory.EnumerateFiles(_results.Case("a")))
        {
            var bytes = File.ReadAllBytes(file);
            foreach (var place in new[] { 0, bytes.Length / 2 })
            {
                var flipped = bytes.ToArray();
                flipped[place] ^= 1;
                File.WriteAllBytes(file, flipped);
                // A flip in a figure of the receipt itself leaves valid JSON behind: its own bytes have no hash beside them.
                if (Path.GetFileName(file) != Receipt.FileName || place == 0)
                    Assert.NotEmpty(Flaws("a"));
            }
            File.WriteAllBytes(file, bytes);
        }
        Assert.Empty(Flaws("a"));
    }

    [Fact]
    public void A_missing_a_shorter_and_an_extra_file_are_told()
    {
        File.WriteAllText(Path.Join(_results.Case("a"), "notes.txt"), "mine");
        Assert.Equal(["notes.txt is no file of the result"], Flaws("a"));
        Assert.False(Verification.OfStudy(_results)[0].IsDamaged);
        File.Delete(Path.Join(_results.Case("a"), "case.log"));
        File.WriteAllText(Path.Join(_results.Case("a"), "spanwise.csv"), "");
        Assert.Matches(@"^spanwise.csv has 0 bytes, was written with \d+;case.log is not there;notes.txt is no file of the result$", string.Join(';', Flaws("a")));
        File.Delete(Path.Join(_results.Case("a"), Receipt.FileName));
        Assert.Equal(["the receipt is not there"], Flaws("a"));
    }

    [Fact]
    public void A_receipt_that_points_out_of_its_folder_is_not_followed()
    {
        var path = Path.Join(_results.Case("a"), Receipt.FileName);
        File.WriteAllText(path, File.ReadAllText(path).Replace("\"case.log\"", "\"../b/case.log\"", StringComparison.Ordinal));
        Assert.Contains("../b/case.log is not there", Flaws("a"));
    }

    [Fact]
    public void A_kept_set_that_lacks_a_result_or_holds_another_is_told()
    {
        var kept = _results.KeptAs("signed");
        Directory.Delete(Path.Join(kept, "a"), recursive: true);
        Assert.Equal(["there is no result"], Verification.OfKept(kept).Single().Flaws.Select(f => f.Sentence));
        Runs.Solve(_results, [FellRotor.Case("a", values: ("rotor.blade_count", "2"))]);
        Directory.CreateDirectory(Path.Join(kept, "a"));
        foreach (var file in Directory.EnumerateFiles(_results.Case("a")))
            File.Copy(file, Path.Join(kept, "a", Path.GetFileName(file)));
        Assert.Equal(["it is another result than the one that was kept"], Verification.OfKept(kept).Single().Flaws.Select(f => f.Sentence));
        File.WriteAllText(Path.Join(kept, KeptRecord.FileName), "{");
        Assert.Equal(["kept.json is not there or is damaged"], Verification.OfKept(kept).Single().Flaws.Select(f => f.Sentence));
    }

    [Fact]
    public void A_damaged_result_that_is_set_aside_is_solved_again_and_never_taken_for_a_result()
    {
        File.WriteAllText(Path.Join(_results.Case("a"), "case.log"), "x");
        DamagedResults.SetAside(_results, ["a"], new Disk());
        Assert.False(Directory.Exists(_results.Case("a")));
        var replaced = ReplacedResult.Of(_results, "a");
        Assert.Equal(2, replaced.Length);
        var damaged = replaced.Single(r => !r.IsResult);
        Assert.Equal("x", File.ReadAllText(Path.Join(damaged.Folder, "case.log")));
        Assert.All(Verification.OfStudy(_results), v => Assert.Empty(v.Flaws));
        var plan = StudyPlan.Make(FellRotor.Study(FellRotor.Case("a"), FellRotor.Case("b")), _results, 1);
        Assert.Equal([true, false], plan.Cases.Select(c => c.IsDue));
    }

    [Fact]
    public void A_kept_table_that_is_not_its_own_hash_is_told()
    {
        Directory.CreateDirectory(_results.Tables);
        File.WriteAllText(Path.Join(_results.Tables, FellRotor.Hash("0,1\n") + ".csv"), "0,1\n");
        Assert.All(Verification.OfStudy(_results), v => Assert.Empty(v.Flaws));
        File.WriteAllText(Path.Join(_results.Tables, FellRotor.Hash("0,1\n") + ".csv"), "0,2\n");
        Assert.EndsWith(".csv has other bytes than were written", Assert.Single(Verification.OfStudy(_results), v => v.IsDamaged).Flaws[0].Sentence, StringComparison.Ordinal);
    }

    private List<string> Flaws(string name) => [.. ResultCheck.Of(_results.Case(name)).Select(f => f.Sentence)];
}
