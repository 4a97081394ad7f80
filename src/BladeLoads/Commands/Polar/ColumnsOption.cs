using System.Collections.Immutable;
using System.CommandLine;
using System.Text.RegularExpressions;
using BladeLoads.Studies;
using BladeLoads.Studies.Laboratory;

namespace BladeLoads.Commands.Polar;

/// <summary><c>--columns alpha=1,cl=2,cd=3</c>: which column of a foreign table is which.</summary>
internal static partial class ColumnsOption
{
    public static Option<string[]> Define() => new("--columns")
    {
        Description = "which column is which, by number or by its name in the header: alpha=1,cl=2,cd=3,cm=5 or alpha=ALPHA; roles are "
            + $"{string.Join(", ", ColumnRoleWords.All)}; cm=none and reynolds=none take none; what is left out is told by the header; may be given several times",
        HelpName = "role=column,...",
    };

    /// <exception cref="WrongUseException">They cannot be meant so.</exception>
    public static ImmutableSortedDictionary<ColumnRole, string> Parse(string[] texts)
    {
        var columns = ImmutableSortedDictionary.CreateBuilder<ColumnRole, string>();
        // A name may hold commas: the next role begins where a word and = follow one.
        foreach (var part in texts.SelectMany(text => NextRole().Split(text)))
        {
            var equals = part.IndexOf('=', StringComparison.Ordinal);
            var word = equals < 0 ? part : part[..equals];
            var column = equals < 0 ? "" : part[(equals + 1)..].Trim();
            if (ColumnRoleWords.Find(word.Trim()) is not { } role)
                throw new WrongUseException(Nearest.Of(word, ColumnRoleWords.All) is { } near
                    ? $"--columns has no role '{word}'; did you mean '{near}'?"
                    : $"--columns has no role '{word}'; there are {string.Join(", ", ColumnRoleWords.All)}: --columns alpha=1,cl=2,cd=3");
            if (column.Length == 0)
                throw new WrongUseException($"--columns says no column for {word}; give its number or its name: {word}=2");
            if (!columns.TryAdd(role, column))
                throw new WrongUseException($"--columns says {word} twice; keep one");
        }
        Check(columns.ToImmutable());
        return columns.ToImmutable();
    }

    private static void Check(ImmutableSortedDictionary<ColumnRole, string> columns)
    {
        foreach (var (role, column) in columns)
            if (column == ReadingRequest.NoColumn && role is not (ColumnRole.Moment or ColumnRole.Reynolds))
                throw new WrongUseException($"--columns {ColumnRoleWords.Of(role)}=none: a table needs one; only cm and reynolds can be left out");
        var along = columns.ContainsKey(ColumnRole.Tangential) || columns.ContainsKey(ColumnRole.Axial);
        if (columns.ContainsKey(ColumnRole.Tangential) && columns.ContainsKey(ColumnRole.Axial))
            throw new WrongUseException("--columns says tangential and axial, which are one force seen from two sides; keep one");
        if (columns.ContainsKey(ColumnRole.Normal) != along)
            throw new WrongUseException("--columns needs normal together with tangential (positive towards the leading edge) or axial (towards the trailing edge)");
        if (along && (columns.ContainsKey(ColumnRole.Lift) || columns.ContainsKey(ColumnRole.Drag)))
            throw new WrongUseException("--columns says forces square to the chord and along it, and lift or drag besides; keep one pair");
    }

    [GeneratedRegex(@",(?=\s*[A-Za-z_]+\s*=)")]
    private static partial Regex NextRole();
}
