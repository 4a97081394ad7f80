using System.Collections.Immutable;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>What is doubtful in a polar table.</summary>
/// <param name="Kind">A few words: <c>sharp stall</c>.</param>
/// <param name="Finding">Its place, what was found and what would do.</param>
/// <param name="Polar">Which of the table's Reynolds numbers, from 0; -1 for all.</param>
/// <param name="FromDeg">The angles, degrees, at which it matters; NaN where it matters at all of them.</param>
/// <param name="ToDeg">The upper end of them.</param>
/// <param name="Rows">The rows of that Reynolds number it is about, from 0: to be marked in a picture.</param>
public sealed record PolarDoubt(string Kind, InputFinding Finding, int Polar, double FromDeg, double ToDeg, ImmutableArray<int> Rows);
