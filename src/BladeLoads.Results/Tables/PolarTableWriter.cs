using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using BladeLoads.Results.Wording;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Results.Tables;

/// <summary>
/// Writes a polar table as cases read it (docs/formats.md): what was done in head comments, then the rows, each number in the fewest
/// digits that read back as the same.
/// </summary>
/// <remarks>Not by <see cref="TableWriter"/>, which rounds to 12 digits: what was read must be what is written.</remarks>
public static class PolarTableWriter
{
    /// <param name="record">Lines of the head, without mark; what moves a cursor in them is written as <c>\uXXXX</c>.</param>
    /// <param name="polars">
    /// One or more, Reynolds numbers rising, or one alone that leaves it open. Moments in all rows or in none.
    /// </param>
    /// <returns>UTF-8 without a mark, lines ended by LF.</returns>
    /// <exception cref="ArgumentException">A polar breaks what is said above.</exception>
    public static byte[] Write(IEnumerable<string> record, ImmutableArray<PolarRows> polars)
    {
        var rows = polars.SelectMany(polar => polar.Rows).ToList();
        var hasMoments = rows.Exists(row => !double.IsNaN(row.Moment));
        if (rows.Count == 0 || hasMoments && rows.Exists(row => double.IsNaN(row.Moment)))
            throw new ArgumentException("a polar table has rows, with moments in all of them or in none", nameof(polars));
        if (polars.Length > 1 && !Enumerable.Range(1, polars.Length - 1).All(i => polars[i].Reynolds > polars[i - 1].Reynolds))
            throw new ArgumentException("Reynolds numbers of a polar table rise", nameof(polars));
        var hasReynolds = !double.IsNaN(polars[0].Reynolds);

        var text = new StringBuilder();
        foreach (var line in record)
            text.Append("# ").Append(Printable.Of(line)).Append('\n');
        text.Append(hasReynolds ? "reynolds," : "").Append("alpha_deg,cl,cd").Append(hasMoments ? ",cm" : "").Append('\n');
        foreach (var polar in polars)
            foreach (var row in polar.Rows)
            {
                if (hasReynolds)
                    text.Append(Shortest(polar.Reynolds)).Append(',');
                text.Append(Shortest(row.AngleDeg)).Append(',').Append(Shortest(row.Lift)).Append(',').Append(Shortest(row.Drag));
                if (hasMoments)
                    text.Append(',').Append(Shortest(row.Moment));
                text.Append('\n');
            }
        return Encoding.UTF8.GetBytes(text.ToString());
    }

    // 0 without a sign: -0 would differ from it in a comparison of files, and means nothing here.
    private static string Shortest(double number) => double.IsFinite(number)
        ? (number + 0.0).ToString("R", CultureInfo.InvariantCulture)
        : throw new ArgumentException("a polar table holds finite numbers only", nameof(number));
}
