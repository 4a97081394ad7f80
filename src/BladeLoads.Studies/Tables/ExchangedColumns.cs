namespace BladeLoads.Studies.Tables;

/// <summary>Whether a polar table seems to have its lift under cd and its drag under cl. Common practice, no source.</summary>
internal static class ExchangedColumns
{
    private const int Many = 3;               // rows with negative drag: one or two are slips of their own
    private const double LittleLift = 0.3;    // every section but a round one goes beyond
    private const double SmallAngle = 10;     // deg; there drag is small, whatever the section
    private const double MuchDrag = 0.5;      // at a small angle

    /// <param name="rows">Angle in degrees; coefficients that could not be read are NaN.</param>
    public static bool AreLikely(IEnumerable<(double Angle, double Lift, double Drag)> rows)
    {
        var all = rows.ToList();
        return all.Count(row => row.Drag < 0) > Many
            && (all.All(row => !(Math.Abs(row.Lift) >= LittleLift))
                || all.Exists(row => Math.Abs(row.Angle) <= SmallAngle && row.Drag > MuchDrag && row.Lift <= MuchDrag));
    }
}
