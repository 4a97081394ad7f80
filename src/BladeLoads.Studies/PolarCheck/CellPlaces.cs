using System.Text;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>Where cells stand in the text of a table that has been read without errors.</summary>
internal sealed class CellPlaces
{
    private readonly string _file;
    private readonly string[] _lines;
    private readonly string[] _columns;

    /// <param name="file">As findings name it.</param>
    public CellPlaces(string file, StoredPolars table)
    {
        _file = file;
        _lines = TextLines.Of(Encoding.UTF8.GetString(table.Bytes.Span).TrimStart('\uFEFF'));
        var header = _lines.FirstOrDefault(line => line.Trim() is [not '#', ..]) ?? "";
        _columns = [.. header.Split(',').Select(name => name.Trim().Trim('"'))];
    }

    public InputFinding Finding(int line, string column, string text) => new(_file, line, ColumnOf(line, column), text);

    // 0, the whole line, where quotes may hide a comma.
    private int ColumnOf(int line, string column)
    {
        var cells = _lines[line - 1].Split(',');
        var at = Array.IndexOf(_columns, column);
        if (at < 0 || at >= cells.Length || cells.Length != _columns.Length)
            return 0;
        return cells.Take(at).Sum(cell => cell.Length + 1) + cells[at].Length - cells[at].TrimStart().Length + 1;
    }
}
