using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>Drag in percent makes a bluff section of a slender one; that it lifts like a slender one gives it away.</summary>
internal static class DragUnit
{
    private const double MuchDrag = 0.25;      // a section with a blunt trailing edge has up to 0.2; in percent the least of any is 0.3
    private const double SlenderSlope = 0.6;   // of 2 pi
    private const double SlenderLift = 0.8;

    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar polar)
    {
        if (polar.Figures is
            {
                LeastDrag: { Value: >= MuchDrag } drag, SlopeRatio: >= SlenderSlope and var slope, LargestLift: { Value: > SlenderLift } lift,
            })
            yield return polar.Doubt(
                DoubtKinds.UnitOfDrag, "cd", [drag.Row], -180, 180,
                $"cd is {Given(drag.Value)} at least, and lift rises by {Found(slope)} of 2 pi to {Given(lift.Value)}, as that of slender sections "
                + "does",
                "; they have a tenth of such drag and less: is it in percent?");
    }
}
