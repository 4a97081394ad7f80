using System.Collections.Immutable;

namespace BladeLoads.Studies.Cases;

/// <summary>What a case leaves out, in the units of the file. The only place where anything is filled in.</summary>
internal static class CaseDefaults
{
    public const double ConeDeg = 0;

    public const double Density = 1.225;              // kg/m3: sea level, 15 degrees C; isa in docs/sources.md
    public const double DynamicViscosity = 1.789e-5;  // Pa s, the same air

    public const double MinRotorSpeedRpm = 0;
    public const double MaxRotorSpeedRpm = double.PositiveInfinity;
    public const double CutInWindSpeed = 0;
    public const double CutOutWindSpeed = double.PositiveInfinity;
    public const double DrivetrainEfficiency = 1;

    public const double TurbulenceIntensity = 0;
    public const string SpeedLimitedPitch = "hold";

    public const double WeibullShape = 2;             // Rayleigh's distribution
    public const double Availability = 1;
    public const double SurfaceWindSpeed = 8;         // m/s; where the best tip-speed ratio is searched for too

    public const string Extend = "none";
    public const string Join = "end";                 // keeps every row of a table
    public const string Augment = "none";

    public const int Elements = 40;
    public const string Spacing = "cosine";
    public const string HeavyLoading = "glauert-1935";
    public const string BalanceWith = "lift and drag";

    public static ImmutableArray<string> Losses { get; } = ["tip", "hub"];

    /// <summary>Rated power is held by the pitch where there is one to hold.</summary>
    public static string AboveRated(bool hasRatedPower) => hasRatedPower ? "pitch-to-feather" : "none";
}
