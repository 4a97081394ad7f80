using System.Reflection;

namespace BladeLoads.Batch.Queue;

/// <summary>The one kind of job: the cases of a group.</summary>
/// <remarks>Public because the queue calls it by reflection.</remarks>
public sealed class CaseJob(Action<IReadOnlyList<string>> work)
{
    internal static MethodInfo Method { get; } = typeof(CaseJob).GetMethod(nameof(Solve))!;

    public void Solve(string[] caseNames) => work(caseNames);
}
