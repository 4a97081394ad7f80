using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Laboratory;

/// <summary>
/// Notes in the comments of a foreign file that hold for the new table as well: that its rows are augmented for rotation. Without it they
/// could be augmented again.
/// </summary>
internal static class CarriedNotes
{
    private const string Name = StoredPolars.AugmentedNote;

    // What a spreadsheet puts behind a line of fewer cells than the table.
    private const string EmptyCells = " \t;,|";

    /// <summary>As lines for the head of the new table, in their order, each once.</summary>
    // Of the whole file, whatever lines hold the table: a head stands above them.
    public static IEnumerable<string> In(ForeignText text, LineSigns signs)
        => text.Lines.Select(line => Note(line, signs)).OfType<string>().Distinct().Select(note => $"{Name}: {note}");

    private static string? Note(string line, LineSigns signs)
    {
        if (!line.Contains(Name, StringComparison.OrdinalIgnoreCase))
            return null;
        var comment = line.TrimStart();
        var isQuoted = comment is ['"', ..];
        comment = isQuoted ? comment[1..].TrimEnd([.. EmptyCells, '"']) : comment.TrimEnd([.. EmptyCells]);
        // Marks may stand one behind another, and one of them may be the first letters of the note.
        while (signs.IsComment(comment, out var rest))
        {
            if (HeadNote.TextUnder(Name, comment) is { } whole)
                return whole;
            if (HeadNote.TextUnder(Name, rest) is { } note)
                return note;
            comment = rest;
        }
        return null;
    }
}
