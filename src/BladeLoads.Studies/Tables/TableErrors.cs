using System.Globalization;
using System.Text.RegularExpressions;

namespace BladeLoads.Studies.Tables;

/// <summary>
/// The errors of one table. Of one kind in one column the first are told one by one, the others by their number.
/// </summary>
internal sealed partial class TableErrors(Findings findings)
{
    private const int MostToldOfAKind = 3;
    private const int Most = 10_000;

    private readonly Dictionary<(string Column, string Kind), (int Count, Place FirstUntold)> _kinds = [];
    private readonly Dictionary<string, string> _questions = new(StringComparer.Ordinal);
    private int _total;

    public bool Any => _total > 0;

    /// <summary>Those not told one by one too.</summary>
    public int Total => _total;

    /// <summary>So many that it is no table of this kind: what follows would only repeat them.</summary>
    public bool AreTooMany => _total >= Most;

    /// <param name="column">Empty for an error of no one column.</param>
    public void Add(string column, Place at, string text)
    {
        _total++;
        // Two errors are of a kind when only the values in them differ.
        var kind = (column, Values().Replace(text, "#"));
        var (count, firstUntold) = _kinds.GetValueOrDefault(kind);
        _kinds[kind] = (count + 1, count == MostToldOfAKind ? at : firstUntold);
        if (count < MostToldOfAKind)
            findings.Error(at, text);
    }

    /// <summary>What to ask beside a number of errors in a column.</summary>
    public void Ask(string column, string question) => _questions[column] = question;

    /// <summary>Tells the number of errors that were not told one by one.</summary>
    public void TellTheRest()
    {
        foreach (var ((column, _), (count, firstUntold)) in _kinds)
            if (count > MostToldOfAKind)
                findings.Error(new InputFinding(firstUntold.File, firstUntold.Line, firstUntold.Column, $"and {(AreTooMany ? "at least " : "")}"
                    + $"{(count - MostToldOfAKind).ToString(CultureInfo.InvariantCulture)} more like it"
                    + (column.Length == 0 ? "" : $" in column {column}")
                    + (_questions.TryGetValue(column, out var question) ? $"; {question}" : ""))
                {
                    Times = count - MostToldOfAKind,
                });
    }

    [GeneratedRegex(@"'.*'|(?<![A-Za-z_])[+-]?\d[\d.e+-]*")]
    private static partial Regex Values();
}
