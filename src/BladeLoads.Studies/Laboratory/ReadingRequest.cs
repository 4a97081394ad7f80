using System.Collections.Immutable;

namespace BladeLoads.Studies.Laboratory;

public enum AngleUnit
{
    Degrees,
    Radians,
}

public enum DecimalSign
{
    Point,
    Comma,
}

public enum CellSeparator
{
    Tab,
    Semicolon,
    Comma,
    Bar,
    Blanks,
}

/// <summary>Of Reynolds numbers beside which none stands; the value is the power of ten.</summary>
public enum ReynoldsUnit
{
    Thousands = 3,
    Millions = 6,
}

/// <summary>Which rows count where a file holds the angles more than once, up and down.</summary>
public enum SweepChoice
{
    Rising,
    Falling,
    Mean,
    All,
}

/// <summary>Lines of a file, counted from 1, both ends included.</summary>
public readonly record struct LineRange(int First, int Last);

/// <summary>What a user says about a foreign table. Whatever is left out (null) is to be told by the table itself, or it is refused.</summary>
public sealed record ReadingRequest
{
    /// <summary>Stands for a column that is not to be taken, though the header names one.</summary>
    public const string NoColumn = "none";

    /// <summary>By role: a number counted from 1, a name in the header, or <see cref="NoColumn"/>.</summary>
    public ImmutableSortedDictionary<ColumnRole, string> Columns { get; init; } = ImmutableSortedDictionary<ColumnRole, string>.Empty;

    public AngleUnit? Angles { get; init; }

    public DecimalSign? DecimalSign { get; init; }

    public CellSeparator? Separator { get; init; }

    /// <summary>Of the whole table, which names none; 1e4 or more.</summary>
    public double? Reynolds { get; init; }

    /// <summary>Of the Reynolds numbers in the table, where neither the name of their column nor the line that names them says one.</summary>
    public ReynoldsUnit? ReynoldsUnit { get; init; }

    /// <summary>A line that begins with this is a comment, as are those that begin with <c># % ! //</c>.</summary>
    public string? Comment { get; init; }

    /// <summary>Only these lines are looked at.</summary>
    public LineRange? Lines { get; init; }

    public SweepChoice? Sweep { get; init; }

    /// <summary>Only rows of this section, of those that a column names.</summary>
    public string? Section { get; init; }

    /// <summary>Rows without a value in a column that is taken are left out.</summary>
    public bool LeaveOutIncomplete { get; init; }

    /// <summary>Rows with a drag below 0 are left out.</summary>
    public bool LeaveOutNegativeDrag { get; init; }

    /// <summary>Angles beyond 180 degrees stand for those a turn less, beyond -180 degrees for those a turn more.</summary>
    public bool Wrap { get; init; }

    internal bool Takes(ColumnRole role) => Columns.TryGetValue(role, out var column) && column != NoColumn;

    internal bool LeavesOut(ColumnRole role) => Columns.TryGetValue(role, out var column) && column == NoColumn;

    /// <summary>Lift and drag come from forces square to the chord and along it.</summary>
    internal bool TakesForces => Takes(ColumnRole.Normal);

    /// <summary>The roles without which there is no table.</summary>
    internal ImmutableArray<ColumnRole> Needed => TakesForces
        ? [ColumnRole.Angle, ColumnRole.Normal, Takes(ColumnRole.Axial) ? ColumnRole.Axial : ColumnRole.Tangential]
        : [ColumnRole.Angle, ColumnRole.Lift, ColumnRole.Drag];
}
