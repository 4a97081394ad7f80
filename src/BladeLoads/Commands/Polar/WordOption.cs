using System.CommandLine;
using System.CommandLine.Parsing;
using BladeLoads.Results.Wording;

namespace BladeLoads.Commands.Polar;

/// <summary>An option that takes one word of a few.</summary>
internal static class WordOption
{
    /// <summary>The words are those of the values, in small letters.</summary>
    public static Option<T?> Define<T>(string name, string description)
        where T : struct, Enum
        => Define(
            name, description, Enum.GetValues<T>().ToDictionary(value => value.ToString().ToLowerInvariant(), value => value, StringComparer.Ordinal));

    /// <param name="words">What each word means.</param>
    public static Option<T?> Define<T>(string name, string description, IReadOnlyDictionary<string, T> words)
        where T : struct => new(name)
        {
            Description = description,
            HelpName = string.Join('|', words.Keys),
            CustomParser = argument => Parse(argument, name, words),
        };

    private static T? Parse<T>(ArgumentResult argument, string name, IReadOnlyDictionary<string, T> words)
        where T : struct
    {
        var text = argument.Tokens.Count == 1 ? argument.Tokens[0].Value : "";
        if (words.TryGetValue(text, out var value))
            return value;
        argument.AddError($"{name} is '{Printable.Of(text)}'; give {string.Join(", ", words.Keys.SkipLast(1))} or {words.Keys.Last()}");
        return null;
    }
}
