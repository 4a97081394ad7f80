using System.Globalization;

namespace BladeLoads.Studies.Tables;

/// <summary>Numbers that were worked out, as files hold them.</summary>
public static class TwelveDigits
{
    /// <summary>
    /// The number with 12 significant digits: beyond them stands what a conversion of units left over, 21.999999999999996 for 22. Zero
    /// has no sign.
    /// </summary>
    public static double Of(double number)
        => double.Parse(number.ToString("G12", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture) + 0.0;
}
