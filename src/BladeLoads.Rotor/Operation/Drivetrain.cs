using System.Collections.Immutable;

namespace BladeLoads.Rotor.Operation;

/// <summary>
/// What the drivetrain makes of rotor power: an efficiency, the same at every load or by load. Electrical power rises with rotor power.
/// Equality is by reference.
/// </summary>
public sealed class Drivetrain
{
    private readonly ImmutableArray<Row> _rows;

    private Drivetrain(ImmutableArray<Row> rows) => _rows = rows;

    /// <summary>One efficiency at every load.</summary>
    /// <param name="efficiency">Electrical over rotor power, above 0 to 1.</param>
    /// <exception cref="ArgumentException">It is not.</exception>
    public static Drivetrain Constant(double efficiency) => ByLoad([(0, efficiency)], 1);

    /// <summary>An efficiency that varies with load, linear between rows; the first holds below, the last beyond.</summary>
    /// <param name="rows">Share of rated electrical power, 0 or above and rising; efficiency, above 0 to 1. One row or more.</param>
    /// <param name="ratedPower">Electrical, W, above 0.</param>
    /// <exception cref="ArgumentException">A row breaks what is said above, or needs less rotor power than the one before it.</exception>
    public static Drivetrain ByLoad(ReadOnlySpan<(double Load, double Efficiency)> rows, double ratedPower)
    {
        var all = ImmutableArray.CreateBuilder<Row>(rows.Length);
        foreach (var (load, efficiency) in rows)
        {
            if (!(load >= 0) || !(efficiency is > 0 and <= 1))
                throw new ArgumentException($"row {all.Count}: load 0 or above, efficiency above 0 to 1", nameof(rows));
            var row = new Row(load * ratedPower, efficiency);
            if (all.Count > 0 && !(row.Electrical > all[^1].Electrical && row.Rotor > all[^1].Rotor))
                throw new ArgumentException($"row {all.Count}: load, and rotor power with it, must rise", nameof(rows));
            all.Add(row);
        }
        if (all.Count == 0)
            throw new ArgumentException("one row or more", nameof(rows));
        return new Drivetrain(all.MoveToImmutable());
    }

    /// <summary>Electrical power, W; 0 where the rotor takes power; NaN for NaN.</summary>
    /// <param name="rotorPower">W.</param>
    public double Electrical(double rotorPower)
    {
        if (rotorPower <= 0)
            return 0;
        if (rotorPower <= _rows[0].Rotor || _rows.Length == 1)
            return rotorPower * _rows[0].Efficiency;
        var i = 0;
        while (i < _rows.Length - 1 && rotorPower > _rows[i + 1].Rotor)
            i++;
        if (i == _rows.Length - 1)
            return rotorPower * _rows[i].Efficiency;
        // The load is that of the electrical power itself: Pe = P (e + s (Pe - Pe_i)), solved for Pe.
        var slope = (_rows[i + 1].Efficiency - _rows[i].Efficiency) / (_rows[i + 1].Electrical - _rows[i].Electrical);
        return rotorPower * (_rows[i].Efficiency - (slope * _rows[i].Electrical)) / (1 - (slope * rotorPower));
    }

    private readonly record struct Row(double Electrical, double Efficiency)
    {
        public double Rotor => Electrical / Efficiency;
    }
}
