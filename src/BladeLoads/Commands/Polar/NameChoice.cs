using System.Collections.Immutable;
using System.IO.Enumeration;

namespace BladeLoads.Commands.Polar;

/// <summary>Which sections are meant: all, or those whose name matches a pattern; <c>*</c> is any text, <c>?</c> one character.</summary>
internal readonly record struct NameChoice(ImmutableArray<string> Patterns)
{
    public bool Includes(string name) => Patterns.IsEmpty || Patterns.Any(pattern => FileSystemName.MatchesSimpleExpression(
        pattern.Replace(@"\", @"\\", StringComparison.Ordinal), name, ignoreCase: false));

    /// <param name="sections">All that there are, each once or more.</param>
    /// <exception cref="WrongUseException">None of them is meant.</exception>
    public void Check(IEnumerable<string> sections)
    {
        var names = sections.Distinct().Order(StringComparer.Ordinal).ToList();
        if (names.Count > 0 && !names.Any(Includes))
            throw new WrongUseException(
                $"no section matches {string.Join(", ", Patterns.Select(p => $"'{p}'"))}; there are {string.Join(", ", names)}");
    }
}
