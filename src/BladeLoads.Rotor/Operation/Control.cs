using System.Collections.Immutable;

namespace BladeLoads.Rotor.Operation;

/// <summary>How rotor speed and pitch follow the wind. A closed set: variable speed, fixed speed, schedule.</summary>
public abstract record Control
{
    private Control(double? ratedPower) => RatedPower = ratedPower;

    /// <summary>Electrical, W; null for none. Only a variable-speed machine holds it; the others mark what exceeds it.</summary>
    public double? RatedPower { get; init; }

    /// <summary>
    /// Rotor speed = tip-speed ratio x wind speed / (R cos cone), held between the limits; fine pitch below rated.
    /// </summary>
    /// <param name="TipSpeedRatio">Held between the speed limits, above 0; null for the best.</param>
    /// <param name="FinePitch">rad; null for the best.</param>
    /// <param name="MinRotorSpeed">rad/s, 0 for none.</param>
    /// <param name="MaxRotorSpeed">rad/s, positive infinity for none.</param>
    /// <param name="SpeedLimitedPitch">What the pitch does below rated where the rotor speed is limited.</param>
    /// <param name="AboveRated">What the pitch does from the rated wind speed up.</param>
    /// <param name="ThrustLimit">N, held by pitch; null for none.</param>
    public sealed record VariableSpeed(
        double? TipSpeedRatio, double? FinePitch, double MinRotorSpeed, double MaxRotorSpeed, SpeedLimitedPitch SpeedLimitedPitch,
        double? RatedPower, AboveRated AboveRated, double? ThrustLimit) : Control(RatedPower);

    /// <param name="RotorSpeed">rad/s; 0 is a rotor at rest.</param>
    /// <param name="Pitch">rad.</param>
    public sealed record FixedSpeed(double RotorSpeed, double Pitch, double? RatedPower) : Control(RatedPower);

    /// <summary>Rotor speed and pitch from a table, linear in wind speed between its rows.</summary>
    /// <param name="Points">At least one, wind speeds rising; covers every wind speed of the case.</param>
    public sealed record Schedule(ImmutableArray<OperatingPoint> Points, double? RatedPower) : Control(RatedPower)
    {
        /// <summary>The operating point at a wind speed, m/s; beyond the table its nearest row holds.</summary>
        public OperatingPoint At(double windSpeed)
        {
            if (windSpeed <= Points[0].WindSpeed)
                return Points[0] with { WindSpeed = windSpeed };
            if (windSpeed >= Points[^1].WindSpeed)
                return Points[^1] with { WindSpeed = windSpeed };
            var j = 0;
            while (Points[j + 1].WindSpeed <= windSpeed)
                j++;
            var (a, b) = (Points[j], Points[j + 1]);
            var w = (windSpeed - a.WindSpeed) / (b.WindSpeed - a.WindSpeed);
            return new OperatingPoint(
                windSpeed, a.RotorSpeed + (w * (b.RotorSpeed - a.RotorSpeed)), a.Pitch + (w * (b.Pitch - a.Pitch)));
        }
    }
}

/// <summary>What the pitch does from the rated wind speed up.</summary>
public enum AboveRated { PitchToFeather, PitchToStall, None }

/// <summary>What the pitch does below rated where the rotor speed is limited: stay fine, or follow the most power.</summary>
public enum SpeedLimitedPitch { Hold, Best }
