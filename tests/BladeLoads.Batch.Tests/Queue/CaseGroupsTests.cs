using BladeLoads.Batch.Queue;

namespace BladeLoads.Batch.Tests.Queue;

public class CaseGroupsTests
{
    [Fact]
    public void Small_cases_share_a_job_of_fifty_milliseconds_or_more()
    {
        var jobs = CaseGroups.Of(Cases(1000, 5), workers: 2);
        Assert.All(jobs[..^1], job => Assert.Equal(10, job.Length));
        Assert.Equal(1000, jobs.Sum(j => j.Length));
    }

    [Fact]
    public void A_long_case_is_alone_and_comes_first()
    {
        var jobs = CaseGroups.Of([.. Cases(100, 5), ("long", 400.0)], workers: 2);
        Assert.Equal("long", Assert.Single(jobs[0]));
    }

    [Fact]
    public void Few_small_cases_are_shared_out_among_the_workers()
        => Assert.Equal(8, CaseGroups.Of(Cases(8, 5), workers: 2).Length);

    [Fact]
    public void Every_case_is_in_one_job_and_the_same_cases_give_the_same_jobs()
    {
        var cases = Enumerable.Range(0, 500).Select(i => ($"case {i}", 1.0 + i * 7919 % 97)).ToList();
        var jobs = CaseGroups.Of(cases, workers: 3);
        Assert.Equal(cases.Select(c => c.Item1).Order(), jobs.SelectMany(j => j).Order());
        Assert.Equal(jobs.Select(j => string.Join(' ', j)), CaseGroups.Of(cases.AsEnumerable().Reverse(), 3).Select(j => string.Join(' ', j)));
    }

    [Fact]
    public void No_cases_are_no_jobs() => Assert.Empty(CaseGroups.Of([], workers: 2));

    private static IEnumerable<(string, double)> Cases(int count, double milliseconds)
        => Enumerable.Range(0, count).Select(i => ($"case {i}", milliseconds));
}
