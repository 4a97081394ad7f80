using System.Reflection;

namespace BladeLoads.Batch.Queue;

/// <summary>The one kind of job: the cases of a group, one after the other.</summary>
/// <remarks>Public because the queue calls it by reflection.</remarks>
public sealed class CaseJob(Action<string> work)
{
    internal static MethodInfo Method { get; } = typeof(CaseJob).GetMethod(nameof(Solve))!;

    public void Solve(string[] caseNames)
    {
        foreach (var name in caseNames)
            work(name);
    }
}
