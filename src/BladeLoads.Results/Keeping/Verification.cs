using System.Collections.Immutable;
using System.Security.Cryptography;
using BladeLoads.Results.Comparison;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;

namespace BladeLoads.Results.Keeping;

/// <summary>What was found about a result, or a kept table.</summary>
/// <param name="Name">Its folder or file, from the folder that was verified.</param>
/// <param name="CurrentCase">The case whose current result it is; null for a replaced or kept one.</param>
public sealed record Verified(string Name, string? CurrentCase, ImmutableArray<ResultFlaw> Flaws)
{
    public bool IsAsWritten => Flaws.IsEmpty;

    /// <summary>Files that do not belong to it are told, but spoil none of its own.</summary>
    public bool IsDamaged => Flaws.Any(f => f is not ResultFlaw.Extra);
}

/// <summary>Holds results against the hashes that were written with them. Reads every byte, and writes nothing.</summary>
public static class Verification
{
    /// <summary>All of a study's results: current, kept and replaced ones, and the tables beside them.</summary>
    public static ImmutableArray<Verified> OfStudy(ResultsFolder results) =>
    [
        .. Folders(results.Study).Where(f => ResultsFolder.Objection(Path.GetFileName(f)) is null)
            .Select(f => new Verified(Path.GetFileName(f), Path.GetFileName(f), Patiently(f))),
        .. Folders(results.Kept).SelectMany(f => OfKept(f)).Select(v => v with { Name = $"kept/{v.Name}" }),
        .. ReplacedResult.All(results).Where(r => r.IsResult).Select(r => new Verified($"replaced/{r.Case}/{Path.GetFileName(r.Folder)}", null, ResultCheck.Of(r.Folder))),
        .. Tables(results),
    ];

    /// <summary>A kept set: its results, and whether those are there that it was kept with.</summary>
    public static ImmutableArray<Verified> OfKept(string folder)
    {
        var set = Path.GetFileName(folder);
        if (KeptRecord.Read(folder) is not { } record)
            return [new Verified(set, null, [new ResultFlaw.NoReceipt($"{KeptRecord.FileName} is not there or is damaged")])];
        var found = Folders(folder).Select(f => Path.GetFileName(f)).ToHashSet(StringComparer.Ordinal);
        return
        [
            .. record.Cases.Where(c => c.Fingerprint is not null || found.Contains(c.Case))
                .Select(c => new Verified($"{set}/{c.Case}", null, OfKeptCase(Path.Join(folder, c.Case), c))),
            .. (record.Files ?? []).Select(file => (file.Name, Flaw: ResultCheck.OfFile(folder, file))).Where(file => file.Flaw is not null)
                .Select(file => new Verified($"{set}/{file.Name}", null, [file.Flaw!])),
            .. found.Where(f => record.Cases.All(c => c.Case != f)).Order(StringComparer.Ordinal)
                .Select(f => new Verified($"{set}/{f}", null, [new ResultFlaw.Extra(f)])),
        ];
    }

    /// <summary>The results of a set that was named.</summary>
    public static ImmutableArray<Verified> OfSet(ResultSet set)
        => [.. set.Cases.Select(c => new Verified(set.IsSingle ? set.Name : $"{set.Name}/{c.Case}", null, ResultCheck.Of(c.Folder)))];

    // A run may exchange the result while it is read: only what is so again is a flaw.
    private static ImmutableArray<ResultFlaw> Patiently(string folder)
    {
        var flaws = ResultCheck.Of(folder);
        return flaws.IsEmpty ? flaws : ResultCheck.Of(folder);
    }

    private static ImmutableArray<ResultFlaw> OfKeptCase(string folder, KeptCase kept)
    {
        var flaws = ResultCheck.Of(folder);
        return flaws.IsEmpty && ReceiptFile.Read(folder) is ReceiptReading.Readable { Receipt.Fingerprint: var fingerprint }
            && fingerprint != kept.Fingerprint
                ? [new ResultFlaw.NoReceipt("it is another result than the one that was kept")] : flaws;
    }

    private static IEnumerable<Verified> Tables(ResultsFolder results)
    {
        if (!Directory.Exists(results.Tables))
            yield break;
        foreach (var file in Directory.EnumerateFiles(results.Tables, "*.csv").Order(StringComparer.Ordinal))
        {
            var name = Path.GetFileName(file);
            ResultFlaw? flaw = null;
            try
            {
                if (Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(file))) != Path.GetFileNameWithoutExtension(file))
                    flaw = new ResultFlaw.OtherContent(name);
            }
            catch (Exception e) when (e is IOException or UnauthorizedAccessException)
            {
                flaw = new ResultFlaw.Unreadable(name, DiskTrouble.ReadingReason(e));
            }
            yield return new Verified($"tables/{name}", null, flaw is null ? [] : [flaw]);
        }
    }

    private static IEnumerable<string> Folders(string folder) => Directory.Exists(folder)
        ? Directory.EnumerateDirectories(folder).Where(f => Path.GetFileName(f)[0] != '.').Order(StringComparer.Ordinal) : [];
}

/// <summary>Takes damaged results out of their places, so that the next run solves their cases again.</summary>
public static class DamagedResults
{
    /// <summary>Moves the current result of a case to the replaced ones, as it is; nothing is deleted.</summary>
    /// <exception cref="NoRoomForResultsException">The system refuses.</exception>
    public static void SetAside(ResultsFolder results, IEnumerable<string> cases, IDisk disk)
    {
        try
        {
            foreach (var name in cases)
                ReplacedResult.SetAside(results.Case(name), name, results, disk, isDamaged: true);
            disk.Sync(results.Study);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new NoRoomForResultsException(results.Study, e);
        }
    }
}
