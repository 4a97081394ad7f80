using System.Collections.Immutable;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Queue;

/// <summary>How cases are put together into jobs, so that the queue's own work stays small beside theirs.</summary>
public static class CaseGroups
{
    /// <summary>What a job should take at least, ms: at a few ms a job, workers spend a third of their time on the queue.</summary>
    public const double JobMilliseconds = 50;

    // As many jobs a worker, at least, where there are cases enough: so that no worker is idle for long at the end.
    private const int JobsPerWorker = 4;

    private const double ElementMicroseconds = 1.5;   // measured on one core, order of size
    // Orders of size, counted on the demo study: rotor solves that a search takes.
    private const double SolvesPerPoint = 3;          // the point and one to either side of its pitch
    private const double RatedSolvesPerPoint = 30;    // the walk down from feather
    private const double ThrustSolvesPerPoint = 300;
    private const double FollowedSolvesPerPoint = 250;
    private const double BestSolves = 4000;
    private const double PublishMilliseconds = 5;     // five flushes to disk, order of size

    /// <summary>About how long a case takes, ms; only ratios matter.</summary>
    public static double Estimate(StudyCase studyCase)
    {
        var (rotor, further) = (studyCase.Rotor, studyCase.Further);
        var solves = Solves(rotor) * (further.ReferenceDensity is null ? 1 : 2);
        if (further.Surface is { } surface)
            solves += surface.TipSpeedRatios.Length * surface.Pitches.Length;
        return PublishMilliseconds + solves * rotor.Model.Elements * ElementMicroseconds / 1000;
    }

    private static double Solves(RotorCase rotor)
    {
        if (rotor.Control is not Control.VariableSpeed control)
            return rotor.WindSpeeds.Length * SolvesPerPoint;
        var perPoint = (control.RatedPower is null ? 0 : RatedSolvesPerPoint)
            + (control.ThrustLimit is null ? 0 : ThrustSolvesPerPoint)
            + (control.SpeedLimitedPitch == SpeedLimitedPitch.Best ? FollowedSolvesPerPoint : 0);
        var searched = control.TipSpeedRatio is null || control.FinePitch is null;
        return rotor.WindSpeeds.Length * (SolvesPerPoint + perPoint)
            + (searched ? BestSolves : 0);
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
