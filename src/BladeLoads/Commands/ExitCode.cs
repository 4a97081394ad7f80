namespace BladeLoads.Commands;

/// <summary>What the program says to whoever started it. The numbers are a promise (docs/formats.md).</summary>
internal static class ExitCode
{
    /// <summary>All solved or current.</summary>
    public const int Good = 0;

    /// <summary>A case failed, was not run, or has points without a balance.</summary>
    public const int SomeNotGood = 1;

    /// <summary>Nothing could run: wrong use, or input.</summary>
    public const int NothingCouldRun = 2;

    /// <summary>No room or no permission to write.</summary>
    public const int NoRoom = 3;

    /// <summary>A fault of ours.</summary>
    public const int Fault = 70;

    public const int Interrupted = 130;

    public const int Terminated = 143;
}
