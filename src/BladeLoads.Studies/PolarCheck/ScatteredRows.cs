using BladeLoads.Studies.Tables;
using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>
/// Rows off the line of their neighbours: beyond, and to one side of, the straight lines through the two rows before, through the two
/// after, and through the nearest of both. A kink, such as a stall, is on one of the three.
/// </summary>
internal static class ScatteredRows
{
    private const double Lowest = -30;      // deg
    private const double Highest = 40;      // deg
    private const double Farthest = 6;      // deg from row to row; farther away no neighbour says anything
    private const double OffLift = 0.03;
    private const double OffDrag = 0.002;   // and a quarter of what the neighbours say
    private const double OffDragShare = 0.25;
    private const double Many = 0.25;       // of the rows

    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar polar)
    {
        if (polar.Figures.IsBluff)
            return [];
        return OfColumn(polar, "cl", row => row.Lift, OffLiftBy).Concat(OfColumn(polar, "cd", row => row.Drag, OffDragBy));
    }

    /// <summary>Whether a row is off in either coefficient.</summary>
    public static bool IsOff(CheckedPolar polar, int row) => OffLiftBy(polar, row) is not null || OffDragBy(polar, row) is not null;

    private static IEnumerable<PolarDoubt> OfColumn(
        CheckedPolar polar, string column, Func<PolarRow, double> value, Func<CheckedPolar, int, double?> offBy)
    {
        var looked = Enumerable.Range(0, polar.Rows.Length).Where(i => polar.Rows[i].AngleDeg is >= Lowest and <= Highest).ToArray();
        var off = looked.Select(i => (Row: i, By: offBy(polar, i))).Where(x => x.By is not null).ToArray();
        if (off.Length > Math.Max(3, Many * looked.Length))
        {
            yield return polar.Doubt(
                DoubtKinds.Scatter, column, off.Select(x => x.Row), polar.Rows[off[0].Row].AngleDeg, polar.Rows[off[^1].Row].AngleDeg,
                $"{column} scatters: {off.Length} of {looked.Length} rows from {Given(polar.Rows[looked[0]].AngleDeg)} to "
                + $"{Given(polar.Rows[looked[^1]].AngleDeg)} deg lie off the line of their neighbours",
                "; smooth the table");
            yield break;
        }
        foreach (var (row, by) in off)
            yield return polar.Doubt(DoubtKinds.Scatter, column, [row], polar.Rows[row - 1].AngleDeg, polar.Rows[row + 1].AngleDeg,
                $"{column} is {Given(value(polar.Rows[row]))} at {Given(polar.Rows[row].AngleDeg)} deg, {Found(Math.Abs(by!.Value))} "
                + $"{(by > 0 ? "above" : "below")} the line of its neighbours",
                "; compare it with the source, or leave the row out");
    }

    private static double? OffLiftBy(CheckedPolar polar, int row) => Off(polar, row, r => r.Lift, _ => OffLift);

    private static double? OffDragBy(CheckedPolar polar, int row)
        => Off(polar, row, r => r.Drag, line => Math.Max(OffDrag, OffDragShare * line));

    private static double? Off(CheckedPolar polar, int row, Func<PolarRow, double> value, Func<double, double> tolerance)
    {
        if (polar.Rows[row].AngleDeg is < Lowest or > Highest || row < 2 || row + 2 >= polar.Rows.Length
            || Enumerable.Range(row - 1, 4).Any(i => polar.Rows[i].AngleDeg - polar.Rows[i - 1].AngleDeg > Farthest))
            return null;
        double Line(int a, int b)
        {
            var (x, from, to) = (polar.Rows[row].AngleDeg, polar.Rows[a], polar.Rows[b]);
            return value(from) + ((value(to) - value(from)) * (x - from.AngleDeg) / (to.AngleDeg - from.AngleDeg));
        }
        var between = Line(row - 1, row + 1);
        var here = value(polar.Rows[row]);
        double[] off = [here - between, here - Line(row - 2, row - 1), here - Line(row + 1, row + 2)];
        if (!off.All(x => x > 0) && !off.All(x => x < 0))
            return null;
        var least = off.MinBy(Math.Abs);
        return Math.Abs(least) > tolerance(Math.Abs(between)) ? least : null;
    }
}
