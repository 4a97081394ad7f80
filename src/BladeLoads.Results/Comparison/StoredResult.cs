using System.Collections.Immutable;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Tables;

namespace BladeLoads.Results.Comparison;

/// <summary>A result of a case as it lies in its folder: nothing in it comes from memory.</summary>
/// <param name="Case">Its name: that of the receipt, or that of the folder where there is none.</param>
/// <param name="Receipt">Null where none can be read; then what only a receipt knows (the rated wind speed) is left open.</param>
/// <param name="Doubts">What makes its numbers doubtful, a phrase each.</param>
public sealed record StoredResult(string Case, string Folder, Receipt? Receipt, StoredCurve Curve, ImmutableArray<string> Doubts)
{
    /// <summary>None where the result has none: earlier versions wrote none.</summary>
    public StoredCurve DesignPoints { get; init; } = new([]);

    /// <exception cref="UnreadableCurveException">There is no power curve that can be read.</exception>
    public static StoredResult Read(string folder)
    {
        var reading = ReceiptFile.Read(folder);
        var receipt = (reading as ReceiptReading.Readable)?.Receipt;
        var curve = StoredCurve.Read(folder);
        var doubt = receipt is null
            ? (reading as ReceiptReading.Unreadable)?.Why ?? "there is no receipt"
            : receipt.Files.FirstOrDefault(f => f.Name == CurveTable.FileName) is { } written
                ? ResultCheck.OfFile(folder, written)?.Sentence
                : $"the receipt knows of no {CurveTable.FileName}";
        return new StoredResult(receipt?.Case ?? NameOf(folder), folder, receipt, curve, doubt is null ? [] : [doubt])
        {
            DesignPoints = StoredCurve.ReadDesignPoints(folder),
        };
    }

    private static string NameOf(string folder) => Path.GetFileName(Path.TrimEndingDirectorySeparator(Path.GetFullPath(folder)));
}
