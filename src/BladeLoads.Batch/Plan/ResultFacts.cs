using System.Collections.Immutable;
using BladeLoads.Results.Receipts;
using BladeLoads.Studies.Files;

namespace BladeLoads.Batch.Plan;

/// <summary>What a plan needs to know of a receipt that is there and can be read.</summary>
/// <param name="Stamp">Of the receipt, taken before it was read.</param>
/// <param name="IsSettled">The stamp can be trusted: as long as the receipt has it, the rest holds.</param>
public sealed record ResultFacts(
    string Title, string Fingerprint, int SolverVersion, ImmutableArray<(string Name, long Size)> Files, FileStamp Stamp, bool IsSettled)
{
    internal static ResultFacts Of(Receipt receipt, FileStamp stamp, long taken) => new(
        receipt.Title, receipt.Fingerprint, receipt.SolverVersion,
        [.. receipt.Files.Select(f => (Path.GetFileName(f.Name), f.Size))], stamp, stamp.IsSettled(taken));

    public bool IsOf(string fingerprint, int solverVersion) => Fingerprint == fingerprint && SolverVersion == solverVersion;
}
