using System.Globalization;
using System.Text;
using BladeLoads.Studies.Laboratory;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>How a laboratory writes a table down.</summary>
internal sealed record SentLayout
{
    public CellSeparator Separator { get; init; } = CellSeparator.Semicolon;

    public DecimalSign Sign { get; init; }

    public AngleUnit Unit { get; init; }

    /// <summary>0: beside the name of the angle; 1: in a row below the names.</summary>
    public int UnitAt { get; init; }

    /// <summary>0: a column; 1: a column in millions; 2: a line above each block; 3: a line in millions.</summary>
    public int ReynoldsAt { get; init; }

    public bool HasFallingAngles { get; init; }

    public bool IsQuoted { get; init; }

    public bool HasMoreColumns { get; init; }

    public bool EndsInSeparator { get; init; }

    public bool HasRemarks { get; init; }

    public bool NamesEachBlock { get; init; }

    public string LineEnd { get; init; } = "\n";

    public string Encoding { get; init; } = "utf-8";
}

/// <summary>A table as it is sent, with the lines of its rows.</summary>
internal sealed record SentTable(string[] Lines, bool[] IsRow, SentLayout Layout)
{
    /// <summary>Where the cells of a row stand in its line, quotes left out.</summary>
    public (int Start, int Length)[] CellsOf(int line)
    {
        var sign = Sign(Layout).Trim(' ') is { Length: > 0 } visible ? visible : " ";
        var places = new List<(int, int)>();
        var (text, at) = (Lines[line], 0);
        var isQuoted = IsQuoted(Layout);
        while (at < text.Length)
        {
            while (at < text.Length && text[at] == ' ')
                at++;
            if (at >= text.Length)
                break;
            var start = isQuoted ? at + 1 : at;
            var end = text.IndexOf(isQuoted ? "\"" : sign, start, StringComparison.Ordinal);
            end = end < 0 ? text.Length : end;
            places.Add((start, text[start..end].TrimEnd().Length));
            at = text.IndexOf(sign, end, StringComparison.Ordinal) is >= 0 and var next ? next + 1 : text.Length;
        }
        return [.. places];
    }

    /// <summary>The same of those that a reader takes; drag of the wake and a remark stand behind them where there are more columns.</summary>
    public IEnumerable<(int Start, int Length)> CellsTaken(int line) => CellsOf(line).SkipLast(Layout.HasMoreColumns ? 2 : 0);

    public byte[] Bytes() => BytesOf(string.Concat(Lines.Select(line => line + Layout.LineEnd)));

    public byte[] BytesOf(string text)
    {
        var encoding = Encoding.GetEncoding(Layout.Encoding);
        return [.. Layout.Encoding == "iso-8859-1" ? [] : encoding.GetPreamble(), .. encoding.GetBytes(text)];
    }

    public static SentTable Of(IReadOnlyList<PolarRows> polars, SentLayout layout)
    {
        var lines = new List<(string Text, bool IsRow)>();
        if (layout.HasRemarks)
            lines.AddRange([("Fell tunnel, lift and drag of a section", false), ("# entry 14, 23.5 C", false), ("", false)]);
        var hasMoments = !double.IsNaN(polars[0].Rows[0].Moment);
        var hasReynolds = !double.IsNaN(polars[0].Reynolds);
        var asColumn = hasReynolds && layout.ReynoldsAt < 2;
        for (var i = 0; i < polars.Count; i++)
        {
            if (hasReynolds && !asColumn)
                lines.Add((layout.ReynoldsAt == 2 ? $"Re = {Number(polars[i].Reynolds, layout)}, clean" : $"Reynolds number (millions): {Millions(polars[i], layout)}", false));
            if (i == 0 || layout.NamesEachBlock && !asColumn)
                lines.AddRange(Names(layout, asColumn, hasMoments).Select(line => (line, false)));
            foreach (var row in layout.HasFallingAngles ? polars[i].Rows.Reverse() : polars[i].Rows)
                lines.Add((Cells(layout, asColumn, polars[i], row), true));
            if (layout.HasRemarks)
                lines.Add(("", false));
        }
        if (layout.HasRemarks)
            lines.Add(("end of the table", false));
        return new SentTable([.. lines.Select(line => line.Text)], [.. lines.Select(line => line.IsRow)], layout);
    }

    private static IEnumerable<string> Names(SentLayout layout, bool asColumn, bool hasMoments)
    {
        var unit = layout.Unit == AngleUnit.Degrees ? "deg" : "rad";
        var names = new List<string> { layout.UnitAt == 0 ? $"Alpha [{unit}]" : "Alpha", "CL", "CD" };
        var units = new List<string> { unit, "-", "-" };
        if (hasMoments)
            (names, units) = ([.. names, "Cm"], [.. units, "-"]);
        if (asColumn)
            (names, units) = ([layout.ReynoldsAt == 0 ? "Re" : "Re [10^6]", .. names], ["-", .. units]);
        if (layout.HasMoreColumns)
            (names, units) = ([.. names, "Cd_wake", "remark"], [.. units, "-", "-"]);
        yield return Joined(names, layout);
        if (layout.UnitAt == 1)
            yield return Joined(units, layout);
    }

    private static string Cells(SentLayout layout, bool asColumn, PolarRows polar, PolarRow row)
    {
        var angle = layout.Unit == AngleUnit.Degrees ? row.AngleDeg : double.DegreesToRadians(row.AngleDeg);
        var cells = new List<string> { Number(angle, layout), Number(row.Lift, layout), Number(row.Drag, layout) };
        if (!double.IsNaN(row.Moment))
            cells.Add(Number(row.Moment, layout));
        if (asColumn)
            cells.Insert(0, layout.ReynoldsAt == 0 ? polar.Reynolds.ToString("F0", CultureInfo.InvariantCulture) : Millions(polar, layout));
        if (layout.HasMoreColumns)
            cells.AddRange([Number(row.Drag, layout), "ok"]);
        return Joined(cells, layout);
    }

    private static string Joined(List<string> cells, SentLayout layout)
    {
        var isQuoted = IsQuoted(layout);
        return string.Join(Sign(layout), cells.Select(cell => isQuoted ? $"\"{cell}\"" : cell)) + (layout.EndsInSeparator ? Sign(layout) : "");
    }

    private static bool IsQuoted(SentLayout layout) => layout.IsQuoted || layout is { Separator: CellSeparator.Comma, Sign: DecimalSign.Comma };

    private static string Sign(SentLayout layout) => layout.Separator switch
    {
        CellSeparator.Tab => "\t",
        CellSeparator.Semicolon => ";",
        CellSeparator.Comma => ",",
        CellSeparator.Bar => " | ",
        _ => "  ",
    };

    // With one decimal at least, as programs write columns of numbers.
    private static string Number(double value, SentLayout layout)
    {
        var text = Math.Abs(value) >= 1e4 ? value.ToString("F0", CultureInfo.InvariantCulture) : value.ToString("0.0################", CultureInfo.InvariantCulture);
        if (Math.Abs(value) < 1e4 && double.Parse(text, CultureInfo.InvariantCulture) != value)
            text = value.ToString("R", CultureInfo.InvariantCulture);
        return layout.Sign == DecimalSign.Point ? text : text.Replace('.', ',');
    }

    private static string Millions(PolarRows polar, SentLayout layout)
        => Number((double)((decimal)polar.Reynolds / 1_000_000m), layout);
}
