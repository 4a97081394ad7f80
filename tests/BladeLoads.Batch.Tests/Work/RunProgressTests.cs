using BladeLoads.Batch.Work;

namespace BladeLoads.Batch.Tests.Work;

public class RunProgressTests
{
    [Fact]
    public void Time_left_follows_from_the_share_of_work_done()
    {
        var time = new HandSetTime();
        var progress = new RunProgress(12, milliseconds: 1000, time);
        time.Advance(TimeSpan.FromSeconds(30));
        progress.CaseEnded(estimate: 250, rotorSolves: 600);
        Assert.Equal("1 of 12 cases, 1:30 left, 20 solves/s", progress.Read().Sentence);
    }

    [Fact]
    public void Before_the_first_case_is_done_nobody_knows_how_long_it_takes()
        => Assert.Equal("0 of 3 cases, 0 solves/s", new RunProgress(3, 100, new HandSetTime()).Read().Sentence);

    [Fact]
    public void At_the_end_no_time_is_left()
    {
        var time = new HandSetTime();
        var progress = new RunProgress(1, 100, time);
        time.Advance(TimeSpan.FromSeconds(2));
        progress.CaseEnded(100, 50);
        Assert.Equal("1 of 1 cases, 25 solves/s", progress.Read().Sentence);
    }

    private sealed class HandSetTime : TimeProvider
    {
        private long _ticks;

        public override long TimestampFrequency => TimeSpan.TicksPerSecond;

        public override long GetTimestamp() => _ticks;

        public void Advance(TimeSpan by) => _ticks += by.Ticks;
    }
}
