using System.Collections.Immutable;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;

namespace BladeLoads.Results.Keeping;

/// <summary>The files of a result as they were at one moment, though a run may exchange it at any.</summary>
/// <param name="Receipt">Null where none can be read.</param>
/// <param name="Flaws">What is not as it was written; empty for a whole result.</param>
internal sealed record ResultCopy(ImmutableArray<ResultContent> Files, Receipt? Receipt, ImmutableArray<ResultFlaw> Flaws)
{
    private const int Tries = 3;

    /// <summary>Null where the folder is not there.</summary>
    public static ResultCopy? Of(string folder)
    {
        for (var n = 1; ; n++)
        {
            var copy = OfOnce(folder);
            // A mixture of two results shows as a flaw; what is still so the third time is one.
            if (copy is null or { Flaws.IsEmpty: true } || n == Tries)
                return copy;
        }
    }

    private static ResultCopy? OfOnce(string folder)
    {
        try
        {
            if (!Directory.Exists(folder))
                return null;
            var files = Directory.EnumerateFiles(folder).Order(StringComparer.Ordinal)
                .Select(path => new ResultContent(Path.GetFileName(path), File.ReadAllBytes(path))).ToImmutableArray();
            var receipt = files.FirstOrDefault(f => f.Name == Receipt.FileName);
            if (receipt is null)
                return new ResultCopy(files, null, [new ResultFlaw.NoReceipt("the receipt is not there")]);
            return ReceiptFile.Parse(receipt.Bytes.Span) switch
            {
                ReceiptReading.Readable { Receipt: var read } => new ResultCopy(
                    [.. files.Where(f => f.Name == Receipt.FileName || read.Files.Any(r => r.Name == f.Name))], read,
                    [.. read.Files.Select(r => FlawOf(r, files.FirstOrDefault(f => f.Name == r.Name))).OfType<ResultFlaw>()]),
                ReceiptReading.Unreadable { Why: var why } => new ResultCopy(files, null, [new ResultFlaw.NoReceipt(why)]),
                _ => throw new InvalidOperationException("bytes of a receipt are read or not"),
            };
        }
        catch (Exception e) when (e is FileNotFoundException or DirectoryNotFoundException)
        {
            return new ResultCopy([], null, [new ResultFlaw.NoReceipt("it changed while it was read")]);
        }
    }

    private static ResultFlaw? FlawOf(ResultFile written, ResultContent? found)
    {
        if (found is null)
            return new ResultFlaw.Missing(written.Name);
        if (found.Bytes.Length != written.Size)
            return new ResultFlaw.OtherSize(written.Name, written.Size, found.Bytes.Length);
        return ResultFile.Of(written.Name, found.Bytes.Span) == written ? null : new ResultFlaw.OtherContent(written.Name);
    }
}
