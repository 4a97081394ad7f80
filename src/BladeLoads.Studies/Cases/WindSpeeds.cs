using System.Collections.Immutable;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>The wind speeds of a case: a list, or from-to-step with both ends.</summary>
internal static class WindSpeeds
{
    private static readonly RisingNumbers Numbers = new(
        "speeds_m_s", "wind speed", "m/s", Bounds.AboveZeroTo(Limits.WindSpeed), "{ from = 3, to = 25, step = 0.5 }");

    /// <summary>m/s, rising; empty when they are wrong, and then the reason is reported.</summary>
    public static ImmutableArray<double> Read(TomlValue value, Findings findings) => Numbers.Read(value, findings);
}
