using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>
/// Steps between two rows that no flow makes but at stall. Attached lift rises by 0.11 a degree, and by 0.16 on thick sections; the drag
/// of a plate across the wind by 0.035 at most.
/// </summary>
internal static class Jumps
{
    private const double SteepLift = 0.25;   // a degree
    private const double SteepDrag = 0.1;    // a degree

    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar polar)
    {
        for (var i = 1; i < polar.Rows.Length; i++)
        {
            // Told as one angle twice, as a stall, or as a row off its line.
            if (NearRows.AreOne(polar, i - 1, i) || SharpStall.IsNear(polar, i - 1, i)
                || polar.IsScattered(i - 1) || polar.IsScattered(i))
                continue;
            if (LiftJumps(polar, i - 1, i))
                yield return Jump(polar, i, "cl", polar.Rows[i - 1].Lift, polar.Rows[i].Lift);
            if (DragJumps(polar, i - 1, i))
                yield return Jump(polar, i, "cd", polar.Rows[i - 1].Drag, polar.Rows[i].Drag);
        }
    }

    public static bool LiftJumps(CheckedPolar polar, int first, int second)
        => Math.Abs(polar.Rows[second].Lift - polar.Rows[first].Lift) > SteepLift * Apart(polar, first, second);

    public static bool DragJumps(CheckedPolar polar, int first, int second)
        => Math.Abs(polar.Rows[second].Drag - polar.Rows[first].Drag) > SteepDrag * Apart(polar, first, second);

    private static PolarDoubt Jump(CheckedPolar polar, int row, string column, double from, double to)
        => polar.DoubtBetween(DoubtKinds.Jump, column, row - 1, row,
            $"{column} jumps from {Given(from)} to {Given(to)} between {Given(polar.Rows[row - 1].AngleDeg)} and "
            + $"{Given(polar.Rows[row].AngleDeg)} deg {polar.RowToRow(row - 1, row)}",
            "; give rows between them, or mend the slip");

    private static double Apart(CheckedPolar polar, int first, int second) => polar.Rows[second].AngleDeg - polar.Rows[first].AngleDeg;
}
