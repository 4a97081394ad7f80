using System.Collections.Immutable;
using BladeLoads.Studies.Tables;
using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>
/// Rows off the line of their neighbours: beyond, and to one side of, the straight lines through the two rows before, through the two
/// after, and through the nearest of both. A kink, such as a stall, is on one of the three.
/// </summary>
/// <remarks>
/// A row that sticks out bends the lines of its neighbours too, so that they seem to be off themselves: of all rows that seem so the one that
/// is off most counts, and the others are looked at again without it. The second row and the last but one have two lines; they count only
/// where they bend those of others.
/// </remarks>
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
        => OfColumn(polar, "cl", row => row.Lift, polar.Scattered.Lift).Concat(OfColumn(polar, "cd", row => row.Drag, polar.Scattered.Drag));

    /// <summary>The rows that are off in lift, and in drag, in their order, and by how much.</summary>
    public static (ImmutableArray<Scattered> Lift, ImmutableArray<Scattered> Drag) Of(CheckedPolar polar) => (
        new Looking(polar, row => row.Lift, _ => OffLift).Found(),
        new Looking(polar, row => row.Drag, line => Math.Max(OffDrag, OffDragShare * line)).Found());

    private static IEnumerable<PolarDoubt> OfColumn(
        CheckedPolar polar, string column, Func<PolarRow, double> value, ImmutableArray<Scattered> off)
    {
        var looked = Enumerable.Range(0, polar.Rows.Length).Where(i => polar.Rows[i].AngleDeg is >= Lowest and <= Highest).ToArray();
        if (off.Length > MostSingly(looked.Length))
        {
            yield return polar.Doubt(
                DoubtKinds.Scatter, column, off.Select(x => x.Row), polar.Rows[off[0].Row].AngleDeg, polar.Rows[off[^1].Row].AngleDeg,
                $"{column} scatters: {off.Length} of {looked.Length} rows from {Given(polar.Rows[looked[0]].AngleDeg)} to "
                + $"{Given(polar.Rows[looked[^1]].AngleDeg)} deg lie off the line of their neighbours",
                "; smooth the table");
            yield break;
        }
        foreach (var (row, by) in off)
            yield return polar.Doubt(
                DoubtKinds.Scatter, column, [row], polar.Rows[Math.Max(0, row - 1)].AngleDeg,
                polar.Rows[Math.Min(row + 1, polar.Rows.Length - 1)].AngleDeg,
                $"{column} is {Given(value(polar.Rows[row]))} at {Given(polar.Rows[row].AngleDeg)} deg, {Found(Math.Abs(by))} "
                + $"{(by > 0 ? "above" : "below")} the line of its neighbours",
                "; compare it with the source, or leave the row out");
    }

    private static double MostSingly(int looked) => Math.Max(3, Many * looked);

    /// <param name="tolerance">By what the neighbours say.</param>
    private sealed class Looking(CheckedPolar polar, Func<PolarRow, double> value, Func<double, double> tolerance)
    {
        private readonly List<int> _kept = [.. Enumerable.Range(0, polar.Rows.Length)
            .Where(i => polar.Rows[i].AngleDeg is >= Lowest - (2 * Farthest) and <= Highest + (2 * Farthest))];

        public ImmutableArray<Scattered> Found()
        {
            var off = Off();
            if (off.Count > MostSingly(polar.Rows.Count(row => row.AngleDeg is >= Lowest and <= Highest)))
                return [.. off.Select(o => new Scattered(_kept[o.Place], o.By))];
            var found = new SortedDictionary<int, double>();
            for (; off.Count > 0; off = Off())
            {
                var (place, by, _) = off.Concat(AtEnds(off)).MaxBy(o => o.Share);
                found.Add(_kept[place], by);
                _kept.RemoveAt(place);
            }
            return [.. found.Select(f => new Scattered(f.Key, f.Value))];
        }

        private List<(int Place, double By, double Share)> Off()
            => [.. Enumerable.Range(0, _kept.Count).Where(place => place >= 2 && place + 2 < _kept.Count).SelectMany(OffAt)];

        // The second row and the last but one, where a row that seems to be off looks at them.
        private IEnumerable<(int Place, double By, double Share)> AtEnds(List<(int Place, double By, double Share)> off)
            => new[] { 1, _kept.Count - 2 }.Where(end => off.Exists(o => Math.Abs(o.Place - end) is 1 or 2)).SelectMany(OffAt);

        // None or one.
        private IEnumerable<(int Place, double By, double Share)> OffAt(int place)
        {
            var (first, last) = (Math.Max(0, place - 2), Math.Min(place + 2, _kept.Count - 1));
            if (Row(place).AngleDeg is < Lowest or > Highest
                || Enumerable.Range(first + 1, last - first).Any(i => Row(i).AngleDeg - Row(i - 1).AngleDeg > Farthest))
                yield break;
            var between = Line(place, place - 1, place + 1);
            var here = value(Row(place));
            double[] off =
            [
                here - between,
                .. first == place - 2 ? [here - Line(place, place - 2, place - 1)] : (double[])[],
                .. last == place + 2 ? [here - Line(place, place + 1, place + 2)] : (double[])[],
            ];
            if (!off.All(x => x > 0) && !off.All(x => x < 0))
                yield break;
            var (least, tolerated) = (off.MinBy(Math.Abs), tolerance(Math.Abs(between)));
            if (Math.Abs(least) > tolerated)
                yield return (place, least, Math.Abs(least) / tolerated);
        }

        private PolarRow Row(int place) => polar.Rows[_kept[place]];

        private double Line(int place, int a, int b) => value(Row(a))
            + ((value(Row(b)) - value(Row(a))) * (Row(place).AngleDeg - Row(a).AngleDeg) / (Row(b).AngleDeg - Row(a).AngleDeg));
    }
}

/// <summary>A row off its line.</summary>
/// <param name="By">How far above it; negative: below.</param>
internal readonly record struct Scattered(int Row, double By);
