using System.Collections.Immutable;
using System.IO.Enumeration;

namespace BladeLoads.Batch.Plan;

/// <summary>
/// Which cases are meant: all, or those whose name matches a pattern; <c>*</c> stands for any text, <c>?</c> for one character. A pattern
/// that matches the name of a case file means all its variants.
/// </summary>
public sealed record CaseChoice(ImmutableArray<string> Patterns)
{
    public static CaseChoice All { get; } = new(ImmutableArray<string>.Empty);

    public bool Includes(string caseName) => Patterns.IsEmpty || Patterns.Any(p => Matches(p, caseName) || Matches(p, caseName.Split('~')[0]));

    /// <summary>
    /// Whether a rejected case is meant. Its variants are not known, so a pattern that could match one of them counts, and a case that
    /// is known by its file alone goes by the file's name.
    /// </summary>
    public bool IncludesRejected(string nameOrFile)
    {
        var name = nameOrFile.EndsWith(".toml", StringComparison.Ordinal) ? Path.GetFileNameWithoutExtension(nameOrFile) : nameOrFile;
        return Includes(name) || Patterns.Any(p => p.IndexOf('~', StringComparison.Ordinal) is > 0 and var end && Matches(p[..end], name));
    }

    // The backslash is the matcher's escape; in a case's name it is no more than a character.
    private static bool Matches(string pattern, string name)
        => FileSystemName.MatchesSimpleExpression(pattern.Replace(@"\", @"\\", StringComparison.Ordinal), name, ignoreCase: false);
}
