using System.Collections.Immutable;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Tables;

namespace BladeLoads.Results.Comparison;

/// <summary>One result, or those of a study or of a set that was kept, by the names of their cases.</summary>
/// <param name="Name">How a user would call it.</param>
/// <param name="Folder">Absolute path.</param>
/// <param name="IsSingle">One result folder, whatever its case is called.</param>
/// <param name="Cases">Name and folder of each, in the order of the names (ordinal).</param>
public sealed record ResultSet(string Name, string Folder, bool IsSingle, ImmutableArray<(string Case, string Folder)> Cases)
{
    /// <summary>The result or results in a folder; null where there is none in it.</summary>
    public static ResultSet? In(string folder, string name)
    {
        if (!Directory.Exists(folder))
            return null;
        if (IsResult(folder))
            return new ResultSet(name, folder, true, [(Path.GetFileName(folder), folder)]);
        var cases = Directory.EnumerateDirectories(folder)
            .Select(f => (Case: Path.GetFileName(f), Folder: f))
            .Where(f => ResultsFolder.Objection(f.Case) is null && IsResult(f.Folder))
            .OrderBy(f => f.Case, StringComparer.Ordinal)
            .ToImmutableArray();
        return cases.IsEmpty ? null : new ResultSet(name, folder, false, cases);
    }

    /// <summary>Whether a folder is that of a result, or of what is left of one.</summary>
    public static bool IsResult(string folder)
        => File.Exists(Path.Join(folder, Receipt.FileName)) || File.Exists(Path.Join(folder, CurveTable.FileName));

    /// <summary>The result of that case; null for none.</summary>
    public string? Of(string caseName) => Cases.FirstOrDefault(c => c.Case == caseName).Folder;

    /// <summary>
    /// Every case of either beside each other; two single results are compared whatever they are called, and a single one with the
    /// case of its name in a set.
    /// </summary>
    public static ImmutableArray<CaseComparison> Compare(ResultSet old, ResultSet now, Func<StoredResult, StoredResult, string> why)
    {
        if (old.IsSingle && now.IsSingle)
            return [ResultComparison.OfFolders(old.Folder, now.Folder, why)];
        var names = (old.IsSingle, now.IsSingle) switch
        {
            (true, _) => [CaseOf(old)],
            (_, true) => [CaseOf(now)],
            _ => old.Cases.Concat(now.Cases).Select(c => c.Case).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal).ToList(),
        };
        return [.. names.AsParallel().AsOrdered().Select(n => Compare(n, old.IsSingle ? old.Folder : old.Of(n), now.IsSingle ? now.Folder : now.Of(n), why))];
    }

    private static CaseComparison Compare(string name, string? old, string? now, Func<StoredResult, StoredResult, string> why) => (old, now) switch
    {
        ({ } before, { } after) => ResultComparison.OfFolders(before, after, why),
        (_, null) => new CaseComparison.NotCompared(name, name, NoComparison.OnlyOld, ""),
        _ => new CaseComparison.NotCompared(name, null, NoComparison.OnlyNew, ""),
    };

    // A result that was replaced lies in a folder that is named by its time: its receipt knows the case.
    private static string CaseOf(ResultSet single)
        => ReceiptFile.Read(single.Folder) is ReceiptReading.Readable { Receipt.Case: var name } ? name : Path.GetFileName(single.Folder);
}
