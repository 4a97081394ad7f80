using System.Collections.Immutable;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>What is doubtful in a polar table.</summary>
/// <param name="Kind">A few words: <c>sharp stall</c>.</param>
/// <param name="Column">The column of the table that it is about; empty for all of them.</param>
/// <param name="Finding">Its place, what was found and what would do.</param>
/// <param name="Polar">Which of the table's Reynolds numbers, from 0; -1 for all.</param>
/// <param name="FromDeg">The angles, degrees, at which it matters; NaN where it matters at all of them.</param>
/// <param name="ToDeg">The upper end of them.</param>
/// <param name="Rows">The rows of that Reynolds number it is about, from 0: to be marked in a picture.</param>
public sealed record PolarDoubt(
    string Kind, string Column, InputFinding Finding, int Polar, double FromDeg, double ToDeg, ImmutableArray<int> Rows)
{
    /// <summary>What was found, without what would do: for where room is short.</summary>
    public required string Found { get; init; }
}
