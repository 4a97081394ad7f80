namespace BladeLoads.Results.Tables;

/// <summary>The one place where SI values and radians become the units that files and screens name.</summary>
internal static class FileUnits
{
    /// <summary>rad/s -> rpm.</summary>
    public static double Rpm(double rotorSpeed) => rotorSpeed / (Math.PI / 30);

    /// <summary>rad -> deg.</summary>
    public static double Deg(double angle) => double.RadiansToDegrees(angle);

    /// <summary>W, N, N m -> kW, kN, kNm.</summary>
    public static double Kilo(double value) => value / 1000;
}
