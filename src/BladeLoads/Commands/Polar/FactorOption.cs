using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;
using BladeLoads.Results.Wording;

namespace BladeLoads.Commands.Polar;

/// <summary>An option that takes a factor.</summary>
internal static class FactorOption
{
    /// <param name="least">The least factor that is taken.</param>
    /// <param name="most">The largest one.</param>
    public static Option<double?> Define(string name, string description, double least, double most) => new(name)
    {
        Description = description,
        HelpName = "factor",
        CustomParser = argument => Parse(argument, name, least, most),
    };

    private static double? Parse(ArgumentResult argument, string name, double least, double most)
    {
        var text = argument.Tokens.Count == 1 ? argument.Tokens[0].Value : "";
        if (double.TryParse(text, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out var factor) && factor >= least && factor <= most)
            return factor;
        argument.AddError(string.Create(
            CultureInfo.InvariantCulture, $"{name} is '{Printable.Of(text)}'; give a factor from {least} to {most}, with a decimal point: 0.95"));
        return null;
    }
}
