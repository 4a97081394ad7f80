using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Tables;

/// <summary>A section's polar table as read, prepared once for all cases that use it.</summary>
/// <param name="Section">Null when an error keeps the table from being used.</param>
/// <param name="Canonical">The parsed values; moment coefficients, which nothing uses, are not in it.</param>
internal sealed record PolarTable(Section? Section, CanonicalTable Canonical, InputFile Input)
{
    private const double AngleSlack = 1e-9;       // deg
    internal const double LargestRadian = 3.2;    // a little more than pi: angles that all lie within are hardly degrees
    private const double LiftClosure = 0.05;

    /// <summary>What is doubtful about the table; to be raised once a blade names its section.</summary>
    public ImmutableArray<InputFinding> Doubts { get; init; } = [];

    /// <summary>Gives the rows in the units of the file, moments among them; of a table without errors.</summary>
    public Func<ImmutableArray<PolarRows>> Rows { get; init; } = () => [];

    /// <summary>Gives the lines in the file on which those rows stand.</summary>
    public Func<ImmutableArray<ImmutableArray<int>>> RowLines { get; init; } = () => [];

    /// <summary>That it does not go round, which is doubtful where nothing extends it; none or one.</summary>
    public ImmutableArray<InputFinding> Reach { get; init; } = [];

    /// <summary>Where the rows of each polar begin.</summary>
    public ImmutableArray<Place> PolarsAt { get; init; } = [];

    /// <summary>That augmentation leaves a polar as it is though it lifts; none or one.</summary>
    public ImmutableArray<InputFinding> NotAugmented { get; init; } = [];

    /// <summary>What the head of the table says of an augmentation for rotation that its rows already have; null where it says nothing.</summary>
    public HeadNote? Augmented { get; init; }

    private static readonly ImmutableArray<Column> Columns =
        [new("reynolds", false), new("alpha_deg", true), new("cl", true), new("cd", true), new("cm", false)];

    public static PolarTable Parse(string sectionName, InputText input, Findings findings)
    {
        using var rows = new CsvRows(input, findings);
        var blocks = new List<Block>();
        if (rows.ReadHeader(Columns))
        {
            while (rows.Read())
                ReadRow(rows, blocks);
            CheckWhole(rows, blocks, input.File);
            if (ExchangedColumns.AreLikely(blocks.SelectMany(block => block.Coefficients())))
                rows.Ask("cd", "are cl and cd exchanged?");
        }
        var section = rows.HasErrors ? null : Section.FromPolars(sectionName, blocks.Select(block => block.ToPolar()));
        return new PolarTable(
            section, Fingerprint.OfTable($"section.{sectionName}", input.File, () => blocks.SelectMany(block => block.Lines())),
            new InputFile(input.File, input.Sha256, section is null ? "polar table with errors" : Contents(blocks)))
        {
            Doubts = section is null ? [] : [.. DoubtsOf(blocks)],
            Rows = () => section is null ? [] : [.. blocks.Select(block => block.ToRows())],
            RowLines = () => section is null ? [] : [.. blocks.Select(block => block.RowLines)],
            Reach = section is null ? [] : [.. ReachOf(blocks)],
            NotAugmented = section is null ? [] : [.. NotAugmentedOf(section, blocks)],
            PolarsAt = [.. blocks.Select(block => block.At)],
            Augmented = HeadNote.Find(input, StoredPolars.AugmentedNote),
        };
    }

