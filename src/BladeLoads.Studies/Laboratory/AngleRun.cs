namespace BladeLoads.Studies.Laboratory;

/// <summary>Rows one after the other whose angles go one way.</summary>
/// <param name="Direction">1 rising, -1 falling, 0 for one row, or rows of one angle.</param>
internal sealed record AngleRun(int Direction, List<LaboratoryRow> Rows)
{
    private double Least => Math.Min(Rows[0].Angle, Rows[^1].Angle);

    private double Most => Math.Max(Rows[0].Angle, Rows[^1].Angle);

    /// <summary>The rows as runs. Where angles turn from one run to the next, the row at the turn is in both.</summary>
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
                runs.Add(new AngleRun(direction, run));
                // A jump to where another sweep begins, or over the whole of this one, is no turn.
                var goesBack = Math.Sign(rows[i].Angle - run[0].Angle) == direction;
                var turns = goesBack && (i + 1 == rows.Count || Math.Sign(rows[i + 1].Angle - rows[i].Angle) != direction);
                run = turns ? [run[^1]] : [];
                step = turns ? step : 0;
                direction = 0;
            }
            run.Add(rows[i]);
            direction = direction == 0 ? step : direction;
        }
        runs.Add(new AngleRun(direction, run));
        return runs;
    }

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
