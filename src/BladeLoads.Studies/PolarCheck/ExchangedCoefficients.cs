using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>Lift under cd and drag under cl, where neither has a sign that gives it away.</summary>
internal static class ExchangedCoefficients
{
    private const double To = 10;            // deg, from 0: flow is attached, whatever the section
    private const double RiseOfLift = 0.4;   // between the two at least
    private const double LittleDrag = 0.15;  // more has no slender section there

    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar polar)
    {
        var rows = Enumerable.Range(0, polar.Rows.Length).Where(i => polar.Rows[i].AngleDeg is >= 0 and <= To).ToArray();
        if (rows.Length < 2)
            yield break;
        var (first, last) = (polar.Rows[rows[0]], polar.Rows[rows[^1]]);
        var largest = rows.Max(i => Math.Abs(polar.Rows[i].Lift));
        if (last.Drag - first.Drag > RiseOfLift && largest < LittleDrag)
            yield return polar.Doubt(DoubtKinds.ExchangedColumns, "cl", rows, -180, 180,
                $"cd rises from {Given(first.Drag)} at {Given(first.AngleDeg)} deg to {Given(last.Drag)} at {Given(last.AngleDeg)} deg, and "
                + $"cl is {Found(largest)} at most",
                "; are cl and cd exchanged?");
    }
}
