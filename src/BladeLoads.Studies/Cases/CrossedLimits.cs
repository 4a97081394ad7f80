using System.Globalization;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Cases;

/// <summary>Two limits of which the lower lies above the upper: nothing would be left between them.</summary>
/// <param name="Lowest">Key of the lower limit.</param>
/// <param name="Highest">Key of the upper one.</param>
/// <param name="Left">What would not be left between them.</param>
/// <param name="LooksExchanged">
/// Whether a lower and an upper limit, as they would be once exchanged, look like what was meant; common practice, no source.
/// </param>
internal sealed record CrossedLimits(string Lowest, string Highest, string Left, Func<double, double, bool> LooksExchanged)
{
    public static CrossedLimits WindSpeeds { get; } = new(
        "control.cut_in_wind_speed_m_s", "control.cut_out_wind_speed_m_s", "wind speed to operate at", (low, high) => low <= 8 && high >= 10);

    public static CrossedLimits RotorSpeeds { get; } = new(
        "control.min_rotor_speed_rpm", "control.max_rotor_speed_rpm", "rotor speed to turn at", (low, high) => high >= 1.2 * low && high <= 4 * low);

    /// <summary>One error where they cross, at the lower limit, or at the upper one where a sweep varies that: the other is the same throughout.</summary>
    /// <param name="low">Value of the lower limit; NaN where it is wrong already.</param>
    public void Refuse(CaseValues values, double low, double high)
    {
        if (!(low > high))
            return;
        var (lowest, highest) = (values.Find(Lowest)!, values.Find(Highest)!);
        var (at, value, word, other, otherValue) = highest.IsSwept
            ? (highest, high, "below", lowest, low)
            : (lowest, low, "above", highest, high);
        values.Refuse(at.Value.At,
            $"{at.Known.Name} is {CanonicalText.Of(value)}, {word} {other.Known.Name} {CanonicalText.Of(otherValue)} in {Where(at, other)}: "
            + $"no {Left} would be left; {WhatWouldDo(at, other, value, low, high)}");
    }

    private static string Where(CaseEntry at, CaseEntry other) => other.Value.At.File == at.Value.At.File
        ? string.Create(CultureInfo.InvariantCulture, $"line {other.Value.At.Line}")
        : string.Create(CultureInfo.InvariantCulture, $"{other.Value.At.File}:{other.Value.At.Line}");

    // Only limits that are written side by side, once each, were ever exchanged by a slip.
    private string WhatWouldDo(CaseEntry at, CaseEntry other, double value, double low, double high)
    {
        var oneOrOther = $"lower {KnownKeys.Find(Lowest)!.Name}, or raise {KnownKeys.Find(Highest)!.Name}";
        if (at.IsSwept)
            return $"take {CanonicalText.Of(value)} out of the sweep, or {(at.Known.Path == Highest ? "lower" : "raise")} {other.Known.Name}";
        return !other.IsSwept && at.Value.At.File == other.Value.At.File && LooksExchanged(high, low) ? "exchange them" : oneOrOther;
    }
}
