using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies;

/// <summary>A place in an input: lines and columns count from 1, 0 means the whole file.</summary>
internal readonly record struct Place(string File, int Line, int Column);

/// <summary>Everything found while a study is read, each finding once, however many cases meet it.</summary>
internal sealed class Findings
{
    private const int MostShownOfAFile = 50;

    private readonly HashSet<InputFinding> _errors = [];
    private readonly HashSet<InputFinding> _doubts = [];

    public void Error(InputFinding finding) => _errors.Add(Visible(finding));

    public void Error(Place at, string text) => Error(new InputFinding(at.File, at.Line, at.Column, text));

    public void Doubt(InputFinding finding) => _doubts.Add(Visible(finding));

    public void Doubt(Place at, string text) => Doubt(new InputFinding(at.File, at.Line, at.Column, text));

    public ImmutableArray<InputFinding> Errors => InFileOrder(_errors, "errors");

    public ImmutableArray<InputFinding> Doubts => InFileOrder(_doubts, "doubts");

    private static InputFinding Visible(InputFinding finding)
        => finding with { File = VisibleText.Escape(finding.File), Text = VisibleText.Escape(finding.Text) };

    private static ImmutableArray<InputFinding> InFileOrder(IEnumerable<InputFinding> findings, string noun) =>
        [.. findings.Order(FindingOrder.Instance).GroupBy(f => f.File, StringComparer.Ordinal)
            .SelectMany(file => FirstOf([.. file], noun))];

    // A table of rubbish must not push every other finding off the screen.
    private static IEnumerable<InputFinding> FirstOf(List<InputFinding> ofOneFile, string noun)
    {
        if (ofOneFile.Count <= MostShownOfAFile)
            return ofOneFile;
        var next = ofOneFile[MostShownOfAFile];
        var rest = ofOneFile.Skip(MostShownOfAFile).Sum(finding => finding.Times);
        return ofOneFile.Take(MostShownOfAFile).Append(
            next with { Column = 0, Text = string.Create(CultureInfo.InvariantCulture, $"and {rest} more {noun} from here on"), Times = rest });
    }
}
