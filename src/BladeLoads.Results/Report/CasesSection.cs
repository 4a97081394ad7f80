using System.Collections.Immutable;
using System.Globalization;
using System.Xml.Linq;
using BladeLoads.Results.Receipts;
using static BladeLoads.Results.Report.Html;

namespace BladeLoads.Results.Report;

/// <summary>What the cases are: the values of one of them, and by which values each of the others differs from it.</summary>
internal static class CasesSection
{
    private const int MostCases = 300;
    private const int HashLength = 64;

    public static XElement? Of(StudyReport report)
    {
        var solved = report.Cases.Where(c => c.Receipt is not null).ToList();
        if (solved.Count == 0)
            return null;
        var reference = solved.Find(c => c.Row.Case == report.Baseline) ?? solved[0];
        return Element(
            "section", Text("h2", "The cases"),
            Table(
                ^0.., ["case", "title", $"differs from {reference.Row.Case} in"],
                solved.Take(MostCases).Select(c => (string[])[c.Row.Case, c.Row.Title, Differences(c.Receipt!, reference.Receipt!)])).Class("cases"),
            solved.Count > MostCases
                ? Text("p", string.Create(CultureInfo.InvariantCulture, $"{solved.Count - MostCases} more cases are in summary.csv."))
                : null,
            Text("h3", $"Values of {reference.Row.Case}"),
            Text("p", "Keys as in case files, with what was left out filled in; of tables the SHA-256 of their values."),
            Table(^0.., ["key", "value"], reference.Receipt!.Values.OrderBy(v => v.Key, StringComparer.Ordinal).Select(v => (string[])[v.Key, v.Value])));
    }

    private static string Differences(Receipt receipt, Receipt reference)
    {
        var differences = receipt.Values.Keys.Union(reference.Values.Keys).Order(StringComparer.Ordinal)
            .Where(key => receipt.Values.GetValueOrDefault(key) != reference.Values.GetValueOrDefault(key))
            .Select(key => Told(key, receipt.Values.GetValueOrDefault(key))).ToImmutableArray();
        return string.Join("; ", differences);
    }

    private static string Told(string key, string? value) => value switch
    {
        null => $"no {key}",
        { Length: HashLength } when value.All(char.IsAsciiHexDigitLower) => $"{key}: another table",
        _ => $"{key} {value}",
    };
}
