using BladeLoads.Results.Receipts;

namespace BladeLoads.EndToEnd.Program;

/// <summary>What lies in a study's results folder, held against its receipts.</summary>
internal static class Found
{
    private static readonly string[] NoCases = ["logs", "failures", "tables", "replaced", "kept", "polars"];

    public static IEnumerable<string> CaseFolders(string results) => Directory.EnumerateDirectories(results)
        .Where(f => Path.GetFileName(f) is not ['.', ..] && !NoCases.Contains(Path.GetFileName(f)));

    /// <summary>What anyone who looks would take for a result must be one.</summary>
    public static void AssertAllWhole(string results)
    {
        IEnumerable<string> replaced = Directory.Exists(Path.Join(results, "replaced"))
            ? Directory.EnumerateDirectories(Path.Join(results, "replaced")).SelectMany(Directory.EnumerateDirectories) : [];
        Assert.All(CaseFolders(results).Concat(replaced), f => Assert.Empty(ResultCheck.Of(f).Select(flaw => $"{f}: {flaw.Sentence}")));
    }

    /// <summary>The fingerprint of every whole result, wherever in the folder it lies.</summary>
    public static HashSet<string> FingerprintsAnywhere(string results) => Directory
        .EnumerateDirectories(results, "*", new EnumerationOptions { RecurseSubdirectories = true, AttributesToSkip = FileAttributes.None })
        .Select(f => (Folder: f, Receipt: (ReceiptFile.Read(f) as ReceiptReading.Readable)?.Receipt))
        .Where(f => f.Receipt is not null && ResultCheck.IsWhole(f.Folder, f.Receipt))
        .Select(f => f.Receipt!.Fingerprint)
        .ToHashSet(StringComparer.Ordinal);

    /// <summary>The fingerprint of each case's result that is in its place, by the case's name.</summary>
    public static Dictionary<string, string> Fingerprints(string results) => CaseFolders(results)
        .Select(f => (Name: Path.GetFileName(f), Receipt: (ReceiptFile.Read(f) as ReceiptReading.Readable)?.Receipt))
        .Where(f => f.Receipt is not null)
        .ToDictionary(f => f.Name, f => f.Receipt!.Fingerprint, StringComparer.Ordinal);

    /// <summary>The bytes of every table of every case, and of the summary, by relative path. Receipts and logs have times in them.</summary>
    public static Dictionary<string, string> Tables(string results) => CaseFolders(results)
        .SelectMany(f => Directory.EnumerateFiles(f, "*.csv"))
        .Append(Path.Join(results, "summary.csv"))
        .ToDictionary(f => Path.GetRelativePath(results, f), File.ReadAllText, StringComparer.Ordinal);

    /// <summary>How often each case was solved, by the logs of all runs.</summary>
    public static Dictionary<string, int> TimesSolved(string results) => Directory.EnumerateFiles(Path.Join(results, "logs"), "*.jsonl")
        .SelectMany(File.ReadLines)
        .Where(line => line.Contains("\"@mt\":\"Case {Case} solved: ", StringComparison.Ordinal))
        .Select(line => System.Text.Json.JsonDocument.Parse(line).RootElement.GetProperty("Case").GetString()!)
        .GroupBy(name => name, StringComparer.Ordinal)
        .ToDictionary(g => g.Key, g => g.Count(), StringComparer.Ordinal);
}
