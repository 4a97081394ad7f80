using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Tables;

/// <summary>
/// A record that a table carries in the comments above its column names: <c># name: text</c>, such as
/// <c># augmented: snel-1993, c/r 0.2</c>.
/// </summary>
/// <param name="Line">In the file, from 1.</param>
/// <param name="Text">What stands behind the name, trimmed.</param>
internal sealed record HeadNote(int Line, string Text)
{
    /// <summary>The first note of that name; null where there is none.</summary>
    /// <param name="name">Small letters.</param>
    public static HeadNote? Find(InputText input, string name)
    {
        var number = 0;
        foreach (var line in TextLines.Of(input.Text))
        {
            number++;
            var trimmed = line.Trim();
            if (trimmed.Length == 0)
                continue;
            if (trimmed[0] != '#')
                return null;
            var comment = trimmed.TrimStart('#').TrimStart();
            if (comment.StartsWith(name, StringComparison.OrdinalIgnoreCase) && comment[name.Length..].TrimStart() is [':', ..] rest)
                return new HeadNote(number, rest[1..].Trim());
        }
        return null;
    }
}
