using System.Collections.Immutable;
using System.Security.Cryptography;

namespace BladeLoads.Results.Receipts;

/// <summary>What is not as it was written in the folder of a result. Each says itself in one phrase.</summary>
public abstract record ResultFlaw
{
    private ResultFlaw() { }

    /// <summary>One phrase, made fit for a terminal by whoever shows it.</summary>
    public abstract string Sentence { get; }

    public sealed record NoReceipt(string Why) : ResultFlaw
    {
        public override string Sentence => Why;
    }

    public sealed record Missing(string Name) : ResultFlaw
    {
        public override string Sentence => $"{Name} is not there";
    }

    public sealed record Unreadable(string Name, string Why) : ResultFlaw
    {
        public override string Sentence => $"{Name} cannot be read: {Why}";
    }

    public sealed record OtherSize(string Name, long Written, long Found) : ResultFlaw
    {
        public override string Sentence => FormattableString.Invariant($"{Name} has {Found} bytes, was written with {Written}");
    }

    public sealed record OtherContent(string Name) : ResultFlaw
    {
        public override string Sentence => $"{Name} has other bytes than were written";
    }

    public sealed record Extra(string Name) : ResultFlaw
    {
        public override string Sentence => $"{Name} is no file of the result";
    }
}

/// <summary>Holds the folder of a result against its receipt.</summary>
public static class ResultCheck
{
    /// <summary>Whether every file that the receipt names is there with the bytes that were written.</summary>
    public static bool IsWhole(string folder, Receipt receipt)
        => receipt.Files.All(file => OfFile(folder, file) is null);

    /// <summary>Everything that is not as it was written; empty where all is. Reads every byte.</summary>
    public static ImmutableArray<ResultFlaw> Of(string folder)
    {
        try
        {
            return ReceiptFile.Read(folder) switch
            {
                ReceiptReading.Readable { Receipt: var receipt } => [.. OfFiles(folder, receipt)],
                ReceiptReading.Unreadable { Why: var why } => [new ResultFlaw.NoReceipt(why)],
                _ => [new ResultFlaw.NoReceipt("there is no result")],
            };
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return [new ResultFlaw.NoReceipt($"its folder cannot be read: {Publishing.DiskTrouble.ReadingReason(e)}")];
        }
    }

    /// <summary>What is not as it was written of one file; null where it is.</summary>
    public static ResultFlaw? OfFile(string folder, ResultFile file)
    {
        var path = Path.Join(folder, file.Name);
        // A receipt says what it likes: only names within its own folder are followed.
        if (file.Name != Path.GetFileName(file.Name) || !File.Exists(path))
            return new ResultFlaw.Missing(file.Name);
        try
        {
            using var stream = File.OpenRead(path);
            if (stream.Length != file.Size)
                return new ResultFlaw.OtherSize(file.Name, file.Size, stream.Length);
            return Convert.ToHexStringLower(SHA256.HashData(stream)) == file.Sha256 ? null : new ResultFlaw.OtherContent(file.Name);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return new ResultFlaw.Unreadable(file.Name, Publishing.DiskTrouble.ReadingReason(e));
        }
    }

    private static IEnumerable<ResultFlaw> OfFiles(string folder, Receipt receipt)
    {
        foreach (var file in receipt.Files)
            if (OfFile(folder, file) is { } flaw)
                yield return flaw;
        var known = receipt.Files.Select(f => f.Name).Append(Receipt.FileName).ToHashSet(StringComparer.Ordinal);
        foreach (var entry in Directory.EnumerateFileSystemEntries(folder).Select(e => Path.GetFileName(e)).Order(StringComparer.Ordinal))
            if (!known.Contains(entry))
                yield return new ResultFlaw.Extra(entry);
    }
}
