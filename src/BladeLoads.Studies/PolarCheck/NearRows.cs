using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>Two rows for what is one angle: between them the curve is a needle.</summary>
internal static class NearRows
{
    private const double OneAngle = 0.05;   // deg
    private const double Near = 0.2;        // deg; one angle too, where the two rows contradict each other

    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar polar)
    {
        for (var i = 1; i < polar.Rows.Length; i++)
            if (AreOne(polar, i - 1, i))
                yield return polar.DoubtBetween(DoubtKinds.OneAngleTwice, "alpha_deg", i - 1, i,
                    $"alpha_deg {Given(polar.Rows[i - 1].AngleDeg)} and {Given(polar.Rows[i].AngleDeg)} are hardly two angles "
                    + polar.RowToRow(i - 1, i),
                    "; keep one of them, or their mean");
    }

    public static bool AreOne(CheckedPolar polar, int first, int second)
    {
        var apart = polar.Rows[second].AngleDeg - polar.Rows[first].AngleDeg;
        return apart < OneAngle || (apart < Near && (Jumps.LiftJumps(polar, first, second) || Jumps.DragJumps(polar, first, second)));
    }
}
