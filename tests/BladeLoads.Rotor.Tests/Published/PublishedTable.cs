using System.Globalization;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>
/// A table of published figures: lines that begin with <c>#</c> say where they come from, the first other line names the columns.
/// </summary>
internal sealed class PublishedTable
{
    private readonly string[] _columns;

    private PublishedTable(string[] columns, IReadOnlyList<Row> rows) => (_columns, Rows) = (columns, rows);

    public IReadOnlyList<Row> Rows { get; }

    public static PublishedTable Read(string name)
    {
        var path = Path.Combine(AppContext.BaseDirectory, "Published", "data", name);
        var lines = File.ReadAllLines(path).Where(line => line.Length > 0 && line[0] != '#').ToArray();
        var columns = lines[0].Split(',');
        var rows = new List<Row>();
        var table = new PublishedTable(columns, rows);
        foreach (var line in lines.Skip(1))
        {
            var cells = line.Split(',');
            if (cells.Length != columns.Length)
                throw new InvalidDataException($"{name}: '{line}' has {cells.Length} cells for {columns.Length} columns");
            rows.Add(new Row(table, cells));
        }
        return table;
    }

    public double[] Column(string name) => [.. Rows.Select(row => row[name])];

    internal sealed class Row(PublishedTable table, string[] cells)
    {
        public double this[string column] => double.Parse(Text(column), NumberStyles.Float, CultureInfo.InvariantCulture);

        public bool Has(string column) => Text(column).Length > 0;

        public string Text(string column)
        {
            var index = Array.IndexOf(table._columns, column);
            return index >= 0 ? cells[index] : throw new InvalidDataException($"no column '{column}'");
        }
    }
}
