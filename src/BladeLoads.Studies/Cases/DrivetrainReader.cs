using System.Collections.Immutable;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>Reads control.drivetrain_efficiency: one number, or pairs of load and efficiency.</summary>
internal static class DrivetrainReader
{
    private const string Path = "control.drivetrain_efficiency";

    private static readonly Pairs LoadPairs = new(
        "drivetrain_efficiency", ("load", Ranges.Load), ("efficiency", Ranges.Efficiency), "[[0.1, 0.85], [1, 0.94]]");

    /// <summary>Null where an error keeps it from being known.</summary>
    /// <param name="ratedPower">Electrical, W; null for none.</param>
    public static Drivetrain? Read(CaseValues values, double? ratedPower)
    {
        if (values.Find(Path) is not { Value: TomlValue.List list })
        {
            var efficiency = values.Number(Path, CaseDefaults.DrivetrainEfficiency, Ranges.Efficiency);
            return double.IsNaN(efficiency) ? null : Drivetrain.Constant(efficiency);
        }
        var rows = LoadPairs.Read(values, list);
        values.Note(Path, Pairs.Canonical(rows));
        if (ratedPower is null)
            values.RefuseValue(Path, "is by load, a share of rated power, and there is none; give rated_power_kW, or one number");
        if (rows.IsEmpty || ratedPower is not { } rated || double.IsNaN(rated) || !RotorPowerRises(values, list, rows))
            return null;
        return Drivetrain.ByLoad(rows.AsSpan(), rated);
    }

    private static bool RotorPowerRises(CaseValues values, TomlValue.List list, ImmutableArray<(double Load, double Efficiency)> rows)
    {
        for (var i = 1; i < rows.Length; i++)
            if (!(rows[i].Load / rows[i].Efficiency > rows[i - 1].Load / rows[i - 1].Efficiency))
            {
                values.Refuse(list.Items[i].At,
                    $"drivetrain_efficiency rises so steeply from load {CanonicalText.Of(rows[i - 1].Load)} to "
                    + $"{CanonicalText.Of(rows[i].Load)} that more load would need less rotor power; check both pairs");
                return false;
            }
        return true;
    }
}
