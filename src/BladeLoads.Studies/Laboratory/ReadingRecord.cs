using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Laboratory;

/// <summary>What was done to make a table of ours, in lines for its head.</summary>
internal sealed class ReadingRecord(ForeignText text, ReadingRequest request, TableScan scan, ReynoldsBlocks reynolds, AngleReading angles)
{
    private readonly List<(int Line, string Why)> _leftOut = [.. scan.LeftOut];
    private readonly List<string> _order = [];

    public void LeaveOut(int line, string why) => _leftOut.Add((line, why));

    public void Order(string done) => _order.Add(done);

    public ImmutableArray<string> Lines()
    {
        var lines = ImmutableArray.CreateBuilder<string>();
        lines.Add($"text: {text.Encoding}, {Layouts.InWords(scan)}");
        if (request.Lines is { } range)
            lines.Add(range.Last == int.MaxValue
                ? string.Create(CultureInfo.InvariantCulture, $"lines from {range.First} on, as --lines says")
                : string.Create(CultureInfo.InvariantCulture, $"lines {range.First} to {range.Last} of the file, as --lines says"));
        if (request.Section is { } section)
            lines.Add($"rows of section '{section}', as --section says");
        lines.Add($"columns: {Columns()}");
        lines.AddRange(scan.Columns!.MomentsNotTaken.Select(moment => $"no moment: {moment}"));
        lines.Add(angles.Why);
        lines.AddRange(reynolds.Why);
        var done = Conversions().ToList();
        if (done.Count > 0)
            lines.Add($"converted: {string.Join("; ", done)}");
        lines.AddRange(_order);
        foreach (var reason in _leftOut.GroupBy(left => left.Why).OrderBy(group => group.Min(left => left.Line)))
            lines.Add($"left out: {LineNumbers.InWords([.. reason.Select(left => left.Line)])}, {reason.Key}");
        lines.AddRange(CarriedNotes.In(text, new LineSigns(request.Comment)));
        return lines.ToImmutable();
    }

    private string Columns()
    {
        var columns = scan.Columns!;
        ImmutableArray<ColumnRole> all = [.. request.Needed, ColumnRole.Moment, ColumnRole.Reynolds, ColumnRole.Section];
        var taken = all.Where(role => columns[role] is not null).Select(role => $"{ColumnRoleWords.Of(role)} from {columns.Shown(role)}");
        var others = columns.NotTaken.ToList();
        return string.Join(", ", taken) + (others.Count == 0 ? "" : $"; not taken: {string.Join(", ", others)}");
    }

    private IEnumerable<string> Conversions()
    {
        foreach (var done in angles.Done())
            yield return done;
        if (SectionForces.Asked(request) is not null)
            yield return "cl and cd from forces square to the chord and along it, 12 significant digits";
        if (scan.Columns!.NameOf(ColumnRole.Reynolds)?.Power is > 0 and var power)
            yield return $"Reynolds numbers times {CanonicalText.Of(Math.Pow(10, power))}";
        else if (request.ReynoldsUnit is { } unit)
            yield return $"Reynolds numbers without a unit times {CanonicalText.Of(Math.Pow(10, (int)unit))}, as --reynolds says";
        if (scan.HasForeignMinus)
            yield return "minus signs of typesetters to -";
        if (scan.HasDegreeSigns)
            yield return "degree signs taken from angles";
    }
}
