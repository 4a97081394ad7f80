using System.Globalization;

namespace BladeLoads.Batch.Work;

/// <summary>How far a run has come. Written by its workers, read by whoever shows it; every reading is consistent enough to show.</summary>
/// <param name="cases">To be solved in all.</param>
/// <param name="milliseconds">About how long they take on one core, in all.</param>
public sealed class RunProgress(int cases, double milliseconds, TimeProvider time)
{
    private readonly Lock _lock = new();
    private readonly long _started = time.GetTimestamp();
    private int _done;
    private long _rotorSolves;
    private double _millisecondsDone;

    public int Cases => cases;

    public void CaseEnded(double estimate, int rotorSolves)
    {
        lock (_lock)
        {
            _done++;
            _rotorSolves += rotorSolves;
            _millisecondsDone += estimate;
        }
    }

    public ProgressReading Read()
    {
        lock (_lock)
        {
            var elapsed = time.GetElapsedTime(_started);
            TimeSpan? left = _millisecondsDone > 0
                ? elapsed * Math.Max(0, (milliseconds - _millisecondsDone) / _millisecondsDone) : null;
            return new ProgressReading(
                _done, cases, elapsed, left, elapsed.TotalSeconds > 0 ? _rotorSolves / elapsed.TotalSeconds : 0);
        }
    }
}

/// <summary>A look at a run under way.</summary>
/// <param name="Left">About how long it still takes; null before the first case is done.</param>
/// <param name="SolvesPerSecond">Rotor solves of finished cases.</param>
public sealed record ProgressReading(int Done, int Cases, TimeSpan Elapsed, TimeSpan? Left, double SolvesPerSecond)
{
    /// <summary><c>7 of 12 cases, 0:03 left, 21000 solves/s</c>.</summary>
    public string Sentence => string.Create(CultureInfo.InvariantCulture, $"{Done} of {Cases} cases, {LeftText}{SolvesPerSecond:0} solves/s");

    private string LeftText => Left is not { } left || Done == Cases
        ? ""
        : string.Create(CultureInfo.InvariantCulture, $"{(long)left.TotalMinutes}:{left.Seconds:00} left, ");
}
