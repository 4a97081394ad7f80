using System.Collections.Concurrent;
using System.Collections.Immutable;
using Hangfire;
using Hangfire.Common;
using Hangfire.InMemory;
using Hangfire.States;
using Hangfire.Storage;

namespace BladeLoads.Batch.Queue;

/// <summary>
/// Carries jobs to workers within this process. It lives in memory: the files are the truth, so nothing is lost with it, and the next
/// run builds it anew from the plan. Nothing global is configured, so several may run side by side.
/// </summary>
public static class CaseWorkers
{
    /// <summary>Returns when every job has ended, well or not.</summary>
    /// <param name="jobs">Each a group of case names: jobs carry identities only.</param>
    /// <param name="work">Solves the cases of a job; called by several workers at once, for different jobs.</param>
    /// <returns>What jobs ended with beside success: faults of ours, since <paramref name="work"/> is to keep its troubles to itself.</returns>
    public static ImmutableArray<Exception> Run(
        ImmutableArray<ImmutableArray<string>> jobs, int workers, Action<IReadOnlyList<string>> work)
    {
        if (jobs.IsEmpty)
            return [];
        // The default filters would try a failed job ten times; a case that fails does so for a reason that stays.
        using var ended = new EndedJobs(jobs.Length);
        var filters = new JobFilterProviderCollection(new OneFilter(ended));
        using var storage = new InMemoryStorage(new InMemoryStorageOptions { MaxStateHistoryLength = 4 });
        var client = new BackgroundJobClient(storage, filters);
        using (new BackgroundJobServer(
            new BackgroundJobServerOptions
            {
                WorkerCount = workers,
                FilterProvider = filters,
                Activator = new TheJob(new CaseJob(work)),
                ServerName = "bladeloads",
                // The defaults serve servers that run for weeks: they would hold up the end of a run for seconds.
                StopTimeout = TimeSpan.Zero,
                ShutdownTimeout = TimeSpan.FromSeconds(5),
                SchedulePollingInterval = TimeSpan.FromSeconds(1),
                CancellationCheckInterval = TimeSpan.FromSeconds(1),
                IsLightweightServer = true,
            },
            storage))
        {
            foreach (var names in jobs)
                client.Create(new Job(typeof(CaseJob), CaseJob.Method, names.ToArray().AsArgument()), new EnqueuedState());
            ended.WaitForAll();
        }
        return ended.Faults;
    }

    private static object[] AsArgument(this string[] names) => [names];

    private sealed class TheJob(CaseJob job) : JobActivator
    {
        public override object ActivateJob(Type jobType) => job;

        public override JobActivatorScope BeginScope(JobActivatorContext context) => new Scope(job);

        private sealed class Scope(CaseJob job) : JobActivatorScope
        {
            public override object Resolve(Type type) => job;
        }
    }

    private sealed class OneFilter(IApplyStateFilter filter) : IJobFilterProvider
    {
        private readonly JobFilter[] _filters = [new JobFilter(filter, JobFilterScope.Global, null)];

        public IEnumerable<JobFilter> GetFilters(Job job) => _filters;
    }

    private sealed class EndedJobs(int jobs) : IApplyStateFilter, IDisposable
    {
        private readonly CountdownEvent _running = new(jobs);
        private readonly ConcurrentDictionary<string, Exception?> _ended = new(StringComparer.Ordinal);

        public ImmutableArray<Exception> Faults => [.. _ended.Values.OfType<Exception>()];

        public void WaitForAll() => _running.Wait();

        public void OnStateApplied(ApplyStateContext context, IWriteOnlyTransaction transaction)
        {
            // A failed state is not final by itself, but nothing here takes a job out of it again.
            if (!context.NewState.IsFinal && context.NewState is not FailedState)
                return;
            if (_ended.TryAdd(context.BackgroundJob.Id, (context.NewState as FailedState)?.Exception))
                _running.Signal();
        }

        public void OnStateUnapplied(ApplyStateContext context, IWriteOnlyTransaction transaction)
        {
        }

        public void Dispose() => _running.Dispose();
    }
}
