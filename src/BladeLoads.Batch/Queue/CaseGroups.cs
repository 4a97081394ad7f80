using System.Collections.Immutable;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Batch.Queue;

/// <summary>How cases are put together into jobs, so that the queue's own work stays small beside theirs.</summary>
public static class CaseGroups
{
    /// <summary>What a job should take at least, ms: at a few ms a job, workers spend a third of their time on the queue.</summary>
    public const double JobMilliseconds = 50;

    // As many jobs a worker, at least, where there are cases enough: so that no worker is idle for long at the end.
    private const int JobsPerWorker = 4;

    private const double ElementMicroseconds = 1.5;   // measured on one core, order of size
    private const double SearchedSolvesPerPoint = 15; // pitch at rated power is found by root finding
    private const double PublishMilliseconds = 5;     // five flushes to disk, order of size

    /// <summary>About how long a case takes, ms; only ratios matter.</summary>
    public static double Estimate(RotorCase rotorCase)
    {
        var solves = rotorCase.WindSpeeds.Length
            * (rotorCase.Control is Control.VariableSpeed { RatedPower: not null } ? SearchedSolvesPerPoint : 1);
        return PublishMilliseconds + solves * rotorCase.Model.Elements * ElementMicroseconds / 1000;
    }

    /// <summary>
    /// Jobs of about <see cref="JobMilliseconds"/> or more; shorter ones where there is too little to keep every worker busy with those.
    /// The longest come first, so that none is left to run alone at the end. The same cases give the same jobs.
    /// </summary>
    /// <param name="cases">Name and estimate in ms, above 0.</param>
    public static ImmutableArray<ImmutableArray<string>> Of(IEnumerable<(string Name, double Milliseconds)> cases, int workers)
    {
        var longestFirst = cases.OrderByDescending(c => c.Milliseconds).ThenBy(c => c.Name, StringComparer.Ordinal).ToList();
        var enough = Math.Min(JobMilliseconds, longestFirst.Sum(c => c.Milliseconds) / (JobsPerWorker * workers));
        var jobs = ImmutableArray.CreateBuilder<ImmutableArray<string>>();
        var job = ImmutableArray.CreateBuilder<string>();
        var milliseconds = 0.0;
        foreach (var (name, estimate) in longestFirst)
        {
            job.Add(name);
            milliseconds += estimate;
            if (milliseconds < enough)
                continue;
            jobs.Add(job.ToImmutable());
            job.Clear();
            milliseconds = 0;
        }
        if (job.Count > 0)
            jobs.Add(job.ToImmutable());
        return jobs.ToImmutable();
    }
}
