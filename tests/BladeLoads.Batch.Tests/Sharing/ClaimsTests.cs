using System.Text;
using BladeLoads.Batch.Sharing;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Publishing;

namespace BladeLoads.Batch.Tests.Sharing;

public sealed class ClaimsTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    private ResultsFolder Results => Runs.Results(_folder);

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_case_is_claimed_by_one_alone_and_is_free_again_when_its_holder_is_gone()
    {
        using var one = Claims();
        using var other = Claims();
        var claim = one.TryTake(FellRotor.Case("clean"));
        Assert.NotNull(claim);
        Assert.Null(other.TryTake(FellRotor.Case("clean")));
        Assert.NotNull(other.TryTake(FellRotor.Case("soiled")));
        claim.GiveBack();
        Assert.NotNull(other.TryTake(FellRotor.Case("clean")));
    }

    [Fact]
    public void An_attempt_counts_when_it_begins_and_is_taken_off_when_it_ends_in_an_orderly_way()
    {
        Lose("clean");
        Lose("clean");
        Assert.Equal(2, Attempts("clean"));
        using (var claims = Claims())
        {
            var claim = claims.TryTake(FellRotor.Case("clean"))!;
            claim.Begin();
            Assert.Equal(Environment.ProcessId, claims.HolderOf("clean"));
            claim.GiveBack();
        }
        Assert.Equal(2, Attempts("clean"));
        using (var claims = Claims())
            claims.TryTake(FellRotor.Case("clean"))!.Done();
        Assert.Equal(0, Attempts("clean"));
    }

    [Fact]
    public void A_case_with_other_values_begins_at_none_lost()
    {
        Lose("clean");
        using var claims = Claims();
        Assert.Equal(0, claims.TryTake(FellRotor.Case("clean", values: ("pitch", "2")))!.LostAttempts);
    }

    [Fact]
    public void What_is_still_held_at_the_end_is_given_back_and_nothing_stays_behind()
    {
        using (var claims = Claims())
            claims.TryTake(FellRotor.Case("clean"))!.Begin();
        Assert.False(Directory.Exists(Results.Claims));
    }

    [Fact]
    public void A_run_killed_between_a_result_and_its_last_word_is_tidied_up_after()
    {
        var clean = FellRotor.Case("clean");
        Runs.Solve(Results, [clean]);
        Lose("clean");
        Lose("soiled");
        BladeLoads.Batch.Sharing.Claims.TidyIfPossible(Results, new Disk());
        Assert.Equal(["soiled"], Directory.EnumerateFiles(Results.Claims).Select(f => Path.GetFileName(f)));
    }

    [Fact]
    public void A_claim_cut_at_any_byte_counts_nothing_or_what_it_counted()
    {
        Lose("clean");
        var whole = File.ReadAllBytes(Results.Claim("clean"));
        Assert.Equal($"{FellRotor.Case("clean").Fingerprint} attempts 1 process {Environment.ProcessId}\n", Encoding.UTF8.GetString(whole));
        for (var bytes = 0; bytes <= whole.Length; bytes++)
        {
            Directory.CreateDirectory(Results.Claims);
            File.WriteAllBytes(Results.Claim("clean"), whole[..bytes]);
            Assert.Equal(bytes == whole.Length ? 1 : 0, Attempts("clean"));
        }
    }

    [Fact]
    public void A_claim_that_is_deleted_by_its_holder_just_when_another_asks_is_never_had_twice()
    {
        // Whoever waited for the lock of a file that is deleted meanwhile holds the lock of nothing, and must notice.
        var holders = 0;
        var most = 0;
        Parallel.For(0, 4, _ =>
        {
            using var claims = Claims();
            for (var i = 0; i < 500; i++)
            {
                if (claims.TryTake(FellRotor.Case("clean")) is not { } claim)
                    continue;
                var now = Interlocked.Increment(ref holders);
                if (now > 1)
                    Interlocked.Exchange(ref most, now);
                Thread.SpinWait(200);
                Interlocked.Decrement(ref holders);
                claim.Done();
            }
        });
        Assert.Equal(0, most);
    }

    private Claims Claims() => new(Results, new Disk());

    // As a process that is killed leaves a claim: begun, and its lock freed by the kernel.
    private void Lose(string name)
    {
        var effectsOfBeginning = 3;   // the folder, the lock, the attempt
        var claims = new Claims(Results, new MisfortuneDisk(effectsOfBeginning + 1, Misfortune.Killed));
        var claim = claims.TryTake(FellRotor.Case(name))!;
        claim.Begin();
        Assert.Throws<KilledException>(claim.Done);
    }

    private int Attempts(string name)
    {
        using var claims = Claims();
        var claim = claims.TryTake(FellRotor.Case(name))!;
        claim.GiveBack();
        return claim.LostAttempts;
    }
}
