using System.Buffers;
using System.Collections.Immutable;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies;
using BladeLoads.Studies.Cases;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Batch.Plan;

/// <summary>What lies between the values of a result and those of its case now.</summary>
internal static class Differences
{
    private static readonly SearchValues<char> HexDigits = SearchValues.Create("0123456789abcdef");

    // Told from the receipt's own field, in words of its own.
    private const string SolverKey = "solver";
    private const string SectionPrefix = "section.";
    private const string AirPrefix = "air.";

    /// <summary>All reasons, the solver first, then values by key; none where the result was made from these values by this solver.</summary>
    public static ImmutableArray<StaleReason> Between(Receipt receipt, StudyCase now, ResultsFolder results, int solverVersion)
    {
        var reasons = ImmutableArray.CreateBuilder<StaleReason>();
        if (receipt.SolverVersion != solverVersion)
            reasons.Add(new StaleReason.SolverChanged(receipt.SolverVersion, solverVersion));
        if (receipt.Fingerprint != now.Fingerprint)
        {
            var before = reasons.Count;
            reasons.AddRange(OfValues(receipt.Values, now.Values, now.Tables, hash => TableArchive.Read(results, hash)));
            if (reasons.Count == before && receipt.SolverVersion == solverVersion)
                reasons.Add(new StaleReason.FingerprintChanged());
        }
        return reasons.ToImmutable();
    }

    /// <summary>Every value that differs, by key; the solver's version apart.</summary>
    /// <param name="tables">Those of the values now, as far as they are at hand: their rows are told.</param>
    /// <param name="earlierTable">The text of a table by its hash, as far as it is at hand.</param>
    internal static IEnumerable<StaleReason> OfValues(
        IReadOnlyDictionary<string, string> was, IReadOnlyDictionary<string, string> now, ImmutableArray<CanonicalTable> tables,
        Func<string, string?> earlierTable)
    {
        var reasons = was.Keys.Union(now.Keys, StringComparer.Ordinal).Order(StringComparer.Ordinal)
            .Where(key => key != SolverKey && was.GetValueOrDefault(key) != now.GetValueOrDefault(key))
            .Select(key => (Key: key, Reason: OfValue(key, was.GetValueOrDefault(key), now.GetValueOrDefault(key), tables, earlierTable)))
            .ToLookup(r => r.Key.StartsWith(AirPrefix, StringComparison.Ordinal));
        // The keys of the air come before all others of a case: the order is still that of the keys.
        return OfAir([.. reasons[true]], now).Concat(reasons[false].Select(r => r.Reason));
    }

    // What someone wrote comes first; what follows from it is told as following, with the same keys, after all that was written.
    private static IEnumerable<StaleReason> OfAir(ImmutableArray<(string Key, StaleReason Reason)> ofAir, IReadOnlyDictionary<string, string> now)
    {
        bool Follows((string Key, StaleReason Reason) r) => r.Reason is StaleReason.ValueChanged && DerivedAir.IsDerived(r.Key, now);
        var written = ofAir.Where(r => !Follows(r)).Select(r => r.Reason).ToList();
        // Where nothing was written, they follow from another version of the program alone.
        if (written.Count == 0 || written.Count == ofAir.Length)
            return ofAir.Select(r => r.Reason);
        return written.Append(new StaleReason.AirFollowed([.. ofAir.Where(Follows).Select(r => (StaleReason.ValueChanged)r.Reason)]));
    }

    private static StaleReason OfValue(string key, string? from, string? to, ImmutableArray<CanonicalTable> tables, Func<string, string?> earlierTable) => (from, to) switch
    {
        (null, { } value) when IsTable(value) => new StaleReason.TableAdded(TableName(key, tables)),
        (null, { } value) => new StaleReason.ValueAdded(key, value),
        ({ } value, null) when IsTable(value) => new StaleReason.TableRemoved(TableName(key, tables)),
        ({ } value, null) => new StaleReason.ValueRemoved(key, value),
        ({ } old, { } value) when IsTable(old) && IsTable(value) => OfTable(key, old, value, tables, earlierTable),
        _ => new StaleReason.ValueChanged(key, from!, to!),
    };

    private static StaleReason OfTable(string key, string old, string value, ImmutableArray<CanonicalTable> tables, Func<string, string?> earlierTable)
    {
        var name = TableName(key, tables);
        return tables.FirstOrDefault(t => t.Key == key && t.Hash == value) is { } table
            && earlierTable(old) is { } was
            && TableRows.Between(name, key, was, table.Text) is { } rows
            ? rows : new StaleReason.TableChanged(name);
    }

    // A section's name is also that of its file; those of the others are known while the case has them.
    private static string TableName(string key, ImmutableArray<CanonicalTable> tables)
    {
        if (key.StartsWith(SectionPrefix, StringComparison.Ordinal))
            return $"polar {key[SectionPrefix.Length..]}.csv";
        var kind = key switch { "control.schedule" => "schedule", "site.histogram" => "histogram", _ => key };
        return tables.FirstOrDefault(t => t.Key == key) is { File.Length: > 0 } table ? $"{kind} {Path.GetFileName(table.File)}" : kind;
    }

    // Tables stand in the values as their SHA-256.
    internal static bool IsTable(string value) => value.Length == 64 && !value.AsSpan().ContainsAnyExcept(HexDigits);
}
