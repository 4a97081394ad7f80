using System.Collections.Immutable;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Laboratory;

/// <summary>What a line came to that has a value a column.</summary>
internal enum RowKind
{
    Row,

    /// <summary>Of a section that is not asked for.</summary>
    OtherSection,

    /// <summary>A value is missing, and such rows are left out.</summary>
    Incomplete,

    /// <summary>No number where one must be.</summary>
    Broken,
}

/// <summary>Cells of a line -> numbers.</summary>
/// <param name="columns">With a column for each role that is needed.</param>
internal sealed class RowReader(ColumnChoice columns, ReadingRequest request, DecimalSign sign, string file)
{
    // No section has a coefficient beyond: there a decimal sign, a unit or a column is wrong. Common practice, no source.
    private const double LargestCoefficient = 20;

    private readonly ColumnRole _lift = request.Needed[1];
    private readonly ColumnRole _drag = request.Needed[2];
    private readonly int _power = columns.NameOf(ColumnRole.Reynolds)?.Power ?? 0;

    /// <summary>Names of the sections met, those that are not asked for among them, each with its first place.</summary>
    public Dictionary<string, Place> Sections { get; } = new(StringComparer.Ordinal);

    /// <summary>A minus sign of typesetters was read.</summary>
    public bool HasForeignMinus { get; private set; }

    /// <summary>A number had a decimal point or an exponent, or a decimal comma in quotes: commas between the cells are separators.</summary>
    public bool ShowsItsDecimals { get; private set; }

    /// <param name="tell">Receives column, place and text of what is wrong; null where nothing is to be told.</param>
    public RowKind Read(ImmutableArray<Cell> cells, int line, Action<string, Place, string>? tell, out ForeignRow row)
    {
        row = default;
        if (columns[ColumnRole.Section] is { } section)
        {
            Sections.TryAdd(cells[section].Text, new Place(file, line, cells[section].Column));
            if (request.Section is { } meant && cells[section].Text != meant)
                return RowKind.OtherSection;
        }
        var absent = Roles().Count(role => ForeignNumber.IsAbsent(cells[columns[role]!.Value].Text));
        if (request.LeaveOutIncomplete && absent > 0 && Roles().Where(role => !ForeignNumber.IsAbsent(cells[columns[role]!.Value].Text))
            .All(role => Number(role, cells, line, null) is not double.NaN))
            return RowKind.Incomplete;

        var angle = Number(ColumnRole.Angle, cells, line, tell);
        var (lift, drag) = (Coefficient(_lift, cells, line, tell), Coefficient(_drag, cells, line, tell));
        var moment = columns[ColumnRole.Moment] is null ? 0 : Coefficient(ColumnRole.Moment, cells, line, tell);
        var reynolds = columns[ColumnRole.Reynolds] is null ? 0 : Number(ColumnRole.Reynolds, cells, line, tell);
        if (double.IsNaN(angle + lift + drag + moment + reynolds))
            return RowKind.Broken;
        row = new ForeignRow(
            line, angle, lift, drag, columns[ColumnRole.Moment] is null ? double.NaN : moment,
            columns[ColumnRole.Reynolds] is null ? double.NaN : reynolds)
        {
            At = (cells[columns[ColumnRole.Angle]!.Value].Column, cells[columns[_drag]!.Value].Column),
        };
        foreach (var role in new[] { ColumnRole.Angle, _lift, _drag })
        {
            var cell = cells[columns[role]!.Value];
            HasForeignMinus |= ForeignNumber.HasForeignMinus(cell.Text);
            ShowsItsDecimals |= cell.Text.AsSpan().IndexOfAny(".eEdD") >= 0 || cell.IsQuoted && cell.Text.Contains(',');
        }
        return RowKind.Row;
    }

    private IEnumerable<ColumnRole> Roles()
    {
        foreach (var role in request.Needed)
            yield return role;
        if (columns[ColumnRole.Moment] is not null)
            yield return ColumnRole.Moment;
        if (columns[ColumnRole.Reynolds] is not null)
            yield return ColumnRole.Reynolds;
    }

    private double Coefficient(ColumnRole role, ImmutableArray<Cell> cells, int line, Action<string, Place, string>? tell)
    {
        var value = Number(role, cells, line, tell);
        if (!(Math.Abs(value) > LargestCoefficient))
            return value;
        Tell(role, cells, line, tell, $"{ColumnRoleWords.Of(role)} is {CanonicalText.Of(value)}, and no section has a coefficient beyond "
            + $"{CanonicalText.Of(LargestCoefficient)}; a decimal sign, a unit or a column is wrong");
        return double.NaN;
    }

    // NaN where there is none.
    private double Number(ColumnRole role, ImmutableArray<Cell> cells, int line, Action<string, Place, string>? tell)
    {
        var text = cells[columns[role]!.Value].Text;
        if (role != ColumnRole.Reynolds)
        {
            if (ForeignNumber.TryParse(text, sign, out var value))
                return value;
            Tell(role, cells, line, tell, ForeignNumber.Problem(ColumnRoleWords.Of(role), text, sign));
            return double.NaN;
        }
        var reynolds = ReynoldsText.Read(text, _power, sign);
        if (reynolds is >= ReynoldsText.Lowest and <= ReynoldsText.Highest)
            return reynolds.Value;
        Tell(role, cells, line, tell, reynolds is null
            ? ForeignNumber.Problem(ColumnRoleWords.Of(role), text, sign)
            : $"reynolds is {VisibleText.Quote(text)}; Reynolds numbers of blades are 1e4 to 1e9. Is it in millions? Then name the column so, or say "
                + "--columns reynolds=none and --reynolds");
        return double.NaN;
    }

    private void Tell(ColumnRole role, ImmutableArray<Cell> cells, int line, Action<string, Place, string>? tell, string text)
        => tell?.Invoke(ColumnRoleWords.Of(role), new Place(file, line, cells[columns[role]!.Value].Column), text);
}
