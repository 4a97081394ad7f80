using System.Collections.Concurrent;
using System.Collections.Immutable;
using BladeLoads.Batch.Queue;

namespace BladeLoads.Batch.Tests.Queue;

public class CaseWorkersTests
{
    [Theory]
    [InlineData(1)]
    [InlineData(4)]
    public void Every_case_of_every_job_is_worked_on_once(int workers)
    {
        var seen = new ConcurrentBag<string>();
        var faults = CaseWorkers.Run([["a", "b"], ["c"], ["d", "e", "f"]], workers, names => names.ToList().ForEach(seen.Add));
        Assert.Empty(faults);
        Assert.Equal(["a", "b", "c", "d", "e", "f"], seen.Order());
    }

    [Fact]
    public void As_many_cases_are_under_way_at_a_time_as_there_are_workers()
    {
        using var together = new Barrier(2);
        var met = 0;
        CaseWorkers.Run([["a"], ["b"]], 2, _ => Interlocked.Add(ref met, together.SignalAndWait(TimeSpan.FromSeconds(30)) ? 1 : 0));
        Assert.Equal(2, met);
    }

    [Fact]
    public void A_job_that_throws_is_told_is_not_tried_again_and_holds_nobody_up()
    {
        var calls = new ConcurrentBag<string>();
        var faults = CaseWorkers.Run([["bad"], ["good"]], 2, names =>
        {
            calls.Add(names[0]);
            if (names[0] == "bad")
                throw new InvalidOperationException("odd");
        });
        Assert.Equal("odd", Assert.Single(faults).Message);
        Assert.Equal(["bad", "good"], calls.Order());
    }

    [Fact]
    public void Without_jobs_there_is_nothing_to_wait_for()
        => Assert.Empty(CaseWorkers.Run(ImmutableArray<ImmutableArray<string>>.Empty, 2, _ => { }));
}
