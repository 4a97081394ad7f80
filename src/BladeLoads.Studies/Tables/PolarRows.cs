using System.Collections.Immutable;

namespace BladeLoads.Studies.Tables;

/// <summary>A row of a polar table, in the units of the file.</summary>
/// <param name="AngleDeg">Angle of attack, degrees, -180 to 180.</param>
/// <param name="Lift">Lift coefficient.</param>
/// <param name="Drag">Drag coefficient, 0 or more.</param>
/// <param name="Moment">Moment coefficient; NaN in a table without.</param>
public readonly record struct PolarRow(double AngleDeg, double Lift, double Drag, double Moment)
{
    /// <summary>The row with other coefficients, each to twelve digits where it moved, and with all its digits where it did not.</summary>
    public PolarRow With(double lift, double drag) => this with
    {
        Lift = Lift == lift ? Lift : TwelveDigits.Of(lift),
        Drag = Drag == drag ? Drag : TwelveDigits.Of(drag),
    };
}

/// <summary>The rows of one Reynolds number, angles rising. Two with equal rows are not equal: the list goes by reference.</summary>
/// <param name="Reynolds">Above 0; NaN in a table that leaves it open.</param>
public sealed record PolarRows(double Reynolds, ImmutableArray<PolarRow> Rows);
