using System.Globalization;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Laboratory;

/// <summary>
/// Brings the rows of one Reynolds number into order of angle. Where their angles go over the same ground more than once, up and down, the
/// user says which count: a section stalls at one angle and recovers at another.
/// </summary>
/// <param name="report">Receives line, column and text of what is wrong.</param>
/// <param name="leaveOut">Receives rows that are passed over, each with the reason.</param>
internal sealed class SweepOrder(SweepChoice? choice, Action<int, int, string> report, Action<int, string> leaveOut)
{
    // deg. Nobody sets a section so finely: two angles nearer to each other are one, written down twice.
    private const double OneAngle = 1e-5;

    /// <summary>What was done to the order, for the record; null where nothing was.</summary>
    public string? Done { get; private set; }

    /// <summary>Angles rising; null where an error was reported.</summary>
    /// <param name="rows">In the order of the file, one at least.</param>
    public List<LaboratoryRow>? Sort(IReadOnlyList<LaboratoryRow> rows)
    {
        var runs = AngleRun.Of(WithoutRepeats(rows, (_, _) => { }));
        if (AngleRun.Overlap(runs) is null)
        {
            if (runs.Count > 1 || runs[0].Direction < 0)
                Done = "rows are sorted by angle";
            return InOrder(AngleRun.Of(rows));
        }
        // A row that is the same in both sweeps counts in both.
        runs = AngleRun.Of(rows);
        if (choice == SweepChoice.All)
        {
            Done = "rows of all sweeps are taken together, sorted by angle";
            return InOrder(runs);
        }
        return choice switch
        {
            null => Refuse(AngleRun.Overlap(runs)!.Value),
            SweepChoice.Mean => Mean(runs),
            SweepChoice.Rising => Chosen(runs, 1, "rising"),
            _ => Chosen(runs, -1, "falling"),
        };
    }

    private List<LaboratoryRow>? InOrder(List<AngleRun> runs)
    {
        var rows = runs.SelectMany(run => run.Rows).DistinctBy(row => row.Line).OrderBy(row => row.Angle).ThenBy(row => row.Line);
        var sorted = WithoutRepeats(rows, leaveOut);
        return AreDistinct(sorted) ? sorted : null;
    }

    private List<LaboratoryRow>? Chosen(List<AngleRun> runs, int direction, string word)
    {
        var chosen = runs.FindAll(run => run.Direction == direction);
        if (chosen.Count == 0 || AngleRun.Overlap(chosen) is not null)
        {
            report(runs[0].Rows[0].Line, 0,
                $"has {(chosen.Count == 0 ? "no" : "more than one")} sweep of {word} angles over the same range; choose rows with --lines, "
                + "or take all with --sweep all");
            return null;
        }
        var kept = chosen.SelectMany(run => run.Rows).Select(row => row.Line).ToHashSet();
        foreach (var row in runs.SelectMany(run => run.Rows).Where(row => !kept.Contains(row.Line)).DistinctBy(row => row.Line))
            leaveOut(row.Line, $"not of the sweep of {word} angles");
        Done = $"rows of the sweep of {word} angles are taken";
        return InOrder(chosen);
    }

    // A row that says what another said takes nothing away.
    private static List<LaboratoryRow> WithoutRepeats(IEnumerable<LaboratoryRow> rows, Action<int, string> leaveOut)
    {
        var known = new Dictionary<PolarRow, int>();
        var left = new List<LaboratoryRow>();
        foreach (var row in rows)
            if (known.TryAdd(row.Values, row.Line))
                left.Add(row);
            else
                leaveOut(row.Line, string.Create(CultureInfo.InvariantCulture, $"the same as line {known[row.Values]}"));
        return left;
    }

    private List<LaboratoryRow>? Refuse((AngleRun One, AngleRun Other) both)
    {
        var (one, other) = both;
        report(other.Rows[0].Line, other.Rows[0].Column, string.Create(CultureInfo.InvariantCulture,
            $"angles {Goes(one)} and then {Goes(other)}: two sweeps over the same range, or rows out of order; "
                + $"say which count with --sweep rising, falling, mean or all, or choose rows with --lines"));
        return null;
    }

