using System.Buffers;
using System.Collections.Immutable;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Plan;

/// <summary>What lies between a result and the case as it reads now.</summary>
internal static class Differences
{
    private static readonly SearchValues<char> HexDigits = SearchValues.Create("0123456789abcdef");

    // Told from the receipt's own field, in words of its own.
    private const string SolverKey = "solver";

    /// <summary>All reasons, the solver first, then values by key, then files; none for a current result.</summary>
    public static ImmutableArray<StaleReason> Between(Receipt receipt, StudyCase now, string folder, int solverVersion)
    {
        var reasons = ImmutableArray.CreateBuilder<StaleReason>();
        if (receipt.SolverVersion != solverVersion)
            reasons.Add(new StaleReason.SolverChanged(receipt.SolverVersion, solverVersion));
        if (receipt.Fingerprint != now.Fingerprint)
        {
            var before = reasons.Count;
            reasons.AddRange(OfValues(receipt.Values, now.Values));
            if (reasons.Count == before && receipt.SolverVersion == solverVersion)
                reasons.Add(new StaleReason.FingerprintChanged());
        }
        reasons.AddRange(OfFiles(receipt.Files, folder));
        return reasons.ToImmutable();
    }

    /// <summary>Every value that differs, by key; the solver's version apart.</summary>
    internal static IEnumerable<StaleReason> OfValues(IReadOnlyDictionary<string, string> was, IReadOnlyDictionary<string, string> now)
    {
        foreach (var key in was.Keys.Union(now.Keys, StringComparer.Ordinal).Order(StringComparer.Ordinal))
        {
            var from = was.GetValueOrDefault(key);
            var to = now.GetValueOrDefault(key);
            if (from != to && key != SolverKey)
                yield return OfValue(key, from, to);
        }
    }

    private static StaleReason OfValue(string key, string? from, string? to) => (from, to) switch
    {
        (null, { } value) when IsTable(value) => new StaleReason.TableAdded(TableName(key)),
        (null, { } value) => new StaleReason.ValueAdded(key, value),
        ({ } value, null) when IsTable(value) => new StaleReason.TableRemoved(TableName(key)),
        ({ } value, null) => new StaleReason.ValueRemoved(key, value),
        ({ } old, { } value) when IsTable(old) && IsTable(value) => new StaleReason.TableChanged(TableName(key)),
        _ => new StaleReason.ValueChanged(key, from!, to!),
    };

    private static string TableName(string key)
        => key.StartsWith("section.", StringComparison.Ordinal) ? "section " + key["section.".Length..] : key;

    // Tables stand in the values as their SHA-256.
    private static bool IsTable(string value) => value.Length == 64 && !value.AsSpan().ContainsAnyExcept(HexDigits);

    private static IEnumerable<StaleReason> OfFiles(IEnumerable<ResultFile> files, string folder)
    {
        foreach (var file in files)
        {
            var found = new FileInfo(Path.Join(folder, Path.GetFileName(file.Name)));
            if (!found.Exists)
                yield return new StaleReason.FileMissing(file.Name);
            else if (found.Length != file.Size)
                yield return new StaleReason.FileSizeChanged(file.Name, file.Size, found.Length);
        }
    }
}
