namespace BladeLoads.Studies.Laboratory;

/// <summary>Rows one after the other whose angles go one way.</summary>
/// <param name="Direction">1 rising, -1 falling, 0 for one row, or rows of one angle.</param>
internal sealed record AngleRun(int Direction, List<LaboratoryRow> Rows)
{
    private double Least => Math.Min(Rows[0].Angle, Rows[^1].Angle);

    private double Most => Math.Max(Rows[0].Angle, Rows[^1].Angle);

    /// <summary>
    /// The rows as runs. Where angles turn from one run to the next, the row at the turn is in both; of two at one angle there, the first ends
    /// the one run and the second begins the other.
    /// </summary>
    public static List<AngleRun> Of(IReadOnlyList<LaboratoryRow> rows)
    {
        var runs = new List<AngleRun>();
        var run = new List<LaboratoryRow>();
        var direction = 0;
        for (var i = 0; i < rows.Count; i++)
        {
            var step = run.Count == 0 ? 0 : Math.Sign(rows[i].Angle - run[^1].Angle);
            if (direction != 0 && step != 0 && step != direction)
            {
                // A jump to where another sweep begins, or over the whole of this one, is no turn.
                var goesBack = Math.Sign(rows[i].Angle - run[0].Angle) == direction;
                var turns = goesBack && (i + 1 == rows.Count || Math.Sign(rows[i + 1].Angle - rows[i].Angle) != direction);
                List<LaboratoryRow> next = turns ? [run[^1]] : [];
                if (turns && IsMeasuredTwice(run))
                    run.RemoveAt(run.Count - 1);
                runs.Add(new AngleRun(direction, run));
                run = next;
                step = turns ? step : 0;
                direction = 0;
            }
            run.Add(rows[i]);
            direction = direction == 0 ? step : direction;
        }
        runs.Add(new AngleRun(direction, run));
        return runs;
    }

    // Of three at one angle it cannot be told which end which run.
    private static bool IsMeasuredTwice(List<LaboratoryRow> run)
        => run.Count > 2 && run[^1].Angle == run[^2].Angle && run[^3].Angle != run[^1].Angle;

    /// <summary>Two runs over the same range, in the order of the file; null where there are none: ends may touch.</summary>
    public static (AngleRun One, AngleRun Other)? Overlap(List<AngleRun> runs)
    {
        var order = Enumerable.Range(0, runs.Count).OrderBy(i => runs[i].Least).ThenBy(i => runs[i].Most).ToList();
        for (var k = 1; k < order.Count; k++)
            if (runs[order[k]].Least < runs[order[k - 1]].Most)
                return (runs[Math.Min(order[k], order[k - 1])], runs[Math.Max(order[k], order[k - 1])]);
        return null;
    }
}
