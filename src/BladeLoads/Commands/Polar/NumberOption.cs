using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;
using BladeLoads.Results.Wording;

namespace BladeLoads.Commands.Polar;

/// <summary>An option that takes a number.</summary>
internal static class NumberOption
{
    /// <param name="noun">What the number is: factor.</param>
    /// <param name="least">The least number that is taken.</param>
    /// <param name="most">The largest one.</param>
    /// <param name="example">A number as it is given.</param>
    public static Option<double?> Define(string name, string description, string noun, double least, double most, string example) => new(name)
    {
        Description = description,
        HelpName = noun,
        CustomParser = argument => Parse(argument, name, noun, least, most, example),
    };

    private static double? Parse(ArgumentResult argument, string name, string noun, double least, double most, string example)
    {
        var text = argument.Tokens.Count == 1 ? argument.Tokens[0].Value : "";
        if (double.TryParse(text, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out var number) && number >= least && number <= most)
            return number;
        argument.AddError(string.Create(
            CultureInfo.InvariantCulture, $"{name} is '{Printable.Of(text)}'; give a {noun} from {least} to {most}, with a decimal point: {example}"));
        return null;
    }
}
