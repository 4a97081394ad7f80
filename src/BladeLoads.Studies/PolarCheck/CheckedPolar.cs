using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>The rows of one Reynolds number under check: what the rules ask of them, and how they speak of them.</summary>
internal sealed class CheckedPolar
{
    private readonly CellPlaces _places;
    private readonly ImmutableArray<int> _lines;
    private (ImmutableArray<Scattered>, ImmutableArray<Scattered>)? _scattered;

    /// <param name="index">Which of the table's Reynolds numbers.</param>
    /// <param name="figures">Of that Reynolds number.</param>
    public CheckedPolar(StoredPolars table, int index, PolarFigures figures, CellPlaces places)
    {
        (Index, _places, _lines) = (index, places, table.RowLines[index]);
        (Rows, Polar) = (table.Polars[index].Rows, table.Section.Polars[index]);
        Figures = figures;
    }

    public int Index { get; }

    public ImmutableArray<PolarRow> Rows { get; }

    public Polar Polar { get; }

    public PolarFigures Figures { get; }

    /// <summary>Rows off the line of their neighbours; none are looked for on bluff sections.</summary>
    public (ImmutableArray<Scattered> Lift, ImmutableArray<Scattered> Drag) Scattered
        => _scattered ??= Figures.IsBluff ? ([], []) : ScatteredRows.Of(this);

    public double Reynolds => Polar.Reynolds;

    public string ReynoldsText => ReynoldsNumber.Text(Reynolds);

    /// <summary>A number as it stands in the table.</summary>
    public static string Given(double value) => CanonicalText.Of(value);

    /// <summary>A number that was worked out: three digits.</summary>
    public static string Found(double value) => CanonicalText.Of(double.Parse(
        value.ToString("G3", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture));

    /// <summary><c>(row 30 to 31)</c>, by their lines in the file.</summary>
    public string RowToRow(int first, int last) => string.Create(CultureInfo.InvariantCulture, $"(row {_lines[first]} to {_lines[last]})");

    /// <summary>Lift and drag at an angle, degrees, straight between rows; null where the rows do not reach.</summary>
    public (double Lift, double Drag)? At(double angleDeg)
    {
        for (var i = 1; i < Rows.Length; i++)
        {
            var (a, b) = (Rows[i - 1], Rows[i]);
            if (angleDeg < a.AngleDeg || angleDeg > b.AngleDeg)
                continue;
            var share = (angleDeg - a.AngleDeg) / (b.AngleDeg - a.AngleDeg);
            return (a.Lift + (share * (b.Lift - a.Lift)), a.Drag + (share * (b.Drag - a.Drag)));
        }
        return null;
    }

    /// <summary>Whether a row is off the line of its neighbours, in either coefficient.</summary>
    public bool IsScattered(int row) => Scattered.Lift.Any(s => s.Row == row) || Scattered.Drag.Any(s => s.Row == row);

    /// <summary>The row whose angle is nearest.</summary>
    public int RowNear(double angleDeg) => Enumerable.Range(0, Rows.Length).MinBy(i => Math.Abs(Rows[i].AngleDeg - angleDeg));

    /// <summary>A doubt about rows, told at a cell of one of them.</summary>
    /// <param name="kind">A few words.</param>
    /// <param name="column">Name of the column.</param>
    /// <param name="rows">What it is about; told at the first.</param>
    /// <param name="found">What was found: the beginning of its sentence.</param>
    /// <param name="further">The rest of the sentence: what is expected, and what would do.</param>
    public PolarDoubt Doubt(
        string kind, string column, IEnumerable<int> rows, double fromDeg, double toDeg, string found, string further)
    {
        var all = rows.ToImmutableArray();
        return new PolarDoubt(kind, column, _places.Finding(_lines[all[0]], column, found + further), Index, fromDeg, toDeg, all)
        {
            Found = found,
        };
    }

    /// <summary>A doubt about what lies between two rows, which are both part of it; told at the second.</summary>
    public PolarDoubt DoubtBetween(string kind, string column, int first, int last, string found, string further) => new(
        kind, column, _places.Finding(_lines[last], column, found + further), Index, Rows[first].AngleDeg, Rows[last].AngleDeg,
        [.. Enumerable.Range(first, last - first + 1)])
    {
        Found = found,
    };
}
