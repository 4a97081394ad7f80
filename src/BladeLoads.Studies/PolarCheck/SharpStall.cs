using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>
/// Lift that falls more steeply beyond stall than attached lift rises, 2 pi a radian: there an annulus may balance at several inflow
/// angles (docs/theory.md, 4.6), and loads jump.
/// </summary>
internal static class SharpStall
{
    private const double Steep = 2 * Math.PI * Math.PI / 180;   // a degree
    private const double SmallFall = 0.1;                       // too little for another balance
    private const double Farthest = 40;                         // deg; beyond, lift falls as that of a plate does

    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar polar)
    {
        for (var i = 1; i < polar.Rows.Length; i++)
        {
            if (!IsSteep(polar, i))
                continue;
            var (first, steepest) = (i - 1, 0.0);
            for (; i < polar.Rows.Length && IsSteep(polar, i); i++)
                steepest = Math.Max(steepest, -Secant(polar, i));
            var last = i - 1;
            if (polar.Rows[first].Lift - polar.Rows[last].Lift < SmallFall)
                continue;
            yield return polar.DoubtBetween(DoubtKinds.SharpStall, "cl", first, last,
                $"cl falls from {Given(polar.Rows[first].Lift)} to {Given(polar.Rows[last].Lift)} between {Given(polar.Rows[first].AngleDeg)} and "
                + $"{Given(polar.Rows[last].AngleDeg)} deg, by up to {Found(steepest)} a degree {polar.RowToRow(first, last)}",
                ": a sharp stall, in which several balances are likely; expect loads to jump there");
        }
    }

    /// <summary>Whether two neighbouring rows lie in a sharp stall, or beside one.</summary>
    public static bool IsNear(CheckedPolar polar, int first, int second)
        => IsSteep(polar, first) || IsSteep(polar, second) || IsSteep(polar, second + 1);

    // From the row before it.
    private static bool IsSteep(CheckedPolar polar, int row)
        => row >= 1 && row < polar.Rows.Length && !polar.Figures.IsBluff && !NearRows.AreOne(polar, row - 1, row)
            && (polar.Rows[row - 1] is { AngleDeg: > 0 and < Farthest, Lift: > 0 }
                || polar.Rows[row] is { AngleDeg: < 0 and > -Farthest, Lift: < 0 })
            && -Secant(polar, row) > Steep;

    private static double Secant(CheckedPolar polar, int row)
        => (polar.Rows[row].Lift - polar.Rows[row - 1].Lift) / (polar.Rows[row].AngleDeg - polar.Rows[row - 1].AngleDeg);
}