    private static string Goes(AngleRun run) => run.Rows.Count == 1
        ? string.Create(CultureInfo.InvariantCulture, $"are {CanonicalText.Of(run.Rows[0].Angle)} (line {run.Rows[0].Line})")
        : string.Create(CultureInfo.InvariantCulture,
            $"{(run.Direction < 0 ? "fall" : "rise")} from {CanonicalText.Of(run.Rows[0].Angle)} to {CanonicalText.Of(run.Rows[^1].Angle)} "
                + $"(lines {run.Rows[0].Line} to {run.Rows[^1].Line})");

    private List<LaboratoryRow>? Mean(List<AngleRun> runs)
    {
        if (runs is not [var first, var second] || first.Direction == second.Direction)
        {
            report(runs[0].Rows[0].Line, 0,
                "--sweep mean takes two sweeps, one of rising and one of falling angles, and there are others; choose rows with --lines");
            return null;
        }
        if (!AreDistinct([.. first.Rows.OrderBy(row => row.Angle)]) | !AreDistinct([.. second.Rows.OrderBy(row => row.Angle)]))
            return null;
        var other = second.Rows.ToDictionary(row => row.Angle);
        var alone = first.Rows.Where(row => !other.ContainsKey(row.Angle))
            .Concat(second.Rows.ExceptBy(first.Rows.Select(row => row.Angle), row => row.Angle)).ToList();
        foreach (var row in alone)
            report(row.Line, row.Column,
                $"alpha {CanonicalText.Of(row.Angle)} is in one of the two sweeps only, so that there is no mean; choose rows with --lines, "
                + "or one sweep");
        if (alone.Count > 0)
            return null;
        Done = "lift, drag and moment are the means of a sweep of rising and one of falling angles, 12 significant digits";
        return [.. first.Rows.Select(row => row with { Values = MeanOf(row.Values, other[row.Angle].Values) }).OrderBy(row => row.Angle)];
    }

    private static PolarRow MeanOf(PolarRow one, PolarRow other) => one == other ? one : one with
    {
        Lift = TwelveDigits.Of((one.Lift + other.Lift) / 2),
        Drag = TwelveDigits.Of((one.Drag + other.Drag) / 2),
        Moment = double.IsNaN(one.Moment) ? double.NaN : TwelveDigits.Of((one.Moment + other.Moment) / 2),
    };

    private bool AreDistinct(List<LaboratoryRow> sorted)
    {
        var distinct = true;
        for (var i = 1; i < sorted.Count; i++)
        {
            var (one, other) = (sorted[i - 1], sorted[i]);
            var (oneRadian, otherRadian) = (double.DegreesToRadians(one.Angle), double.DegreesToRadians(other.Angle));
            // Asked in radians too: two angles that differ in their last digit may be one there.
            if (otherRadian > oneRadian && (other.Angle - one.Angle > OneAngle || other.Values with { AngleDeg = one.Angle } == one.Values))
                continue;
            distinct = false;
            report(other.Line, other.Column, string.Create(CultureInfo.InvariantCulture,
                $"alpha {CanonicalText.Of(other.Angle)} has {Coefficients(other)} here "
                    + $"and {Beside(one, other)}{Coefficients(one)} in line {one.Line}; which is meant cannot be told, keep one"));
        }
        return distinct;
    }

    private static string Beside(LaboratoryRow one, LaboratoryRow other)
        => one.Angle == other.Angle ? "" : $"alpha {CanonicalText.Of(one.Angle)}, within 1e-5 degrees of it, has ";

    private static string Coefficients(LaboratoryRow row)
        => $"cl {CanonicalText.Of(row.Values.Lift)} cd {CanonicalText.Of(row.Values.Drag)}"
            + (double.IsNaN(row.Values.Moment) ? "" : $" cm {CanonicalText.Of(row.Values.Moment)}");
}
