using System.Globalization;

namespace BladeLoads.Results.Wording;

/// <summary>Numbers as a reader compares them, on the screen and in the report; tables have all digits.</summary>
public static class FigureText
{
    /// <summary>Shown for a number that there is not.</summary>
    public const string None = "-";

    /// <summary>Four digits, as long as they are not before the point.</summary>
    public static string Figure(double? value) => value is not { } number
        ? None
        : number.ToString(Math.Abs(number) switch { >= 1000 => "0", >= 100 => "0.0", >= 10 => "0.00", _ => "0.000" }, CultureInfo.InvariantCulture);

    /// <summary>Four digits behind the point.</summary>
    public static string Coefficient(double? value) => value?.ToString("0.0000", CultureInfo.InvariantCulture) ?? None;

    /// <summary>With its sign, and two digits behind the point.</summary>
    public static string Percent(double? value) => value?.ToString("+0.00;-0.00;0.00", CultureInfo.InvariantCulture) ?? None;
}
