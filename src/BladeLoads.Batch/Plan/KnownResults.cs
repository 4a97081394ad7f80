using BladeLoads.Batch.Plan.Index;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;

namespace BladeLoads.Batch.Plan;

/// <summary>The results that are there, each receipt opened once at most, and not at all where the index knows it.</summary>
/// <param name="index">What an earlier plan found; null for none.</param>
internal sealed class KnownResults(ResultsFolder results, PlanIndex? index, TimeProvider time) : IDisposable
{
    private readonly FolderStamps? _stamps = FolderStamps.Open(results.Study);
    private readonly Dictionary<string, (ResultFacts? Facts, string? Why)> _seen = new(StringComparer.Ordinal);
    private readonly Dictionary<string, Receipt> _opened = new(StringComparer.Ordinal);
    private ILookup<string, string>? _byFingerprint;

    /// <summary>Receipts were opened that the index did not know.</summary>
    public bool HasLearned { get; private set; }

    public ResultsFolder Results => results;

    /// <summary>The facts by folder, relative to the study's results.</summary>
    public IEnumerable<KeyValuePair<string, ResultFacts>> Facts
        => _seen.Where(s => s.Value.Facts is not null).Select(s => KeyValuePair.Create(s.Key, s.Value.Facts!));

    public void Dispose() => _stamps?.Dispose();

    /// <summary>What is known of a result; null where there is no receipt that can be read, with the reason in <paramref name="why"/>.</summary>
    /// <param name="folder">Relative to the study's results.</param>
    /// <param name="why">Null where there is no result folder at all.</param>
    public ResultFacts? Look(string folder, out string? why)
    {
        if (!_seen.TryGetValue(folder, out var seen))
        {
            seen = LookAnew(folder);
            _seen.Add(folder, seen);
        }
        why = seen.Why;
        return seen.Facts;
    }

    /// <summary>The whole receipt; null where it has gone since.</summary>
    public Receipt? Open(string folder)
    {
        if (!_opened.TryGetValue(folder, out var receipt)
            && ReceiptFile.Read(Path.Join(results.Study, folder)) is ReceiptReading.Readable { Receipt: var read })
            _opened[folder] = receipt = read;
        return receipt;
    }

    /// <summary>Whether a file of a result is not there or not of the size it was written with.</summary>
    public bool IsDamaged(string folder, ResultFacts facts)
    {
        if (_stamps is null)
            return Damage(folder, facts).Any();
        foreach (var (name, size) in facts.Files)
            if (_stamps.Of(folder, name) is not { Type: EntryType.File, Size: var found } || found != size)
                return true;
        return false;
    }

    /// <summary>The files of a result that are not there or not of the size they were written with.</summary>
    public IEnumerable<StaleReason> Damage(string folder, ResultFacts facts)
    {
        foreach (var (name, size) in facts.Files)
        {
            var found = new FileInfo(Path.Join(results.Study, folder, name));
            if (!found.Exists)
                yield return new StaleReason.FileMissing(name);
            else if (found.Length != size)
                yield return new StaleReason.FileSizeChanged(name, size, found.Length);
        }
    }

    /// <summary>A whole result of these very values in another place than its own: among those it replaced, or of another case.</summary>
    public FoundResult? Find(StudyCase wanted, int solverVersion)
    {
        _byFingerprint ??= Folders().Select(folder => (Folder: folder, Facts: Look(folder, out _)))
            .Where(found => found.Facts?.SolverVersion == solverVersion)
            .ToLookup(found => found.Facts!.Fingerprint, found => found.Folder, StringComparer.Ordinal);
        var own = $"replaced/{wanted.Name}/";
        var found = _byFingerprint[wanted.Fingerprint]
            .Where(folder => folder != wanted.Name && Look(folder, out _) is { } facts && !Damage(folder, facts).Any())
            .OrderByDescending(folder => folder.StartsWith(own, StringComparison.Ordinal))
            .ThenBy(folder => folder, StringComparer.Ordinal).FirstOrDefault();
        return found is not null && Open(found) is { } receipt ? new FoundResult(CaseOf(found), found, receipt.SolvedAt) : null;
    }

    private static string CaseOf(string folder) => folder.StartsWith("replaced/", StringComparison.Ordinal) ? folder.Split('/')[1] : folder;

    private List<string> Folders()
    {
        if (!Directory.Exists(results.Study))
            return [];
        var inPlace = Directory.EnumerateDirectories(results.Study).Select(path => Path.GetFileName(path))
            .Where(name => ResultsFolder.Objection(name) is null);
        var replaced = ReplacedResult.All(results).Where(r => r.IsResult).Select(r => $"replaced/{r.Case}/{Path.GetFileName(r.Folder)}");
        return [.. inPlace.Concat(replaced)];
    }

    private (ResultFacts? Facts, string? Why) LookAnew(string folder)
    {
        // Before reading: what changes in between has another stamp.
        var taken = FileStamp.Now(time);
        var stamp = _stamps?.Of(folder, Receipt.FileName) ?? default;
        if (index?.Find(folder) is { IsSettled: true } known && known.Stamp == stamp)
            return (known, null);
        switch (ReceiptFile.Read(Path.Join(results.Study, folder)))
        {
            case ReceiptReading.Readable { Receipt: var receipt }:
                HasLearned = true;
                _opened[folder] = receipt;
                return (ResultFacts.Of(receipt, stamp, taken), null);
            case ReceiptReading.Unreadable { Why: var why }:
                return (null, why);
            default:
                return (null, null);
        }
    }
}
