using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Cases;

/// <summary>A case is named by its file; the name is that of its results' folder too.</summary>
internal static class CaseName
{
    public const string Ending = ".toml";

    private static readonly string[] Reserved =
        ["logs", "failures", "tables", "replaced", "kept", "polars", "pictures", "summary.csv", "changes.csv", "report.html"];

    public static string Of(string fullPath) => Path.GetFileName(fullPath)[..^Ending.Length];

    /// <summary>What is wrong with the name and what would do, or null.</summary>
    public static string? Problem(string name)
    {
        if (SafeName.Problem(name) is { } problem)
            return $"the case name {VisibleText.Quote(name)} {problem}; rename the file, its results get a folder of this name";
        return Reserved.Contains(name, StringComparer.OrdinalIgnoreCase)
            ? $"the case name '{name}' is kept for another part of the results; rename the file"
            : null;
    }
}
