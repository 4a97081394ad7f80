using BladeLoads.Studies.Tables;
using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>Values that stand still where a section's do not: the limit of an instrument, or a row copied.</summary>
internal static class RepeatedRows
{
    private const double Widest = 90;       // deg; far beyond stall tables are often made, and flat there
    private const double Span = 2.5;        // deg; over less, equal numbers may be rounding
    private const double MuchDrag = 0.1;    // attached drag is flat; this is not attached
    private const double SomeLift = 0.05;

    private const string OfAnInstrument = ": the limit of an instrument? Measure there, or leave all but the first out";

    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar polar)
    {
        if (polar.Figures.IsBluff)
            yield break;
        foreach (var (first, last) in Runs(polar, (a, b) => a.Lift == b.Lift && a.Drag == b.Drag))
            yield return polar.DoubtBetween(DoubtKinds.RepeatedRows, "cl", first, last,
                $"cl and cd are {Given(polar.Rows[last].Lift)} and {Given(polar.Rows[last].Drag)} {Running(polar, first, last)}",
                ": copied? Measure there, or leave all but the first out");
        foreach (var (first, last) in Runs(polar, (a, b) => a.Drag == b.Drag && a.Drag > MuchDrag && a.Lift != b.Lift))
            if (last - first >= 2 && SpanOf(polar, first, last) >= Span)
                yield return polar.DoubtBetween(DoubtKinds.RepeatedRows, "cd", first, last,
                    $"cd is {Given(polar.Rows[last].Drag)} {Running(polar, first, last)}", OfAnInstrument);
        foreach (var (first, last) in Runs(polar, (a, b) => a.Lift == b.Lift && Math.Abs(a.Lift) > SomeLift && a.Drag != b.Drag))
            if (last - first >= 3 && SpanOf(polar, first, last) >= Span)
                yield return polar.DoubtBetween(DoubtKinds.RepeatedRows, "cl", first, last,
                    $"cl is {Given(polar.Rows[last].Lift)} {Running(polar, first, last)}", OfAnInstrument);
    }

    private static string Running(CheckedPolar polar, int first, int last)
        => $"in {Given(last - first + 1)} rows running, from {Given(polar.Rows[first].AngleDeg)} to {Given(polar.Rows[last].AngleDeg)} deg";

    private static double SpanOf(CheckedPolar polar, int first, int last) => polar.Rows[last].AngleDeg - polar.Rows[first].AngleDeg;

    private static IEnumerable<(int First, int Last)> Runs(CheckedPolar polar, Func<PolarRow, PolarRow, bool> areEqual)
    {
        bool IsRepeated(int row) => row < polar.Rows.Length && Math.Abs(polar.Rows[row].AngleDeg) <= Widest
            && Math.Abs(polar.Rows[row - 1].AngleDeg) <= Widest && areEqual(polar.Rows[row - 1], polar.Rows[row]);
        for (var i = 1; i < polar.Rows.Length; i++)
        {
            if (!IsRepeated(i))
                continue;
            var first = i - 1;
            while (IsRepeated(i + 1))
                i++;
            yield return (first, i);
        }
    }
}
