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
            if (TextUnder(name, trimmed.TrimStart('#')) is { } text)
                return new HeadNote(number, text);
        }
        return null;
    }

    /// <summary>What a comment without its mark says under that name, trimmed; null where it is no such note.</summary>
    public static string? TextUnder(string name, string comment)
        => comment.TrimStart() is var note && note.StartsWith(name, StringComparison.OrdinalIgnoreCase)
            && note[name.Length..].TrimStart() is [':', ..] rest
                ? rest[1..].Trim()
                : null;
}
