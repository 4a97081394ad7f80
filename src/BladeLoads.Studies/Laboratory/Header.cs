using System.Collections.Immutable;

namespace BladeLoads.Studies.Laboratory;

/// <summary>A line that names columns.</summary>
/// <param name="Line">Counted from 1; 0 where no line does.</param>
/// <param name="Cells">As the line is taken apart.</param>
/// <param name="Names">One a cell.</param>
internal sealed record Header(int Line, ImmutableArray<Cell> Cells, ImmutableArray<ColumnName> Names)
{
    private const int MostWords = 4;   // pitching moment coefficient c/4

    public static Header None { get; } = new(0, [], []);

    /// <summary>The line as a header, in the way that gives it so many columns; null where it is none, or has another number of them.</summary>
    /// <param name="count">0 for any.</param>
    public static Header? Of(string text, int line, CellSeparator separator, int count, ReadingRequest request)
    {
        foreach (var way in Ways(text, separator))
        {
            // A column at the end that has no name is none.
            var cells = Laboratory.Cells.WithoutTrailing(way, 1);
            if (count != 0 && cells.Length != count)
                continue;
            var names = cells.Select(cell => ColumnName.Of(cell.Text)).ToImmutableArray();
            if (NamesColumns(cells, names, request))
                return new Header(line, cells, names);
        }
        return null;
    }

    public bool IsRepeatedBy(string text, CellSeparator separator) => Line > 0 && Ways(text, separator).Any(way =>
        Laboratory.Cells.WithoutTrailing(way, Cells.Length) is var cells && cells.Length == Cells.Length
        && cells.Zip(Cells).All(pair => string.Equals(pair.First.Text, pair.Second.Text, StringComparison.OrdinalIgnoreCase)));

    private static bool NamesColumns(ImmutableArray<Cell> cells, ImmutableArray<ColumnName> names, ReadingRequest request)
    {
        var asked = request.Columns.Values.Where(column => column != ReadingRequest.NoColumn && !column.All(char.IsAsciiDigit)).ToList();
        if (asked.Count > 0 && asked.TrueForAll(name => cells.Any(cell => ColumnName.AreAlike(cell.Text, name))))
            return true;
        return names.Any(name => name.MayBe.Contains(ColumnRole.Angle))
            && names.Any(name => name.MayBe.Any(role => role is not (ColumnRole.Angle or ColumnRole.Reynolds or ColumnRole.Section)))
            && !cells.Any(cell => ForeignNumber.LooksLikeOne(cell.Text));
    }

    // Blanks stand within names as well as between them.
    private static IEnumerable<ImmutableArray<Cell>> Ways(string text, CellSeparator separator)
    {
        if (separator != CellSeparator.Blanks)
        {
            yield return Laboratory.Cells.Of(text, separator);
            yield break;
        }
        var words = WithTheirUnits(Laboratory.Cells.Of(text, separator));
        yield return words;
        yield return WithKnownNames(words);
        yield return AtWideGaps(text);
    }

    private static ImmutableArray<Cell> WithTheirUnits(ImmutableArray<Cell> words)
    {
        var cells = new List<Cell>();
        foreach (var word in words)
        {
            var isOpen = cells.Count > 0 && cells[^1].Text.Length <= ColumnName.LongestName
                && cells[^1].Text.AsSpan().IndexOfAny("[({") >= 0 && cells[^1].Text.AsSpan().IndexOfAny("])}") < 0;
            if (cells.Count > 0 && (isOpen || word.Text is ['[' or '(' or '{', ..]))
                cells[^1] = cells[^1] with { Text = $"{cells[^1].Text} {word.Text}" };
            else
                cells.Add(word);
        }
        return [.. cells];
    }

    private static ImmutableArray<Cell> WithKnownNames(ImmutableArray<Cell> words)
    {
        var cells = ImmutableArray.CreateBuilder<Cell>();
        for (var i = 0; i < words.Length;)
        {
            var length = 1;
            for (var k = Math.Min(MostWords, words.Length - i); k > 1 && length == 1; k--)
                if (ColumnName.Of(Joined(words, i, k)).IsPlain)
                    length = k;
            cells.Add(words[i] with { Text = Joined(words, i, length) });
            i += length;
        }
        return cells.ToImmutable();
    }

    private static ImmutableArray<Cell> AtWideGaps(string text)
    {
        var cells = ImmutableArray.CreateBuilder<Cell>();
        for (var at = 0; at < text.Length;)
        {
            while (at < text.Length && char.IsWhiteSpace(text[at]))
                at++;
            var start = at;
            while (at < text.Length
                && !(text[at] == '\t' || char.IsWhiteSpace(text[at]) && (at + 1 == text.Length || char.IsWhiteSpace(text[at + 1]))))
                at++;
            if (at > start)
                cells.Add(new Cell(text[start..at].Trim(), start + 1, false));
        }
        return cells.ToImmutable();
    }

    private static string Joined(ImmutableArray<Cell> words, int from, int count)
        => string.Join(' ', words.AsSpan(from, count).ToArray().Select(word => word.Text));
}
