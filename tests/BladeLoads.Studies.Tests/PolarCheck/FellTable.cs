using System.Globalization;
using System.Text;
using BladeLoads.Studies.PolarCheck;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Tests.PolarCheck;

/// <summary>
/// An invented sound table, whose rows a test changes before it is checked: attached lift of 6.2 a radian from -3 degrees, a gentle stall, a plate across the
/// wind beyond. The first row stands on line 3.
/// </summary>
internal sealed class FellTable
{
    private const string Rows = """
        -180,0,0.02
        -165,0.45,0.1057
        -150,0.779,0.34
        -135,0.9,0.66
        -120,0.779,0.98
        -105,0.45,1.2143
        -90,0,1.3
        -75,-0.45,1.2143
        -60,-0.779,0.98
        -45,-0.9,0.66
        -30,-0.785,0.3393
        -25,-0.718,0.2451
        -20,-0.711,0.1548
        -17.5,-0.765,0.1095
        -15,-0.829,0.0678
        -12.5,-0.82,0.0377
        -10,-0.688,0.0216
        -8,-0.518,0.0155
        -6,-0.319,0.0123
        -4,-0.109,0.0105
        -2,0.107,0.0095
        0,0.322,0.0091
        2,0.532,0.0093
        4,0.732,0.0101
        6,0.911,0.0121
        8,1.042,0.0165
        10,1.094,0.0256
        12,1.045,0.0423
        14,0.922,0.0671
        16,0.795,0.0972
        18,0.711,0.1294
        20,0.676,0.1622
        25,0.707,0.2469
        30,0.783,0.3397
        45,0.9,0.66
        60,0.779,0.98
        75,0.45,1.2143
        90,0,1.3
        105,-0.45,1.2143
        120,-0.779,0.98
        135,-0.9,0.66
        150,-0.779,0.34
        165,-0.45,0.1057
        180,0,0.02
        """;

    private readonly SortedDictionary<double, (string Lift, string Drag)> _rows = [];
    private string _head = "# Invented data of an invented section.";
    private string? _reynolds = "1e6";

    public FellTable()
    {
        foreach (var row in Rows.Split('\n', StringSplitOptions.TrimEntries).Select(line => line.Split(',')))
            _rows[double.Parse(row[0], CultureInfo.InvariantCulture)] = (row[1], row[2]);
    }

    /// <summary>A row in the place of the one at its angle, or between two.</summary>
    public FellTable With(double angleDeg, string lift, string drag)
    {
        _rows[angleDeg] = (lift, drag);
        return this;
    }

    public FellTable Without(Func<double, bool> angles)
    {
        foreach (var angle in _rows.Keys.Where(angles).ToList())
            _rows.Remove(angle);
        return this;
    }

    /// <summary>Every row changed: angle, lift, drag.</summary>
    public FellTable Changed(Func<(double Angle, double Lift, double Drag), (double Angle, double Lift, double Drag)> change)
    {
        var rows = _rows.Select(r => change((r.Key, Number(r.Value.Lift), Number(r.Value.Drag)))).ToList();
        _rows.Clear();
        foreach (var (angle, lift, drag) in rows)
            _rows[angle] = (Text(lift), Text(drag));
        return this;
    }

    public FellTable WithHead(string line)
    {
        _head = line;
        return this;
    }

    /// <param name="reynolds">Null for a table that names none.</param>
    public FellTable At(string? reynolds)
    {
        _reynolds = reynolds;
        return this;
    }

    /// <param name="upper">Further rows of a higher Reynolds number.</param>
    public string ToText(FellTable? upper = null)
    {
        var text = new StringBuilder().Append(_head).Append('\n').Append(_reynolds is null ? "" : "reynolds,").Append("alpha_deg,cl,cd\n");
        Append(text);
        upper?.Append(text);
        return text.ToString();
    }

    /// <summary>The doubts, as a user reads them, of file <c>fell.csv</c>.</summary>
    public IEnumerable<string> Doubts(FellTable? upper = null) => DoubtsOf(ToText(upper));

    public static IEnumerable<string> DoubtsOf(string text) => Check(text).Select(doubt => FindingText.Format(doubt.Finding)["fell.csv:".Length..]);

    public static IReadOnlyList<PolarDoubt> Check(string text)
    {
        var table = StoredPolars.FromBytes("fell.csv", Encoding.UTF8.GetBytes(text), out var errors);
        Told.Exactly([], errors);
        return CheckedTable.Of(table!, "fell.csv").Doubts;
    }

    private void Append(StringBuilder text)
    {
        foreach (var (angle, (lift, drag)) in _rows)
            text.Append(_reynolds is null ? "" : _reynolds + ",").Append(Text(angle)).Append(',').Append(lift).Append(',').Append(drag).Append('\n');
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    private static string Text(double number) => Math.Round(number, 6).ToString("R", CultureInfo.InvariantCulture);
}
