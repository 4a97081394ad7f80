using System.Text;
using BladeLoads.Results.Wording;
using BladeLoads.Studies;

namespace BladeLoads.Screen;

/// <summary>The line of an input that a finding is about, with a caret below its place.</summary>
internal static class SourceExcerpt
{
    private const int Width = 100;
    private const int LongestLine = 100_000;
    private const long LargestFile = 16 << 20;

    /// <summary>Two lines, or none where there is no such place to show.</summary>
    public static string[] Of(string studyFolder, InputFinding finding)
    {
        if (finding.Line < 1 || finding.Column < 1)
            return [];
        try
        {
            var file = new FileInfo(Path.Join(studyFolder, finding.File));
            if (!file.Exists || file.Length > LargestFile)
                return [];
            var line = File.ReadLines(file.FullName, Encoding.UTF8).ElementAtOrDefault(finding.Line - 1);
            return line is null || line.Length > LongestLine || finding.Column > line.Length + 1 ? [] : Excerpt(line, finding.Column - 1);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return [];   // the finding itself has said what is wrong
        }
    }

    private static string[] Excerpt(string line, int place)
    {
        var from = Math.Max(0, place - Width / 2);
        var before = Printable.Of(line[from..place].Replace('\t', ' '));
        var after = Printable.Of(line[place..Math.Min(line.Length, from + Width)].Replace('\t', ' '));
        return ["    " + before + after, new string(' ', 4 + before.Length) + "^"];
    }
}
