using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Results.Pictures;

/// <summary>What a page shows of one blade section: a value to which lines are added, and which <see cref="PictureFile"/> draws.</summary>
/// <param name="Title">The largest line on the page.</param>
/// <param name="Notes">Smaller lines below the title.</param>
/// <param name="Lines">In the order of the legend; those further back are drawn over those before.</param>
public sealed record PolarPicture(string Title, ImmutableArray<string> Notes, ImmutableArray<PolarLine> Lines)
{
    private const int MostReynoldsNumbersListed = 6;

    /// <summary>What the section's tables were before; null where nothing is compared.</summary>
    public EarlierTables? Earlier { get; init; }

    /// <summary>Rows in doubt, which get a ring.</summary>
    public ImmutableArray<RingedRow> Ringed { get; init; } = [];

    /// <summary>The angles of attack at which blades work, rad, from lower to higher: they are shaded; null for none.</summary>
    public (double From, double To)? Shaded { get; init; }

    /// <summary>A section as tabulated, a line a Reynolds number.</summary>
    /// <param name="set">The name of the set of polars.</param>
    /// <param name="source">Where the table stands, for the note below the title.</param>
    public static PolarPicture Of(Section section, string set, string source) => new(
        $"Section {section.Name}, set {set}", [source, Contents(section)],
        [.. section.Polars.Select(polar => new PolarLine(polar, LineKind.Tabulated, ReynoldsText(polar.Reynolds)))]);

    /// <summary>The picture with further lines, over those that are there.</summary>
    public PolarPicture With(params IEnumerable<PolarLine> lines) => this with { Lines = Lines.AddRange(lines) };

    /// <summary>The picture with the tables before an update below its lines, and strips of the difference.</summary>
    /// <param name="name">What the earlier tables are.</param>
    public PolarPicture Over(Section earlier, string name) => this with { Earlier = new EarlierTables(earlier, name) };

    internal static string ReynoldsText(double reynolds)
        => double.IsNaN(reynolds) ? "any" : ReynoldsNumber.Text(reynolds);

    private static string Contents(Section section)
    {
        var numbers = section.Polars.Select(polar => ReynoldsText(polar.Reynolds)).ToList();
        var reynolds = section.Polars switch
        {
            [{ Reynolds: double.NaN }] => "no Reynolds number",
            [_] => $"Reynolds number {numbers[0]}",
            { Length: <= MostReynoldsNumbersListed } => $"Reynolds numbers {string.Join(", ", numbers)}",
            _ => string.Create(CultureInfo.InvariantCulture, $"{numbers.Count} Reynolds numbers from {numbers[0]} to {numbers[^1]}"),
        };
        var (from, to) = (section.Polars.Min(p => p.Angles[0]), section.Polars.Max(p => p.Angles[^1]));
        return string.Create(CultureInfo.InvariantCulture,
            $"{reynolds}; {section.Polars.Sum(p => p.Angles.Length)} rows from {AngleText(from)} to {AngleText(to)} deg");
    }

    private static string AngleText(double angle) => double.RadiansToDegrees(angle).ToString("0.###", CultureInfo.InvariantCulture);
}

/// <summary>One line of a picture.</summary>
/// <param name="Label">What the legend says of it; lines of one kind and label stand in the legend once.</param>
public sealed record PolarLine(Polar Polar, LineKind Kind, string Label)
{
    /// <summary>The parts of the polar that are drawn, rad, each from lower to higher; empty for all of it.</summary>
    public ImmutableArray<(double From, double To)> Parts { get; init; } = [];
}

/// <summary>A row of a table that a reader is to look at.</summary>
/// <param name="Of">Which of its coefficients: it has no ring where only the other is drawn.</param>
public readonly record struct RingedRow(Polar Polar, int Row, RingedCoefficient Of);

public enum RingedCoefficient { Both, Lift, Drag }

/// <summary>Where a line comes from; each kind looks different.</summary>
public enum LineKind
{
    /// <summary>A table's own rows: a colour, a dash and a mark for each Reynolds number.</summary>
    Tabulated,

    /// <summary>Worked out beyond the table's own angles.</summary>
    Extended,

    /// <summary>Worked out from the table for a place on a rotor.</summary>
    Augmented,
}

/// <summary>The tables of a section before an update.</summary>
/// <param name="Name">What they are, for the legend.</param>
public sealed record EarlierTables(Section Section, string Name)
{
    internal string Label => $"before: {Name}";
}
