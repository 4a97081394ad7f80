using System.Text;

namespace BladeLoads.Screen;

/// <summary>Columns as wide as what is in them: the first to the left, the others to the right, notes after the last.</summary>
internal sealed class TextTable(params string[] head)
{
    private readonly List<(string[] Cells, string Note)> _rows = [(head, "")];

    /// <param name="note">Stands behind the row, and widens no column.</param>
    public void Add(string[] cells, string note = "") => _rows.Add((cells, note));

    /// <param name="indent">How far from the left edge, characters.</param>
    public void Write(TextWriter output, int indent = 0)
    {
        var widths = Enumerable.Range(0, head.Length)
            .Select(column => _rows.Max(row => column < row.Cells.Length ? row.Cells[column].Length : 0)).ToArray();
        foreach (var (cells, note) in _rows)
        {
            var line = new StringBuilder().Append(' ', indent);
            for (var column = 0; column < cells.Length; column++)
                line.Append(column == 0 ? cells[0].PadRight(widths[0]) : "  " + cells[column].PadLeft(widths[column]));
            output.WriteLine((note.Length == 0 ? line.ToString() : $"{line}  {note}").TrimEnd());
        }
    }
}
