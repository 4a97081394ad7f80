namespace BladeLoads.Results.Tables;

/// <summary>The one place where SI values and radians become the units that files and screens name.</summary>
internal static class FileUnits
{
    /// <summary>rad/s -> rpm.</summary>
    public static double Rpm(double rotorSpeed) => rotorSpeed / (Math.PI / 30);

    /// <summary>rad -> deg.</summary>
    public static double Deg(double angle) => double.RadiansToDegrees(angle);

    /// <summary>A slope by angle: per rad -> per deg.</summary>
    public static double PerDeg(double slope) => slope * (Math.PI / 180);

    /// <summary>J -> MWh.</summary>
    public static double MegawattHours(double energy) => energy / 3.6e9;

    /// <summary>s -> h.</summary>
    public static double Hours(double time) => time / 3600;

    /// <summary>W, N, N m -> kW, kN, kNm.</summary>
    public static double Kilo(double value) => value / 1000;
}