    private static void ReadRow(CsvRows rows, List<Block> blocks)
    {
        var reynolds = rows.Has("reynolds") ? rows.Number("reynolds") : double.NaN;
        if (blocks.Count == 0 || rows.Has("reynolds") && !double.IsNaN(reynolds) && reynolds != blocks[^1].Reynolds)
        {
            if (rows.Has("reynolds"))
                CheckReynolds(rows, blocks, reynolds);
            blocks.Add(new Block(reynolds, rows.Cell(rows.Has("reynolds") ? "reynolds" : "alpha_deg")));
        }
        var block = blocks[^1];

        var angle = AngleOf(rows);
        // Asked in radians: two angles that differ in their last digit may be one there.
        if (block.Angles.Count > 0 && double.DegreesToRadians(angle) <= double.DegreesToRadians(block.Angles[^1]))
            rows.Error("alpha_deg", Rising.Problem("alpha_deg",
                (block.Angles[^1], block.LastLine), angle, rows.Line, "angles must rise within one Reynolds number"));
        var lift = Coefficient(rows, "cl");
        var drag = Coefficient(rows, "cd");
        if (drag < 0)
            rows.Error("cd", $"cd is {CanonicalText.Of(drag)}; drag coefficients must be >= 0");
        var moment = rows.Has("cm") ? rows.Number("cm") : double.NaN;
        block.Rows++;
        if (double.IsNaN(angle))
            return;
        block.Add(new PolarRow(angle, lift, drag, moment), rows.Line);
        if (angle is -180 or 180)
            block.LiftAtEnd.Add((lift, rows.Cell("cl")));
    }

    private static double Coefficient(CsvRows rows, string column)
    {
        var value = rows.Number(column);
        if (Math.Abs(value) > PolarLimits.LargestCoefficient)
            rows.Error(column, PolarLimits.BeyondLargest(column, value));
        return value;
    }

    // NaN where it is wrong.
    private static double AngleOf(CsvRows rows)
    {
        var angle = rows.Number("alpha_deg");
        if (!(Math.Abs(angle) > 180 + AngleSlack))
            return Math.Clamp(angle, -180, 180);
        rows.Error("alpha_deg", $"alpha_deg is {CanonicalText.Of(angle)}; give an angle from -180 to 180");
        return double.NaN;
    }

    private static void CheckReynolds(CsvRows rows, List<Block> blocks, double reynolds)
    {
        if (reynolds < PolarLimits.LowestReynolds)
            rows.Error("reynolds",
                $"reynolds is {CanonicalText.Of(reynolds)}; Reynolds numbers of blades are 1e4 and more, three million is 3e6");
        else if (blocks.Any(block => block.Reynolds == reynolds))
            rows.Error("reynolds", $"reynolds returns to {ReynoldsNumber.Text(reynolds)}; keep the rows of one Reynolds number together");
        else if (blocks.Count > 0 && reynolds < blocks[^1].Reynolds)
            rows.Error("reynolds", Rising.Problem("reynolds",
                (blocks[^1].Reynolds, blocks[^1].LastLine), reynolds, rows.Line, "Reynolds numbers must rise"));
    }

    private static void CheckWhole(CsvRows rows, List<Block> blocks, string file)
    {
        if (blocks.Count == 0 && !rows.HasErrors)
            rows.Error(new Place(file, 0, 0), "has no row; a polar needs three or more");
        foreach (var block in blocks.Where(block => block.Rows < PolarLimits.FewestRows))
        {
            var of = double.IsNaN(block.Reynolds) ? "the table" : $"Reynolds number {ReynoldsNumber.Text(block.Reynolds)}";
            rows.Error(block.At, $"{of} has {(block.Rows == 1 ? "one row" : "two rows")}; a polar needs three or more");
        }
        if (rows.HasErrors)
            return;
        var (lowest, highest) = (blocks.Min(block => block.Angles[0]), blocks.Max(block => block.Angles[^1]));
        if (lowest >= -LargestRadian && highest <= LargestRadian)
            rows.Error(blocks[0].At, $"alpha_deg runs from {CanonicalText.Of(lowest)} to {CanonicalText.Of(highest)} only; "
                + "these look like radians, angles are in degrees");
    }

    private static IEnumerable<InputFinding> DoubtsOf(List<Block> blocks)
    {
        foreach (var block in blocks)
            if (block.LiftAtEnd is [var (low, _), var (high, at)] && Math.Abs(high - low) > LiftClosure)
                yield return new InputFinding(at.File, at.Line, at.Column,
                    $"cl is {CanonicalText.Of(high)} at 180 deg and {CanonicalText.Of(low)} at -180 deg; "
                    + "these are one angle and should have one lift");
    }

