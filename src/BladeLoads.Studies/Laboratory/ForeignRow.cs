namespace BladeLoads.Studies.Laboratory;

/// <summary>A row of a foreign table, in its own units.</summary>
/// <param name="Line">Counted from 1.</param>
/// <param name="Angle">Degrees or radians.</param>
/// <param name="Lift">Lift coefficient; where forces are taken, that square to the chord.</param>
/// <param name="Drag">Drag coefficient; where forces are taken, that along the chord.</param>
/// <param name="Moment">NaN where no column is taken.</param>
/// <param name="Reynolds">NaN where no column is taken.</param>
internal readonly record struct ForeignRow(int Line, double Angle, double Lift, double Drag, double Moment, double Reynolds)
{
    /// <summary>Columns of the first characters of angle and drag in the line; these say nothing about the values.</summary>
    public (int Angle, int Drag) At { get; init; }

    public bool HasValuesOf(in ForeignRow other) => Angle == other.Angle && Lift == other.Lift && Drag == other.Drag
        && Moment.Equals(other.Moment) && Reynolds.Equals(other.Reynolds);
}
