using Serilog;

namespace BladeLoads.Batch.Logs;

/// <summary>What the log of a run tells beside its cases.</summary>
public static class RunEvents
{
    /// <summary>A fault of ours, outside any case: one line for the screen, the details for whoever repairs it.</summary>
    public static void Fault(this ILogger log, Exception fault)
        => log.Error(fault, "fault in BladeLoads, please report: {Message}", fault.Message);
}
