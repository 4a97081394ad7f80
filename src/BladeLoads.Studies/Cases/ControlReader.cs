using System.Collections.Immutable;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>What [control] says: the strategy, the wind speeds of operation, the drivetrain.</summary>
/// <param name="Strategy">Null when an error keeps it from being known.</param>
internal sealed record ControlValues(
    Control? Strategy, double CutIn, double CutOut, Drivetrain? Drivetrain, ScheduleTable? Schedule);

/// <summary>Reads [control].</summary>
internal static class ControlReader
{
    private const string VariableSpeed = "variable-speed", FixedSpeed = "fixed-speed", BySchedule = "schedule";

    private static readonly ImmutableDictionary<string, string[]> KeysOf = new Dictionary<string, string[]>
    {
        [VariableSpeed] =
        [
            "tip_speed_ratio", "fine_pitch_deg", "min_rotor_speed_rpm", "max_rotor_speed_rpm", "speed_limited_pitch",
            "above_rated", "thrust_limit_kN",
        ],
        [FixedSpeed] = ["rotor_speed_rpm", "pitch_deg"],
        [BySchedule] = ["schedule"],
    }.ToImmutableDictionary(StringComparer.Ordinal);

    /// <param name="windSpeeds">m/s; empty when they are not known.</param>
    public static ControlValues Read(CaseValues values, ImmutableArray<double> windSpeeds, StudyFolder folder, StudyTables tables)
    {
        var cutIn = values.Number(
            "control.cut_in_wind_speed_m_s", CaseDefaults.CutInWindSpeed, Ranges.CutIn);
        var cutOut = values.Number(
            "control.cut_out_wind_speed_m_s", CaseDefaults.CutOutWindSpeed, Ranges.CutOut);
        CrossedLimits.WindSpeeds.Refuse(values, cutIn, cutOut);
        UsualRanges.CheckOperation(values, windSpeeds, cutIn, cutOut);
        var ratedPowerKiloWatt = values.OptionalNumber("control.rated_power_kW", Ranges.RatedPower);
        UsualRanges.Check(values, "control.rated_power_kW", ratedPowerKiloWatt ?? double.NaN);
        var ratedPower = ratedPowerKiloWatt * 1e3;
        var drivetrain = DrivetrainReader.Read(values, ratedPower);

        if (!values.Has("control.strategy"))
            values.Missing("control.strategy", null);
        var strategy = values.Choice("control.strategy", "", VariableSpeed, FixedSpeed, BySchedule);
        var read = new ControlValues(null, cutIn, cutOut, drivetrain, null);
        if (strategy is null or "")
            return read;
        RefuseKeysOfOthers(values, strategy);
        return strategy switch
        {
            VariableSpeed => read with { Strategy = ReadVariableSpeed(values, ratedPower) },
            FixedSpeed => read with { Strategy = ReadFixedSpeed(values, ratedPower) },
            _ => ReadSchedule(values, windSpeeds, ratedPower, read, folder, tables),
        };
    }

    private static Control.VariableSpeed ReadVariableSpeed(CaseValues values, double? ratedPower)
    {
        var tipSpeedRatio = values.NumberOrBest("control.tip_speed_ratio", Ranges.TipSpeedRatio);
        var finePitch = values.NumberOrBest("control.fine_pitch_deg", Ranges.FinePitch);
        var slowest = values.Number(
            "control.min_rotor_speed_rpm", CaseDefaults.MinRotorSpeedRpm, Ranges.RotorSpeed);
        var fastest = values.Number(
            "control.max_rotor_speed_rpm", CaseDefaults.MaxRotorSpeedRpm, Ranges.HighestRotorSpeed);
        CrossedLimits.RotorSpeeds.Refuse(values, slowest, fastest);
        var speedLimitedPitch = values.Choice("control.speed_limited_pitch", CaseDefaults.SpeedLimitedPitch, "hold", "best");
        var aboveRated = values.Choice("control.above_rated", CaseDefaults.AboveRated(values.Has("control.rated_power_kW")),
            "pitch-to-feather", "pitch-to-stall", "none");
        if (aboveRated is "pitch-to-feather" or "pitch-to-stall" && !values.Has("control.rated_power_kW"))
            values.RefuseValue("control.above_rated",
                $"is '{aboveRated}' without a rated power; give rated_power_kW or leave above_rated out");
        var thrustLimit = values.OptionalNumber("control.thrust_limit_kN", Ranges.ThrustLimit) * 1e3;
        UsualRanges.Check(values, "control.thrust_limit_kN", thrustLimit / 1e3 ?? double.NaN);
        return new Control.VariableSpeed(
            tipSpeedRatio, finePitch is { } deg ? double.DegreesToRadians(deg) : null, RadiansPerSecond(slowest), RadiansPerSecond(fastest),
            speedLimitedPitch == "best" ? SpeedLimitedPitch.Best : SpeedLimitedPitch.Hold, ratedPower,
            aboveRated switch
            {
                "pitch-to-feather" => AboveRated.PitchToFeather,
                "pitch-to-stall" => AboveRated.PitchToStall,
                _ => AboveRated.None,
            },
            thrustLimit);
    }

