using System.Collections.Immutable;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Laboratory;

/// <summary>Cells of a line -> numbers.</summary>
/// <param name="columns">With a column for each role that is needed.</param>
internal sealed class RowReader(ColumnChoice columns, ReadingRequest request, DecimalSign sign, string file)
{
    private readonly ColumnRole _lift = request.Needed[1];
    private readonly ColumnRole _drag = request.Needed[2];
    private readonly int _power = columns.NameOf(ColumnRole.Reynolds)?.Power is > 0 and var power ? power : (int)(request.ReynoldsUnit ?? 0);

    /// <param name="tell">Receives column, place and text of what is wrong; null where nothing is to be told.</param>
    public RowReading Read(ImmutableArray<Cell> cells, int line, Action<string, Place, string>? tell)
    {
        var named = columns[ColumnRole.Section] is { } section ? cells[section] : (Cell?)null;
        var kind = KindOf(cells, named?.Text, line, tell, out var row);
        var numbers = kind == RowKind.Row ? new[] { ColumnRole.Angle, _lift, _drag }.Select(role => cells[columns[role]!.Value]).ToArray() : [];
        return new RowReading(kind, row)
        {
            Section = named is { } cell ? (cell.Text, new Place(file, line, cell.Column)) : null,
            HasForeignMinus = numbers.Any(number => ForeignNumber.HasForeignMinus(number.Text)),
            HasDegreeSign = kind == RowKind.Row && ForeignNumber.HasDegreeSign(numbers[0].Text),
            ShowsItsDecimals = numbers.Any(
                number => number.Text.AsSpan().IndexOfAny(".eEdD") >= 0 || number.IsQuoted && number.Text.Contains(',')),
        };
    }

    private RowKind KindOf(
        ImmutableArray<Cell> cells, string? section, int line, Action<string, Place, string>? tell, out ForeignRow row)
    {
        row = default;
        if (section is not null && request.Section is { } meant && section != meant)
            return RowKind.OtherSection;
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
        if (!(Math.Abs(value) > PolarLimits.LargestCoefficient))
            return value;
        Tell(role, cells, line, tell, PolarLimits.BeyondLargest(ColumnRoleWords.Of(role), value));
        return double.NaN;
    }

    // NaN where there is none.
    private double Number(ColumnRole role, ImmutableArray<Cell> cells, int line, Action<string, Place, string>? tell)
    {
        var text = cells[columns[role]!.Value].Text;
        if (role != ColumnRole.Reynolds)
        {
            if (ForeignNumber.TryParse(role == ColumnRole.Angle ? ForeignNumber.WithoutDegreeSign(text) : text, sign, out var value))
                return value;
            Tell(role, cells, line, tell, ForeignNumber.Problem(ColumnRoleWords.Of(role), text, sign));
            return double.NaN;
        }
        var reynolds = ReynoldsText.Read(text, _power, sign);
        if (reynolds is { } number && PolarLimits.IsReynoldsOfABlade(number))
            return number;
        Tell(role, cells, line, tell, reynolds is null
            ? ForeignNumber.Problem(ColumnRoleWords.Of(role), text, sign)
            : $"reynolds is {VisibleText.Quote(text)}; Reynolds numbers of blades are {PolarLimits.ReynoldsInWords}"
                + (_power == 0 ? ". Is it in millions? Then say --reynolds millions"
                    : request.ReynoldsUnit is { } unit ? $", and --reynolds says {ReynoldsBlocks.InWords(unit)}"
                    : ", and the name of the column gives a unit"));
        return double.NaN;
    }

    private void Tell(ColumnRole role, ImmutableArray<Cell> cells, int line, Action<string, Place, string>? tell, string text)
        => tell?.Invoke(ColumnRoleWords.Of(role), new Place(file, line, cells[columns[role]!.Value].Column), text);
}
