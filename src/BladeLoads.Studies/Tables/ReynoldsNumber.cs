using System.Globalization;

namespace BladeLoads.Studies.Tables;

/// <summary>How a Reynolds number reads in sentences and legends.</summary>
public static class ReynoldsNumber
{
    /// <summary><c>3e6</c>, <c>1.25e7</c>: seven digits at most.</summary>
    /// <param name="value">Above 0.</param>
    public static string Text(double value) => value.ToString("0.######e0", CultureInfo.InvariantCulture);
}