    private static Control.FixedSpeed ReadFixedSpeed(CaseValues values, double? ratedPower)
    {
        var rotorSpeed = values.RequiredNumber("control.rotor_speed_rpm", Ranges.RotorSpeed);
        var pitch = values.RequiredNumber("control.pitch_deg", Bounds.Within(180));
        return new Control.FixedSpeed(RadiansPerSecond(rotorSpeed), double.DegreesToRadians(pitch), ratedPower);
    }

    private static ControlValues ReadSchedule(
        CaseValues values, ImmutableArray<double> windSpeeds, double? ratedPower, ControlValues rest, StudyFolder folder,
        StudyTables tables)
    {
        const string path = "control.schedule";
        if (!values.Has(path))
            values.Missing(path, null);
        if (values.Text(path) is not { } reference)
            return rest;
        var at = values.Find(path)!.Value.At;
        if (folder.Locate(at.File, reference, EntryKind.File, out var problem) is not { } fullPath)
        {
            values.Refuse(at, problem);
            return rest;
        }
        values.Uses(folder.RelativePath(fullPath));
        if (tables.Schedule(fullPath) is not { Points.IsEmpty: false } schedule)
        {
            values.Spoil();
            return rest;
        }
        values.Note(path, schedule.Canonical.Hash);
        var (lowest, highest) = (schedule.Points[0].WindSpeed, schedule.Points[^1].WindSpeed);
        var operating = windSpeeds.Where(v => v >= rest.CutIn && v <= rest.CutOut);
        if (operating.Where(v => v < lowest || v > highest).ToList() is [var bare, .. var others])
            values.RefuseValue(path, $"{VisibleText.Quote(reference)} runs from {CanonicalText.Of(lowest)} to "
                + $"{CanonicalText.Of(highest)} m/s and does not cover {Uncovered(bare, others)}: rotor speed and pitch are not known there; "
                + "add rows, or set cut-in and cut-out within it");
        return rest with { Strategy = new Control.Schedule(schedule.Points, ratedPower), Schedule = schedule };
    }

    private static string Uncovered(double first, List<double> others) => others.Count == 0
        ? $"{CanonicalText.Of(first)} m/s"
        : $"{CanonicalText.Of(others.Count + 1)} wind speeds of the case, the first {CanonicalText.Of(first)} and the last {CanonicalText.Of(others[^1])} m/s";

    private static void RefuseKeysOfOthers(CaseValues values, string strategy)
    {
        foreach (var (other, keys) in KeysOf)
            foreach (var key in keys.Where(_ => other != strategy))
                if (values.Find($"control.{key}") is { } entry && !ChangesNothing(entry.Value))
                    values.RefuseKey($"control.{key}",
                        $"'{key}' does not go with strategy '{strategy}', which takes {string.Join(", ", KeysOf[strategy])}; "
                        + (values.IsStartingValue(entry) ? "write it in the cases that it goes with" : "leave it out"));
    }

    private static bool ChangesNothing(TomlValue value) => value is TomlValue.Text { Value: "hold" or "none" };

    private static double RadiansPerSecond(double revolutionsPerMinute) => revolutionsPerMinute * Math.Tau / 60;
}
