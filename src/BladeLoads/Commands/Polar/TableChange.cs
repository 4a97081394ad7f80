using System.Collections.Immutable;
using BladeLoads.Studies;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>What a command makes of one polar table: a closed set.</summary>
internal abstract record TableChange
{
    private TableChange()
    {
    }

    /// <summary>A new table.</summary>
    /// <param name="Deed">What was done, in a word: scaled.</param>
    /// <param name="How">What was done to all of it, a line each.</param>
    /// <param name="Record">What was done at each Reynolds number, a line each.</param>
    public sealed record Changed(
        ImmutableArray<PolarRows> Polars, string Deed, ImmutableArray<string> How, ImmutableArray<string> Record) : TableChange
    {
        public ImmutableArray<InputFinding> Doubts { get; init; } = [];

        /// <summary>The new head: what was done, and all that the head of the old table said.</summary>
        public IEnumerable<string> Head(StoredPolars old) =>
        [
            $"{Deed} by bladeloads {CommandLine.ToolVersion} from {old.SectionName}.csv (SHA-256 {old.Sha256})",
            .. How, .. Record, .. old.Head.IsEmpty ? [] : (string[])["the head of that table:"], .. old.Head,
        ];
    }

    /// <summary>The file as it is, and why.</summary>
    public sealed record Copied(string Why) : TableChange;

    public sealed record Refused(ImmutableArray<InputFinding> Errors) : TableChange;
}
