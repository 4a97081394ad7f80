using System.Collections.Immutable;

namespace BladeLoads.Rotor.Operation;

/// <summary>How rotor speed and pitch follow the wind. A closed set: variable speed, fixed speed, schedule.</summary>
public abstract record Control
{
    private Control() { }

    /// <summary>
    /// Rotor speed = tip-speed ratio x wind speed / (R cos cone), held between the limits; fine pitch below rated.
    /// </summary>
    /// <param name="TipSpeedRatio">Tip-speed ratio held between the speed limits, above 0.</param>
    /// <param name="FinePitch">rad.</param>
    /// <param name="MinRotorSpeed">rad/s, 0 for none.</param>
    /// <param name="MaxRotorSpeed">rad/s, positive infinity for none.</param>
    /// <param name="RatedPower">Electrical, W; null for none.</param>
    /// <param name="AboveRated">What the pitch does from the rated wind speed up.</param>
    public sealed record VariableSpeed(
        double TipSpeedRatio, double FinePitch, double MinRotorSpeed, double MaxRotorSpeed,
        double? RatedPower, AboveRated AboveRated) : Control;

    /// <param name="RotorSpeed">rad/s; 0 is a rotor at rest.</param>
    /// <param name="Pitch">rad.</param>
    /// <param name="RatedPower">Electrical, W; only marks the points that exceed it. Null for none.</param>
    public sealed record FixedSpeed(double RotorSpeed, double Pitch, double? RatedPower) : Control;

    /// <summary>Rotor speed and pitch from a table, linear in wind speed between its rows.</summary>
    /// <param name="Points">At least one, wind speeds rising; covers every wind speed of the case.</param>
    /// <param name="RatedPower">Electrical, W; only marks the points that exceed it. Null for none.</param>
    public sealed record Schedule(ImmutableArray<OperatingPoint> Points, double? RatedPower) : Control
    {
        /// <summary>The operating point at a wind speed, m/s; beyond the table its nearest row holds.</summary>
        public OperatingPoint At(double windSpeed)
        {
            var j = 0;
            while (j < Points.Length - 2 && Points[j + 1].WindSpeed <= windSpeed)
                j++;
            if (Points.Length == 1 || windSpeed <= Points[0].WindSpeed)
                return Points[0] with { WindSpeed = windSpeed };
            if (windSpeed >= Points[^1].WindSpeed)
                return Points[^1] with { WindSpeed = windSpeed };
            var (a, b) = (Points[j], Points[j + 1]);
            var w = (windSpeed - a.WindSpeed) / (b.WindSpeed - a.WindSpeed);
            return new OperatingPoint(
                windSpeed, a.RotorSpeed + (w * (b.RotorSpeed - a.RotorSpeed)), a.Pitch + (w * (b.Pitch - a.Pitch)));
        }
    }
}

/// <summary>What the pitch does from the rated wind speed up.</summary>
public enum AboveRated { PitchToFeather, None }
