namespace BladeLoads.Studies;

/// <summary>
/// The order in which findings are told: study.toml, cases, blades, polars, everything else; then by name of the file
/// (ordinal), line and column. What concerns a whole file comes first in it, what concerns a whole line last in that.
/// </summary>
public sealed class FindingOrder : IComparer<InputFinding>
{
    private FindingOrder()
    {
    }

    public static FindingOrder Instance { get; } = new();

    /// <inheritdoc/>
    public int Compare(InputFinding? x, InputFinding? y)
    {
        if (x is null || y is null)
            return (x is null ? 0 : 1) - (y is null ? 0 : 1);
        var order = Rank(x.File).CompareTo(Rank(y.File));
        if (order == 0)
            order = string.CompareOrdinal(x.File, y.File);
        if (order == 0)
            order = x.Line.CompareTo(y.Line);
        if (order == 0)
            order = Column(x).CompareTo(Column(y));
        return order != 0 ? order : string.CompareOrdinal(x.Text, y.Text);
    }

    private static int Column(InputFinding finding) => finding.Column > 0 ? finding.Column : int.MaxValue;

    private static int Rank(string file) => file switch
    {
        StudyReader.StartingValuesFile => 0,
        _ when file.StartsWith("cases/", StringComparison.Ordinal) => 1,
        _ when file.StartsWith("blades/", StringComparison.Ordinal) => 2,
        _ when file.StartsWith("polars/", StringComparison.Ordinal) => 3,
        _ => 4,
    };
}
