using System.Collections.Immutable;
using System.Globalization;
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

    /// <summary>How a line of the record begins; empty where the table leaves its Reynolds number open.</summary>
    public static string At(PolarRows rows) => double.IsNaN(rows.Reynolds) ? "" : $"at Reynolds number {Reynolds(rows)}: ";

    /// <summary>Which Reynolds numbers are meant, to be put behind a noun; empty where all are.</summary>
    public static string Where(IReadOnlyList<PolarRows> some, StoredPolars table) => some.Count == table.Polars.Length
        ? ""
        : $" at Reynolds number{(some.Count == 1 ? "" : "s")} {string.Join(", ", some.Select(Reynolds))}";

    /// <summary>An angle, rad, in degrees.</summary>
    public static string Degrees(double angle) => Short(double.RadiansToDegrees(angle));

    public static string Short(double value) => value.ToString("G6", CultureInfo.InvariantCulture);

    private static string Reynolds(PolarRows rows) => rows.Reynolds.ToString("0.######e0", CultureInfo.InvariantCulture);
}
