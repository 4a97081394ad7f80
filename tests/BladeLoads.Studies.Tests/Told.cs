namespace BladeLoads.Studies.Tests;

/// <summary>Findings, compared character by character as a user reads them.</summary>
internal static class Told
{
    public static void Exactly(IEnumerable<string> expected, IEnumerable<InputFinding> findings)
        => Assert.Equal(string.Join('\n', expected), string.Join('\n', findings.Select(FindingText.Format)));
}
