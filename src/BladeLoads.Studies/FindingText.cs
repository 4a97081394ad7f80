using System.Globalization;

namespace BladeLoads.Studies;

/// <summary>A finding as one line of text.</summary>
public static class FindingText
{
    /// <summary><c>file:line:column: text</c>; the line, or the column, is left out where it is not known.</summary>
    public static string Format(InputFinding finding) => (finding.Line, finding.Column) switch
    {
        ( <= 0, _) => $"{finding.File}: {finding.Text}",
        (var line, <= 0) => string.Create(CultureInfo.InvariantCulture, $"{finding.File}:{line}: {finding.Text}"),
        var (line, column) => string.Create(CultureInfo.InvariantCulture, $"{finding.File}:{line}:{column}: {finding.Text}"),
    };
}