    private static IEnumerable<InputFinding> ReachOf(List<Block> blocks)
    {
        var narrowest = blocks.MinBy(block => block.Angles[^1] - block.Angles[0])!;
        if (narrowest.Angles[0] > -180 || narrowest.Angles[^1] < 180)
            yield return new InputFinding(narrowest.At.File, narrowest.At.Line, narrowest.At.Column,
                $"angles reach from {CanonicalText.Of(narrowest.Angles[0])} to {CanonicalText.Of(narrowest.Angles[^1])} deg; "
                + "beyond them the end value serves, and each use is marked outside-angles");
    }

    private static IEnumerable<InputFinding> NotAugmentedOf(Section section, List<Block> blocks) => section.Polars.Zip(blocks)
        .Where(pair => !pair.First.IsRound && PotentialLift.Of(pair.First) is null)
        .Select(pair => new InputFinding(pair.Second.At.File, pair.Second.At.Line, pair.Second.At.Column,
            "lift does not rise through 0 within 20 deg of 0; augment leaves these rows as they are"))
        .Take(1);

    private static string Contents(List<Block> blocks)
    {
        var rowCount = blocks.Sum(block => block.Rows);
        var reynolds = blocks switch
        {
            [{ Reynolds: double.NaN }] => "no Reynolds number",
            [var only] => $"Reynolds number {ReynoldsNumber.Text(only.Reynolds)}",
            _ => string.Create(CultureInfo.InvariantCulture,
                $"{blocks.Count} Reynolds numbers from {ReynoldsNumber.Text(blocks[0].Reynolds)} to {ReynoldsNumber.Text(blocks[^1].Reynolds)}"),
        };
        var (lowest, highest) = (CanonicalText.Of(blocks.Min(b => b.Angles[0])), CanonicalText.Of(blocks.Max(b => b.Angles[^1])));
        return string.Create(CultureInfo.InvariantCulture, $"{reynolds}, {rowCount} rows, {lowest} to {highest} deg");
    }

    /// <summary>The rows of one Reynolds number.</summary>
    private sealed class Block(double reynolds, Place at)
    {
        private readonly List<double> _lift = [];
        private readonly List<double> _drag = [];
        private readonly List<double> _moment = [];
        private readonly List<int> _line = [];

        public double Reynolds { get; } = reynolds;

        public Place At { get; } = at;

        public int Rows { get; set; }

        public int LastLine => _line is [.., var last] ? last : At.Line;

        public ImmutableArray<int> RowLines => [.. _line];

        public List<double> Angles { get; } = [];

        public List<(double Lift, Place At)> LiftAtEnd { get; } = [];

        public void Add(PolarRow row, int line)
        {
            Angles.Add(row.AngleDeg);
            _lift.Add(row.Lift);
            _drag.Add(row.Drag);
            _moment.Add(row.Moment);
            _line.Add(line);
        }

        public PolarRows ToRows()
            => new(Reynolds, [.. Angles.Select((angle, i) => new PolarRow(angle, _lift[i], _drag[i], _moment[i]))]);

        public Polar ToPolar() => Polar.FromRows(
            Reynolds, [.. Angles.Select(angle => Math.Clamp(double.DegreesToRadians(angle), -Math.PI, Math.PI))],
            [.. _lift], [.. _drag]);

        public IEnumerable<(double Angle, double Lift, double Drag)> Coefficients()
            => Angles.Select((angle, i) => (angle, _lift[i], _drag[i]));

        public IEnumerable<string> Lines()
        {
            var reynolds = double.IsNaN(Reynolds) ? "-" : CanonicalText.Of(Reynolds);
            for (var i = 0; i < Angles.Count; i++)
                yield return $"{reynolds},{CanonicalText.Of([Angles[i], _lift[i], _drag[i]])}";
        }
    }
}
