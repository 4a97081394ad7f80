using System.Collections.Immutable;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Cases;

/// <summary>
/// Values that can be, but are more likely in another unit than meant: each is raised as a doubt. Common practice, no source.
/// </summary>
internal static class UsualRanges
{
    private const double SlowestTip = 5, FastestTip = 150; // m/s

    private static readonly (string Path, double Low, double High, string Sentence)[] Lines =
    [
        ("air.density_kg_m3", 0.5, 1.6, "air has 0.5 to 1.6 kg/m3"),
        ("air.reference_density_kg_m3", 0.5, 1.6, "air has 0.5 to 1.6 kg/m3"),
        ("air.dynamic_viscosity_Pa_s", 1e-5, 3e-5, "air has 1e-5 to 3e-5 Pa s"),
        ("control.rated_power_kW", 0, 100_000, "no rotor makes more than 100,000 kW; is it in watts?"),
        ("control.thrust_limit_kN", 0, 10_000, "no rotor takes more than 10,000 kN; is it in newtons?"),
        ("wind.turbulence_intensity", 0, 0.6, "even in slight wind 0.6 is seldom exceeded; it is a share and not percent"),
        ("model.elements", 10, double.PositiveInfinity, "below 10 the loads along the blade are coarse"),
    ];

    /// <param name="value">In the unit of the file; NaN or 0 where it is wrong, and then nothing more is said.</param>
    public static void Check(CaseValues values, string path, double value)
    {
        var usual = Lines.First(line => line.Path == path);
        if (values.Has(path) && (value > 0 && value < usual.Low || value > usual.High))
            values.Doubt(path, $"is {CanonicalText.Of(value)}; {usual.Sentence}");
    }

    /// <summary>The tip speed at the highest rotor speed that the case states.</summary>
    /// <param name="cone">rad</param>
    public static void CheckTipSpeed(CaseValues values, Control strategy, Blade blade, double cone)
    {
        var (path, rotorSpeed) = strategy switch
        {
            Control.VariableSpeed variable => ("control.max_rotor_speed_rpm", variable.MaxRotorSpeed),
            Control.FixedSpeed fixedSpeed => ("control.rotor_speed_rpm", fixedSpeed.RotorSpeed),
            Control.Schedule schedule => ("control.schedule", schedule.Points.Max(point => point.RotorSpeed)),
            _ => throw new ArgumentOutOfRangeException(nameof(strategy)),
        };
        var tipSpeed = rotorSpeed * blade.TipRadius * Math.Cos(cone);
        if (!values.Has(path) || !(tipSpeed is > 0 and < SlowestTip or > FastestTip))
            return;
        var rpm = CanonicalText.Of(Math.Round(rotorSpeed * 60 / Math.Tau, 6));
        var found = strategy is Control.Schedule ? $"goes up to {rpm} rpm" : $"is {rpm}";
        values.Doubt(path, $"{found}, a tip speed of {CanonicalText.Of(Math.Round(tipSpeed, 2))} m/s; "
            + "5 to 150 m/s are usual, and rotor speeds are in rpm");
    }

    /// <summary>Doubts a case that lists no wind speed from cut-in to cut-out: the rotor is at rest in every row.</summary>
    public static void CheckOperation(CaseValues values, ImmutableArray<double> windSpeeds, double cutIn, double cutOut)
    {
        if (windSpeeds.IsDefaultOrEmpty || cutIn > cutOut || windSpeeds.Any(v => v >= cutIn && v <= cutOut))
            return;
        var (path, found) = windSpeeds[^1] < cutIn
            ? ("control.cut_in_wind_speed_m_s", $"is {CanonicalText.Of(cutIn)}, above the last wind speed of the case, {CanonicalText.Of(windSpeeds[^1])} m/s")
            : ("control.cut_out_wind_speed_m_s",
                $"is {CanonicalText.Of(cutOut)}, and the case lists no wind speed from cut-in {CanonicalText.Of(cutIn)} up to it");
        values.Doubt(path, $"{found}; the rotor is at rest in every row");
    }

    /// <summary>Doubts a year of energy whose curve does not reach from cut-in to cut-out: it leaves out what lies between, in silence.</summary>
    public static void CheckYear(CaseValues values, ImmutableArray<double> windSpeeds, double cutIn, double cutOut)
    {
        const double Bin = 0.5;
        const string CutIn = "control.cut_in_wind_speed_m_s", CutOut = "control.cut_out_wind_speed_m_s";
        if (windSpeeds.IsDefaultOrEmpty)
            return;
        if (values.Has(CutIn) && windSpeeds[0] > cutIn + Bin)
            values.Doubt(CutIn, $"is {CanonicalText.Of(cutIn)}, and the wind speeds of the case begin at "
                + $"{CanonicalText.Of(windSpeeds[0])} m/s; the year of [site] leaves out what lies between");
        if (values.Has(CutOut) && windSpeeds[^1] < cutOut - Bin)
            values.Doubt(CutOut, $"is {CanonicalText.Of(cutOut)}, and the wind speeds of the case end at "
                + $"{CanonicalText.Of(windSpeeds[^1])} m/s; the year of [site] leaves out what lies between");
    }
}
